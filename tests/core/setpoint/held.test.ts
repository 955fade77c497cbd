import { describe, expect, test } from "vitest";
import { analyse } from "../../../shared/analysis";
import { valueOf } from "../../../shared/outcome";
import type { Problem } from "../../../shared/schemas/problem";
import { heldSetPoint, windowAt } from "../../../shared/setpoint/held";
import { solve } from "../../../shared/solve";
import { band, library } from "../../support/solver";

const problem: Problem = {
  temperatureC: 60,
  metals: [
    { element: "Zn", requirement: "dissolved", activity: 0.08 },
    { element: "Fe", requirement: "solid", activity: 1e-5 },
  ],
  ligands: [{ component: "S", activity: 0.5 }],
  solidsBasis: "fresh",
  frame: { pH: [1, 8], Eh: [-0.2, 1.2] },
  controlBand: band,
};
const analysis = valueOf(analyse(problem, library));
const solution = valueOf(solve(problem, library));
const deepest = solution.windows[0]!.setPoint;
const at = (pH: number, Eh: number) => heldSetPoint(analysis, solution, [pH, Eh], band)!;

describe("a set point placed by hand", () => {
  test("on the deepest point has the deepest point's margin, distances and kind of potential", () => {
    const held = at(deepest.pH, deepest.Eh);
    expect(held.inside).toBe(true);
    expect(held.window.setPoint.margin).toBeCloseTo(deepest.margin, 6);
    expect(held.window.setPoint.mixedPotential).toBe(deepest.mixedPotential);
    held.window.limits.forEach((limit, i) => {
      const before = solution.windows[0]!.limits[i]!;
      expect(limit.distance).toBeCloseTo(before.distance, 9);
      expect(limit.distancePH ?? -99).toBeCloseTo(before.distancePH ?? -99, 9);
      expect(limit.distanceEh ?? -99).toBeCloseTo(before.distanceEh ?? -99, 9);
    });
  });

  test("loses margin by the bands it moves along pH towards the nearer limit", () => {
    const nearer = solution.windows[0]!.limits.map((l) => l.distancePH)
      .filter((d) => d !== null)
      .sort((a, b) => Math.abs(a) - Math.abs(b))[0]!;
    const held = at(deepest.pH + Math.sign(nearer) * 2 * band.pH, deepest.Eh);
    expect(held.window.setPoint.margin).toBeCloseTo(Math.abs(nearer) / band.pH - 2, 6);
  });

  test("outside has a margin below zero and stays with the nearest window", () => {
    const held = at(7.5, deepest.Eh);
    expect(held).toMatchObject({ inside: false, index: 0 });
    expect(held.window.setPoint.margin).toBeLessThan(0);
    expect(held.window.setPoint.EhRange).toBeUndefined();
  });

  test("leaves the solution alone", () => {
    at(5, 0.5);
    expect(solution.windows[0]!.setPoint).toEqual(deepest);
  });
});

test("without a window there is nowhere to stand", () => expect(windowAt([], [5, 0.5], band)).toBeNull());
