import type { Convex } from "../geometry/convex";

/** How far apart two sets of convex pieces stand along pH (at one Eh) and along Eh (at one pH); null where no such line
 *  meets both. */
export interface Gap {
  readonly pH: number | null;
  readonly Eh: number | null;
}

type Axis = "x" | "y";
const other = (axis: Axis): Axis => (axis === "x" ? "y" : "x");

/** Ends of a piece on the line where the other coordinate has this level. */
function span(piece: Convex, axis: Axis, level: number): [number, number] {
  const across = piece[other(axis)];
  const along = piece[axis];
  let low = Infinity;
  let high = -Infinity;
  for (let i = 0; i < along.length; i++) {
    const j = i + 1 === along.length ? 0 : i + 1;
    const [a, b] = [across[i]!, across[j]!];
    if ((a < level && b < level) || (a > level && b > level)) continue;
    const t = a === b ? 0 : (level - a) / (b - a);
    const hit = along[i]! + t * (along[j]! - along[i]!);
    low = Math.min(low, hit);
    high = Math.max(high, hit);
    if (a === b) {
      low = Math.min(low, along[j]!);
      high = Math.max(high, along[j]!);
    }
  }
  return [low, high];
}

/** Smallest gap along an axis between two convex pieces: linear between corner levels, so the least stands at a level. */
function between(a: Convex, b: Convex, axis: Axis): number {
  const [p, q] = [a[other(axis)], b[other(axis)]];
  const low = Math.max(Math.min(...p), Math.min(...q));
  const high = Math.min(Math.max(...p), Math.max(...q));
  if (low > high) return Infinity;
  let least = Infinity;
  for (const level of [...p, ...q, low, high]) {
    if (level < low || level > high) continue;
    const [al, ah] = span(a, axis, level);
    const [bl, bh] = span(b, axis, level);
    least = Math.min(least, Math.max(0, bl - ah, al - bh));
  }
  return least;
}

/** The gap between two regions given as convex pieces.
 *  @param a, b  pieces     @returns  pH and V between them; 0 where they touch; null where no line meets both
 *  @source  distance of convex polygons along an axis, exact at corner levels */
export function gapBetween(a: readonly Convex[], b: readonly Convex[]): Gap {
  let [pH, Eh] = [Infinity, Infinity];
  for (const p of a)
    for (const q of b) {
      pH = Math.min(pH, between(p, q, "x"));
      Eh = Math.min(Eh, between(p, q, "y"));
    }
  return { pH: Number.isFinite(pH) ? pH : null, Eh: Number.isFinite(Eh) ? Eh : null };
}
