import type { Point } from "../../../shared/solution";

/** What two convex polygons have in common (Sutherland and Hodgman 1974). Both counter-clockwise; for drawing, in floating point.
 *  @returns  its corners; empty where they share no ground */
export function convexOverlap(a: readonly Point[], b: readonly Point[]): Point[] {
  let rest: readonly Point[] = a;
  for (let i = 0; i < b.length && rest.length > 0; i++) {
    const [px, py] = b[i] as Point;
    const [qx, qy] = b[(i + 1) % b.length] as Point;
    const side = ([x, y]: Point) => (qx - px) * (y - py) - (qy - py) * (x - px);
    rest = rest.flatMap((p, k) => {
      const next = rest[(k + 1) % rest.length] as Point;
      const [here, there] = [side(p), side(next)];
      const t = here / (here - there);
      const crossing: Point = [p[0] + t * (next[0] - p[0]), p[1] + t * (next[1] - p[1])];
      if (here >= 0) return there >= 0 ? [p] : [p, crossing];
      return there >= 0 ? [crossing] : [];
    });
  }
  return rest.length < 3 ? [] : [...rest];
}
