import { coincides, sideOfCrossing, turn, type Line } from "./line";

/** A convex piece of the (pH, E) plane: the counter-clockwise cycle of its bounding lines, each positive inside.
 *  Corner i is the crossing of edges i and i + 1; its coordinates are only for drawing, measuring and for filtering the
 *  exact predicates (`ex`, `ey` bound their rounding). `tags[i]` says, in the caller's own numbers, what edge i is. */
export interface Convex {
  readonly lines: readonly Line[];
  readonly tags: readonly number[];
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly ex: readonly number[];
  readonly ey: readonly number[];
}

const EPS = Number.EPSILON;

interface Corners {
  readonly x: number[];
  readonly y: number[];
  readonly ex: number[];
  readonly ey: number[];
}

const room = (n: number): Corners => ({
  x: new Array<number>(n),
  y: new Array<number>(n),
  ex: new Array<number>(n),
  ey: new Array<number>(n),
});

/** Puts the crossing of two lines at place i. */
function putCorner({ x, y, ex, ey }: Corners, i: number, a: Line, b: Line): void {
  const p = a[1] * b[2];
  const q = b[1] * a[2];
  const det = p - q;
  const u1 = a[2] * b[0];
  const u2 = b[2] * a[0];
  const v1 = b[1] * a[0];
  const v2 = a[1] * b[0];
  const cx = (u1 - u2) / det;
  const cy = (v1 - v2) / det;
  const size = Math.abs(det);
  const detError = Math.abs(p) + Math.abs(q);
  x[i] = cx;
  y[i] = cy;
  ex[i] = (4 * EPS * (Math.abs(u1) + Math.abs(u2) + Math.abs(cx) * detError)) / size;
  ey[i] = (4 * EPS * (Math.abs(v1) + Math.abs(v2) + Math.abs(cy) * detError)) / size;
}

/** A piece from its cycle of lines.
 *  @param lines  counter-clockwise, positive inside, no redundant line     @param tags  one a line     @returns  the piece
 *  @source  Cramer's rule for the corners */
export function convexOf(lines: readonly Line[], tags: readonly number[]): Convex {
  const n = lines.length;
  const corners = room(n);
  for (let i = 0; i < n; i++) putCorner(corners, i, lines[i]!, lines[i + 1 === n ? 0 : i + 1]!);
  return { lines, tags, x: corners.x, y: corners.y, ex: corners.ex, ey: corners.ey };
}

/** The rectangle of the frame; edges in the order low E, high pH, high E, low pH.
 *  @param pH, Eh  [low, high], pH and V     @param tags  of the four edges in that order
 *  @source  axis-parallel half-planes */
export function rectangle(
  pH: readonly [number, number],
  Eh: readonly [number, number],
  tags: readonly [number, number, number, number],
): Convex {
  return convexOf(
    [
      [-Eh[0], 0, 1],
      [pH[1], -1, 0],
      [Eh[1], 0, -1],
      [-pH[0], 1, 0],
    ],
    tags,
  );
}

/** Sign of line h at corner i of a piece; exact (floating point decides only where its error bound allows).
 *  @returns  -1, 0 or 1     @source  filtered predicate, Shewchuk 1997 */
export function sideOfCorner(piece: Convex, i: number, h: Line): number {
  const x = piece.x[i]!;
  const y = piece.y[i]!;
  const hx = h[1] * x;
  const hy = h[2] * y;
  const value = h[0] + hx + hy;
  const bound =
    Math.abs(h[1]) * piece.ex[i]! +
    Math.abs(h[2]) * piece.ey[i]! +
    4 * EPS * (Math.abs(h[0]) + Math.abs(hx) + Math.abs(hy));
  if (value > bound) return 1;
  if (value < -bound) return -1;
  const a = piece.lines[i]!;
  const b = piece.lines[i + 1 === piece.lines.length ? 0 : i + 1]!;
  return coincides(h, a) || coincides(h, b) ? 0 : sideOfCrossing(h, a, b);
}

