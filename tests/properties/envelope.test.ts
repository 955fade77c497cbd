import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { areaOf } from "../../shared/geometry/convex";
import { lowerEnvelope, type EnvelopeCell, type Plane } from "../../shared/geometry/envelope";
import { planeSet, square } from "../support/arbitraries";
import { runs } from "../support/fuzz";

const cell = square(5);

/** Heights times 6 x 7 at (a / 7, b / 7): whole numbers, compared exactly. */
const height = (p: Plane, a: number, b: number): number => ((7 * p.k + p.x * a + p.y * b) * 6) / p.atoms;

const holds = (c: EnvelopeCell, a: number, b: number): boolean =>
  c.piece.lines.every(([k, x, y]) => 7 * k + x * a + y * b >= 0);

/** Planes that are the same function, whatever their place in the list. */
const nameOf = (p: Plane): string => [p.k, p.x, p.y].map((n) => n / p.atoms + 0).join();

const neighboursByName = (planes: readonly Plane[]): [string, string[]][] =>
  lowerEnvelope(planes, cell)
    .map(({ plane, piece }): [string, string[]] => [
      nameOf(planes[plane]!),
      piece.tags.map((t) => (t < 0 ? `side ${t}` : nameOf(planes[t]!))).sort(),
    ])
    .sort(([a], [b]) => (a < b ? -1 : 1));

describe("the lower envelope", () => {
  test("gives every point to the lowest plane and to no other", () =>
    fc.assert(
      fc.property(planeSet, fc.integer({ min: -34, max: 34 }), fc.integer({ min: -34, max: 34 }), (planes, a, b) => {
        const least = Math.min(...planes.map((p) => height(p, a, b)));
        const lowest = new Set(planes.filter((p) => height(p, a, b) === least).map(nameOf));
        const owners = lowerEnvelope(planes, cell).filter((c) => holds(c, a, b));
        expect(owners.length).toBeGreaterThan(0);
        for (const o of owners) expect(lowest).toContain(nameOf(planes[o.plane]!));
        if (lowest.size === 1) expect(owners.length).toBe(1);
      }),
      runs(1500),
    ));

  test("gives equal planes to the first of them", () =>
    fc.assert(
      fc.property(planeSet, (planes) => {
        for (const { plane } of lowerEnvelope(planes, cell))
          expect(planes.findIndex((p) => nameOf(p) === nameOf(planes[plane]!))).toBe(plane);
      }),
      runs(600),
    ));

  test("covers the cell once", () =>
    fc.assert(
      fc.property(planeSet, (planes) => {
        const area = lowerEnvelope(planes, cell).reduce((sum, c) => sum + areaOf(c.piece), 0);
        expect(area).toBeCloseTo(100, 9);
      }),
      runs(800),
    ));

  test("has mutual neighbours", () =>
    fc.assert(
      fc.property(planeSet, (planes) => {
        const cells = lowerEnvelope(planes, cell);
        for (const { plane, piece } of cells)
          for (const tag of piece.tags)
            if (tag >= 0) expect(cells.find((c) => c.plane === tag)?.piece.tags ?? []).toContain(plane);
      }),
      runs(1500),
    ));

  test("names one neighbour an edge, and each neighbour once", () =>
    fc.assert(
      fc.property(planeSet, (planes) => {
        for (const { piece } of lowerEnvelope(planes, cell)) expect(new Set(piece.tags).size).toBe(piece.tags.length);
      }),
      runs(800),
    ));

  test("does not depend on the order of the planes", () =>
    fc.assert(
      fc.property(planeSet, fc.nat(13), (planes, k) => {
        const turned = [...planes.slice(k), ...planes.slice(0, k)].reverse();
        expect(neighboursByName(turned)).toEqual(neighboursByName(planes));
      }),
      runs(800),
    ));
});
