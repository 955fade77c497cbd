/** A stretch of border in units of the control bands (u = pH / dpH, v = Eh / dE), region on its left. */
export interface Segment {
  readonly ax: number;
  readonly ay: number;
  readonly bx: number;
  readonly by: number;
}

/** Linear function p u + q v + r. */
export type Affine = readonly [p: number, q: number, r: number];

/** How far a box round (u, v) can grow, in half-widths, before it meets the segment: the largest of these. Two convex sets
 *  are apart when one of them is apart along an axis of the box or across the segment.
 *  @param s  segment     @returns  up to six affine functions of (u, v)     @source  separating axis theorem */
export function clearances(s: Segment): Affine[] {
  const out: Affine[] = [
    [-1, 0, Math.min(s.ax, s.bx)],
    [1, 0, -Math.max(s.ax, s.bx)],
    [0, -1, Math.min(s.ay, s.by)],
    [0, 1, -Math.max(s.ay, s.by)],
  ];
  const nx = -(s.by - s.ay);
  const ny = s.bx - s.ax;
  const size = Math.abs(nx) + Math.abs(ny);
  if (nx !== 0 && ny !== 0) {
    const p = nx / size;
    const q = ny / size;
    const r = -(p * s.ax + q * s.ay);
    out.push([p, q, r], [-p, -q, -r]);
  }
  return out;
}

export const at = (f: Affine, u: number, v: number): number => f[0] * u + f[1] * v + f[2];

/** Which clearance is largest at a point, and its value (the box distance; 0 on the segment).
 *  @returns  [index, value] */
export function widest(functions: readonly Affine[], u: number, v: number): [number, number] {
  let best = 0;
  let value = -Infinity;
  for (let i = 0; i < functions.length; i++) {
    const f = functions[i]!;
    const d = f[0] * u + f[1] * v + f[2];
    if (d > value) {
      value = d;
      best = i;
    }
  }
  return [best, value];
}

/** Whether (u, v) lies inside the border: winding number over all loops, holes included.
 *  @source  crossing number with upward and downward edges counted apart */
export function insideOf(segments: readonly Segment[], u: number, v: number): boolean {
  let winding = 0;
  for (const s of segments) {
    if (s.ay <= v !== s.by <= v) {
      const side = (s.bx - s.ax) * (v - s.ay) - (u - s.ax) * (s.by - s.ay);
      if (s.ay <= v ? side > 0 : side < 0) winding += s.ay <= v ? 1 : -1;
    }
  }
  return winding !== 0;
}
