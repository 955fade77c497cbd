import { expect, test } from "vitest";
import { expectInvariants } from "../../support/invariants";
import { solved } from "../../support/solver";
import { invented } from "../../support/synthetic";

// Copper dissolves above one pH and zinc below another that is higher by a fraction of a grid step: 9e-10 pH. That was a window.
test("ground thinner than 1e-9 pH is no window, and the conflict says so", () => {
  const t = 40_900_000;
  const [copper, zinc] = [(12 + 13 * t) / 1024, (13 + 14 * t) / 1024]; // 13 (13 + 14 t) - 14 (12 + 13 t) = 1
  const problem = invented({
    Cu: {
      requirement: "dissolved",
      species: [
        { name: "ion", phase: "aq", k: 0, p: 0, q: 13 },
        { name: "solid", phase: "s", k: -copper, p: 13 },
      ],
    },
    Zn: {
      requirement: "dissolved",
      species: [
        { name: "ion", phase: "aq", k: 0, p: 0, q: -14 },
        { name: "solid", phase: "s", k: zinc, p: -14 },
      ],
    },
  });
  const solution = solved(problem);
  expect(solution.windows).toEqual([]);
  expect(solution.conflicts.map((c) => c.map((m) => m.metal))).toEqual([["Cu", "Zn"]]);
  expectInvariants(problem, solution);
});
