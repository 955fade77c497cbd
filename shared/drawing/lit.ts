import type { Point, Solution } from "../solution";

/** Whether a point lies in open ground: every metal there as required. Even-odd, so holes are shut. */
export function isLit(windows: Solution["windows"], pH: number, Eh: number): boolean {
  let inside = false;
  for (const { polygons } of windows)
    for (const { outer, holes } of polygons)
      for (const ring of [outer, ...holes])
        ring.forEach(([x0, y0], i) => {
          const [x1, y1] = ring[(i + 1) % ring.length] as Point;
          if (y0 > Eh !== y1 > Eh && pH < x0 + ((Eh - y0) / (y1 - y0)) * (x1 - x0)) inside = !inside;
        });
  return inside;
}
