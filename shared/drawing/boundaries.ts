import type { Frame } from "../schemas/problem";
import type { Field, Point } from "../solution";

/** Drawing tolerances in units of the frame: corners of neighbours are computed apart and agree to rounding only. */
const SAME_PLACE = 1e-7;
const NUDGE = 1e-5;

interface Piece {
  species: string;
  /** corners in units of the frame */
  ring: Point[];
  box: [number, number, number, number];
}

function containing(pieces: readonly Piece[], [x, y]: Point): Piece | undefined {
  return pieces.find(({ ring, box }) => {
    if (x < box[0] || x > box[2] || y < box[1] || y > box[3]) return false;
    for (let i = 0; i < ring.length; i++) {
      const a = ring[i] as Point;
      const b = ring[(i + 1) % ring.length] as Point;
      if ((b[0] - a[0]) * (y - a[1]) - (b[1] - a[1]) * (x - a[0]) < 0) return false;
    }
    return true;
  });
}

/** Where along a-b other pieces' corners stand, 0 and 1 included: there the neighbour may change. */
function cuts(a: Point, b: Point, length: number, pieces: readonly Piece[]): number[] {
  const at = [0, 1];
  const [x0, x1] = a[0] < b[0] ? [a[0], b[0]] : [b[0], a[0]];
  const [y0, y1] = a[1] < b[1] ? [a[1], b[1]] : [b[1], a[1]];
  for (const { ring, box } of pieces) {
    if (box[0] > x1 + SAME_PLACE || box[2] < x0 - SAME_PLACE || box[1] > y1 + SAME_PLACE || box[3] < y0 - SAME_PLACE)
      continue;
    for (const [x, y] of ring) {
      const dx = x - a[0];
      const dy = y - a[1];
      const off = ((b[0] - a[0]) * dy - (b[1] - a[1]) * dx) / length;
      if (Math.abs(off) > SAME_PLACE) continue;
      const t = ((b[0] - a[0]) * dx + (b[1] - a[1]) * dy) / (length * length);
      if (t * length > SAME_PLACE && (1 - t) * length > SAME_PLACE) at.push(t);
    }
  }
  return at.sort((p, q) => p - q);
}

/** Lines between different species of one metal, each once; seams between pieces of one species and the frame's sides left out.
 *  @param fields  convex pieces of ONE metal, counter-clockwise, V vs SHE     @returns  polylines in the same coordinates */
export function boundaryLines(fields: readonly Field[], frame: Frame): Point[][] {
  const [wide, high] = [frame.pH[1] - frame.pH[0], frame.Eh[1] - frame.Eh[0]];
  const pieces: Piece[] = fields.map(({ species, polygon }) => {
    const ring = polygon.map(([x, y]): Point => [(x - frame.pH[0]) / wide, (y - frame.Eh[0]) / high]);
    const xs = ring.map((p) => p[0]);
    const ys = ring.map((p) => p[1]);
    return { species, ring, box: [Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)] };
  });
  const segments: [Point, Point][] = [];
  for (const piece of pieces) {
    piece.ring.forEach((a, i) => {
      const b = piece.ring[(i + 1) % piece.ring.length] as Point;
      const length = Math.hypot(b[0] - a[0], b[1] - a[1]);
      if (length < SAME_PLACE) return;
      const at = cuts(a, b, length, pieces);
      for (let k = 0; k + 1 < at.length; k++) {
        const [s, t] = [at[k] as number, at[k + 1] as number];
        if ((t - s) * length < SAME_PLACE) continue;
        const m = (s + t) / 2;
        // Counter-clockwise: the outside lies to the right.
        const out: Point = [
          a[0] + m * (b[0] - a[0]) + (NUDGE * (b[1] - a[1])) / length,
          a[1] + m * (b[1] - a[1]) - (NUDGE * (b[0] - a[0])) / length,
        ];
        if (out[0] < 0 || out[0] > 1 || out[1] < 0 || out[1] > 1) continue;
        const other = containing(pieces, out);
        if (other !== undefined && other.species >= piece.species) continue;
        const point = (u: number): Point => [a[0] + u * (b[0] - a[0]), a[1] + u * (b[1] - a[1])];
        segments.push([point(s), point(t)]);
      }
    });
  }
  return chained(segments).map((line) => line.map(([x, y]): Point => [frame.pH[0] + x * wide, frame.Eh[0] + y * high]));
}

const key = ([x, y]: Point): string => `${Math.round(x * 1e6)} ${Math.round(y * 1e6)}`;

/** Joins segments end to end where exactly two meet, so that dashes run on. */
export function chained(segments: readonly [Point, Point][]): Point[][] {
  const ends = new Map<string, number[]>();
  segments.forEach(([a, b], i) => {
    for (const p of [a, b]) ends.set(key(p), [...(ends.get(key(p)) ?? []), i]);
  });
  const used = new Set<number>();
  const lines: Point[][] = [];
  const grow = (line: Point[]) => {
    for (;;) {
      const tip = line[line.length - 1] as Point;
      const here = ends.get(key(tip)) ?? [];
      const next = here.length === 2 ? here.find((i) => !used.has(i)) : undefined;
      if (next === undefined) return;
      used.add(next);
      const [a, b] = segments[next] as [Point, Point];
      line.push(key(a) === key(tip) ? b : a);
    }
  };
  segments.forEach(([a, b], i) => {
    if (used.has(i)) return;
    used.add(i);
    const line: Point[] = [a, b];
    grow(line);
    line.reverse();
    grow(line);
    lines.push(line);
  });
  return lines;
}
