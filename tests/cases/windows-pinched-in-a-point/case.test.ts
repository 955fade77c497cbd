import { expect, test } from "vitest";
import { rectangle } from "../../../shared/geometry/convex";
import { connect } from "../../../shared/geometry/region";
import { expectInvariants } from "../../support/invariants";
import { solved } from "../../support/solver";
import { invented, PROTON } from "../../support/synthetic";

// The walk round a border that began in the pinch did not see its own start again and went on into the other square.
test("two squares that share a corner stay two, wherever the walk begins", () => {
  const low = rectangle([0, 1], [0, 1], [-1, -2, -3, -4]);
  const high = rectangle([1, 2], [1, 2], [-1, -2, -3, -4]);
  for (const pieces of [
    [low, high],
    [high, low],
  ]) {
    const regions = connect(pieces);
    expect(regions.map((r) => [r.pieces.length, r.outer.length, r.holes.length, r.area])).toEqual([[1, 4, 0, 1], [1, 4, 0, 1]]); // prettier-ignore
  }
});

test("a hole that touches the border in a point is part of the outer loop, which passes there twice", () => {
  const side = (pH: [number, number], Eh: [number, number]) => rectangle(pH, Eh, [-1, -2, -3, -4]);
  // a square of 4 x 4 with the square [0, 1] x [1, 2] moved in until a corner touches the left wall from a notch
  const pieces = [side([0, 4], [0, 1]), side([1, 4], [1, 2]), side([0, 4], [2, 4]), side([0, 1], [1, 2])];
  expect(connect(pieces)[0]!.holes).toEqual([]);
  const notch = connect([side([0, 2], [0, 1]), side([0, 1], [1, 2]), side([1, 3], [2, 3]), side([2, 3], [0, 2]), side([0, 1], [2, 3])]); // prettier-ignore
  expect(notch.map((r) => [r.holes.length, r.area])).toEqual([[1, 8]]);
});

test("a window between two solids that meet in a point is two windows", () => {
  const problem = invented({
    Cu: {
      requirement: "dissolved",
      species: [
        { name: "upper", phase: "aq", k: 0, q: -1 },
        { name: "lower", phase: "aq", k: 0, q: 1 },
        { name: "left", phase: "s", k: 7 * PROTON, p: -1 },
        { name: "right", phase: "s", k: -7 * PROTON, p: 1 },
      ],
    },
  });
  const solution = solved(problem);
  expect(solution.windows.length).toBe(2);
  for (const w of solution.windows) {
    const pinch = w.polygons[0]!.outer.find((p) => Math.hypot(p[0] - 7, p[1]) < 1e-5);
    expect(pinch).toBeDefined();
  }
  expectInvariants(problem, solution);
});
