import { describe, expect, test } from "vitest";
import { toProblem } from "../../../shared/plan/toProblem";
import { overallReaction } from "../../../shared/reactions/atSetPoint";
import {
  planReaction,
  planReactions,
  startsOf,
  staysAsItIs,
  staysWords,
  usualRedox,
} from "../../../shared/reactions/ofPlan";
import type { PlanInputs } from "../../../shared/schemas/plan";
import { metal, sheetInputs } from "../../support/sheetFixture";
import { library as data, solved } from "../../support/solver";

const leach: PlanInputs = {
  ...sheetInputs,
  temperatureC: 25,
  metals: [metal("Cu", "target", "dissolved", 0.01)],
  ligands: [...sheetInputs.ligands, { component: "S(sulfide)", activity: 0.01 }],
  feedMinerals: ["CuFeS2(s)"],
  dosed: [],
  leftOut: [],
};
const purification: PlanInputs = {
  ...sheetInputs,
  metals: [metal("Cd", "gangue", "metal", 1e-6), metal("Zn", "target", "dissolved", 0.1)],
  feedMinerals: [],
  frame: { pH: [1, 7], Eh: [-1.2, 0.6] },
  water: { bound: "upper" },
};
const acid = { pH: 1.5, Eh: 0.65 };
const of = (inputs: PlanInputs, at: { pH: number; Eh: number }, from: string) =>
  planReaction(toProblem(inputs, data), data, inputs, at, from);
const amount = ({ outcome }: ReturnType<typeof of>, formula: string) =>
  outcome.ok ? outcome.value.demand.find((d) => d.formula === formula)?.kgPerKgMetal : undefined;

describe("starts", () => {
  test("feed minerals first, then what is won as it stands in the liquor, then the metals that no mineral brings, each once", () => {
    expect(startsOf(leach, solved(toProblem(leach, data)), data)).toEqual(["CuFeS2(s)"]);
    expect(startsOf({ ...leach, feedMinerals: [] }, solved(toProblem(leach, data)), data)).toEqual(["Cu(s)"]);
    const starts = startsOf(purification, solved(toProblem(purification, data)), data);
    expect(starts).toEqual(["CdSO4(aq)", "Cd(s)", "Zn(s)"]);
  });
  test("the usual reagent follows the electrons and the liquor", () => {
    expect([usualRedox(4, "sulfate", []), usualRedox(4, "chloride", []), usualRedox(0, "sulfate", [])]).toEqual(["air", "cupric-chloride", null]); // prettier-ignore
    expect([usualRedox(-2, "cyanide", []), usualRedox(-2, "sulfate", ["Zn"]), usualRedox(-2, "sulfate", ["Ni"])]).toEqual(["zinc-dust", "zinc-dust", "iron-scrap"]); // prettier-ignore
  });
});

