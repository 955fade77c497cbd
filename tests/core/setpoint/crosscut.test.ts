import { describe, expect, test } from "vitest";
import type { Problem } from "../../../shared/schemas/problem";
import { crosscut, speciesAt } from "../../../shared/setpoint/crosscut";
import { isAsRequired, oracleFor } from "../../support/oracle";
import { randomProblem } from "../../support/problems";
import { seeded } from "../../support/random";
import { library, solved, wideFrame, band } from "../../support/solver";

describe("a crosscut", () => {
  test("covers the frame from side to side, once, with the species the oracle finds", () => {
    const random = seeded(20261220);
    for (let i = 0; i < 60; i++) {
      const p = randomProblem(random);
      const solution = solved(p);
      const oracle = oracleFor(p, library);
      const through = [random.between(...p.frame.pH), random.between(...p.frame.Eh)] as const;
      for (const along of ["pH", "Eh"] as const)
        for (const { element, requirement } of p.metals) {
          const parts = crosscut(solution, element, along, through);
          expect(parts[0]!.from).toBeCloseTo(p.frame[along][0], 9);
          expect(parts.at(-1)!.to).toBeCloseTo(p.frame[along][1], 9);
          parts.slice(1).forEach((part, k) => {
            expect(part.from).toBeCloseTo(parts[k]!.to, 8);
            expect(part.species).not.toBe(parts[k]!.species);
          });
          for (const part of parts.filter((q) => q.to - q.from > 1e-4)) {
            const at = (part.from + part.to) / 2;
            const [pH, Eh] = along === "pH" ? [at, through[1]] : [through[0], at];
            expect(oracle.cheapest(element, pH, Eh).species.id).toBe(part.species);
            expect(part.fulfilled).toBe(isAsRequired(requirement, part.state));
          }
        }
    }
  });

  const zinc: Problem = {
    temperatureC: 25,
    metals: [{ element: "Zn", requirement: "dissolved", activity: 1e-3 }],
    ligands: [],
    frame: wideFrame,
    controlBand: band,
  };

  test("along the line of a horizontal border shows one of the two, not both", () => {
    const solution = solved(zinc);
    const border = solution.fields.find((f) => f.species === "Zn(s)")!.polygon.reduce((a, b) => (b[1] > a[1] ? b : a));
    const parts = crosscut(solution, "Zn", "pH", border);
    parts.slice(1).forEach((p, k) => expect(p.from).toBeGreaterThanOrEqual(parts[k]!.to - 1e-9));
  });

  test("of a metal that is not in the question is empty", () =>
    expect(crosscut(solved(zinc), "Cu", "pH", [7, 0])).toEqual([]));

  test("the read-out names every metal's species under the cursor, in the order of the question, and none outside", () => {
    const p: Problem = { ...zinc, metals: [...zinc.metals, { element: "Cu", requirement: "metal", activity: 1e-6 }] };
    expect(speciesAt(solved(p), 3, 0)).toEqual([
      { metal: "Zn", species: "Zn^2+(aq)", state: "dissolved", fulfilled: true },
      { metal: "Cu", species: "Cu(s)", state: "metal", fulfilled: true },
    ]);
    expect(speciesAt(solved(p), 30, 0)).toEqual([]);
  });
});
