import { describe, expect, test } from "vitest";
import { deepestPoint } from "../../../shared/setpoint/deepestPoint";
import type { Segment } from "../../../shared/setpoint/segments";
import { cutUp, loop, moved } from "../../support/border";
import { clearanceAt, deeperThan } from "../../support/bruteMargin";

type Corners = readonly (readonly [number, number])[];
const hole = (corners: Corners): Segment[] => loop([...corners].reverse());
const rectangle = (u0: number, v0: number, u1: number, v1: number): Corners => [[u0, v0], [u1, v0], [u1, v1], [u0, v1]]; // prettier-ignore

function expectDeepest(border: Segment[], u: number, v: number, margin: number): void {
  const found = deepestPoint(border)!;
  for (const [is, should] of [
    [found.u, u],
    [found.v, v],
    [found.margin, margin],
  ] as const)
    // prettier-ignore
    expect(Math.abs(is - should)).toBeLessThan(1e-6);
  expect(Math.abs(clearanceAt(border, found.u, found.v) - margin)).toBeLessThan(1e-6);
}

describe("by analysis", () => {
  test("no border, no point", () => expect(deepestPoint([])).toBeNull());

  test.each([
    ["a square: its centre", loop(rectangle(0, 0, 6, 6)), 3, 3, 3],
    ["a long rectangle: the middle of its ridge", loop(rectangle(0, 0, 20, 4)), 10, 2, 2],
    ["a tall rectangle", loop(rectangle(-3, -50, 1, 10)), -1, -20, 2],
    ["a right triangle: legs 6, the box (m, m) reaches u + v = 6 with its corner, 4 m = 6", loop([[0, 0], [6, 0], [0, 6]]), 1.5, 1.5, 1.5],
    ["a triangle on its base: 8 wide, 4 high, m + 2 m = 4", loop([[0, 0], [8, 0], [4, 4]]), 4, 4 / 3, 4 / 3],
    ["a diamond |u| + |v| < 4: 2 m = 4", loop([[-4, 0], [0, -4], [4, 0], [0, 4]]), 0, 0, 2],
  ] as const)("%s", (_, border, u, v, margin) => expectDeepest([...border], u, v, margin)); // prettier-ignore

  test("a trapezoid whose sides part by a thousandth: its wide end", () => {
    // v = m, u = 40 - m, and the roof 4 + 0.001 u stands m (1 + 0.001) above
    const m = 4.04 / 2.002;
    expectDeepest(loop([[0, 0], [40, 0], [40, 4.04], [0, 4]]), 40 - m, m, m); // prettier-ignore
  });

  test("an L: the middle of the longer arm", () => {
    const l = (across: number, up: number) => loop([[0, 0], [across, 0], [across, 4], [4, 4], [4, up], [0, up]]); // prettier-ignore
    expectDeepest(l(14, 9), 7, 2, 2);
    expectDeepest(l(9, 14), 2, 7, 2);
    expectDeepest(l(12, 12), 2, 6, 2); // equal arms: the lower u
  });

  test("a wide arm beats a long one", () =>
    expectDeepest(loop([[0, 0], [30, 0], [30, 2], [5, 2], [5, 6], [0, 6]]), 2.5, 3, 2.5)); // prettier-ignore

  test("a ring: the middle of its left arm", () =>
    expectDeepest([...loop(rectangle(0, 0, 10, 10)), ...hole(rectangle(4, 4, 6, 6))], 2, 5, 2));

  test("a ring with one wider arm", () =>
    expectDeepest([...loop(rectangle(0, 0, 12, 10)), ...hole(rectangle(4, 4, 6, 6))], 9, 5, 3));

  test("a plus: its centre, whichever arm is taken", () =>
    expectDeepest(loop([[1, 0], [2, 0], [2, 1], [3, 1], [3, 2], [2, 2], [2, 3], [1, 3], [1, 2], [0, 2], [0, 1], [1, 1]]), 1.5, 1.5, 0.5)); // prettier-ignore

  test("two equal rooms: the one of lower u, then of lower v", () => {
    const doors = loop([[0, 0], [4, 0], [4, 1.5], [8, 1.5], [8, 0], [12, 0], [12, 4], [8, 4], [8, 2.5], [4, 2.5], [4, 4], [0, 4]]); // prettier-ignore
    expectDeepest(doors, 2, 2, 2);
    const stacked = loop([[0, 0], [4, 0], [4, 4], [2.5, 4], [2.5, 8], [4, 8], [4, 12], [0, 12], [0, 8], [1.5, 8], [1.5, 4], [0, 4]]); // prettier-ignore
    expectDeepest(stacked, 2, 2, 2);
    const larger = loop([[0, 0], [4, 0], [4, 1.5], [8, 1.5], [8, -0.2], [12.2, -0.2], [12.2, 4], [8, 4], [8, 2.5], [4, 2.5], [4, 4], [0, 4]]); // prettier-ignore
    expectDeepest(larger, 10.1, 1.9, 2.1);
  });

  test("a needle and a hair", () => {
    expectDeepest(loop([[0, 0], [1000, 0], [1000, 1e-3], [0, 1e-3]]), 500, 5e-4, 5e-4); // prettier-ignore
    expectDeepest(loop([[0, 0], [1e-7, 0], [1e-7, 80], [0, 80]]), 5e-8, 40, 5e-8); // prettier-ignore
  });

  test("far from the origin, as with narrow control bands", () => {
    const far = moved(loop([[0, 0], [14, 0], [14, 4], [4, 4], [4, 9], [0, 9]]), 12_000, -40_000); // prettier-ignore
    expectDeepest(far, 12_007, -39_998, 2);
  });
});

