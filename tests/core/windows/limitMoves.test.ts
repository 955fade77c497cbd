import { expect, test } from "vitest";
import { analyse } from "../../../shared/analysis";
import type { Problem } from "../../../shared/schemas/problem";
import type { Limit } from "../../../shared/solution";
import { solve } from "../../../shared/solve";
import { limitMoves, type MoveBy } from "../../../shared/windows/limitMoves";
import { library } from "../../support/solver";

/** Zinc over iron in sulfate, the first question of docs/solver.md. */
const base: Problem = {
  temperatureC: 60,
  metals: [
    { element: "Zn", requirement: "dissolved", activity: 0.08 },
    { element: "Fe", requirement: "solid", activity: 1e-5 },
  ],
  ligands: [{ component: "S", activity: 0.5 }],
  solidsBasis: "fresh",
  frame: { pH: [1, 8], Eh: [-0.2, 1.2] },
  controlBand: { pH: 0.15, Eh: 0.03 },
};

function solved(problem: Problem) {
  const [solution, analysis] = [solve(problem, library), analyse(problem, library)];
  if (!solution.ok || !analysis.ok) throw new Error("the question of the test has no answer");
  return { window: solution.value.windows[0]!, analysis: analysis.value };
}

const changed = (by: MoveBy): Problem => {
  if (by.kind === "temperature") return { ...base, temperatureC: base.temperatureC + by.kelvin };
  const times = <Part extends { activity?: number | undefined }>(part: Part, hit: boolean): Part =>
    hit ? { ...part, activity: (part.activity ?? 0) * by.factor } : part;
  return {
    ...base,
    metals: base.metals.map((m) => times(m, by.kind === "metal" && m.element === by.component)),
    ligands: (base.ligands ?? []).map((l) => times(l, by.kind === "ligand")),
  };
};

const { window, analysis } = solved(base);
const { setPoint } = window;
const { pH: p, Eh: e } = setPoint;

/** The same edge in the window of another question. */
const again = (limit: Limit, problem: Problem): Limit | undefined =>
  solved(problem).window.limits.find(
    (l) => l.kind === limit.kind && l.side === limit.side && l.inside === limit.inside && l.outside === limit.outside,
  );
const pHAt = ([k, x, y]: Limit["line"], Eh: number) => -(k + y * Eh) / x;
const EhAt = ([k, x, y]: Limit["line"], pH: number) => -(k + x * pH) / y;

test.each(window.limits.filter((l) => l.kind !== "frame").map((l) => [l.reaction ?? "", l] as const))(
  "every move of %s is where the limit stands when the question is solved again",
  (_, limit) => {
    const moves = limitMoves(analysis, limit, setPoint);
    expect(moves.map((m) => m.by.kind)).toEqual(
      limit.kind === "water" ? ["temperature"] : ["metal", "ligand", "temperature"],
    );
    let compared = 0;
    for (const { by, pH, Eh } of moves) {
      const moved = again(limit, changed(by));
      if (!moved) continue; // another reaction shuts there now
      compared += 1;
      const middle = [0, 1].map((i) => (limit.from[i as 0] + limit.to[i as 0]) / 2) as [number, number];
      const at = { Eh: limit.distancePH === null ? middle[1] : e, pH: limit.distanceEh === null ? middle[0] : p };
      // The grid moves a line by some 1e-7 (docs/method.md, section 2).
      if (pH !== null) expect(pH).toBeCloseTo(pHAt(moved.line, at.Eh) - pHAt(limit.line, at.Eh), 5);
      if (Eh !== null) expect(Eh).toBeCloseTo(EhAt(moved.line, at.pH) - EhAt(limit.line, at.pH), 5);
    }
    expect(compared).toBeGreaterThan(0);
  },
);

test("ferrihydrite holds ten times less iron back a third of a pH higher: three protons an iron", () => {
  const [limit] = window.limits.filter(
    (l) => (l.metal === "Fe" && l.line[2] === 0) || (l.metal === "Fe" && Math.abs(l.line[2]) < 1e-9),
  );
  const [iron] = limitMoves(analysis, limit!, setPoint);
  expect(iron!.by).toEqual({ kind: "metal", component: "Fe", factor: 0.1 });
  expect(iron!.pH).toBeCloseTo(1 / 3, 4);
  expect(iron!.Eh).toBeNull();
});

test("a line of hydrogen ions and electrons does not move with a ligand that both sides lack, and the frame with nothing", () => {
  const water = window.limits.find((l) => l.kind === "water")!;
  expect(limitMoves(analysis, water, setPoint)).toHaveLength(1);
  const frame: Limit = { ...water, kind: "frame", side: "low pH" };
  expect(limitMoves(analysis, frame, setPoint)).toEqual([]);
});
