import type { Outline, Point } from "../../shared/solution";

/** Plain floating-point measures of loops and polygons, for checking what the exact code drew. */

export const edgesOf = (loop: readonly Point[]): [Point, Point][] =>
  loop.map((p, i) => [p, loop[i + 1 === loop.length ? 0 : i + 1]!]);

/** Positive when counter-clockwise. */
export function signedArea(loop: readonly Point[]): number {
  const [ox, oy] = loop[0]!;
  let twice = 0;
  for (const [a, b] of edgesOf(loop)) twice += (a[0] - ox) * (b[1] - oy) - (b[0] - ox) * (a[1] - oy);
  return twice / 2;
}

export const loopsOf = ({ outer, holes }: Outline): Point[][] => [outer, ...holes];

/** Longest stretch along pH inside a convex polygon. */
export function widthAlongPH(polygon: readonly Point[]): number {
  let most = 0;
  for (const [, level] of polygon) {
    const hits: number[] = [];
    for (const [a, b] of edgesOf(polygon)) {
      if (a[1] === level) hits.push(a[0]);
      if (a[1] < level !== b[1] < level) hits.push(a[0] + ((level - a[1]) / (b[1] - a[1])) * (b[0] - a[0]));
    }
    most = Math.max(most, Math.max(...hits) - Math.min(...hits));
  }
  return most;
}

/** Half-width of the largest box of control bands round a point that meets no point of a segment: the least over the
 *  segment of the larger of |pH| / dpH and |Eh| / dEh, which stands at an end, where one of them is zero, or where they tie. */
export function boxDistance(p: Point, [a, b]: readonly [Point, Point], band: { pH: number; Eh: number }): number {
  const x = (a[0] - p[0]) / band.pH;
  const y = (a[1] - p[1]) / band.Eh;
  const dx = (b[0] - a[0]) / band.pH;
  const dy = (b[1] - a[1]) / band.Eh;
  const candidates = [0, 1, -x / dx, -y / dy, (y - x) / (dx - dy), -(x + y) / (dx + dy)];
  let least = Infinity;
  for (const t of candidates)
    if (t >= 0 && t <= 1) least = Math.min(least, Math.max(Math.abs(x + t * dx), Math.abs(y + t * dy)));
  return least;
}

export const marginAt = (
  p: Point,
  border: readonly (readonly [Point, Point])[],
  band: { pH: number; Eh: number },
): number => Math.min(...border.map((s) => boxDistance(p, s, band)));

interface Side {
  from: number;
  to: number;
  forward: boolean;
}

/** Length of border that one polygon of a partition shows and no other answers: zero when every edge inside the frame is
 *  shared, point by point, by the polygon on its other side. Edges are brought together by slope and offset. */
export function unansweredBorder(
  polygons: readonly (readonly Point[])[],
  onFrame: (a: Point, b: Point) => boolean,
): number {
  const lines = new Map<string, Side[]>();
  for (const polygon of polygons)
    for (const [a, b] of edgesOf(polygon)) {
      if (onFrame(a, b)) continue;
      const size = Math.hypot(b[0] - a[0], b[1] - a[1]);
      if (size < 1e-9) continue;
      const [ux, uy] = [(b[0] - a[0]) / size, (b[1] - a[1]) / size];
      const forward = ux > 1e-7 || (Math.abs(ux) <= 1e-7 && uy > 0);
      const [dx, dy] = forward ? [ux, uy] : [-ux, -uy];
      const key = lineKey(lines, dx, dy, dx * a[1] - dy * a[0]);
      const t = dx * a[0] + dy * a[1];
      const s = dx * b[0] + dy * b[1];
      lines.get(key)!.push({ from: Math.min(t, s), to: Math.max(t, s), forward });
    }
  let missing = 0;
  for (const sides of lines.values()) {
    const cuts = [...new Set(sides.flatMap((s) => [s.from, s.to]))].sort((a, b) => a - b);
    for (let i = 0; i + 1 < cuts.length; i++) {
      const middle = (cuts[i]! + cuts[i + 1]!) / 2;
      let balance = 0;
      for (const s of sides) if (s.from < middle && s.to > middle) balance += s.forward ? 1 : -1;
      missing += Math.abs(balance) * (cuts[i + 1]! - cuts[i]!);
    }
  }
  return missing;
}

/** Bucket of a line; lines within rounding of each other share one. */
function lineKey(lines: Map<string, Side[]>, dx: number, dy: number, offset: number): string {
  const at = [Math.round(Math.atan2(dy, dx) * 1e6), Math.round(offset * 1e6)] as const;
  for (const i of [0, -1, 1])
    for (const j of [0, -1, 1]) {
      const key = `${at[0] + i}|${at[1] + j}`;
      if (lines.has(key)) return key;
    }
  const key = at.join("|");
  lines.set(key, []);
  return key;
}
