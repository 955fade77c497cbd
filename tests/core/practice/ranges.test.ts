import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { boxOf } from "../../../shared/practice/box";
import { publishedRanges, rangesFor } from "../../../shared/practice/ranges";
import { presetNames } from "../../../shared/schemas/plan";
import { library } from "../../support/solver";

interface Check {
  id: string;
  topic: string;
  expected: Record<string, { min: number; max: number; unit: string }>;
  source: string;
}
const checks = (JSON.parse(readFileSync("tests/golden/practice-checks.json", "utf8")) as Check[]).filter((c) =>
  c.id.startsWith("R"),
);
const byId = new Map(publishedRanges.map((r) => [r.id, r])); // prettier-ignore

describe("the ranges are those of the practice brief", () => {
  test("all 44, each with a step and a source", () => {
    expect(publishedRanges.map((r) => r.id)).toEqual(checks.map((c) => c.id).sort());
    for (const c of checks) {
      const range = byId.get(c.id)!;
      expect(`operating range: ${range.step}`).toBe(c.topic);
      expect(range.source).toBe(c.source);
    }
  });
  test("pH, Eh on the SHE scale and temperature as published", () => {
    for (const { id, expected } of checks) {
      const range = byId.get(id)!;
      const span = (key: string, factor = 1) => {
        const e = expected[key];
        return e === undefined ? null : [e.min * factor, e.max * factor];
      };
      expect(range.pH, id).toEqual(span("pH") ?? span("pH_PLS"));
      expect(range.Eh?.map((v) => Math.round(1000 * v)) ?? null, id).toEqual(span("Eh_SHE"));
      expect(range.temperatureC, id).toEqual(span("T") ?? span("T_leach"));
    }
  });
  test("elements and lixiviants are known, spans run upwards", () => {
    for (const r of publishedRanges) {
      for (const e of r.elements) expect(library.molarMass.has(e), `${r.id} ${e}`).toBe(true);
      for (const p of r.presets) expect(presetNames, r.id).toContain(p);
      for (const span of [r.pH, r.Eh, r.temperatureC]) if (span) expect(span[0], r.id).toBeLessThanOrEqual(span[1]);
    }
  });
});

describe("ranges for a plan's map", () => {
  const ids = (plan: Parameters<typeof rangesFor>[0]) => rangesFor(plan).map((r) => r.range.id);
  test("of its lixiviant and one of its metals, with a pH or an Eh to draw", () => {
    expect(ids({ preset: "cyanide", elements: ["Au"], temperatureC: 25 })).toEqual(["R10", "R11"]);
    expect(ids({ preset: "sulfate", elements: ["U"], temperatureC: 25 })).toEqual(["R28", "R41"]);
    expect(ids({ preset: "carbonate", elements: ["Zn"], temperatureC: 25 })).toEqual([]);
  });
  test("whether the temperature fits is said: within 5 C of the range", () => {
    const at = (temperatureC: number) =>
      rangesFor({ preset: "sulfate", elements: ["Zn"], temperatureC }).find((r) => r.range.id === "R14")!.atTemperature;
    expect([49, 50, 80, 81].map(at)).toEqual([false, true, true, false]);
  });
  test("an axis that is not stated spans the frame; a single value gets the margin; what lies outside is not drawn", () => {
    const frame = { pH: [0, 14] as [number, number], Eh: [-1, 1.2] as [number, number] };
    expect(boxOf(byId.get("R10")!, frame)).toEqual({ pH: [10, 11.5], Eh: [-0.2, 0.2] });
    expect(boxOf(byId.get("R14")!, frame)).toEqual({ pH: [4.5, 5.4], Eh: [-1, 1.2] });
    expect(boxOf(byId.get("R05")!, frame)).toEqual({ pH: [0, 14], Eh: [0.65, 0.8] });
    expect(boxOf(byId.get("R20")!, frame)!.pH.map((v) => Number(v.toFixed(9)))).toEqual([3.8, 4.2]);
    expect(boxOf(byId.get("R10")!, { ...frame, pH: [0, 7] })).toBeNull();
    expect(boxOf(byId.get("R10")!, { ...frame, pH: [0, 11] })!.pH).toEqual([10, 11]);
  });
});
