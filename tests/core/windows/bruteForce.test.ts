import { expect, test } from "vitest";
import type { Problem } from "../../../shared/schemas/problem";
import type { Solution } from "../../../shared/solution";
import { expectInvariants } from "../../support/invariants";
import { isAsRequired, oracleFor, type Oracle } from "../../support/oracle";
import { coupleProblem, randomProblem } from "../../support/problems";
import { seeded, type Random } from "../../support/random";
import { insideWindows } from "../../support/read";
import { library, solved } from "../../support/solver";

const PROBLEMS = 240;
const POINTS = 150;

/** Whether all is as required at a point by the oracle; null where a metal or a water line is too near to call. */
function isOpen(oracle: Oracle, pH: number, Eh: number): boolean | null {
  const { problem } = oracle;
  const wins = problem.metals.some((m) => m.requirement === "metal");
  const { bound, oxygenV = 0, hydrogenV = 0 } = { oxygenV: 0, hydrogenV: 0, ...(problem.water ?? { bound: wins ? "upper" : "both" }) }; // prettier-ignore
  const room: number[] = [];
  if (bound === "both" || bound === "upper") room.push(oracle.oxygen(pH) + oxygenV - Eh);
  if (bound === "both" || bound === "lower") room.push(Eh - oracle.hydrogen(pH) + hydrogenV);
  let open = room.every((v) => v > 0);
  let sure = room.every((v) => Math.abs(v) > 1e-5);
  for (const { element, requirement } of problem.metals) {
    const standings = oracle.standings(element, pH, Eh);
    const [best] = standings;
    const asRequired = isAsRequired(requirement, best!.state);
    const rival = standings.find((s) => isAsRequired(requirement, s.state) !== asRequired);
    if (rival && rival.energy - best!.energy < 0.01 * Math.max(1, best!.moved, rival.moved)) sure = false;
    open &&= asRequired;
  }
  return sure ? open : null;
}

/** Points anywhere, and next to the corners of the windows. */
function pointFor({ frame }: Problem, solution: Solution, random: Random): [number, number] {
  const corners = solution.windows.flatMap((w) => w.polygons.flatMap((p) => [p.outer, ...p.holes].flat()));
  if (corners.length > 0 && random.chance(0.4)) {
    const [pH, Eh] = random.pick(corners);
    const reach = random.decade(-4, -1);
    return [pH + reach * random.between(-1, 1), Eh + 0.06 * reach * random.between(-1, 1)];
  }
  return [random.between(...frame.pH), random.between(...frame.Eh)];
}

test("a point lies in a window exactly when every requirement holds there, and every solution keeps the invariants", () => {
  const random = seeded(20261201);
  const complaints: string[] = [];
  const seen = { windows: 0, inside: 0, outside: 0, couples: 0 };
  for (let i = 0; i < PROBLEMS; i++) {
    const problem = i % 6 === 5 ? coupleProblem(random) : randomProblem(random);
    const solution = solved(problem);
    const oracle = oracleFor(problem, library);
    seen.windows += solution.windows.length;
    seen.couples += solution.windows.filter((w) => !w.setPoint.mixedPotential).length;
    for (let k = 0; k < POINTS; k++) {
      const [pH, Eh] = pointFor(problem, solution, random);
      const { frame } = problem;
      if (pH <= frame.pH[0] || pH >= frame.pH[1] || Eh <= frame.Eh[0] || Eh >= frame.Eh[1]) continue;
      const open = isOpen(oracle, pH, Eh);
      if (open === null) continue;
      seen[open ? "inside" : "outside"]++;
      if (insideWindows(solution, pH, Eh) !== open)
        complaints.push(`problem ${i}: pH ${pH}, ${Eh} V is ${open ? "open" : "shut"} by the oracle`);
    }
    expectInvariants(problem, solution);
  }
  expect(complaints).toEqual([]);
  // the questions are neither all empty nor all open
  expect(seen.windows).toBeGreaterThan(60);
  expect(seen.couples).toBeGreaterThan(10);
  expect(seen.inside).toBeGreaterThan(2000);
  expect(seen.outside).toBeGreaterThan(2000);
});
