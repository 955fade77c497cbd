import { describe, expect, test } from "vitest";
import { nextTrials, standingAt, type Site } from "../../../shared/nextTrials/nextTrials";
import { loop } from "../../support/border";
import { solved } from "../../support/solver";
import { windowOf } from "../../support/windowOf";

const unit = { pH: 1, Eh: 1 };
const tried = (pH: number, Eh: number, name: string): Site => ({ pH, Eh, name, kind: "tried" });
const box = loop([[0, 0], [20, 0], [20, 10], [0, 10]]); // prettier-ignore
const places = (list: readonly { pH: number; Eh: number }[]) =>
  list.map(({ pH, Eh }) => [Number(pH.toFixed(6)), Number(Eh.toFixed(6))]);

// Worked by hand. The box is 20 by 10 control bands, so trials may stand in 1..19 by 1..9.
describe("a box of 20 by 10 control bands", () => {
  const window = windowOf(box);

  // On the upper wall (x - 1)^2 + 64 = (x - 10)^2 + 16 at x = 51 / 18: there the first corner and the set point are as far.
  test("without a trial: the set point, two corners, then the largest gaps; lowest pH and lowest Eh first", () => {
    const { points, keepOff, full, along } = nextTrials(window, unit, [], 5);
    expect(places(points)).toEqual([[10, 5], [1, 1], [19, 1], [2.833333, 9], [17.166667, 9]]); // prettier-ignore
    expect(points.map((p) => p.gap && Number(p.gap.toFixed(6)))).toEqual([null, 9.848858, 9.848858, 8.207382, 8.207382]); // prettier-ignore
    expect(points.map((p) => p.nearest?.name)).toEqual([undefined, "1", "1", "2", "1"]);
    expect(points.map((p) => Number(p.inside.toFixed(6)))).toEqual([5, 1, 1, 1, 1]);
    expect({ keepOff, full, along }).toEqual({ keepOff: 1, full: false, along: "both" });
  });

  test("the far end from one trial", () => {
    const [point] = nextTrials(window, unit, [tried(1, 1, "T-1")], 1).points;
    expect(places([point!])).toEqual([[19, 9]]);
    expect(point!.gap).toBeCloseTo(Math.hypot(18, 8), 9);
    expect(point!.nearest?.name).toBe("T-1");
  });

  test("a Voronoi vertex: midway between four trials in the corners", () => {
    const corners = [tried(1, 1, "a"), tried(19, 1, "b"), tried(1, 9, "c"), tried(19, 9, "d")];
    const [point] = nextTrials(window, unit, corners, 1).points;
    // (10, 5) is 9.85 from all four
    expect(places([point!])).toEqual([[10, 5]]);
    expect(point!.gap).toBeCloseTo(Math.hypot(9, 4), 9);
  });

  test("a Voronoi edge on the border: between two trials on the middle line", () => {
    const [a, b] = nextTrials(window, unit, [tried(4, 5, "a"), tried(16, 5, "b")], 2).points;
    // (10, 1) and (10, 9): 6 along, 4 across = 7.2; the corners are 5
    expect(places([a!, b!])).toEqual([[10, 1], [10, 9]]); // prettier-ignore
  });

  test("trials outside the window count too, and trials in line or in one place do no harm", () => {
    const inLine = [tried(-2, 5, "o"), tried(5, 5, "a"), tried(5, 5, "a again"), tried(10, 5, "b"), tried(15, 5, "c")];
    const [point] = nextTrials(window, unit, inLine, 1).points;
    expect(places([point!])).toEqual([[19, 1]]);
    expect(point!.gap).toBeCloseTo(Math.hypot(4, 4), 9);
  });

  test("it stops where everything left is closer than one control band to a trial", () => {
    const grid = Array.from({ length: 21 * 11 }, (_, i) => tried(i % 21, Math.floor(i / 21), `g${i}`));
    expect(nextTrials(window, unit, grid, 3)).toMatchObject({ points: [], full: true });
  });

  test("in its own units: a band of 0.15 pH and 30 mV", () => {
    const band = { pH: 0.15, Eh: 0.03 };
    const { points } = nextTrials(windowOf(box, band), band, [], 2);
    expect(places(points)).toEqual([[1.5, 0.15], [0.15, 0.03]]); // prettier-ignore
    expect(points[1]!.gap).toBeCloseTo(9.848858, 6);
  });
});

test("a window narrower than two control bands either way keeps half its margin", () => {
  const narrow = windowOf(loop([[0, 0], [20, 0], [20, 2], [0, 2]])); // prettier-ignore
  const { points, keepOff } = nextTrials(narrow, unit, [tried(10, 1, "m")], 2);
  expect(keepOff).toBeCloseTo(0.5, 9);
  expect(points.every((p) => p.inside >= 0.5 - 1e-6)).toBe(true);
  expect(places(points)).toEqual([[0.5, 0.5], [19.5, 0.5]]); // prettier-ignore
});

