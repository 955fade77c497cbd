import { expect, test } from "vitest";
import { expectInvariants } from "../../support/invariants";
import { solved } from "../../support/solver";
import type { Problem } from "../../../shared/schemas/problem";

// Every metal alone was named as a conflict where none of them was to blame.
test("a frame that water leaves no ground in names no requirement", () => {
  const problem: Problem = {
    temperatureC: 25,
    metals: [
      { element: "Zn", requirement: "dissolved", activity: 0.1 },
      { element: "Cu", requirement: "metal", activity: 1e-4 },
    ],
    ligands: [],
    frame: { pH: [0, 4], Eh: [-1.5, -1] },
    water: { bound: "both" },
    controlBand: { pH: 0.15, Eh: 0.03 },
  };
  const solution = solved(problem);
  expect([solution.windows, solution.conflicts]).toEqual([[], []]);
  expectInvariants(problem, solution);
});
