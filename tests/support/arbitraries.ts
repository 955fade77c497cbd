import fc from "fast-check";
import { clip, rectangle, type Convex } from "../../shared/geometry/convex";
import type { Plane } from "../../shared/geometry/envelope";
import type { Line } from "../../shared/geometry/line";

/** Small whole numbers, so that equal planes, parallel edges and many edges through one point are the rule. */
const coefficient = fc.integer({ min: -3, max: 3 });

export const plane: fc.Arbitrary<Plane> = fc.record({
  k: fc.integer({ min: -12, max: 12 }),
  x: coefficient,
  y: coefficient,
  atoms: fc.integer({ min: 1, max: 3 }),
});

export const planeSet: fc.Arbitrary<Plane[]> = fc.array(plane, { minLength: 1, maxLength: 14 });

export const square = (half: number): Convex => rectangle([-half, half], [-half, half], [-1, -2, -3, -4]);

const cut: fc.Arbitrary<Line> = fc
  .tuple(fc.integer({ min: -8, max: 8 }), coefficient, coefficient)
  .filter(([, x, y]) => x !== 0 || y !== 0);

/** A square cut by whole lines: convex pieces that fill it, many sharing corners. */
export const subdivision: fc.Arbitrary<Convex[]> = fc.array(cut, { minLength: 0, maxLength: 9 }).map((lines) => {
  let pieces: Convex[] = [square(4)];
  lines.forEach((l, i) => {
    pieces = pieces.flatMap((p) => {
      const above = clip(p, l, i);
      const below = clip(p, [-l[0], -l[1], -l[2]], i);
      return above && below ? [above, below] : [p];
    });
  });
  return pieces;
});
