import { describe, expect, test } from "vitest";
import { areaOf, clip, cornersOf, rectangle, sideOfCorner, type Convex } from "../../../shared/geometry/convex";
import { lowerEnvelope, type Plane } from "../../../shared/geometry/envelope";

const square = rectangle([0, 4], [0, 4], [-1, -2, -3, -4]);

describe("clip", () => {
  test("the frame's sides in the order low Eh, high pH, high Eh, low pH", () => {
    expect(square.tags).toEqual([-1, -2, -3, -4]);
    expect(cornersOf(square)).toEqual([[4, 0], [4, 4], [0, 4], [0, 0]]); // prettier-ignore
    expect(areaOf(square)).toBe(16);
  });

  test("keeps the same object where nothing is cut, gives none where nothing is left", () => {
    expect(clip(square, [1, 1, 1], 7)).toBe(square);
    expect(clip(square, [-9, 1, 1], 7)).toBeNull();
  });

  test("a line through a corner from outside leaves everything or nothing", () => {
    expect(clip(square, [0, 1, 1], 7)).toBe(square);
    expect(clip(square, [0, -1, -1], 7)).toBeNull();
    expect(clip(square, [-8, 1, 1], 7)).toBeNull();
  });

  test("a line along a side keeps the old name unless the new is preferred", () => {
    expect(clip(square, [0, 1, 0], 7)).toBe(square);
    expect(clip(square, [0, 3, 0], 7, () => true)!.tags).toEqual([-1, -2, -3, 7]);
    expect(clip(square, [0, 1, 0], 7, (edge) => square.tags[edge] === -2)).toBe(square);
    expect(clip(square, [0, -1, 0], 7, () => true)).toBeNull();
  });

  test("a line through two corners leaves a triangle", () => {
    const half = clip(square, [0, 1, -1], 7)!;
    expect([half.lines.length, areaOf(half)]).toEqual([3, 8]);
    expect(half.tags).toContain(7);
  });

  test("each cut adds at most one edge; a thin end keeps its corners apart", () => {
    let piece: Convex = square;
    for (let i = 1; i < 30; i++) piece = clip(piece, [-3 + i / 10, -1, 2], i) ?? piece;
    expect(new Set(cornersOf(piece).map((c) => c.join())).size).toBe(piece.lines.length);
  });

  test("the side of a corner is exact where coordinates cannot tell", () => {
    // corner (1 / 3, 1 / 3); a line that misses it by one part in 3e15
    const third = clip(clip(square, [1, -3, 0], 5)!, [1, 0, -3], 6)!;
    const at = cornersOf(third).findIndex(([x, y]) => Math.abs(x - 1 / 3) < 1e-9 && Math.abs(y - 1 / 3) < 1e-9);
    const big = 3e15;
    expect(sideOfCorner(third, at, [-2e15, big, big])).toBe(0);
    expect(sideOfCorner(third, at, [-2e15 + 1, big, big])).toBe(1);
    expect(sideOfCorner(third, at, [-2e15 - 1, big, big])).toBe(-1);
  });
});

describe("the lower envelope", () => {
  const plane = (k: number, x: number, y: number, atoms = 1): Plane => ({ k, x, y, atoms });
  const tagsOf = (planes: Plane[]) =>
    lowerEnvelope(planes, square).map((c) => [c.plane, [...c.piece.tags].sort((a, b) => a - b)]);

  test("one plane has the cell", () => expect(tagsOf([plane(0, 0, 0)])).toEqual([[0, [-4, -3, -2, -1]]]));
  test("none of no planes", () => expect(lowerEnvelope([], square)).toEqual([]));
  test("equal planes: the first; equal per atom too", () => {
    expect(tagsOf([plane(1, 2, 3), plane(1, 2, 3)]).map(([i]) => i)).toEqual([0]);
    expect(tagsOf([plane(2, 4, 6, 2), plane(1, 2, 3)]).map(([i]) => i)).toEqual([0]);
  });
  test("four planes through one corner: opposite ones are no neighbours", () => {
    const four = [plane(0, -1, 0), plane(-4, 1, 0), plane(-2, 0, 1), plane(-2, 0, -1)]; // all -2 at (2, 2)
    for (const [i, tags] of tagsOf(four)) expect(tags).not.toContain((i as number) ^ 1);
  });
  test("planes that share one edge: the one that falls fastest beyond it is the neighbour", () => {
    const fan = [plane(0, 0, 0), plane(2, -1, 0), plane(6, -3, 0), plane(4, -2, 0)]; // all 0 at pH 2
    expect(tagsOf(fan)).toEqual([[0, [-4, -3, -1, 2]], [2, [-3, -2, -1, 0]]]); // prettier-ignore
  });
  test("a plane that touches from above owns nothing", () =>
    expect(tagsOf([plane(0, -1, 0), plane(-4, 1, 0), plane(-2, 0, 0)]).map(([i]) => i)).toEqual([0, 1]));
});