describe("ridges among teeth and turns, where brute force can only tell to a hundredth", () => {
  const comb: Corners = [[0, 0], [12, 0], [12, 6], [10, 6], [10, 2], [8, 2], [8, 7], [5, 7], [5, 2], [3, 2], [3, 6], [0, 6]]; // prettier-ignore
  const spiral: Corners = [[0, 0], [9, 0], [9, 9], [2, 9], [2, 4], [5, 4], [5, 6.5], [4, 6.5], [4, 5.5], [3, 5.5], [3, 7.5], [7, 7.5], [7, 2], [0, 2]]; // prettier-ignore

  test.each([1, 3])("sides in %i parts", (n) => {
    const teeth = cutUp(loop(comb), n);
    expectDeepest(teeth, 6.5, 3.5, 1.5); // the middle tooth is the longest of two that are 3 wide
    expect(deeperThan(teeth, 1.5, 0.01)).toBeNull();
    const turns = cutUp(loop(spiral), n);
    expectDeepest(turns, 4.5, 1, 1); // two arms 2 wide and 7 long: the lower u
    expect(deeperThan(turns, 1, 0.01)).toBeNull();
  });
});

describe("against brute force", () => {
  const shapes: [string, Segment[]][] = [
    ["an arrowhead", loop([[0, 0], [10, 5], [0, 10], [3, 5]])],
    ["a thin slanted wall", [...loop(rectangle(0, 0, 12, 12)), ...hole([[2.8, 3.2], [3.2, 2.8], [9.2, 8.8], [8.8, 9.2]])]],
    ["a slanted wall from one side", loop([[0, 0], [12, 0], [12, 9], [3, 4.8], [3, 5.2], [12, 9.6], [12, 12], [0, 12]])],
    ["two slanted holes", [...loop(rectangle(0, 0, 12, 8)), ...hole([[2, 2], [5, 3], [4, 6]]), ...hole([[7, 1], [10, 4], [8, 6]])]],
    ["a saw", loop([[0, 0], [11, 0], [10, 5], [9, 2], [8, 5.5], [6, 1.5], [5, 4.8], [3, 2.2], [1, 6]])],
  ]; // prettier-ignore

  test.each(shapes.flatMap(([name, s]) => [1, 3].map((n) => [`${name}, sides in ${n}`, cutUp(s, n)] as const)))(
    "%s",
    (_, border) => {
      const found = deepestPoint(border)!;
      expect(Math.abs(clearanceAt(border, found.u, found.v) - found.margin)).toBeLessThan(1e-6);
      expect(deeperThan(border, found.margin, 1e-6, 400_000)).toBeNull();
    },
  );
});

describe("the point moves no faster than the border, where the answer does not jump", () => {
  const path = (shapes: (t: number) => Corners): [number, number, number][] =>
    Array.from({ length: 201 }, (_, i) => {
      const { u, v, margin } = deepestPoint(loop(shapes(i / 200)))!;
      return [u, v, margin];
    });
  const fastest = (points: readonly [number, number, number][], axis: 0 | 1 | 2): number =>
    Math.max(...points.slice(1).map((p, i) => Math.abs(p[axis] - points[i]![axis])));

  test("a wall that moves in", () => {
    const points = path((t) => rectangle(0, 0, 20 - 10 * t, 4));
    expect(fastest(points, 0)).toBeLessThan(0.026); // half of 10 / 200
    expect(fastest(points, 1)).toBeLessThan(1e-6);
  });

  test("a roof that comes down on an L until its other arm is the longer", () => {
    const points = path((t) => [[0, 0], [14, 0], [14, 4], [4, 4], [4, 12 - 4 * t], [0, 12 - 4 * t]]); // prettier-ignore
    expect(fastest(points, 0)).toBeLessThan(1e-6); // the horizontal arm is the longer all along
    expect(fastest(points, 2)).toBeLessThan(1e-6);
  });

  test("walls that turn", () => {
    const points = path((t) => [[0, 0], [10, t], [9 - 2 * t, 8], [1 + t, 6]]); // prettier-ignore
    for (const axis of [0, 1, 2] as const) expect(fastest(points, axis)).toBeLessThan(0.05);
  });
});
