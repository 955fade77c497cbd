import { orient2d } from "robust-predicates";

type Corner = readonly [x: number, y: number];

/** Where a point lies against a closed loop of corners, either direction: exact for the corners as they stand.
 *  @param loop  corners, at least three     @param x, y  the point, same units     @returns  1 inside, 0 on an edge or corner, -1 outside
 *  @source  crossing count with exact signs (Shewchuk 1997, package robust-predicates)
 *  @example sideOfLoop([[0, 0], [2, 0], [0, 2]], 0.5, 0.5) // => 1
 *  @example sideOfLoop([[0, 0], [2, 0], [0, 2]], 1, 1) // => 0
 *  @example sideOfLoop([[0, 0], [2, 0], [0, 2]], 2, 2) // => -1 */
export function sideOfLoop(loop: readonly Corner[], x: number, y: number): -1 | 0 | 1 {
  let inside = false;
  let p = loop.at(-1);
  for (const q of loop) {
    if (p !== undefined) {
      const turn = orient2d(p[0], p[1], q[0], q[1], x, y);
      if (turn === 0 && between(p[0], q[0], x) && between(p[1], q[1], y)) return 0;
      // The crossing lies to the right of the point: the sign of the turn against the edge's direction says so without dividing.
      if (p[1] > y !== q[1] > y && turn > 0 === p[1] > q[1]) inside = !inside;
    }
    p = q;
  }
  return inside ? 1 : -1;
}

const between = (a: number, b: number, v: number): boolean => (a <= v && v <= b) || (b <= v && v <= a);

/** Whether a point lies inside a closed loop of corners, for drawing: in floating point, so that a point on an edge may count either way.
 *  @param loop  corners, either direction     @param x, y  the point, same units
 *  @source  crossing count; where the answer decides something, sideOfLoop
 *  @example Number(insideLoop([[0, 0], [2, 0], [0, 2]], 0.5, 0.5)) // => 1
 *  @example Number(insideLoop([[0, 0], [2, 0], [0, 2]], 2, 2)) // => 0 */
export function insideLoop(loop: readonly Corner[], x: number, y: number): boolean {
  let inside = false;
  let p = loop.at(-1);
  for (const q of loop) {
    if (p !== undefined && p[1] > y !== q[1] > y && x < p[0] + ((y - p[1]) / (q[1] - p[1])) * (q[0] - p[0]))
      inside = !inside;
    p = q;
  }
  return inside;
}
