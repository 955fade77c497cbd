import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { connect } from "../../shared/geometry/region";
import { farthestPoint } from "../../shared/nextTrials/farthest";
import { nextTrials, type Site } from "../../shared/nextTrials/nextTrials";
import { roomOf } from "../../shared/nextTrials/room";
import { deepestPoint } from "../../shared/setpoint/deepestPoint";
import { insideOf, type Segment } from "../../shared/setpoint/segments";
import { subdivision } from "../support/arbitraries";
import { clearanceAt } from "../support/bruteMargin";
import { runs } from "../support/fuzz";
import { windowOf } from "../support/windowOf";

/** Borders of regions put together from pieces of a cut square: reflex corners, holes, pinches, islands. */
const borders: fc.Arbitrary<Segment[][]> = fc
  .tuple(subdivision, fc.infiniteStream(fc.boolean()), fc.constantFrom(1, 3), fc.constantFrom(1, 4))
  .map(([pieces, keep, su, sv]) =>
    connect(pieces.filter(() => keep.next().value)).map((r) =>
      [r.outer, ...r.holes]
        .flat()
        .map(({ from, to }) => ({ ax: from[0] * su, ay: from[1] * sv, bx: to[0] * su, by: to[1] * sv })),
    ),
  )
  // a hair has no room for a trial
  .map((regions) => regions.filter((border) => (deepestPoint(border)?.margin ?? 0) > 1e-4));

interface Box {
  readonly u: readonly [number, number];
  readonly v: readonly [number, number];
}
const boxOf = (border: readonly Segment[]): Box => {
  const of = (list: number[]): [number, number] => [Math.min(...list), Math.max(...list)];
  return { u: of(border.map((s) => s.ax)), v: of(border.map((s) => s.ay)) };
};

/** Sites in and about a box, some in one place, some in line. */
const sitesAbout = ({ u, v }: Box, shares: readonly (readonly [number, number])[]): [number, number][] =>
  shares.map(([a, b]) => [u[0] + a * (u[1] - u[0]), v[0] + b * (v[1] - v[0])]);
const share = fc.oneof(fc.double({ min: -0.3, max: 1.3, noNaN: true }), fc.constantFrom(0, 0.25, 0.5, 1));
const shares = (most: number) => fc.array(fc.tuple(share, share), { minLength: 1, maxLength: most });

const gapAt = (sites: readonly (readonly [number, number])[], u: number, v: number) =>
  Math.min(...sites.map((s) => Math.hypot(s[0] - u, s[1] - v)));

describe("the point farthest from every site", () => {
  test("is allowed, as far as it says, and no point of a fine grid is farther", () =>
    fc.assert(
      fc.property(borders, shares(12), fc.constantFrom(0.1, 0.4, 0.8), (regions, spots, part) => {
        for (const border of regions) {
          const keepOff = part * deepestPoint(border)!.margin;
          const box = boxOf(border);
          const sites = sitesAbout(box, spots);
          const found = farthestPoint(roomOf(border, keepOff), sites)!;
          expect(insideOf(border, found.u, found.v)).toBe(true);
          expect(clearanceAt(border, found.u, found.v)).toBeGreaterThan(keepOff - 1e-6);
          expect(found.gap).toBeCloseTo(gapAt(sites, found.u, found.v), 9);
          const n = 60;
          for (let i = 0; i <= n; i++)
            for (let j = 0; j <= n; j++) {
              const u = box.u[0] + ((box.u[1] - box.u[0]) * i) / n;
              const v = box.v[0] + ((box.v[1] - box.v[0]) * j) / n;
              if (gapAt(sites, u, v) > found.gap + 2e-6 && insideOf(border, u, v))
                expect(clearanceAt(border, u, v)).toBeLessThan(keepOff);
            }
        }
      }),
      runs(40),
    ));
});

/** Scaled so that the window is a good many control bands wide. */
const large = (border: readonly Segment[]): Segment[] => {
  const k = 6 / deepestPoint(border)!.margin;
  return border.map((s) => ({ ax: s.ax * k, ay: s.ay * k, bx: s.bx * k, by: s.by * k }));
};
const asSites = (spots: readonly (readonly [number, number])[], band = { pH: 1, Eh: 1 }): Site[] =>
  spots.map(([u, v], i) => ({ pH: u * band.pH, Eh: v * band.Eh, name: `T-${i}`, kind: "tried" }));

describe("a row of next trials", () => {
  const unit = { pH: 1, Eh: 1 };

  test("inside, gaps never growing, no two closer than the last gap, one control band from every trial", () =>
    fc.assert(
      fc.property(borders, shares(8), fc.integer({ min: 1, max: 8 }), (regions, spots, count) => {
        for (const border of regions.map(large)) {
          const sites = asSites(sitesAbout(boxOf(border), spots));
          const { points, keepOff, full } = nextTrials(windowOf(border), unit, sites, count);
          expect(full ? points.length < count : points.length === count).toBe(true);
          points.forEach((p, i) => {
            expect(p.inWindow).toBe(true);
            expect(clearanceAt(border, p.pH, p.Eh)).toBeGreaterThan(keepOff - 1e-6);
            expect(p.gap!).toBeGreaterThan(1 - 1e-6);
            if (i > 0) expect(p.gap!).toBeLessThan(points[i - 1]!.gap! + 1e-5);
            for (const q of points.slice(0, i))
              expect(Math.hypot(p.pH - q.pH, p.Eh - q.Eh)).toBeGreaterThan(points.at(-1)!.gap! - 1e-5);
          });
        }
      }),
      runs(30),
    ));

  test("the same whatever the order of the trials, to the last digit", () =>
    fc.assert(
      fc.property(borders, shares(8), (regions, spots) => {
        for (const border of regions.map(large)) {
          const sites = asSites(sitesAbout(boxOf(border), spots));
          const window = windowOf(border);
          const asked = nextTrials(window, unit, sites, 4);
          expect(nextTrials(window, unit, [...sites].reverse(), 4)).toEqual(asked);
          expect(nextTrials(window, unit, sites, 4)).toEqual(asked);
        }
      }),
      runs(30),
    ));

  test("the same in control bands when pH, Eh and the bands are scaled together", () =>
    fc.assert(
      fc.property(borders, shares(6), (regions, spots) => {
        const band = { pH: 0.25, Eh: 0.03125 }; // powers of two: no rounding, so that ties stay ties
        for (const border of regions.map(large)) {
          const at = sitesAbout(boxOf(border), spots);
          const plain = nextTrials(windowOf(border), unit, asSites(at), 3);
          const scaled = nextTrials(windowOf(border, band), band, asSites(at, band), 3);
          expect(scaled.points.map((p) => [p.pH / band.pH, p.Eh / band.Eh])).toEqual(
            plain.points.map((p) => [p.pH, p.Eh]),
          );
        }
      }),
      runs(20),
    ));

  test("a point set aside stays a place that is taken: the others do not move", () =>
    fc.assert(
      fc.property(borders, shares(5), (regions, spots) => {
        for (const border of regions.map(large)) {
          const sites = asSites(sitesAbout(boxOf(border), spots));
          const window = windowOf(border);
          const { points } = nextTrials(window, unit, sites, 4);
          const first = points[0];
          if (!first) continue;
          const aside: Site = { pH: first.pH, Eh: first.Eh, name: "1", kind: "set aside" };
          const rest = nextTrials(window, unit, [...sites, aside], 3).points;
          expect(rest.map(({ pH, Eh }) => [pH, Eh])).toEqual(points.slice(1).map(({ pH, Eh }) => [pH, Eh]));
        }
      }),
      runs(20),
    ));
});
