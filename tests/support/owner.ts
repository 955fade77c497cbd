import type { Field, Point } from "../../shared/solution";

/** How far inside a convex counter-clockwise polygon a point lies; negative outside. Axes as they are. */
export function depthIn(polygon: readonly Point[], pH: number, Eh: number): number {
  let least = Infinity;
  for (let i = 0; i < polygon.length; i++) {
    const [ax, ay] = polygon[i]!;
    const [bx, by] = polygon[i + 1 === polygon.length ? 0 : i + 1]!;
    const size = Math.hypot(bx - ax, by - ay);
    if (size === 0) continue;
    least = Math.min(least, ((bx - ax) * (Eh - ay) - (by - ay) * (pH - ax)) / size);
  }
  return least;
}

/** The field that holds a point deepest, of one metal. */
export function ownerAt(fields: readonly Field[], pH: number, Eh: number): Field | null {
  let best: Field | null = null;
  let most = -1e-9;
  for (const f of fields) {
    const depth = depthIn(f.polygon, pH, Eh);
    if (depth > most) [best, most] = [f, depth];
  }
  return best;
}
