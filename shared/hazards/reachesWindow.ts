import { sideOfLoop } from "../geometry/loop";
import type { Outline, Point } from "../solution";

/** Whether a point lies inside an outline, its holes left out. */
const holds = ({ outer, holes }: Outline, [x, y]: Point): boolean =>
  sideOfLoop(outer, x, y) > 0 && holes.every((hole) => sideOfLoop(hole, x, y) < 0);

const sidesOf = ({ outer, holes }: Outline): [Point, Point][] =>
  [outer, ...holes].flatMap((ring) => ring.map((p, i): [Point, Point] => [p, ring[(i + 1) % ring.length] ?? p]));

const turn = (a: Point, b: Point, c: Point): number => (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);

/** Two sides that truly cross; those that only touch share no ground. */
const cross = ([a, b]: [Point, Point], [c, d]: [Point, Point]): boolean =>
  turn(a, b, c) * turn(a, b, d) < 0 && turn(c, d, a) * turn(c, d, b) < 0;

/** A point just inside each side: outlines run with their ground on the left. */
const inner = (outline: Outline): Point[] =>
  sidesOf(outline).map(([[ax, ay], [bx, by]]) => [(ax + bx) / 2 - 1e-7 * (by - ay), (ay + by) / 2 + 1e-7 * (bx - ax)]);

/** Whether a region and a window share ground.
 *  @param region, window  outlines with holes in (pH, Eh), counter-clockwise, holes clockwise
 *  @returns  true where they overlap; touching alone does not count
 *  @source  points just inside each side that lie in the other, or sides that cross */
export function sharesGround(region: readonly Outline[], window: readonly Outline[]): boolean {
  const meets = (a: Outline, b: Outline): boolean =>
    inner(a).some((p) => holds(b, p)) ||
    inner(b).some((p) => holds(a, p)) ||
    sidesOf(a).some((s) => sidesOf(b).some((t) => cross(s, t)));
  return region.some((r) => window.some((w) => meets(r, w)));
}
