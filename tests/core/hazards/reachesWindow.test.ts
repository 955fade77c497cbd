import { expect, test } from "vitest";
import { sharesGround } from "../../../shared/hazards/reachesWindow";
import type { Outline, Point } from "../../../shared/solution";

const box = (x0: number, x1: number, y0: number, y1: number): Point[] => [
  [x0, y0],
  [x1, y0],
  [x1, y1],
  [x0, y1],
];
const plain = (outer: Point[], holes: Point[][] = []): Outline[] => [{ outer, holes }];
const window = plain(box(2, 6, 0, 1));

test.each([
  ["apart", box(7, 9, 0, 1), false],
  ["touching along a side", box(6, 9, 0, 1), false],
  ["overlapping at a corner", box(5, 9, 0.5, 2), true],
  ["crossing without a corner inside", box(3, 4, -1, 2), true],
  ["inside", box(3, 4, 0.2, 0.4), true],
  ["around", box(0, 9, -1, 2), true],
] as const)("a region %s", (_, region, shares) => {
  expect(sharesGround(plain([...region]), window)).toBe(shares);
  expect(sharesGround(window, plain([...region]))).toBe(shares);
});

test("a region in the window's hole shares nothing with it", () => {
  const holed = plain(box(2, 6, 0, 1), [[...box(3, 5, 0.2, 0.8)].reverse()]);
  expect(sharesGround(plain(box(3.5, 4.5, 0.4, 0.6)), holed)).toBe(false);
});
