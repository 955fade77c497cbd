import { expect, test } from "vitest";
import { gramsPerMole, weighedAs } from "../../../shared/plan/totals";
import { toProblem } from "../../../shared/plan/toProblem";
import { planInputs } from "../../../shared/schemas/plan";
import { problemSchema } from "../../../shared/schemas/problem";
import { componentKind, SULFIDE_SULFUR } from "../../../shared/selection/components";
import { unusualInputs } from "../../support/planInputs";
import { library as data } from "../../support/solver";

const totals = [...data.components.keys(), SULFIDE_SULFUR].filter((c) =>
  ["ligand", "partner"].includes(componentKind(data, c)),
);

test("every ligand and other component has a formula to weigh, and mol/L comes back from g/L", () => {
  expect(totals.length).toBeGreaterThan(15);
  for (const component of totals)
    for (const reduction of [false, true]) {
      const grams = gramsPerMole(data, component, reduction);
      expect(grams, component).toBeGreaterThan(6);
      expect((0.75 * grams) / grams, component).toBeCloseTo(0.75, 12);
    }
});

// IUPAC abridged standard atomic weights, added up by hand.
test.each([
  ["S", 96.06],
  [SULFIDE_SULFUR, 32.06],
  ["Cl", 35.45],
  ["C", 60.009],
  ["NH3", 17.031],
  ["CN", 26.018],
  ["S2O3", 112.12],
  ["SCN", 58.08],
  ["GLY", 75.067],
  ["OX", 88.018],
  ["N", 62.004],
  ["P", 94.97],
  ["F", 18.998],
  ["K", 39.098],
  ["Na", 22.99],
])("one mol/L of %s is %d g/L", (component, grams) =>
  expect(gramsPerMole(data, component, false)).toBeCloseTo(grams, 1),
);

test("with sulfate reduction on all sulfur is one pool, and is weighed as sulfur", () =>
  expect([weighedAs("S", false), weighedAs("S", true)]).toEqual(["SO4^2-", "S"]));

test("the unit stays with the plan and does not reach the solver, which refuses keys it does not know", () => {
  expect(planInputs.parse(structuredClone(unusualInputs))).toEqual(unusualInputs);
  expect(toProblem(unusualInputs, data).ligands).toEqual([{ component: "NH3", activity: 1.75 }]);
  expect(problemSchema.safeParse(toProblem(unusualInputs, data)).success).toBe(true);
});
