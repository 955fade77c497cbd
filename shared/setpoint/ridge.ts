import { at, type Affine } from "./segments";

/** A straight stretch of equally deep points; one point where both ends agree. */
export interface Ridge {
  readonly from: readonly [u: number, v: number];
  readonly to: readonly [u: number, v: number];
}

export const lengthOf = ({ from, to }: Ridge): number => Math.max(Math.abs(to[0] - from[0]), Math.abs(to[1] - from[1]));

export const middleOf = ({ from, to }: Ridge): [number, number] => [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2];

/** How far one can go from a point along a direction and back while every clearance stays at a level or above. A box that
 *  moves along a line meets a segment during one interval, so the first interval on either side ends the way.
 *  @param functions  clearances of each segment     @param u, v  at the level or above     @param d  direction
 *  @returns  the way back (<= 0) and forth (>= 0), in units of d     @source  segments.ts: the largest clearance decides */
function reach(
  functions: readonly (readonly Affine[])[],
  u: number,
  v: number,
  d: readonly [number, number],
  level: number,
): [number, number] {
  let back = -Infinity;
  let forth = Infinity;
  for (const fs of functions) {
    let from = -Infinity;
    let to = Infinity;
    for (const f of fs) {
      const here = at(f, u, v) - level;
      const growth = f[0] * d[0] + f[1] * d[1];
      if (Math.abs(growth) < 1e-12) {
        if (here >= 0) to = -Infinity;
      } else if (growth > 0) to = Math.min(to, -here / growth);
      else from = Math.max(from, -here / growth);
    }
    if (from >= to) continue;
    if (from + to > 0) forth = Math.min(forth, Math.max(0, from));
    else back = Math.max(back, Math.min(0, to));
  }
  return [back, forth];
}

/** The longest straight stretch through a point on which every clearance keeps the level: it must run along the lines of
 *  equal clearance of whatever is nearest.
 *  @param functions  clearances of each segment     @param u, v  the point     @param margin  its margin     @param slack  what counts as equal
 *  @returns  the stretch, the point itself where there is none */
export function ridgeThrough(
  functions: readonly (readonly Affine[])[],
  u: number,
  v: number,
  margin: number,
  slack: number,
): Ridge {
  let best: Ridge = { from: [u, v], to: [u, v] };
  for (const fs of functions) {
    const widest = Math.max(...fs.map((f) => at(f, u, v)));
    if (widest > margin + 16 * slack) continue;
    for (const f of fs) {
      if (at(f, u, v) < widest - 16 * slack) continue;
      const d = [-f[1], f[0]] as const;
      const [back, forth] = reach(functions, u, v, d, margin - slack);
      const ridge: Ridge = { from: [u + back * d[0], v + back * d[1]], to: [u + forth * d[0], v + forth * d[1]] };
      if (lengthOf(ridge) > lengthOf(best)) best = ridge;
    }
  }
  return best;
}

/** Whether a stretch passes through a square. */
export function passes({ from, to }: Ridge, u: number, v: number, half: number): boolean {
  let [t0, t1] = [0, 1];
  for (const [a, b, middle] of [
    [from[0], to[0], u],
    [from[1], to[1], v],
  ] as const) {
    const d = b - a;
    const [low, high] = [middle - half - a, middle + half - a];
    if (d === 0) {
      if (low > 0 || high < 0) return false;
      continue;
    }
    t0 = Math.max(t0, Math.min(low / d, high / d));
    t1 = Math.min(t1, Math.max(low / d, high / d));
  }
  return t0 <= t1;
}
