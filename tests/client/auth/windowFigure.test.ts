import { expect, test } from "vitest";
import { demoPlans } from "../../../server/demo/plans";
import { valueOf } from "../../../shared/outcome";
import { toProblem } from "../../../shared/plan/toProblem";
import { solve } from "../../../shared/solve";
import { windowFigure } from "../../../src/features/auth/windowFigure";
import { chemistry } from "../../support/chemistry";

test("the window on the first page is what the solver says of the demo's neutral leach", () => {
  const inputs = demoPlans.find(({ name }) => name === windowFigure.planName)?.revisions.at(-1)?.inputs;
  if (!inputs) throw new Error("The plan of the first page is not in the demo.");
  const solution = valueOf(solve(toProblem(inputs, chemistry()), chemistry(), { shutGround: true }));
  const rounded = (points: readonly (readonly [number, number])[] = []) =>
    points.map(([pH, Eh]) => [Number(pH.toFixed(2)), Number(Eh.toFixed(3))]);
  const shut = (metal: string) => solution.shut?.find((s) => s.metal === metal)?.polygons ?? [];
  const [window] = solution.windows;

  expect(windowFigure.frame).toEqual(solution.frame);
  expect(solution.windows).toHaveLength(1);
  expect(window?.polygons.map(({ outer }) => rounded(outer))).toEqual([windowFigure.window]);
  expect(shut("Zn").map(({ outer }) => rounded(outer))).toEqual([windowFigure.shut.Zn]);
  expect(shut("Fe").map(({ outer }) => rounded(outer))).toEqual([windowFigure.shut.Fe]);
  expect(rounded(window && [[window.setPoint.pH, window.setPoint.Eh]])).toEqual([windowFigure.setPoint]);
  expect(inputs.controlBand).toEqual({ pH: windowFigure.controlBand[0], Eh: windowFigure.controlBand[1] });
});
