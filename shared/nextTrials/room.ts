import { clearances, insideOf, widest, type Segment } from "../setpoint/segments";

type Spot = readonly [u: number, v: number];

/** Where a trial may stand: inside the window, at least so many control bands from every limit. In units of the bands. */
export interface Room {
  readonly border: readonly Segment[];
  readonly keepOff: number;
  /** v from and to, both counted in; all of it where nothing narrows it */
  readonly between: readonly [number, number];
  /** stretches that hold the room's own border */
  readonly edges: readonly Segment[];
  /** all corners of the room */
  readonly corners: readonly Spot[];
}

/** Clearance is good to this many control bands. */
const SLACK = 1e-7;

/** Outline of what a box of half-width k sweeps along a segment: six corners, counter-clockwise. */
function swept({ ax, ay, bx, by }: Segment, k: number): Spot[] {
  const [a, b]: [Spot, Spot] = ax <= bx ? [[ax, ay], [bx, by]] : [[bx, by], [ax, ay]]; // prettier-ignore
  const off = (p: Spot, du: number, dv: number): Spot => [p[0] + du * k, p[1] + dv * k];
  return b[1] >= a[1]
    ? [off(a, -1, -1), off(a, 1, -1), off(b, 1, -1), off(b, 1, 1), off(b, -1, 1), off(a, -1, 1)]
    : [off(a, -1, -1), off(b, -1, -1), off(b, 1, -1), off(b, 1, 1), off(a, 1, 1), off(a, -1, 1)];
}

/** Where two segments cross; null where they do not, or run side by side. */
export function crossingOf(s: Segment, t: Segment): Spot | null {
  const [sx, sy, tx, ty] = [s.bx - s.ax, s.by - s.ay, t.bx - t.ax, t.by - t.ay];
  const det = sx * ty - sy * tx;
  if (det === 0) return null;
  const [wx, wy] = [t.ax - s.ax, t.ay - s.ay];
  const p = (wx * ty - wy * tx) / det;
  const q = (wx * sy - wy * sx) / det;
  const near = 1e-9;
  return p >= -near && p <= 1 + near && q >= -near && q <= 1 + near ? [s.ax + p * sx, s.ay + p * sy] : null;
}

/** Distance to the nearest limit, counted as the margin is: half-widths of the box of control bands. */
export const clearanceAt = (border: readonly Segment[], u: number, v: number): number =>
  Math.min(...border.map((s) => Math.max(0, widest(clearances(s), u, v)[1])));

/** Whether a point may be taken. */
export const inRoom = (
  { border, keepOff, between: [low, high] }: Pick<Room, "border" | "keepOff" | "between">,
  u: number,
  v: number,
): boolean =>
  v >= low - SLACK &&
  v <= high + SLACK &&
  border.every((s) => widest(clearances(s), u, v)[1] >= keepOff - SLACK) &&
  insideOf(border, u, v);

const apart = (s: Segment, t: Segment): boolean =>
  Math.min(s.ax, s.bx) > Math.max(t.ax, t.bx) + 1e-9 ||
  Math.max(s.ax, s.bx) < Math.min(t.ax, t.bx) - 1e-9 ||
  Math.min(s.ay, s.by) > Math.max(t.ay, t.by) + 1e-9 ||
  Math.max(s.ay, s.by) < Math.min(t.ay, t.by) - 1e-9;

/** The window less a band along its limits. A point is nearer than k to a limit exactly when it lies in the hexagon that a box of half-width k
 *  sweeps along it, so the room is the window less all hexagons: its border runs along their edges, its corners are theirs or
 *  where two of them cross; the same with the two levels between which it is to lie.
 *  @param border  all loops of one window, in control bands, window on the left     @param keepOff  control bands, above 0
 *  @param between  lowest and highest v
 *  @returns  the room; without corners where nothing is that far inside     @source  Minkowski sum of a segment and a box */
export function roomOf(
  border: readonly Segment[],
  keepOff: number,
  between: readonly [number, number] = [-Infinity, Infinity],
): Room {
  const us = border.map((s) => s.ax);
  const [left, right] = [Math.min(...us), Math.max(...us)];
  const levels = between.filter(Number.isFinite).map((v): Segment => ({ ax: left, ay: v, bx: right, by: v }));
  const walls = border.flatMap((s) => {
    const round = swept(s, keepOff);
    return round.flatMap((a, i): Segment[] => {
      const b = round[(i + 1) % round.length]!;
      return a[0] === b[0] && a[1] === b[1] ? [] : [{ ax: a[0], ay: a[1], bx: b[0], by: b[1] }];
    });
  });
  const edges = [...walls, ...levels];
  const room = { border, keepOff, between };
  const corners: Spot[] = edges.map((e): Spot => [e.ax, e.ay]).filter(([u, v]) => inRoom(room, u, v));
  edges.forEach((s, i) => {
    for (let j = i + 1; j < edges.length; j++) {
      const t = edges[j]!;
      const at = apart(s, t) ? null : crossingOf(s, t);
      if (at && inRoom(room, at[0], at[1])) corners.push(at);
    }
  });
  return { ...room, edges, corners };
}