describe("what the plan has chosen is what is written", () => {
  test("without a choice: the usual oxidant, sulfur left as sulfur, iron as ferric; ferrous by hand takes 0.504 kg oxygen a kg of copper (practice, section 6)", () => {
    const usual = of(leach, acid, "CuFeS2(s)");
    expect(usual).toMatchObject({ redox: "air", electrons: 5, chosen: {} });
    expect(amount(usual, "O2")).toBeCloseTo((1.25 * 31.998) / 63.546, 3);
    const ferrous = { ...leach, overall: { "CuFeS2(s)": { products: { Fe: "Fe^2+(aq)" } } } };
    const found = of(ferrous, acid, "CuFeS2(s)");
    expect(found).toMatchObject({ redox: "air", electrons: 4, chosen: { Fe: "Fe^2+(aq)" } });
    expect(amount(found, "O2")).toBeCloseTo(0.504, 3);
  });
  test("with another oxidant and sulfate for sulfur: kept choices, and what would rule beside them", () => {
    const chosen = { Fe: "Fe^2+(aq)", "S(sulfide)": "SO4^2-(aq)" };
    const inputs = { ...leach, overall: { "CuFeS2(s)": { redox: "ferric", products: chosen } } };
    const found = of(inputs, acid, "CuFeS2(s)");
    expect(found).toMatchObject({ redox: "ferric", electrons: 16, chosen });
    expect(found.rules.get("S(sulfide)")).toBe("S(s,rhombic)");
    expect(amount(found, "Fe^3+")).toBeCloseTo((16 * 55.845) / 63.546, 2);
    const direct = overallReaction(toProblem(inputs, data), data, { from: "CuFeS2(s)", at: acid, redox: "ferric", products: chosen }); // prettier-ignore
    expect(found.outcome).toEqual(direct);
  });
  test("electrons left open stay in the reaction", () => {
    const found = of({ ...leach, overall: { "CuFeS2(s)": { redox: "open" } } }, acid, "CuFeS2(s)");
    expect(found.redox).toBe("open");
    expect(found.outcome.ok && found.outcome.value.terms.some((t) => t.species === "e^-")).toBe(true);
  });
  test("a choice that cannot be is refused with its path, not dropped", () => {
    const { outcome } = of({ ...leach, overall: { "CuFeS2(s)": { products: { Cu: "ZnO(s)" } } } }, acid, "CuFeS2(s)");
    expect(outcome).toMatchObject({ ok: false, error: { code: "INVALID_INPUT", path: "products.Cu" } });
  });
});

test("a metal won, and any start that rules at the set point, is said to stay; no reaction to itself is written", () => {
  const at = { pH: 3.5, Eh: -0.74 };
  const found = startsOf(purification, solved(toProblem(purification, data)), data).map((from) => of(purification, at, from));
  expect(found.filter(({ outcome }) => staysAsItIs(outcome)).map(({ from }) => from)).toEqual(["Cd(s)"]);
  expect(planReactions(toProblem(purification, data), data, purification, solved(toProblem(purification, data)), at).map((r) => r.from)).toEqual(["CdSO4(aq)", "Zn(s)"]);
  expect(staysWords("Cd(s)", data)).toBe("stays as it is: the metal itself is stable at the set point");
  expect(staysWords("CuFeS2(s)", data)).toBe("stays as it is: the mineral itself is stable at the set point");
  expect(staysWords("CdSO4(aq)", data)).toMatch(/^stays dissolved as it is/);
}); // prettier-ignore

test("a cementing metal's own product is named: what rules at the set point without a choice, the choice with it", () => {
  const at = { pH: 3.5, Eh: -0.74 };
  const usual = of(purification, at, "CdSO4(aq)");
  expect(usual).toMatchObject({ redox: "zinc-dust", electrons: -2 });
  expect(usual.rules.get("Zn")).toBe("ZnSO4(aq)");
  expect(amount(usual, "Zn")).toBeCloseTo(0.582, 3); // practice, section 6
  const inputs = { ...purification, overall: { "CdSO4(aq)": { products: { Zn: "Zn^2+(aq)" } } } };
  const chosen = of(inputs, at, "CdSO4(aq)");
  expect(chosen.rules.get("Zn")).toBe("ZnSO4(aq)");
  expect(chosen.outcome.ok && chosen.outcome.value.products.get("Zn")).toBe("Zn^2+(aq)");
});

test("all of a plan: in the order of its starts, without what already stands as its own product", () => {
  const problem = toProblem(purification, data);
  const all = planReactions(problem, data, purification, solved(problem), { pH: 3.5, Eh: -0.74 });
  expect(all.map((r) => r.from)).toEqual(["CdSO4(aq)", "Zn(s)"]);
  const refused = { ...purification, overall: { "CdSO4(aq)": { products: { Cd: "ZnO(s)" } } } };
  const told = planReactions(problem, data, refused, solved(problem), { pH: 3.5, Eh: -0.74 });
  expect(told.find((r) => r.from === "CdSO4(aq)")?.outcome.ok).toBe(false);
});
