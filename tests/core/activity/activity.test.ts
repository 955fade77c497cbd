import { readFileSync } from "node:fs";
import { parse } from "csv-parse/sync";
import { describe, expect, test } from "vitest";
import { ionicStrength, molality } from "../../../shared/activity/concentration";
import { davies, DAVIES_LIMIT, daviesSlope } from "../../../shared/activity/davies";
import { debyeHuckelA, debyeHuckelB, dielectricConstant } from "../../../shared/activity/debyeHuckel";
import { nernstSlope } from "../../../shared/electrodes/convert";
import { valueOf } from "../../../shared/outcome";
import { kelvin } from "../../../shared/units";
import { chemistry } from "../../support/chemistry";
import { practiceCheck } from "../../support/practice";

const rows = parse<Record<string, string>>(readFileSync("tests/golden/water.csv", "utf8"), { columns: true });
const near = (value: number, want: number, tolerance: number) =>
  expect(Math.abs(value - want)).toBeLessThanOrEqual(tolerance);

describe.each(rows)("water at $T_C C", (row) => {
  const T = Number(row.T_K);
  test("dielectric constant", () => near(dielectricConstant(T), Number(row.epsilon__IAPWSR8), 0.02));
  test("Debye-Hueckel A and B", () => {
    near(debyeHuckelA(T), Number(row["DH_A_log10_kg0.5_mol-0.5__CALC"]), 0.0005);
    near(debyeHuckelB(T), Number(row.DH_B_per_angstrom__CALC), 0.0002);
  });
});

// IAPWS R8-97, check values of the release as references.csv quotes them (IAPWSR8).
test.each([
  [298.15, 999.242866, 78.590725],
  [873.15, 26.0569558, 1.1262097],
])("the dielectric constant at %d K and %d kg/m3 is %d", (T, density, value) =>
  near(dielectricConstant(T, density), value, 1e-6),
);

describe("Davies", () => {
  test("F22: a copper sulfate liquor", () => {
    const check = practiceCheck("F22");
    const Cu = valueOf(molality(chemistry(), "Cu", check.input("Cu_as_CuSO4")));
    const Na2SO4 = check.input("Na2SO4");
    near(Cu, check.expected("Cu"), check.within("Cu"));
    const I = ionicStrength([
      { m: Cu, z: 2 },
      { m: Cu + Na2SO4, z: -2 },
      { m: 2 * Na2SO4, z: 1 },
    ]);
    near(I, check.expected("I"), check.within("I"));
    const gamma = davies(2, I);
    near(gamma, check.expected("gamma_z2"), check.within("gamma_z2"));
    near(Cu * gamma, check.expected("activity"), check.within("activity"));
    const shift = (nernstSlope(kelvin(25)) / 2) * Math.log10(gamma) * 1000;
    near(shift, check.expected("potential_shift"), check.within("potential_shift"));
  });

  test("F23: the terms 0.3 and 0.2", () => {
    const check = practiceCheck("F23");
    near(davies(2, check.input("I")), check.expected("gamma_0.3"), check.within("gamma_0.3"));
    near(davies(2, check.input("I"), 0.2), check.expected("gamma_0.2"), check.within("gamma_0.2"));
  });

  test("F24: beyond the limit the raw number is there, and known to mean nothing", () => {
    const check = practiceCheck("F24");
    expect(check.input("I") <= DAVIES_LIMIT).toBe(false);
    near(davies(check.input("z"), check.input("I")), check.expected("raw_gamma"), 1e-4);
  });

  test("a neutral species, or water without ions, has gamma 1", () => {
    expect(davies(0, 0.3)).toBe(1);
    expect(davies(2, 0)).toBe(1);
  });

  test("the slope is 0.509 at 25 C and rises with temperature", () => {
    expect(daviesSlope(298.15)).toBe(0.509);
    for (let t = 5; t <= 250; t += 5) expect(daviesSlope(kelvin(t))).toBeGreaterThan(daviesSlope(kelvin(t - 5)));
  });
});

test("a tenor that is none is refused", () => {
  expect(molality(chemistry(), "Xx", 1)).toMatchObject({ ok: false, error: { code: "UNKNOWN_COMPONENT" } });
  expect(molality(chemistry(), "Cu", 0)).toMatchObject({
    ok: false,
    error: { code: "OUT_OF_RANGE", message: "tenor of Cu: 0 g/L; it must be above 0" },
  });
});
