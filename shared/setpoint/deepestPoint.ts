import { largest, type Constraint } from "./linearProgram";
import { lengthOf, middleOf, passes, ridgeThrough, type Ridge } from "./ridge";
import { at, clearances, insideOf, widest, type Affine, type Segment } from "./segments";

export interface Deepest {
  readonly u: number;
  readonly v: number;
  readonly margin: number;
}

interface Border {
  readonly segments: readonly Segment[];
  readonly functions: readonly (readonly Affine[])[];
  readonly low: readonly [number, number];
  readonly high: readonly [number, number];
  /** bound on every coordinate, for the linear programs */
  readonly box: number;
  /** margins nearer than this are equal */
  readonly slack: number;
}

function borderOf(segments: readonly Segment[]): Border {
  let [ux, uy, hx, hy] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const s of segments) {
    ux = Math.min(ux, s.ax);
    uy = Math.min(uy, s.ay);
    hx = Math.max(hx, s.ax);
    hy = Math.max(hy, s.ay);
  }
  const box = 4 * Math.max(Math.abs(ux), Math.abs(uy), Math.abs(hx), Math.abs(hy), 1);
  const slack = Math.max(1e-9, 1e-14 * box);
  return { segments, functions: segments.map(clearances), low: [ux, uy], high: [hx, hy], box, slack };
}

/** One loop that only turns left, no edge too short for its direction to mean anything. */
function isConvex(segments: readonly Segment[]): boolean {
  return segments.every((s, i) => {
    const t = segments[i + 1 === segments.length ? 0 : i + 1]!;
    const [sx, sy, tx, ty] = [s.bx - s.ax, s.by - s.ay, t.bx - t.ax, t.by - t.ay];
    const length = Math.sqrt(sx * sx + sy * sy);
    const size = length * Math.sqrt(tx * tx + ty * ty);
    const joined = Math.abs(t.ax - s.bx) < 1e-9 && Math.abs(t.ay - s.by) < 1e-9;
    return joined && length > 1e-6 && sx * ty - sy * tx >= -1e-12 * size;
  });
}

/** Largest m such that the box of half-widths m round a point of the region meets no border: the point and m. Ties go to
 *  the middle of the longest straight stretch of the deepest set, among equally long ones to the lowest u, then the lowest v.
 *  Exact to 1e-6.
 *  @param segments  all loops of one region, region on the left, consecutive within a loop; u, v in control bands
 *  @returns  the deepest point, null for an empty border
 *  @source  docs/method.md, section 6: a linear program for a convex region; else branch and bound whose bounds are linear
 *           programs too, so that long ridges of equal depth are settled at once */
export function deepestPoint(segments: readonly Segment[]): Deepest | null {
  if (segments.length === 0) return null;
  const border = borderOf(segments);
  const found = (isConvex(segments) && convexOptimum(border)) || new Search(border).deepest();
  if (!found) return null;
  const [u, v] = middleOf(found.ridge);
  return { u, v, margin: Math.max(found.margin, marginAt(border, u, v)) };
}

interface Found {
  readonly margin: number;
  readonly ridge: Ridge;
}

const innerSide = (s: Segment): Affine => {
  const nx = -(s.by - s.ay);
  const ny = s.bx - s.ax;
  const size = Math.abs(nx) + Math.abs(ny);
  return [nx / size, ny / size, -(nx * s.ax + ny * s.ay) / size];
};

const asConstraint = (f: Affine): Constraint => [-f[0], -f[1], 1, f[2]];

const ridgeAt = (border: Border, u: number, v: number, margin: number): Ridge =>
  ridgeThrough(border.functions, u, v, margin, border.slack);

function convexOptimum(border: Border): Found | null {
  const found = largest(
    border.segments.map((s) => asConstraint(innerSide(s))),
    border.box,
  );
  if (!found) return null;
  const [u, v, margin] = found;
  return { margin, ridge: ridgeAt(border, u, v, margin) };
}

function marginAt(border: Border, u: number, v: number): number {
  let least = Infinity;
  for (const fs of border.functions) least = Math.min(least, widest(fs, u, v)[1]);
  return least;
}

interface Cell {
  readonly u: number;
  readonly v: number;
  readonly half: number;
  readonly bound: number;
}

const CORNERS = [
  [-1, -1],
  [1, -1],
  [1, 1],
  [-1, 1],
] as const;

/** Best first branch and bound over squares, for regions that are not convex. */
class Search {
  private margin = -Infinity;
  private ridges: Ridge[] = [];
  private readonly queue: Cell[] = [];
  private readonly coarse: number;
  constructor(private readonly border: Border) {
    const { low, high } = border;
    this.coarse = Math.max(high[0] - low[0], high[1] - low[1]) / 16;
  }

  deepest(): Found | null {
    const { low, high, slack } = this.border;
    const half = this.coarse;
    for (let u = low[0] + half; u - half < high[0]; u += 2 * half)
      for (let v = low[1] + half; v - half < high[1]; v += 2 * half) this.consider(u, v, half);
    for (let cell = this.next(); cell !== null; cell = this.next()) {
      if (cell.bound < this.margin - slack) break;
      const quarter = cell.half / 2;
      for (const [du, dv] of CORNERS) this.consider(cell.u + du * quarter, cell.v + dv * quarter, quarter);
    }
    const best = this.ridges.reduce<Ridge | null>((a, b) => (a === null || goesBefore(b, a) ? b : a), null);
    return best && { margin: this.margin, ridge: best };
  }

