import { orient2d, orient3d } from "robust-predicates";

/** k + x pH + y E; the half-plane where it is >= 0 when used as a bound. Coefficients are exact doubles. */
export type Line = readonly [k: number, x: number, y: number];

/** Sign of the determinant x1 y2 - x2 y1 of the directions of two lines; 0 when parallel. Exact.
 *  @param q, r  lines     @returns  -1, 0 or 1
 *  @source  Shewchuk 1997, adaptive predicates (package robust-predicates, whose y axis points down)
 *  @example turn([0, 1, 0], [0, 0, 1]) // => 1 */
export const turn = (q: Line, r: Line): number => -Math.sign(orient2d(q[1], q[2], r[1], r[2], 0, 0));

/** Equal or opposite coefficients: the cheap answer to most exact zeros. */
export const coincides = (p: Line, q: Line): boolean =>
  p === q || (p[0] === q[0] && p[1] === q[1] && p[2] === q[2]) || (p[0] === -q[0] && p[1] === -q[1] && p[2] === -q[2]);

const volume = (p: Line, q: Line, r: Line): number =>
  Math.sign(orient3d(p[0], p[1], p[2], q[0], q[1], q[2], r[0], r[1], r[2], 0, 0, 0));

/** Sign of p at the crossing of q and r; 0 when the three meet, or when q and r are parallel. Exact.
 *  @param p, q, r  lines     @returns  -1, 0 or 1     @source  Cramer's rule with exact signs (Shewchuk 1997)
 *  @example sideOfCrossing([-1, 1, 0], [-2, 1, 0], [0, 0, 1]) // => 1 */
export const sideOfCrossing = (p: Line, q: Line, r: Line): number => volume(p, q, r) * turn(q, r);

/** Order of two crossings along line `on`, walked with its positive side on the left: negative when the crossing with p
 *  comes first. Exact; p and q must cross `on`.
 *  @param on, p, q  lines     @returns  -1, 0 or 1     @source  sign of q at (on, p) against the growth of q along `on`
 *  @example orderAlong([0, 0, 1], [-1, 1, 0], [-2, 1, 0]) // => -1 */
export const orderAlong = (on: Line, p: Line, q: Line): number =>
  coincides(p, q) ? 0 : sideOfCrossing(q, on, p) * -turn(on, q);

/** Whether two lines are the same set of points (either direction). Exact.
 *  @param p, q  lines     @returns  true when all 2x2 minors vanish     @source  proportional coefficients */
export const sameLine = (p: Line, q: Line): boolean =>
  coincides(p, q) ||
  (turn(p, q) === 0 && orient2d(p[0], p[1], q[0], q[1], 0, 0) === 0 && orient2d(p[0], p[2], q[0], q[2], 0, 0) === 0);

/** The line seen from its other side. */
export const flipped = (p: Line): Line => [-p[0], -p[1], -p[2]];

/** Value of p at a point, in the line's own units; plain floating point, for drawing and measuring only.
 *  @param p  line     @param pH     @param Eh  V     @returns  k + x pH + y E
 *  @example valueAt([1, 2, 3], 1, 1) // => 6 */
export const valueAt = (p: Line, pH: number, Eh: number): number => p[0] + p[1] * pH + p[2] * Eh;