describe("between two potentials that can be reached", () => {
  test("nothing beyond them; the farthest stands on one of them", () => {
    const { points } = nextTrials(windowOf(box), unit, [tried(1, 3, "a")], 2, [3, 6]);
    // 9.25 from both at (9.75, 6) and at (10.25, 3); the first stands deeper in the window
    expect(places(points)).toEqual([[19, 6], [9.75, 6]]); // prettier-ignore
  });
  test("without a trial: the set point, where it can be reached, else the deepest place that can", () => {
    expect(places(nextTrials(windowOf(box), unit, [], 1, [4, 6]).points)).toEqual([[10, 5]]);
    expect(nextTrials(windowOf(box), unit, [], 1, [6, 8]).points[0]).toMatchObject({ pH: 1, Eh: 6 });
  });
  test("none where they miss the window", () =>
    expect(nextTrials(windowOf(box), unit, [], 3, [12, 14])).toMatchObject({ points: [], full: true }));
});

test("round a hole: never in it, never within a control band of it", () => {
  const holed = [...box, ...loop([[8, 3], [8, 7], [12, 7], [12, 3]])]; // prettier-ignore
  const { points } = nextTrials(windowOf(holed), unit, [], 8);
  expect(points).toHaveLength(8);
  for (const { pH, Eh } of points) expect(Math.max(Math.abs(pH - 10) - 2, Math.abs(Eh - 5) - 2)).toBeGreaterThan(1 - 1e-6); // prettier-ignore
});

describe("where Eh is a mixed potential", () => {
  // widest along pH at the bottom: 20 bands at v = 0, none at v = 10
  const window = windowOf(loop([[0, 0], [20, 0], [20, 4], [0, 4]]), unit, { mixedPotential: true }); // prettier-ignore

  test("points lie on the chord of the set point, apart along pH", () => {
    const { points, along } = nextTrials(window, unit, [], 4);
    expect(along).toBe("pH");
    expect(places(points)).toEqual([[10, 2], [1, 2], [19, 2], [5.5, 2]]); // prettier-ignore
    expect(points.map((p) => p.inside)).toEqual([10, 1, 1, 5.5]);
    expect(points[3]!.gap).toBeCloseTo(4.5, 9);
  });

  test("a trial counts by its pH, whatever its Eh was", () => {
    const [point] = nextTrials(window, unit, [tried(1, 99, "a"), tried(19, -50, "b")], 1).points;
    expect(places([point!])).toEqual([[10, 2]]);
    expect(point!.gap).toBe(9);
  });
});

describe("how a condition stands", () => {
  const kinds = ["frame", "metal", "metal", "metal"] as const;
  const window = windowOf(box, unit, { kinds });

  test("moved by hand, also out of the window", () => {
    const inside = standingAt({ pH: 18, Eh: 5 }, window, unit, [tried(15, 1, "T-3"), tried(0, 0, "T-4")]);
    expect(inside).toMatchObject({ gap: 5, nearest: { name: "T-3" }, inside: 2, inWindow: true, limit: { metal: "M1" } }); // prettier-ignore
    expect(standingAt({ pH: 22, Eh: 5 }, window, unit, [])).toMatchObject({ gap: null, inside: 0, inWindow: false });
  });

  test("of a real limit and the frame, equally near, the real one is named", () =>
    expect(standingAt({ pH: 1, Eh: 1 }, window, unit, []).limit?.metal).toBe("M3"));
});

test("a solved plan: zinc over iron, two trials tried near the set point", () => {
  const band = { pH: 0.15, Eh: 0.03 };
  const solution = solved({
    temperatureC: 60,
    metals: [
      { element: "Zn", requirement: "dissolved", activity: 0.08 },
      { element: "Fe", requirement: "solid", activity: 1e-5 },
    ],
    ligands: [{ component: "S", activity: 0.5 }],
    solidsBasis: "fresh",
    frame: { pH: [1, 8], Eh: [-0.2, 1.2] },
    controlBand: band,
  });
  const window = solution.windows[0]!;
  const { setPoint } = window;
  const near: Site[] = [0, 0.1].map((d, i) => ({
    pH: setPoint.pH + d,
    Eh: setPoint.Eh,
    name: `T-${i}`,
    kind: "tried",
  }));
  const { points, keepOff } = nextTrials(window, band, near, 8);
  expect(points).toHaveLength(8);
  for (const p of points) {
    expect(p.inWindow).toBe(true);
    expect(p.inside).toBeGreaterThan(keepOff - 1e-6);
    expect(p.limit).not.toBeNull();
  }
});
