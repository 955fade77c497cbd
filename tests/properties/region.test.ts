import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { areaOf, type Convex } from "../../shared/geometry/convex";
import { connect, type Region, type Stretch } from "../../shared/geometry/region";
import { subdivision } from "../support/arbitraries";
import { runs } from "../support/fuzz";
import { signedArea } from "../support/shapes";

const areaOfLoop = (loop: readonly Stretch[]): number => signedArea(loop.map((s) => s.from));
const sum = (pieces: readonly Convex[]): number => pieces.reduce((s, p) => s + areaOf(p), 0);

/** What holds of any regions, whatever the pieces. */
function expectRegions(pieces: readonly Convex[], regions: readonly Region[]): void {
  expect(regions.flatMap((r) => r.pieces).sort((a, b) => a - b)).toEqual(pieces.map((_, i) => i));
  for (const r of regions) {
    for (const loop of [r.outer, ...r.holes]) {
      loop.forEach((s, i) => {
        const next = loop[(i + 1) % loop.length]!;
        expect(Math.hypot(s.to[0] - next.from[0], s.to[1] - next.from[1])).toBeLessThan(1e-12);
        expect(r.pieces).toContain(s.piece);
      });
    }
    expect(areaOfLoop(r.outer)).toBeGreaterThan(0);
    for (const h of r.holes) expect(areaOfLoop(h)).toBeLessThan(0);
    const outlined = [r.outer, ...r.holes].reduce((s, l) => s + areaOfLoop(l), 0);
    expect(outlined).toBeCloseTo(sum(r.pieces.map((i) => pieces[i]!)), 9);
    expect(r.area).toBeCloseTo(outlined, 9);
  }
}

/** Pieces joined where their drawn corners say that they share more than a point: the slow twin. */
function components(pieces: readonly Convex[]): number {
  const group = pieces.map((_, i) => i);
  const find = (i: number): number => (group[i] === i ? i : find(group[i]!));
  for (let a = 0; a < pieces.length; a++)
    for (let b = 0; b < a; b++) if (sharedLength(pieces[a]!, pieces[b]!) > 1e-9) group[find(a)] = find(b);
  return new Set(group.map((_, i) => find(i))).size;
}

function sharedLength(a: Convex, b: Convex): number {
  let longest = 0;
  const n = a.x.length;
  for (let i = 0; i < n; i++) {
    const j = (i + 1) % n;
    const [ux, uy] = [a.x[j]! - a.x[i]!, a.y[j]! - a.y[i]!];
    const size = Math.hypot(ux, uy);
    const on: number[] = [];
    b.x.forEach((x, k) => {
      const [dx, dy] = [x - a.x[i]!, b.y[k]! - a.y[i]!];
      if (Math.abs(ux * dy - uy * dx) < 1e-10 * size) on.push((ux * dx + uy * dy) / size);
    });
    if (on.length >= 2) longest = Math.max(longest, Math.min(size, Math.max(...on)) - Math.max(0, Math.min(...on)));
  }
  return longest;
}

describe("connect", () => {
  test("joins all convex pieces of a square into the square, without holes", () =>
    fc.assert(
      fc.property(subdivision, (pieces) => {
        const regions = connect(pieces);
        expect(regions.length).toBe(1);
        expect(regions[0]!.holes).toEqual([]);
        expect(regions[0]!.area).toBeCloseTo(64, 9);
        expectRegions(pieces, regions);
        for (const { from, to } of regions[0]!.outer)
          expect(([0, 1] as const).some((axis) => Math.abs(from[axis]) === 4 && from[axis] === to[axis])).toBe(true);
      }),
      runs(100),
    ));

  test("joins any choice of the pieces as their shared edges say, and never across a point", () =>
    fc.assert(
      fc.property(subdivision, fc.infiniteStream(fc.boolean()), (all, keep) => {
        const pieces = all.filter(() => keep.next().value);
        const regions = connect(pieces);
        expectRegions(pieces, regions);
        expect(regions.length).toBe(pieces.length === 0 ? 0 : components(pieces));
      }),
      runs(350),
    ));

  test("does not depend on the order of the pieces", () =>
    fc.assert(
      fc.property(subdivision, fc.nat(40), fc.nat(3), (all, k, drop) => {
        const pieces = all.filter((_, i) => i % 4 !== drop);
        const turned = [...pieces.slice(k), ...pieces.slice(0, k)].reverse();
        const shapes = (list: readonly Convex[]): number[][] =>
          connect(list)
            .map((r) => [r.area, r.holes.length, r.pieces.length].map((n) => Math.round(n * 1e9) / 1e9))
            .sort((a, b) => a[0]! - b[0]! || a[1]! - b[1]! || a[2]! - b[2]!);
        expect(shapes(turned)).toEqual(shapes(pieces));
      }),
      runs(250),
    ));
});