/** Whether a new line along an edge of a piece takes the edge's name. */
export type PrefersNew = (edge: number, piece: Convex, h: Line, tag: number) => boolean;

/** Scratch of `clip`, which calls nothing that clips. */
const signs: number[] = [];

/** The part of a piece where line h is >= 0, or null when no corner lies strictly inside it. An edge stays if one of its
 *  ends is strictly inside. Where h lies along an edge, `prefersNew` says whether the new tag replaces the old.
 *  @param piece  the piece     @param h  new bound     @param tag  of the new edge     @param prefersNew  tie rule, default keeps the old
 *  @returns  the same object when nothing is cut     @source  half-plane clipping on the cycle of lines, signs exact */
export function clip(piece: Convex, h: Line, tag: number, prefersNew?: PrefersNew): Convex | null {
  const n = piece.lines.length;
  let inside = 0;
  let anyOutside = false;
  let anyOn = false;
  const sign = signs;
  for (let i = 0; i < n; i++) {
    const s = sideOfCorner(piece, i, h);
    sign[i] = s;
    if (s > 0) inside++;
    else if (s < 0) anyOutside = true;
    else anyOn = true;
  }
  if (inside === 0) return null;
  if (!anyOutside) return anyOn && prefersNew ? retag(piece, h, tag, sign, prefersNew) : piece;
  // strictly inside corners are contiguous on the cycle: edges first..last keep an end inside
  let i = 0;
  while (!(sign[i]! > 0 && sign[i === 0 ? n - 1 : i - 1]! <= 0)) i++;
  const lines = new Array<Line>(inside + 2);
  const tags = new Array<number>(inside + 2);
  const corners = room(inside + 2);
  for (let to = 0; to < inside; to++) {
    lines[to] = piece.lines[i]!; // edge i ends in corner i
    tags[to] = piece.tags[i]!;
    corners.x[to] = piece.x[i]!;
    corners.y[to] = piece.y[i]!;
    corners.ex[to] = piece.ex[i]!;
    corners.ey[to] = piece.ey[i]!;
    i = i + 1 === n ? 0 : i + 1;
  }
  const last = (lines[inside] = piece.lines[i]!); // begins strictly inside
  tags[inside] = piece.tags[i]!;
  lines[inside + 1] = h;
  tags[inside + 1] = tag;
  putCorner(corners, inside, last, h);
  putCorner(corners, inside + 1, h, lines[0]!);
  return { lines, tags, x: corners.x, y: corners.y, ex: corners.ex, ey: corners.ey };
}

function retag(piece: Convex, h: Line, tag: number, sign: readonly number[], prefersNew: PrefersNew): Convex {
  const n = piece.lines.length;
  for (let i = 0; i < n; i++) {
    const before = sign[i === 0 ? n - 1 : i - 1]!;
    if (sign[i] === 0 && before === 0 && turn(piece.lines[i]!, h) === 0 && prefersNew(i, piece, h, tag)) {
      return {
        ...piece,
        lines: piece.lines.map((l, k) => (k === i ? h : l)),
        tags: piece.tags.map((t, k) => (k === i ? tag : t)),
      };
    }
  }
  return piece;
}

/** Area of a piece, pH x V; shoelace on the drawn corners.
 *  @source  Gauss's area formula */
export function areaOf(piece: Pick<Convex, "x" | "y">): number {
  const n = piece.x.length;
  let twice = 0;
  for (let i = 0; i < n; i++) {
    const j = i + 1 === n ? 0 : i + 1;
    twice +=
      (piece.x[i]! - piece.x[0]!) * (piece.y[j]! - piece.y[0]!) -
      (piece.x[j]! - piece.x[0]!) * (piece.y[i]! - piece.y[0]!);
  }
  return twice / 2;
}

/** Corners counter-clockwise, for drawing. */
export const cornersOf = (piece: Convex): [number, number][] => piece.x.map((x, i) => [x, piece.y[i]!]);
