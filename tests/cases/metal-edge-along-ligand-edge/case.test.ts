import { expect, test } from "vitest";
import { expectInvariants } from "../../support/invariants";
import { solved } from "../../support/solver";
import { ELECTRON, invented, inventedLigand, PROTON } from "../../support/synthetic";

// A metal changes state exactly where its ligand takes up a proton. The limit was named by looking 1e-7 across its middle, so
// that several species beyond it had one name, and a field thinner than that none.
const K = 40000;
const ligand = inventedLigand("Cl", [
  { name: "base", phase: "aq", k: 0, p: 0, q: 1 },
  { name: "acid", phase: "aq", k: -K, p: 1, q: 1 },
]);

test("one species on either side", () => {
  const problem = invented(
    {
      Cu: {
        requirement: "dissolved",
        species: [
          { name: "ion", phase: "aq", k: 0, p: 0, q: 1, ligands: { Cl: 1 } },
          { name: "salt", phase: "s", k: -K, p: 1, ligands: { Cl: 1 } },
        ],
      },
    },
    ligand,
  );
  const solution = solved(problem);
  const edge = solution.windows[0]!.limits.filter((l) => l.kind === "metal");
  expect(edge.map((l) => [l.inside, l.outside, l.reaction])).toEqual([
    ["CuCl^-(aq,ion)", "CuClH(s,salt)", "CuCl^- + H^+ = CuClH"],
  ]);
  expect(edge[0]!.from[0]).toBeCloseTo(K / PROTON, 5);
  expectInvariants(problem, solution);
});

test("two species on either side are two limits, split where they meet", () => {
  const tenth = ELECTRON / 10;
  const problem = invented(
    {
      Cu: {
        requirement: "dissolved",
        species: [
          { name: "high", phase: "aq", k: 0, p: 0, q: 1, ligands: { Cl: 1 } },
          { name: "low", phase: "aq", k: -tenth, p: 0, q: 2, ligands: { Cl: 1 } },
          { name: "high", phase: "s", k: -K, p: 1, ligands: { Cl: 1 } },
          { name: "low", phase: "s", k: -2 * K - tenth, p: 2, ligands: { Cl: 1 } },
        ],
      },
    },
    ligand,
  );
  const solution = solved(problem);
  expect(solution.windows.length).toBe(1);
  const edge = solution.windows[0]!.limits.filter((l) => l.kind === "metal");
  expect(edge.map((l) => [l.inside, l.outside, +l.from[1].toFixed(6), +l.to[1].toFixed(6)])).toEqual([
    ["CuCl^-(aq,high)", "CuClH(s,high)", 1, 0.1],
    ["CuCl^2-(aq,low)", "CuClH2(s,low)", 0.1, -1],
  ]);
  expectInvariants(problem, solution);
});

test("a field of one grid step beyond the edge is no reason to break", () => {
  for (const steps of [-2, -1, 1, 2]) {
    const off = steps / 1024;
    const problem = invented(
      {
        Cu: {
          requirement: "dissolved",
          species: [
            { name: "ion", phase: "aq", k: 0, p: 0, q: 1, ligands: { Cl: 1 } },
            { name: "salt", phase: "s", k: -K + off, p: 1, ligands: { Cl: 1 } },
          ],
        },
      },
      ligand,
    );
    const solution = solved(problem);
    expect(solution.windows.length).toBe(1);
    expectInvariants(problem, solution);
  }
});
