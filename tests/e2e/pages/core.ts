import { expect } from "vitest";
import { demoPlans } from "../../../server/demo/plans";
import { valueOf } from "../../../shared/outcome";
import { toProblem } from "../../../shared/plan/toProblem";
import type { PlanInputs } from "../../../shared/schemas/plan";
import { speciesAt } from "../../../shared/setpoint/crosscut";
import type { Solution } from "../../../shared/solution";
import { solve } from "../../../shared/solve";
import { chemistry } from "../../support/chemistry";
import type { Answers } from "./workspace";

/** The latest inputs of a demo plan. */
export function demoInputs(planId: string): PlanInputs {
  const inputs = demoPlans.find((plan) => plan.id === planId)?.revisions.at(-1)?.inputs;
  if (!inputs) throw new Error(`No demo plan ${planId}.`);
  return inputs;
}

/** What the core answers, solved here and not in the browser. */
export const solved = (inputs: PlanInputs): Solution => valueOf(solve(toProblem(inputs, chemistry()), chemistry()));

/** The screen shows the set point that the core finds for these inputs, to the digits that are shown. */
export function expectSetPoint(shown: Answers, inputs: PlanInputs): void {
  const setPoint = solved(inputs).windows[0]?.setPoint;
  expect([shown.pH, shown.Eh]).toEqual([Number(setPoint?.pH.toFixed(2)), Number(setPoint?.Eh.toFixed(2))]);
}

/** Each metal's species at a point, in the order of the plan. */
export const speciesThere = (inputs: PlanInputs, pH: number, Eh: number): string[] =>
  speciesAt(solved(inputs), pH, Eh).map((s) => s.species);
