import { expect, test } from "vitest";
import { demoPlans } from "../../../server/demo/plans";
import { adviceFor } from "../../../shared/advice/openings";
import { robustWindow } from "../../../shared/advice/robust";
import { borderMove, borderOf } from "../../../shared/advice/temperatures";
import { tidied } from "../../../shared/advice/tidy";
import { analyse } from "../../../shared/analysis";
import type { Convex } from "../../../shared/geometry/convex";
import { common } from "../../../shared/geometry/overlay";
import { valueOf } from "../../../shared/outcome";
import { toProblem } from "../../../shared/plan/toProblem";
import type { PlanInputs } from "../../../shared/schemas/plan";
import { library, solved } from "../../support/solver";

/** Zinc by its tenor and Davies, whose slope goes with temperature: its activity is another at every temperature. */
const base = demoPlans.find((p) => p.name.startsWith("Neutral leach"))!.revisions.at(-1)!.inputs;
const plan: PlanInputs = {
  ...base,
  ionicStrength: 0.4,
  metals: base.metals.map((m) => (m.element === "Zn" ? { ...m, entry: "gPerL", value: 30, gammaFrom: "davies" } : m)),
};
const at = (temperatureC: number) => toProblem({ ...plan, temperatureC }, library);

test("over a range of temperature a tenor becomes an activity anew at each", () => {
  const { windows } = valueOf(robustWindow(at(60), { temperatureC: [52, 68] }, library, undefined, plan));
  let ground: readonly Convex[] | null = null;
  for (let t = 52; t <= 68; t += 0.25) {
    const pieces = valueOf(analyse(at(t), library)).pieces.map((p) => p.piece);
    ground = ground === null ? pieces : common(ground, pieces);
  }
  expect(borderMove(windows, borderOf(ground ?? []), [0.001, 0.001])).toBeLessThan(1);
  // and it matters: with the gamma of 60 C throughout an edge stands elsewhere
  const still = valueOf(robustWindow(at(60), { temperatureC: [52, 68] }, library)).windows;
  expect(borderMove(windows, still, [0.001, 0.001])).toBeGreaterThan(1);
});

test("the temperature that opens a window is one at which the plan itself has one", () => {
  const [low] = solved(at(60)).windows.map((w) => w.pH[1]); // zinc precipitates at lower pH the hotter
  const shut: PlanInputs = { ...plan, frame: { ...plan.frame, pH: [low! + 0.05, 9] } };
  const problemAt = (temperatureC: number) => toProblem({ ...shut, temperatureC }, library);
  expect(solved(problemAt(60)).windows).toEqual([]);
  const { openings } = valueOf(adviceFor(problemAt(60), library, undefined, shut));
  const found = openings.find((o) => o.change === "temperature")!;
  const to = Number(found.to);
  expect(to).toBeLessThan(60);
  expect(solved(problemAt(to)).windows.length).toBeGreaterThan(0);
  expect(solved(problemAt(to + 0.01)).windows).toEqual([]);
  const offered = tidied(found, library, shut);
  expect(solved(problemAt(Number(offered.to))).windows.length).toBeGreaterThan(0);
  expect(offered.problem).toEqual(problemAt(Number(offered.to)));
});
