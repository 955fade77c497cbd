import { describe, expect, test } from "vitest";
import { demoPlans } from "../../../server/demo/plans";
import { gammaOf, presetLeavesOut, simpleIonCharge, toProblem } from "../../../shared/plan/toProblem";
import type { PlanInputs, PlanMetal } from "../../../shared/schemas/plan";
import { presetNames } from "../../../shared/schemas/plan";
import { problemSchema } from "../../../shared/schemas/problem";
import { expectInvariants } from "../../support/invariants";
import { unusualInputs } from "../../support/planInputs";
import { library, solved } from "../../support/solver";

const problem = (change: Partial<PlanInputs> = {}) => toProblem({ ...unusualInputs, ...change }, library);
const sulfate: Partial<PlanInputs> = { preset: "sulfate", ligands: [{ component: "S", activity: 0.5 }], sulfateReduction: false }; // prettier-ignore

describe("the question behind a plan", () => {
  test("carries everything the plan says", () => {
    expect(problem()).toEqual({
      temperatureC: 47.5,
      metals: [
        { element: "Cu", role: "watched", requirement: "free", gPerL: 3.25, gamma: 0.42 },
        { element: "Zn", role: "gangue", requirement: "compound", activity: 2e-7 },
      ],
      ligands: [{ component: "NH3", activity: 1.75 }],
      others: [{ component: "K", activity: 0.05 }],
      sulfateReduction: true,
      solidsBasis: "aged",
      feedMinerals: ["CuO(s)"],
      dosed: ["peroxide"],
      leftOut: ["ZnO(s)"],
      putBack: ["Cu(OH)2(s)"],
      frame: { pH: [7.5, 12.5], Eh: [-0.75, 0.65] },
      water: { bound: "upper", oxygenV: 0.3, hydrogenV: 0.7 },
      controlBand: { pH: 0.25, Eh: 0.045 },
      excludedHazards: [{ gas: "NH3", bar: 0.0125 }],
    });
  });

  test("is a problem the solver takes, and its solution keeps the invariants", () => {
    expect(problemSchema.safeParse(problem()).success).toBe(true);
    expectInvariants(problem(), solved(problem()));
  });

  test.each(demoPlans.flatMap((p) => p.revisions.map((r) => [`${p.name}: ${r.note}`, r.inputs] as const)))(
    "%s keeps the invariants",
    (_, inputs) => {
      const asked = toProblem(inputs, library);
      expectInvariants(asked, solved(asked));
    },
  );
});

describe("what the lixiviant leaves out", () => {
  test.each(presetNames)("%s names species of the library", (preset) => {
    for (const full of [false, true])
      for (const id of presetLeavesOut(library, preset, full)) expect(library.species.has(id)).toBe(true);
  });

  test("sulfate leaves sulfides out; with all of sulfur in play they stay", () => {
    expect(problem(sulfate).leftOut).toContain("CuS(s)");
    expect(problem({ ...sulfate, sulfateReduction: true }).leftOut).not.toContain("CuS(s)");
    const sulfideDosed = [...sulfate.ligands!, { component: "S(sulfide)", activity: 1e-3 }];
    expect(problem({ ...sulfate, ligands: sulfideDosed }).leftOut).not.toContain("CuS(s)");
  });

  test("but not the feed's minerals, what is put back, or the forms of a reagent dosed", () => {
    const all = problem(sulfate).leftOut!;
    expect(all).toEqual(expect.arrayContaining(["CuFeS2(s)", "NiS(s)", "S2O8^2-(aq)", "HSO3^-(aq)"]));
    const kept = problem({
      ...sulfate,
      feedMinerals: ["CuFeS2(s)"],
      putBack: ["NiS(s)"],
      dosed: ["persulfate"],
    }).leftOut!;
    expect(all.filter((id) => !kept.includes(id)).sort()).toEqual(["CuFeS2(s)", "NiS(s)", "S2O8^2-(aq)"]);
  });

  test("the plan's own list wins over what it puts back", () => {
    const both = { leftOut: [{ species: "ZnO(s)", reason: "slow here" }], putBack: ["ZnO(s)"] };
    expect(problem(both).leftOut).toContain("ZnO(s)");
    expect(solved(problem(both)).leftOut).toContainEqual({ species: "ZnO(s)", reason: "left out by the plan" });
  });
});

describe("gamma of a tenor", () => {
  const line = (gammaFrom: PlanMetal["gammaFrom"], element = "Cu", gamma: number | null = null): PlanMetal =>
    ({ element, role: "target", requirement: "dissolved", entry: "gPerL", value: 1, gammaFrom, gamma }); // prettier-ignore

  test("one, typed, or Davies where there is an ionic strength", () => {
    expect(gammaOf(library, line("one"), 0.1)).toBe(1);
    expect(gammaOf(library, line("typed", "Cu", 0.3), 0.1)).toBe(0.3);
    expect(gammaOf(library, line("davies"), null)).toBe(1);
    // log10 gamma = -0.51 z^2 (sqrt I / (1 + sqrt I) - 0.3 I) at 25 C, z = 2, I = 0.1: 0.371
    expect(gammaOf(library, line("davies"), 0.1, 25)).toBeCloseTo(0.37, 2);
  });

  test.each([
    ["Cu", 2],
    ["Zn", 2],
    ["Ag", 1],
    ["Al", 3],
    ["Fe", 2],
    ["As", 0],
    ["Au", 1],
  ])("the simple ion of %s has charge %i", (element, z) =>
    // prettier-ignore
    expect(simpleIonCharge(library, element)).toBe(z),
  );
});
