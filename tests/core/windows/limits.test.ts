import { describe, expect, test } from "vitest";
import type { Problem } from "../../../shared/schemas/problem";
import { loopsOf } from "../../support/shapes";
import { randomProblem } from "../../support/problems";
import { seeded } from "../../support/random";
import { solved } from "../../support/solver";
import { minimalConflicts } from "../../../shared/windows/conflicts";

const zincOverIron: Problem = {
  temperatureC: 25,
  metals: [
    { element: "Zn", requirement: "dissolved", activity: 0.1 },
    { element: "Fe", requirement: "solid", activity: 1e-6 },
  ],
  ligands: [],
  leftOut: ["Fe2O3(s,hematite)", "Fe3O4(s,magnetite)", "FeOOH(s,goethite)", "FeOOH(s,lepidocrocite)"],
  frame: { pH: [0, 10], Eh: [-0.5, 1.2] },
  controlBand: { pH: 0.15, Eh: 0.03 },
};

describe("the limits of a window", () => {
  const [window] = solved(zincOverIron).windows;

  test("name metal, both species and the reaction that shuts it", () => {
    const named = window!.limits
      .filter((l) => l.kind === "metal")
      .map((l) => [l.metal, l.inside, l.outside, l.reaction]);
    expect(named).toContainEqual([
      "Fe",
      "Fe(OH)3(s,ferrihydrite)",
      "Fe^2+(aq)",
      "Fe(OH)3 + 3 H^+ + e^- = Fe^2+ + 3 H2O",
    ]);
    expect(named.some(([metal, inside]) => metal === "Zn" && inside === "Zn^2+(aq)")).toBe(true);
  });

  test("bring the water lines and the frame by name", () => {
    expect(window!.limits.filter((l) => l.kind === "water").map((l) => [l.side, l.reaction])).toContainEqual([
      "oxygen",
      "2 H2O = O2 + 4 H^+ + 4 e^-",
    ]);
  });

  test("tell the signed way from the set point along either axis, and none where that line misses them", () => {
    const { pH, Eh } = window!.setPoint;
    for (const l of window!.limits) {
      for (const [way, axis, other] of [
        [l.distancePH, 0, 1],
        [l.distanceEh, 1, 0],
      ] as const) {
        // prettier-ignore
        const at = [pH, Eh][other]!;
        const [lo, hi] = [Math.min(l.from[other], l.to[other]), Math.max(l.from[other], l.to[other])];
        expect(way !== null).toBe(lo !== hi && at >= lo && at <= hi);
        if (way === null) continue;
        const point = axis === 0 ? [pH + way, Eh] : [pH, Eh + way];
        const [k, x, y] = l.line;
        expect(Math.abs(k + x * point[0]! + y * point[1]!)).toBeLessThan(1e-9);
      }
    }
  });

  test("lie on lines with their larger coefficient one", () => {
    for (const { line } of window!.limits) expect(Math.max(Math.abs(line[1]), Math.abs(line[2]))).toBe(1);
  });
});

test("neighbouring limits differ: one stretch of one line with one meaning is one limit", () => {
  const random = seeded(20261230);
  for (let i = 0; i < 80; i++)
    for (const w of solved(randomProblem(random)).windows) {
      let at = 0;
      for (const loop of w.polygons.flatMap(loopsOf)) {
        const own = w.limits.slice(at, (at += loop.length));
        own.forEach((l, k) => {
          const next = own[(k + 1) % own.length]!;
          const meaning = (m: typeof l) => [m.kind, m.metal, m.inside, m.outside, m.side].join();
          const cross = l.line[1] * next.line[2] - l.line[2] * next.line[1];
          if (own.length > 2 && meaning(l) === meaning(next)) expect(Math.abs(cross)).toBeGreaterThan(0);
        });
      }
    }
});

test("minimal conflicts are what trying every set finds", () => {
  const random = seeded(5);
  for (let i = 0; i < 300; i++) {
    const n = random.whole(0, 6);
    const bans = Array.from({ length: random.whole(0, 4) }, () => random.whole(0, (1 << n) - 1));
    const holds = (set: number) => bans.every((b) => (b & set) !== b);
    const found = minimalConflicts(n, holds).sort((a, b) => a - b);
    const all = Array.from({ length: 1 << n }, (_, s) => s).filter((s) => !holds(s));
    const minimal = all.filter((s) => !all.some((t) => t !== s && (t & s) === t));
    expect(found).toEqual(minimal);
  }
});
