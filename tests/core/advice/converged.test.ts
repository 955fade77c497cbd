import { describe, expect, test } from "vitest";
import { robustWindow } from "../../../shared/advice/robust";
import { borderMove, borderOf, ruleTemperatures } from "../../../shared/advice/temperatures";
import { demoPlans } from "../../../server/demo/plans";
import { analyse } from "../../../shared/analysis";
import type { Convex } from "../../../shared/geometry/convex";
import { common } from "../../../shared/geometry/overlay";
import { valueOf } from "../../../shared/outcome";
import { toProblem } from "../../../shared/plan/toProblem";
import type { Problem } from "../../../shared/schemas/problem";
import { library } from "../../support/solver";

const planOf = (name: string): Problem => {
  const plan = demoPlans.find((p) => p.name.startsWith(name));
  return toProblem(plan!.revisions.at(-1)!.inputs, library);
};

/** Ground that is open at every one of many temperatures, none of them chosen by the refinement, and just below 50 and 70 C, where rules of
 *  solids-basis.csv end. */
function atMany(problem: Problem, [low, high]: readonly [number, number], count: number): readonly Convex[] {
  let ground: readonly Convex[] | null = null;
  const even = Array.from({ length: count + 1 }, (_, i) => low + ((high - low) * i) / count);
  for (const temperatureC of [...even, ...[49.9999, 69.9999].filter((t) => t > low && t < high)]) {
    const pieces = valueOf(analyse({ ...problem, temperatureC }, library)).pieces.map((p) => p.piece);
    ground = ground === null ? pieces : common(ground, pieces);
  }
  return ground ?? [];
}

/** A rule of the solids basis between two temperatures, a gas kept out, an edge whose worst lies inside the range. */
describe.each([
  ["Neutral leach", [60, 80]],
  ["Oxide heap", [45, 75]],
  ["Cyanide leach", [25, 95]],
  ["Cyanide leach", [45, 75]],
  ["Ammonia-carbonate", [20, 60]],
] as const)("%s over %j C", (name, range) => {
  const problem = planOf(name);
  const robust = valueOf(robustWindow(problem, { temperatureC: range }, library));

  test("says that it settled, and 211 other temperatures move no edge by 0.001 pH or 1 mV", () => {
    expect(robust.checked.settled).toBe(true);
    const dense = borderOf(atMany(problem, range, 211));
    expect(borderMove(robust.windows, dense, [0.001, 0.001])).toBeLessThan(1);
  });
});

test("an edge that is worst just below a rule is found there: iron shuts further the hotter it is, until goethite counts at 70 C", () => {
  const problem = planOf("Cyanide leach");
  const right = (w: readonly { outer: readonly (readonly [number, number])[] }[]) => Math.max(...w.flatMap((o) => o.outer.map((p) => p[0]))); // prettier-ignore
  const held = right(valueOf(robustWindow(problem, { temperatureC: [45, 75] }, library)).windows);
  const below = right(borderOf(valueOf(analyse({ ...problem, temperatureC: 69.99999 }, library)).pieces.map((p) => p.piece))); // prettier-ignore
  expect(held).toBeCloseTo(below, 5);
});

test("the temperatures at which the solids that count change are solved on both sides, and told", () => {
  const problem = planOf("Neutral leach");
  const { checked } = valueOf(robustWindow(problem, { temperatureC: [60, 80] }, library));
  expect(checked.rules).toEqual([70]); // goethite counts as fresh from 70 C on (solids-basis.csv)
  expect(checked.temperatures.filter((t) => Math.abs(t - 70) < 1e-3).length).toBe(2);
  expect(ruleTemperatures({ ...problem, solidsBasis: "aged" }, library, 60, 80)).toEqual([]);
});

describe("how far a border moved", () => {
  const square = (x: number, y: number, side: number) => ({
    outer: [[x, y], [x + side, y], [x + side, y + side], [x, y + side]] satisfies [number, number][],
    holes: [],
  }); // prettier-ignore
  test("is the greatest way from a corner of either to the other's border, not to its corners", () => {
    expect(borderMove([square(0, 0, 4)], [square(0, 0, 4)], [1, 1])).toBe(0);
    expect(borderMove([square(0, 0, 4)], [square(0.5, 0, 4)], [1, 1])).toBeCloseTo(0.5, 12);
    expect(borderMove([square(0, 0, 4)], [square(0.5, 0, 4)], [0.1, 1])).toBeCloseTo(5, 12);
    const notched = { outer: [[0, 0], [4, 0], [4, 4], [2, 3.9], [0, 4]] satisfies [number, number][], holes: [] }; // prettier-ignore
    expect(borderMove([square(0, 0, 4)], [notched], [1, 1])).toBeCloseTo(0.1, 12);
  });
  test("is without bound where the ground is gone", () => {
    expect(borderMove([square(0, 0, 4)], [], [1, 1])).toBe(Infinity);
    expect(borderMove([], [], [1, 1])).toBe(0);
  });
});
