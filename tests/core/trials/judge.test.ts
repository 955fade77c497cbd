import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { demoPlans } from "../../../server/demo/plans";
import { sideOfLoop } from "../../../shared/geometry/loop";
import { toProblem } from "../../../shared/plan/toProblem";
import { judge } from "../../../shared/trials/judge";
import { chemistry } from "../../support/chemistry";
import { insideWindows } from "../../support/read";
import { solved } from "../../support/solver";

const inputs = demoPlans.find((p) => p.id === "demo-neutral-leach")!.revisions.at(-1)!.inputs;
const solution = solved(toProblem(inputs, chemistry()));
const band = inputs.controlBand;
const at = (pH: number, Eh: number, EhUncertainty = 0) => judge({ pH, Eh, EhUncertainty }, solution, band);

describe("a point against the windows of a solution", () => {
  const { pH, Eh } = solution.setPoint!;
  test("the set point is inside, as far from the nearest limit as the solution says", () => {
    const found = at(pH, Eh);
    expect(found.verdict).toBe("inside");
    expect(found.window).toBe(0);
    expect(found.unsure).toBe(false);
    const limits = solution.windows[0]!.limits.filter((l) => l.kind !== "frame");
    expect(found.nearest!.distance).toBeCloseTo(Math.min(...limits.map((l) => l.distance)), 9);
  });
  test("every corner and every middle of an edge that lies on it exactly is inside", () => {
    for (const w of solution.windows)
      for (const { outer } of w.polygons) for (const corner of outer) expect(at(...corner).verdict).toBe("inside");
  });
  test("a hair beyond a corner's bounding box is not", () => {
    const w = solution.windows[0]!;
    expect(at(w.pH[0] - 1e-9, (w.Eh[0] + w.Eh[1]) / 2).verdict).not.toBe("inside");
  });
  test("beyond the frame nothing is judged", () => expect(at(-3, 0.5).verdict).toBe("off the map"));
  test("names the metal that shuts it there", () => {
    const low = at(1.2, Eh);
    expect(low.verdict).toBe("outside");
    expect(low.nearest?.limit.metal).toBe("Fe");
  });
  test("within its error of a limit it is unsure", () => {
    const limit = solution.windows[0]!.limits.find(
      (l) => Math.abs(l.line[2]) > Math.abs(l.line[1]) && l.kind !== "frame",
    )!;
    const [x, y] = [(limit.from[0] + limit.to[0]) / 2, (limit.from[1] + limit.to[1]) / 2];
    expect(at(x, y + 0.004, 0.01).unsure).toBe(true);
    expect(at(x, y - 0.004, 0.01).unsure).toBe(true);
    expect(at(x, y + 0.004, 0).unsure).toBe(false);
  });
  test("agrees with plain crossing counts wherever no edge is near", () => {
    const frame = solution.frame;
    fc.assert(
      fc.property(
        fc.double({ min: frame.pH[0], max: frame.pH[1], noNaN: true }),
        fc.double({ min: frame.Eh[0], max: frame.Eh[1], noNaN: true }),
        (x, y) => {
          const found = at(x, y);
          fc.pre(
            found.nearest!.distance > 1e-9 && x > frame.pH[0] && x < frame.pH[1] && y > frame.Eh[0] && y < frame.Eh[1],
          );
          expect(found.verdict === "inside").toBe(insideWindows(solution, x, y));
        },
      ),
    );
  });
});

describe("a point against a loop", () => {
  const square = [
    [0, 0],
    [1, 0],
    [1, 1],
    [0, 1],
  ] as const;
  test("edges and corners are 0 in either direction", () => {
    for (const loop of [square, [...square].reverse()]) {
      for (const [x, y] of [[0, 0], [1, 1], [0.5, 0], [0, 0.3], [1, 0.25]] as const) expect(sideOfLoop(loop, x, y)).toBe(0); // prettier-ignore
      expect(sideOfLoop(loop, 0.5, 0.5)).toBe(1);
      expect(sideOfLoop(loop, 1.5, 1)).toBe(-1);
      expect(sideOfLoop(loop, -0.5, 0)).toBe(-1);
    }
  });
  test("exact where floating point is not: on the line from (0, 0) to (3, 1), and one step off", () => {
    const triangle = [
      [0, 0],
      [3, 1],
      [0, 1],
    ] as const;
    expect(sideOfLoop(triangle, 0.75, 0.25)).toBe(0);
    expect(sideOfLoop(triangle, 0.75, 0.25 + 2 ** -54)).toBe(1);
    expect(sideOfLoop(triangle, 0.75, 0.25 - 2 ** -55)).toBe(-1);
  });
});
