import { describe, expect, test } from "vitest";
import { missingTotals, withMissingTotals } from "../../../shared/plan/missingTotals";
import { toProblem } from "../../../shared/plan/toProblem";
import { solve } from "../../../shared/solve";
import { feedPlanInputs, newPlanInputs } from "../../../src/lib/newPlan";
import { library, solved } from "../../support/solver";

const leach = newPlanInputs({ step: "leach", preset: "sulfate", target: "Cu", other: "Fe", temperatureC: 25 }, library);
const naming = (...feedMinerals: string[]) => ({ ...leach, feedMinerals });

describe("totals that named minerals need", () => {
  test.each([
    ["covellite", "CuS(s)"],
    ["chalcopyrite", "CuFeS2(s)"],
    ["pyrite", "FeS2(s,pyrite)"],
  ])("%s in a sulfate liquor asks for sulfide, and is solved with it", (_, id) => {
    const plan = naming(id);
    expect(solve(toProblem(plan, library), library)).toMatchObject({ ok: false, error: { code: "LIGAND_MISSING" } });
    expect(missingTotals(plan, library)).toEqual([{ component: "S(sulfide)", list: "ligands", species: [id] }]);
    const given = withMissingTotals(plan, library);
    expect(given).toEqual({ ...plan, ligands: [...plan.ligands, { component: "S(sulfide)", activity: 0.01 }] });
    solved(toProblem(given, library));
    expect(missingTotals(given, library)).toEqual([]);
  });

  test("are each named once, with all that need them, ligands and others where they belong", () => {
    const plan = { ...naming("CuS(s)", "Cu2S(s,chalcocite)"), putBack: ["KFe3(SO4)2(OH)6(s,jarosite)"] };
    expect(missingTotals(plan, library)).toEqual([
      { component: "S(sulfide)", list: "ligands", species: ["CuS(s)", "Cu2S(s,chalcocite)"] },
      { component: "K", list: "others", species: ["KFe3(SO4)2(OH)6(s,jarosite)"] },
    ]);
    solved(toProblem(withMissingTotals(plan, library), library));
  });

  test("with one pool of sulfur the sulfate is enough; oxides and minerals of other metals ask for nothing", () => {
    expect(missingTotals({ ...naming("CuS(s)"), sulfateReduction: true }, library)).toEqual([]);
    expect(missingTotals(naming("CuO(s,tenorite)", "ZnS(s,sphalerite)"), library)).toEqual([]);
    expect(withMissingTotals(leach, library)).toBe(leach);
  });

  test("a plan made from a feed with sulfides can be solved as it is", () => {
    const lines = [{ element: "Cu", role: "target", gPerL: 5 } as const, { element: "Fe", role: "gangue", gPerL: 0.01 } as const];
    const plan = feedPlanInputs({ preset: "chloride", temperatureC: 90, lines, minerals: ["CuFeS2(s)"], sulfate: null }, library);
    expect(plan.ligands.at(-1)).toEqual({ component: "S(sulfide)", activity: 0.01 });
    solved(toProblem(plan, library));
  }); // prettier-ignore
});
