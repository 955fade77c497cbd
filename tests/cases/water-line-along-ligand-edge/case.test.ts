import { expect, test } from "vitest";
import { expectInvariants } from "../../support/invariants";
import { solved } from "../../support/solver";
import { invented, inventedLigand } from "../../support/synthetic";

// A ligand whose couple stands exactly on the hydrogen line: the edge kept the ligand's name, no metal changed state across
// it, and the solver broke.
test("where a water line runs along a ligand edge it is the water that shuts", () => {
  const ligand = inventedLigand("Cl", [
    { name: "oxidised", phase: "aq", k: 0, p: 0, q: 0 },
    { name: "reduced", phase: "aq", k: 0, p: 1, q: 1 },
  ]);
  const problem = invented(
    { Cu: { requirement: "dissolved", species: [{ name: "only", phase: "aq", k: 0, q: 0 }] } },
    { ...ligand, water: { bound: "both" } },
  );
  const solution = solved(problem);
  expect(solution.windows.length).toBe(1);
  expect(solution.windows[0]!.limits.map((l) => l.side)).toEqual(expect.arrayContaining(["hydrogen", "oxygen"]));
  expect(solution.windows[0]!.limits.filter((l) => l.kind === "metal")).toEqual([]);
  expectInvariants(problem, solution);
});
