import { describe, expect, test } from "vitest";
import { demoPlans } from "../../../server/demo/plans";
import { toProblem } from "../../../shared/plan/toProblem";
import type { Problem } from "../../../shared/schemas/problem";
import { library, solved } from "../../support/solver";

/** The set point under the hand: along a slider that crosses no rule of the solids basis and no change of the kind of limits it moves
 *  in small steps, and so does its margin. */
const planOf = (name: string): Problem => {
  const plan = demoPlans.find((p) => p.name.startsWith(name));
  return toProblem(plan!.revisions.at(-1)!.inputs, library);
};

interface Steps {
  pH: number;
  Eh: number;
  margin: number;
  windows: number;
}

function largestSteps(problems: readonly Problem[]): Steps {
  const points = problems.map((p) => solved(p).windows[0]!);
  const step = (of: (w: (typeof points)[number]) => number): number =>
    Math.max(...points.slice(1).map((w, i) => Math.abs(of(w) - of(points[i]!))));
  return {
    pH: step((w) => w.setPoint.pH),
    Eh: step((w) => w.setPoint.Eh),
    margin: step((w) => w.setPoint.margin),
    windows: points.length,
  };
}

const STEPS = 120;
const along = (f: (t: number) => Problem): Problem[] => Array.from({ length: STEPS + 1 }, (_, i) => f(i / STEPS));

describe("dragging the temperature", () => {
  test.each([
    ["Neutral leach", 25, 69.9],
    ["Zinc-dust", 25, 69.9],
    ["Ammonia-carbonate", 25, 69.9],
  ])("of %s from %f to %f C", (name, from, to) => {
    const plan = planOf(name);
    const steps = largestSteps(along((t) => ({ ...plan, temperatureC: from + (to - from) * t })));
    expect(steps.pH).toBeLessThan(0.03);
    expect(steps.Eh).toBeLessThan(0.01);
    expect(steps.margin).toBeLessThan(0.2);
  });
});

describe("dragging the first activity over two decades", () => {
  test.each(["Neutral leach", "Zinc-dust", "Ammonia-carbonate", "Cyanide"])("of %s", (name) => {
    const plan = planOf(name);
    const [first, ...others] = plan.metals;
    const steps = largestSteps(
      along((t) => ({ ...plan, metals: [{ ...first!, activity: first!.activity! * 10 ** (2 * t - 1) }, ...others] })),
    );
    expect(steps.pH).toBeLessThan(0.03);
    expect(steps.Eh).toBeLessThan(0.01);
    expect(steps.margin).toBeLessThan(0.2);
  });
});

describe("dragging a side of the frame or a control band", () => {
  test("moves the set point no further than the side", () => {
    const plan = planOf("Cyanide");
    const steps = largestSteps(along((t) => ({ ...plan, frame: { ...plan.frame, pH: [plan.frame.pH[0] + 0.5 * t, plan.frame.pH[1]] } }))); // prettier-ignore
    expect(steps.pH).toBeLessThan(0.5 / STEPS + 1e-9);
  });
  test("a narrower band counts the same place in more bands", () => {
    const plan = planOf("Neutral leach");
    const wide = solved(plan).windows[0]!.setPoint;
    const { pH, Eh } = plan.controlBand;
    const narrow = solved({ ...plan, controlBand: { pH: pH / 2, Eh: Eh / 2 } }).windows[0]!.setPoint;
    expect(narrow.margin / wide.margin).toBeCloseTo(2, 6);
    expect(narrow.pH).toBeCloseTo(wide.pH, 6);
  });
});