  private next(): Cell | null {
    const { queue } = this;
    if (queue.length === 0) return null;
    let top = 0;
    for (let i = 1; i < queue.length; i++) if (queue[i]!.bound > queue[top]!.bound) top = i;
    const cell = queue[top]!;
    queue[top] = queue.at(-1)!;
    queue.pop();
    return cell;
  }

  /** Bounds the margin in a square; queues it where it may hold a deeper point, or an equally deep one not known yet. */
  private consider(u: number, v: number, half: number): void {
    const { segments, slack } = this.border;
    const margin = marginAt(this.border, u, v);
    const inside = insideOf(segments, u, v);
    const lipschitz = (inside ? margin : -margin) + half;
    if (lipschitz < this.margin - slack || lipschitz <= 0) return;
    if (inside && margin > slack && lipschitz > this.margin) this.climb(u, v);
    const { bound, choices } = inSquare(this.border, u, v, half);
    const least = Math.min(bound, lipschitz);
    if (least < this.margin - slack) return;
    if (choices) {
      for (const rows of choices) this.settle(rows);
      return;
    }
    const known =
      least <= this.margin + slack && half < this.coarse / 8 && this.ridges.some((r) => passes(r, u, v, half));
    if (!known && half > 1e-7) this.queue.push({ u, v, half, bound: least });
  }

  /** Where every segment keeps one clearance the margin is concave, and positive on one side of the border only. */
  private settle(rows: readonly Constraint[]): void {
    const found = largest(rows, this.border.box);
    if (
      found &&
      found[2] > 0 &&
      found[2] >= this.margin - this.border.slack &&
      insideOf(this.border.segments, found[0], found[1])
    )
      this.offer(...found);
  }

  private offer(u: number, v: number, margin: number): void {
    const { slack } = this.border;
    if (margin < this.margin - slack) return;
    if (margin > this.margin + slack) this.ridges = [];
    this.margin = Math.max(margin, this.margin);
    if (!this.ridges.some((r) => passes(r, u, v, 1e-6))) this.ridges.push(ridgeAt(this.border, u, v, margin));
  }

  /** From a point inside, climb: every segment keeps the clearance that is widest here; the linear program moves on. */
  private climb(u: number, v: number): void {
    let best: Deepest = { u, v, margin: marginAt(this.border, u, v) };
    for (let step = 0; step < 40; step++) {
      const rows = this.border.functions.map((fs) => asConstraint(fs[widest(fs, best.u, best.v)[0]]!));
      const found = largest(rows, this.border.box);
      if (!found || found[2] <= best.margin + this.border.slack) break;
      best = { u: found[0], v: found[1], margin: found[2] };
    }
    this.offer(best.u, best.v, best.margin);
  }
}

/** The tie rule: the longer stretch, then the one whose middle has the lower u, then the lower v. */
function goesBefore(a: Ridge, b: Ridge): boolean {
  const gap = lengthOf(a) - lengthOf(b);
  if (Math.abs(gap) > 1e-6) return gap > 0;
  const [p, q] = [middleOf(a), middleOf(b)];
  return Math.abs(p[0] - q[0]) > 1e-6 ? p[0] < q[0] : p[1] < q[1];
}

/** More choices of clearances than this, and a square is divided instead. */
const MANY = 24;

/** The margin inside a square. Where one clearance of a segment is widest at all four corners it is so throughout; else the
 *  largest corner value bounds it, clearances being convex together. Each way to choose one clearance for every segment of
 *  the second kind that could bind is a linear program whose optimum is truly as deep as it says; together they hold the
 *  deepest point of the square.
 *  @returns  an upper bound, and the programs when they are few */
function inSquare(
  border: Border,
  u: number,
  v: number,
  half: number,
): { bound: number; choices: readonly (readonly Constraint[])[] | null } {
  const fixed: Constraint[] = [
    [1, 0, 0, u + half],
    [-1, 0, 0, half - u],
    [0, 1, 0, v + half],
    [0, -1, 0, half - v],
  ];
  const mixed: { least: number; most: number; functions: Affine[] }[] = [];
  for (const fs of border.functions) {
    let same = -2;
    let most = -Infinity;
    for (const [du, dv] of CORNERS) {
      const [i, d] = widest(fs, u + du * half, v + dv * half);
      same = same === -2 || same === i ? i : -1;
      most = Math.max(most, d);
    }
    if (same >= 0) fixed.push(asConstraint(fs[same]!));
    else {
      const least = widest(fs, u, v)[1] - half; // clearances change by no more than the way
      mixed.push({ least, most, functions: fs.filter((f) => at(f, u, v) + half >= least) });
    }
  }
  const bound =
    largest([...fixed, ...mixed.map(({ most }): Constraint => [0, 0, 1, most])], border.box)?.[2] ?? -Infinity;
  const binding = mixed.filter(({ least }) => least <= bound);
  if (binding.reduce((n, { functions }) => n * functions.length, 1) > MANY) return { bound, choices: null };
  const choices = binding.reduce<Constraint[][]>(
    (all, { functions }) => functions.flatMap((f) => all.map((rows) => [...rows, asConstraint(f)])),
    [fixed],
  );
  return { bound, choices };
}
