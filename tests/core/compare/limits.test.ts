import { describe, expect, test } from "vitest";
import { limitMoves } from "../../../shared/compare/limits";
import type { Problem } from "../../../shared/schemas/problem";
import { lineThroughWindows } from "../../support/read";
import { band, solved } from "../../support/solver";

const neutral: Problem = {
  temperatureC: 25,
  metals: [
    { element: "Zn", requirement: "dissolved", activity: 0.08 },
    { element: "Fe", requirement: "solid", activity: 1e-5 },
  ],
  ligands: [],
  solidsBasis: "fresh",
  frame: { pH: [1, 10], Eh: [-0.2, 1.2] },
  controlBand: band,
};
const withIron = (activity: number): Problem => ({ ...neutral, metals: [neutral.metals[0]!, { ...neutral.metals[1]!, activity }] }); // prettier-ignore
const windowOf = (p: Problem) => solved(p).windows[0]!;

describe("limits between two answers", () => {
  test("a tenth of the iron in solution: by hand 1/3 pH for Fe^3+ + 3 H2O = Fe(OH)3 + 3 H^+, one decade of RT ln10/F for Fe^2+; zinc stays", () => {
    const [before, after] = [windowOf(withIron(1e-2)), windowOf(withIron(1e-3))];
    const moves = limitMoves(before, after, [before.setPoint.pH, before.setPoint.Eh]);
    const of = (metal: string, side: string) => moves.find((m) => m.metal === metal && m.side === side);
    expect(of("Fe", "low pH")?.pH?.by).toBeCloseTo(1 / 3, 4);
    expect(of("Fe", "low pH")?.Eh).toBeNull();
    // Fe(OH)3 + 3 H^+ + e^- = Fe^2+ + 3 H2O
    expect(of("Fe", "low Eh")?.Eh?.by).toBeCloseTo(0.05916, 4);
    expect(of("Zn", "high pH")?.pH?.by).toBeCloseTo(0, 12);
    expect(moves.map((m) => m.side)).toContain("high Eh");
  });

  test("a limit whose species beyond is another is still one limit", () => {
    const [before, after] = [windowOf(withIron(1e-3)), windowOf(withIron(1e-5))];
    const low = limitMoves(before, after, [before.setPoint.pH, before.setPoint.Eh]).find((m) => m.metal === "Fe" && m.side === "low pH"); // prettier-ignore
    expect([low?.before[0]?.outside, low?.after[0]?.outside]).toEqual(["Fe^3+(aq)", "FeOH^2+(aq)"]);
    expect(low?.pH?.by).toBeGreaterThan(0.9);
  });

  test("what it says of the pH walls is what the windows show on the same line", () => {
    const [a, b] = [
      { ...neutral, temperatureC: 40 },
      { ...neutral, temperatureC: 80 },
    ];
    const [before, after] = [windowOf(a), windowOf(b)];
    let read = 0;
    for (const m of limitMoves(before, after, [before.setPoint.pH, before.setPoint.Eh])) {
      if (m.pH === null || m.metal !== "Zn") continue;
      const [, wasHigh] = lineThroughWindows(solved(a), "pH", m.pH.atEh);
      const [, isHigh] = lineThroughWindows(solved(b), "pH", m.pH.atEh);
      expect(m.pH.by).toBeCloseTo(isHigh - wasHigh, 9);
      read++;
    }
    expect(read).toBeGreaterThan(0);
  });

  test("against itself nothing moves and nothing comes or goes", () => {
    const w = windowOf(neutral);
    for (const m of limitMoves(w, w, [w.setPoint.pH, w.setPoint.Eh])) {
      expect([m.before.length > 0, m.after.length > 0]).toEqual([true, true]);
      expect([m.pH?.by ?? 0, m.Eh?.by ?? 0]).toEqual([0, 0]);
    }
  });

  test("swapped, every move has the other sign; a limit that only one has is told with no way", () => {
    const [before, after] = [windowOf(neutral), windowOf({ ...neutral, water: { bound: "none" } })];
    const near = [before.setPoint.pH, before.setPoint.Eh] as const;
    const [there, back] = [limitMoves(before, after, near), limitMoves(after, before, near)];
    const oxygen = there.find((m) => m.kind === "water" && m.side === "high Eh");
    expect([oxygen?.before.length, oxygen?.after, oxygen?.pH, oxygen?.Eh]).toEqual([1, [], null, null]);
    for (const m of there) {
      const other = back.find((o) => o.kind === m.kind && o.metal === m.metal && o.side === m.side); // prettier-ignore
      expect(other?.Eh?.by ?? 0).toBeCloseTo(-(m.Eh?.by ?? 0), 12);
    }
  });
});
