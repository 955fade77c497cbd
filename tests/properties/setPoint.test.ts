import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { connect } from "../../shared/geometry/region";
import { deepestPoint } from "../../shared/setpoint/deepestPoint";
import { insideOf, type Segment } from "../../shared/setpoint/segments";
import { widestChord } from "../../shared/setpoint/widestChord";
import { subdivision } from "../support/arbitraries";
import { cutUp, moved } from "../support/border";
import { clearanceAt, deeperThan } from "../support/bruteMargin";
import { runs } from "../support/fuzz";

/** Borders of regions put together from pieces of a cut square: reflex corners, holes, pinches, equal rooms. */
const borders: fc.Arbitrary<Segment[][]> = fc
  .tuple(subdivision, fc.infiniteStream(fc.boolean()), fc.constantFrom(1, 3, 0.2), fc.constantFrom(1, 0.1, 8))
  .map(([pieces, keep, su, sv]) =>
    connect(pieces.filter(() => keep.next().value)).map((r) =>
      [r.outer, ...r.holes]
        .flat()
        .map(({ from, to }) => ({ ax: from[0] * su, ay: from[1] * sv, bx: to[0] * su, by: to[1] * sv })),
    ),
  );

const wide = (border: readonly Segment[]): number =>
  Math.max(...border.map((s) => Math.max(Math.abs(s.ax), Math.abs(s.ay))));

describe("the deepest point of any region", () => {
  test("is inside, as deep as it says, and nothing is deeper", () =>
    fc.assert(
      fc.property(borders, (regions) => {
        for (const border of regions) {
          const { u, v, margin } = deepestPoint(border)!;
          expect(insideOf(border, u, v)).toBe(true);
          expect(Math.abs(clearanceAt(border, u, v) - margin)).toBeLessThan(1e-6);
          expect(deeperThan(border, margin, 1e-6 + 0.005 * wide(border), 8000) ?? null).toBeNull();
        }
      }),
      runs(80),
    ));

  test("moves with the region", () =>
    fc.assert(
      fc.property(borders, fc.integer({ min: -50, max: 50 }), fc.integer({ min: -50, max: 50 }), (regions, du, dv) => {
        for (const border of regions) {
          const [here, there] = [deepestPoint(border)!, deepestPoint(moved(border, du, dv))!];
          expect(Math.abs(there.margin - here.margin)).toBeLessThan(1e-6);
          expect(Math.max(Math.abs(there.u - here.u - du), Math.abs(there.v - here.v - dv))).toBeLessThan(1e-4);
        }
      }),
      runs(60),
    ));

  test("does not see where one side is cut in parts", () =>
    fc.assert(
      fc.property(borders, fc.integer({ min: 2, max: 3 }), (regions, n) => {
        for (const border of regions) {
          const [whole, parts] = [deepestPoint(border)!, deepestPoint(cutUp(border, n))!];
          expect(Math.abs(parts.margin - whole.margin)).toBeLessThan(1e-6);
          expect(Math.max(Math.abs(parts.u - whole.u), Math.abs(parts.v - whole.v))).toBeLessThan(1e-4);
        }
      }),
      runs(40),
    ));
});

describe("the widest chord of any region", () => {
  test("ends on the border on both sides and no level has a wider one", () =>
    fc.assert(
      fc.property(
        borders,
        fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 8, maxLength: 8 }),
        (regions, levels) => {
          for (const border of regions) {
            const { margin } = widestChord(border)!;
            const low = Math.min(...border.map((s) => s.ay));
            const high = Math.max(...border.map((s) => s.ay));
            for (const t of levels) {
              const v = low + t * (high - low);
              const hits = border
                .filter((s) => s.ay <= v !== s.by <= v)
                .map((s) => s.ax + ((v - s.ay) / (s.by - s.ay)) * (s.bx - s.ax))
                .sort((a, b) => a - b);
              for (let i = 0; i + 1 < hits.length; i += 2)
                expect((hits[i + 1]! - hits[i]!) / 2).toBeLessThanOrEqual(margin + 1e-9 * wide(border));
            }
          }
        },
      ),
      runs(150),
    ));
});
