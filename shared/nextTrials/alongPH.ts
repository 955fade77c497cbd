import { settleTies, type Farthest } from "./farthest";

/** The same along pH alone: on a stretch the largest gap is at one of its ends or midway between two neighbouring sites.
 *  @param stretch  from low to high, control bands     @param v  where it lies     @param sites  u of each, at least one
 *  @param depth  distance to the nearer end of the chord     @returns  the point; null for a stretch that ends before it begins
 *  @source  one-dimensional farthest point; brute force in the tests */
export function farthestAlong(
  [low, high]: readonly [number, number],
  v: number,
  sites: readonly number[],
  depth: (u: number) => number,
): Farthest | null {
  if (!(low <= high) || sites.length === 0) return null;
  const sorted = [...sites].sort((a, b) => a - b);
  const middles = sorted.flatMap((u, i) => {
    const middle = i === 0 ? low : (u + sorted[i - 1]!) / 2;
    return middle > low && middle < high ? [middle] : [];
  });
  const found = [low, ...middles, high].map((u) => ({ u, v, gap: Math.min(...sites.map((s) => Math.abs(s - u))) }));
  return settleTies(found, (f) => depth(f.u));
}
