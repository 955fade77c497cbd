import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import type { Problem, Requirement } from "../../shared/schemas/problem";
import { speciesAt } from "../../shared/setpoint/crosscut";
import { library, solved, wideFrame, band } from "../support/solver";
import { presetChoice } from "../support/presets";
import { borderValues, insideWindows, lineThroughWindows, overlapsBox, containsBox, type Axis } from "../support/read";

/** Known answers, each with its source and argument in the file (copied from published ranges, hand calculation or brute
 *  force on the tables, as its `basis` says). Companions are not solved yet. */
interface Scenario {
  id: string;
  title: string;
  inputs: {
    T_C: number;
    preset: string;
    ligands?: Record<string, number>;
    companions?: Record<string, number>;
    exclude?: string[];
    include?: string[];
    use_defaults?: boolean;
    water_band?: boolean;
    metals: { element: string; activity: number; requirement: Requirement }[];
  };
  expect: Expectation[];
}
type Expectation =
  | { type: "stable_at"; metal: string; pH: number; E: number; one_of: string[] }
  | {
      type: "border";
      metal: string;
      between: [string, string];
      at: { pH?: number; E?: number };
      axis: Axis;
      value: number;
      tol: number;
    }
  | { type: "window_contains" | "window_overlaps" | "window_excludes"; pH: [number, number]; E: [number, number] }
  | { type: "window_empty" }
  | { type: "window_E_at_pH"; pH: number; min: number; max: number; tol: number }
  | { type: "window_pH_at_E"; E: number; min: number; max: number; tol: number }
  | { type: "never" | "appears"; metal: string; species: string[]; in_water_band?: boolean };

const { scenarios } = JSON.parse(readFileSync(new URL("./scenarios.json", import.meta.url), "utf8")) as {
  scenarios: Scenario[];
};
const solvable = scenarios.filter((s) => s.inputs.companions === undefined);

export function problemOf({ inputs }: Scenario): Problem {
  const { ligands, leftOut } = presetChoice(inputs.preset, inputs.ligands);
  const include = new Set(inputs.include);
  return {
    temperatureC: inputs.T_C,
    metals: inputs.metals,
    ligands,
    sulfateReduction: inputs.preset === "sulfate_sulfide",
    ...(inputs.use_defaults ? { solidsBasis: "aged" as const } : {}),
    leftOut: [...leftOut, ...(inputs.exclude ?? [])].filter((id) => !include.has(id)),
    putBack: [...include],
    frame: wideFrame,
    water: { bound: inputs.water_band === false ? "none" : "both" },
    controlBand: band,
  };
}

test("24 of the scenarios are within this solver's reach", () => expect(solvable.length).toBe(24));

describe.each(solvable.map((s) => [`${s.id} ${s.title}`, s] as const))("%s", (_, scenario) => {
  const problem = problemOf(scenario);
  const solution = solved(problem);
  const water = solution.waterLines;
  test.each(scenario.expect.map((e, i) => [`${i + 1} ${e.type}`, e] as const))("%s", (_name, e) => {
    switch (e.type) {
      case "stable_at":
        expect(e.one_of).toContain(speciesAt(solution, e.pH, e.E).find((s) => s.metal === e.metal)?.species);
        break;
      case "border": {
        const values = borderValues(solution, e.metal, e.between, e.at, e.axis); // a field may touch another twice
        expect(Math.min(...values.map((v) => Math.abs(v - e.value)))).toBeLessThanOrEqual(e.tol);
        break;
      }
      case "window_contains":
        expect(containsBox(solution, e.pH, e.E)).toBe(true);
        break;
      case "window_overlaps":
        expect(overlapsBox(solution, e.pH, e.E)).toBe(true);
        break;
      case "window_excludes":
        expect(overlapsBox(solution, e.pH, e.E)).toBe(false);
        break;
      case "window_empty":
        expect(solution.windows).toEqual([]);
        break;
      case "window_E_at_pH":
      case "window_pH_at_E": {
        const [lo, hi] =
          e.type === "window_E_at_pH"
            ? lineThroughWindows(solution, "E", e.pH)
            : lineThroughWindows(solution, "pH", e.E);
        expect(Math.abs(lo - e.min)).toBeLessThanOrEqual(e.tol);
        expect(Math.abs(hi - e.max)).toBeLessThanOrEqual(e.tol);
        break;
      }
      case "never":
      case "appears":
        for (const species of e.species) {
          const rules = solution.fields.some(
            (f) => f.metal === e.metal && f.species === species && (!e.in_water_band || reachesBand(f.polygon, water)),
          );
          expect([species, rules]).toEqual([species, e.type === "appears"]);
        }
        break;
    }
  });
  test("no activity was lost", () => {
    for (const m of problem.metals) expect(m.activity).toBeGreaterThan(0);
    expect(insideWindows(solution, 99, 99)).toBe(false);
    expect(library.species.size).toBeGreaterThan(500);
  });
});

/** Whether a convex polygon has a point strictly inside the water band: clip it against both lines. */
function reachesBand(
  polygon: readonly (readonly [number, number])[],
  lines: { which: string; intercept: number; slope: number }[],
): boolean {
  let rest = [...polygon];
  for (const { which, intercept, slope } of lines) {
    const side = which === "oxygen" ? 1 : -1;
    const height = (p: readonly [number, number]) => side * (intercept + slope * p[0] - p[1]);
    rest = rest.flatMap((p, i) => {
      const q = rest[(i + 1) % rest.length]!;
      const [a, b] = [height(p), height(q)];
      const out: (readonly [number, number])[] = a >= 0 ? [p] : [];
      if (a >= 0 !== b >= 0) {
        const t = a / (a - b);
        out.push([p[0] + t * (q[0] - p[0]), p[1] + t * (q[1] - p[1])]);
      }
      return out;
    });
  }
  const area = rest.reduce((sum, p, i) => {
    const q = rest[(i + 1) % rest.length]!;
    return sum + p[0] * q[1] - p[1] * q[0];
  }, 0);
  return area / 2 > 1e-9;
}
