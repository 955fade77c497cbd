import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { analyse } from "../../../shared/analysis";
import { groundDifference } from "../../../shared/compare/ground";
import { areaOf, type Convex } from "../../../shared/geometry/convex";
import { common, without } from "../../../shared/geometry/overlay";
import { connect } from "../../../shared/geometry/region";
import { valueOf } from "../../../shared/outcome";
import type { Problem } from "../../../shared/schemas/problem";
import { subdivision } from "../../support/arbitraries";
import { runs } from "../../support/fuzz";
import { insideOutline, insideWindows } from "../../support/read";
import { band, library, solved } from "../../support/solver";

const sum = (pieces: readonly Convex[]): number => pieces.reduce((s, p) => s + areaOf(p), 0);
const holds = (p: Convex, x: number, y: number): boolean => p.lines.every(([k, a, b]) => k + a * x + b * y >= 0);

describe("overlays of cut squares", () => {
  const parts = fc.tuple(subdivision, subdivision, fc.infiniteStream(fc.boolean()));
  test("kept, lost and gained fill both sets, do not overlap, and hold the points they should", () =>
    fc.assert(
      fc.property(
        parts,
        fc.array(fc.tuple(fc.double({ min: -4, max: 4, noNaN: true }), fc.double({ min: -4, max: 4, noNaN: true })), {
          minLength: 20,
          maxLength: 20,
        }),
        ([p, q, keep], points) => {
          // prettier-ignore
          const a = p.filter(() => keep.next().value);
          const b = q.filter(() => keep.next().value);
          const [kept, lost, gained] = [common(a, b), without(a, b), without(b, a)];
          expect(sum(kept) + sum(lost)).toBeCloseTo(sum(a), 9);
          expect(sum(kept) + sum(gained)).toBeCloseTo(sum(b), 9);
          // `connect` throws where pieces overlap
          for (const set of [kept, lost, gained]) expect(connect(set).reduce((s, r) => s + r.area, 0)).toBeCloseTo(sum(set), 9); // prettier-ignore
          for (const [x, y] of points) {
            const [inA, inB] = [a.some((s) => holds(s, x, y)), b.some((s) => holds(s, x, y))];
            const onEdge = [...p, ...q].some((s) => s.lines.some(([k, u, v]) => Math.abs(k + u * x + v * y) < 1e-6));
            if (onEdge) continue;
            const here = [kept, lost, gained].map((set) => set.some((s) => holds(s, x, y)));
            expect(here).toEqual([inA && inB, inA && !inB, !inA && inB]);
          }
        },
      ),
      runs(120),
    ));

  test("a set less itself is nothing, less nothing is itself", () =>
    fc.assert(
      fc.property(subdivision, (pieces) => {
        expect(without(pieces, pieces)).toEqual([]);
        expect(without(pieces, [])).toEqual(pieces);
      }),
      runs(60),
    ));
});

const neutral: Problem = {
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
const of = (problem: Problem) => valueOf(analyse(problem, library));

describe("open ground between two answers", () => {
  const others: [string, Problem][] = [
    ["another temperature", { ...neutral, temperatureC: 85 }],
    ["another activity", { ...neutral, metals: [neutral.metals[0]!, { ...neutral.metals[1]!, activity: 1e-3 }] }],
    ["another basis", { ...neutral, solidsBasis: "aged" }],
    ["another frame", { ...neutral, temperatureC: 70, frame: { pH: [2, 9], Eh: [0, 1.0] } }],
  ];
  test.each(others)("%s: areas add up and every point of a grid is told right", (_, other) => {
    const d = groundDifference(of(neutral), of(other));
    const [before, after] = [solved(neutral), solved(other)];
    const { frame } = d;
    if (frame === null) throw new Error("the frames share ground");
    const counted = { gained: 0, lost: 0, kept: 0 };
    for (let i = 0; i < 70; i++)
      for (let j = 0; j < 70; j++) {
        const pH = frame.pH[0] + ((i + 0.5) / 70) * (frame.pH[1] - frame.pH[0]);
        const Eh = frame.Eh[0] + ((j + 0.5) / 70) * (frame.Eh[1] - frame.Eh[0]);
        const [was, is] = [insideWindows(before, pH, Eh), insideWindows(after, pH, Eh)];
        const told = (["gained", "lost", "kept"] as const).filter((k) =>
          d[k].outlines.some((o) => insideOutline(o, pH, Eh)),
        );
        expect([pH, Eh, told]).toEqual([pH, Eh, was && is ? ["kept"] : was ? ["lost"] : is ? ["gained"] : []]);
        for (const k of told) counted[k]++;
      }
    const cell = ((frame.pH[1] - frame.pH[0]) * (frame.Eh[1] - frame.Eh[0])) / 4900;
    for (const k of ["gained", "lost", "kept"] as const) expect(Math.abs(counted[k] * cell - d[k].area)).toBeLessThan(0.06); // prettier-ignore
    if (!d.framesDiffer) {
      const area = (s: typeof before) => s.windows.reduce((t, w) => t + w.area, 0);
      expect(d.kept.area + d.lost.area).toBeCloseTo(area(before), 9);
      expect(d.kept.area + d.gained.area).toBeCloseTo(area(after), 9);
    }
  });

  test("an answer against itself: all is kept", () => {
    const d = groundDifference(of(neutral), of(structuredClone(neutral)));
    expect([d.gained.area, d.lost.area]).toEqual([0, 0]);
    expect(d.kept.area).toBeCloseTo(solved(neutral).windows[0]!.area, 12);
    expect(d.framesDiffer).toBe(false);
  });

  test("less may dissolve: ground is only lost; swapped, only gained", () => {
    const strict: Problem = { ...neutral, metals: [neutral.metals[0]!, { ...neutral.metals[1]!, activity: 1e-7 }] };
    const [there, back] = [groundDifference(of(neutral), of(strict)), groundDifference(of(strict), of(neutral))];
    expect(there.gained.area).toBe(0);
    expect(there.lost.area).toBeGreaterThan(0.01);
    expect([back.gained.area, back.lost.area]).toEqual([there.lost.area, 0]);
  });

  test("frames apart: nothing to compare, and it says so", () => {
    const far: Problem = { ...neutral, frame: { pH: [9, 12], Eh: [-0.2, 1.2] } };
    expect(groundDifference(of(neutral), of(far))).toMatchObject({
      frame: null,
      framesDiffer: true,
      kept: { area: 0 },
    });
  });
});
