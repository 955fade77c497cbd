import { describe, expect, test } from "vitest";
import { adviceGaps } from "../../../shared/advice/openings";
import type { Problem } from "../../../shared/schemas/problem";
import type { Point } from "../../../shared/solution";
import { seeded } from "../../support/random";
import { band, library, solved } from "../../support/solver";

const sulfate = (change: Partial<Problem> & Pick<Problem, "metals">): Problem => ({
  temperatureC: 25,
  ligands: [{ component: "S", activity: 0.5 }],
  solidsBasis: "fresh",
  frame: { pH: [0, 12], Eh: [-1, 1.4] },
  controlBand: band,
  ...change,
});
const gapsOf = (problem: Problem) => {
  const { conflicts, windows } = solved(problem);
  expect(windows).toEqual([]);
  return adviceGaps(problem, library, conflicts);
};

describe("a single demand that holds nowhere", () => {
  test("zinc as metal between the water lines: its ground lies below the hydrogen line by E0 of zinc less its activity's term", () => {
    const problem = sulfate({
      metals: [{ element: "Zn", requirement: "metal", activity: 1e-6 }],
      ligands: [],
      frame: { pH: [0, 6], Eh: [-1.5, 1] },
      water: { bound: "both" },
    });
    const [found] = gapsOf(problem);
    expect(found).toMatchObject({ members: ["Zn"], across: "water", nearest: null });
    // Zn^2+ + 2 e^- = Zn at 1e-6: -0.762 - 0.1775 V; the hydrogen line is nearest at the frame's highest pH, 6
    const zinc = -147.06 / (2 * 96.48533) - (6 * 0.0591597) / 2;
    expect(found!.gap!.Eh).toBeCloseTo(-0.0591597 * 6 - zinc, 2);
    expect(found!.gap!.pH).toBeNull(); // no Eh meets both inside the frame
  });

  test("iron solid on a map that ends below its pH: the ground beyond the frame, read from the wider map", () => {
    const metals: Problem["metals"] = [{ element: "Fe", requirement: "solid", activity: 1e-5 }];
    const narrow = sulfate({ metals, frame: { pH: [1, 2], Eh: [0, 1] } });
    const wide = sulfate({ metals, frame: { pH: [1, 8], Eh: [0, 1] } });
    const from = Math.min(...solved(wide).windows.map((w) => w.pH[0]));
    const [found] = gapsOf(narrow);
    expect(found).toMatchObject({ members: ["Fe"], across: "frame" });
    expect(found!.gap!.pH).toBeCloseTo(from - 2, 6);
  });
});

/** The problem with only some of its demands left. */
const withOnly = (problem: Problem, asked: readonly string[]): Problem => ({
  ...problem,
  water: problem.water ?? { bound: problem.metals.some((m) => m.requirement === "metal") ? "upper" : "both" },
  metals: problem.metals.map((m) => (asked.includes(m.element) ? m : { ...m, requirement: "free" })),
});

type Rings = readonly (readonly Point[])[];
const ringsOf = (problem: Problem): Rings =>
  solved(problem).windows.flatMap((w) => w.polygons.flatMap((p) => [p.outer, ...p.holes]));

/** Where a line through windows is inside, low to high: crossings of every ring, paired. */
function chords(rings: Rings, axis: 0 | 1, level: number): [number, number][] {
  const hits = rings
    .flatMap((ring) =>
      ring.flatMap((a, i) => {
        const b = ring[(i + 1) % ring.length]!;
        const [p, q] = [a[1 - axis]!, b[1 - axis]!]; // where the line stands
        return p <= level === q <= level ? [] : [a[axis] + ((level - p) / (q - p)) * (b[axis] - a[axis])];
      }),
    )
    .sort((x, y) => x - y);
  return Array.from({ length: hits.length / 2 }, (_, i) => [hits[2 * i]!, hits[2 * i + 1]!]);
}

/** Least way between two grounds along an axis, on many lines. */
function leastWay(a: Problem, b: Problem, axis: 0 | 1): number {
  const [low, high] = axis === 0 ? a.frame.Eh : a.frame.pH;
  const [ringsA, ringsB] = [ringsOf(a), ringsOf(b)];
  let least = Infinity;
  for (let i = 0; i < 400; i++) {
    const level = low + ((high - low) * (i + 0.5)) / 400;
    for (const [al, ah] of chords(ringsA, axis, level))
      for (const [bl, bh] of chords(ringsB, axis, level)) least = Math.min(least, Math.max(0, bl - ah, al - bh));
  }
  return least;
}

test("three that any two of could: the gap of the one that stands nearest to what the others have in common", () => {
  const problem = sulfate({
    metals: [
      { element: "Ni", requirement: "solid", activity: 1.5e-3 },
      { element: "Mn", requirement: "compound", activity: 0.1 },
      { element: "Fe", requirement: "dissolved", activity: 0.04 },
    ],
  });
  const [found] = gapsOf(problem);
  expect(found).toMatchObject({ members: ["Ni", "Mn", "Fe"], across: "members" });
  const names = found!.members;
  const ways = names.map((name) => {
    const [one, rest] = [withOnly(problem, [name]), withOnly(problem, names.filter((n) => n !== name))]; // prettier-ignore
    const [pH, Eh] = [leastWay(one, rest, 0), leastWay(one, rest, 1)];
    return { name, pH, Eh, size: Math.min(pH / band.pH, Eh / band.Eh) };
  });
  const nearest = ways.sort((a, b) => a.size - b.size)[0]!;
  expect(found!.nearest).toBe(nearest.name);
  // on 400 lines the least is seen a little late, never early
  expect(nearest.pH - (found!.gap!.pH ?? Infinity)).toBeGreaterThan(-1e-9);
  expect(nearest.pH - (found!.gap!.pH ?? Infinity)).toBeLessThan(0.06);
  expect(nearest.Eh - (found!.gap!.Eh ?? Infinity)).toBeGreaterThan(-1e-9);
  expect(nearest.Eh - (found!.gap!.Eh ?? Infinity)).toBeLessThan(0.02);
});

test("the smallest sets are those, and all those, that solving every set of demands by itself finds", () => {
  const random = seeded(20261201);
  let [without, larger] = [0, 0];
  for (let i = 0; i < 250; i++) {
    const problem = sulfate({
      metals: random
        .shuffled(["Cu", "Fe", "Zn", "Ni", "Co", "Mn", "Cd", "Pb", "Al", "As", "Ag"])
        .slice(0, 4)
        .map((element) => ({
          element,
          requirement: random.pick(["dissolved", "solid", "metal", "compound"] as const),
          activity: random.decade(-6, -1),
        })),
    });
    const { conflicts, windows } = solved(problem);
    if (windows.length > 0) continue;
    without++;
    const names = problem.metals.map((m) => m.element);
    const sets = Array.from({ length: 16 }, (_, mask) => names.filter((_, k) => mask & (1 << k)));
    const shut = sets.filter((set) => solved(withOnly(problem, set)).windows.length === 0);
    const smallest = shut.filter((set) => !shut.some((s) => s.length < set.length && s.every((n) => set.includes(n))));
    const found = conflicts.map((set) => set.map((d) => d.metal ?? "").join());
    expect([...found].sort()).toEqual(smallest.map((set) => set.join()).sort());
    if (smallest.some((set) => set.length > 2)) larger++;
  }
  expect(without).toBeGreaterThan(80);
  expect(larger).toBeGreaterThan(3);
});
