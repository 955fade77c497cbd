import { expect, test } from "vitest";
import type { GroundDifference } from "../../../shared/compare/ground";
import { limitMoves } from "../../../shared/compare/limits";
import type { Problem } from "../../../shared/schemas/problem";
import { namingOf } from "../../../shared/windows/limitWords";
import { potentialScale } from "../../../src/lib/potential";
import { moveLines, verdict } from "../../../src/features/workspace/compare/words";
import { band, library, solved } from "../../support/solver";

const ground = (gained: number, lost: number, kept: number): GroundDifference => ({
  gained: { outlines: [], area: gained },
  lost: { outlines: [], area: lost },
  kept: { outlines: [], area: kept },
  frame: { pH: [0, 14], Eh: [-1, 1] },
  framesDiffer: false,
});

test.each([
  [ground(0, 0, 0), "No window is open in either."],
  [ground(0.5, 0, 0), "B opens a window, 0.500\u2009pH·V; A has none."],
  [ground(0, 0.5, 0), "B shuts the window of A, 0.500\u2009pH·V."],
  [ground(0, 0, 1), "The open ground is the same."],
  [ground(0.5, 0, 1), "B has 50\u202f% more open ground than A: ground is only gained."],
  [ground(0, 0.25, 0.75), "B has 25\u202f% less open ground than A: ground is only lost."],
  [ground(0.1, 0.3, 0.7), "B has 20\u202f% less open ground than A: 10\u202f% gained, 30\u202f% lost."],
  [ground(0.3, 0.3, 0.7), "B has as much open ground as A, elsewhere: 30\u202f% gained, 30\u202f% lost."],
  [{ ...ground(0, 0, 0), frame: null }, "The two frames have no ground in common: there is nothing to compare."],
])("the verdict on the ground %#", (difference, said) => expect(verdict(difference)).toBe(said));

test("limits are told by side, what happens and how far they moved; one that did not move stays; another species beyond is named", () => {
  const withIron = (activity: number): Problem => ({
    temperatureC: 25,
    metals: [
      { element: "Zn", requirement: "dissolved", activity: 0.08 },
      { element: "Fe", requirement: "solid", activity },
    ],
    ligands: [],
    solidsBasis: "fresh",
    frame: { pH: [1, 10], Eh: [-0.2, 1.2] },
    controlBand: band,
  });
  const [a, b] = [solved(withIron(1e-3)), solved(withIron(1e-5))];
  const side = (s: typeof a) => ({ window: s.windows[0]!, naming: namingOf(library, s) });
  const at = a.setPoint!;
  const lines = moveLines(
    limitMoves(a.windows[0]!, b.windows[0]!, [at.pH, at.Eh]),
    side(a),
    side(b),
    potentialScale("V"),
  );
  const of = (what: string) => lines.find((l) => l.what === what);
  expect(of("zinc precipitates")).toMatchObject({ side: "high pH", note: "stays", pH: null });
  expect(of("iron dissolves")).toMatchObject({
    side: "low pH",
    pH: "+0.99\u2009".trim() + " pH at 0.81\u2009V",
    beyond: ["Fe^3+(aq)", "FeOH^2+(aq)"],
  });
  expect(of("iron is reduced and dissolves")?.Eh).toBe(`+118\u2009mV at pH 4.20`);
});
