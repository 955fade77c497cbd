import { readFileSync } from "node:fs";
import { parse } from "csv-parse/sync";
import { describe, expect, test } from "vitest";
import { pKwater, pKwaterMarshallFranck, saturatedDensity, saturationPressure } from "../../../shared/gibbs/water";

const rows = parse<Record<string, string>>(readFileSync("tests/golden/water.csv", "utf8"), { columns: true });
const near = (value: number, want: number, tolerance: number) =>
  expect(Math.abs(value - want)).toBeLessThanOrEqual(tolerance);
// 0 C lies 0.01 K below the triple point, where the formulas still hold.
describe.each(rows)("water at $T_C C", (row) => {
  const T = Number(row.T_K);
  test("vapour pressure is that of IF97 within 0.05 %", () =>
    near(saturationPressure(T) / 1e5, Number(row.P_sat_bar__IF97), 5e-4 * Number(row.P_sat_bar__IF97) + 5e-6));
  test("density is that of IF97 within 0.02 %", () =>
    near(saturatedDensity(T), Number(row.density_kg_m3__IF97), 2e-4 * Number(row.density_kg_m3__IF97)));
  test("pKw by IAPWS R11-07 is the table's within 0.002", () => near(pKwater(T), Number(row.pKw__IAPWSR11), 0.002));
  test("pKw by Marshall and Franck is the table's within 0.002", () =>
    near(pKwaterMarshallFranck(T), Number(row.pKw__MF81), 0.002));
});

// IAPWS SR1-86(1992), the check values printed with the equations.
test.each([
  [273.16, 611.657, 999.789],
  [373.1243, 0.101325e6, 958.365],
  [647.096, 22.064e6, 322],
])("the saturation equations reproduce the release at %d K", (T, p, density) => {
  near(saturationPressure(T) / p, 1, 1e-5);
  near(saturatedDensity(T), density, 1e-3);
});
