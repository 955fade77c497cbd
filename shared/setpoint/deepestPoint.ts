import { largest, type Constraint } from "./linearProgram";
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
  readonly box: number;
  readonly convex: boolean;
}

const EXACT = 1e-9;

function borderOf(segments: readonly Segment[]): Border {
  let [ux, uy, hx, hy] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const s of segments) {
    ux = Math.min(ux, s.ax);
    uy = Math.min(uy, s.ay);
    hx = Math.max(hx, s.ax);
    hy = Math.max(hy, s.ay);
  }
  const box = 4 * Math.max(Math.abs(ux), Math.abs(uy), Math.abs(hx), Math.abs(hy), 1);
  return {
    segments,
    functions: segments.map(clearances),
    low: [ux, uy],
    high: [hx, hy],
    box,
    convex: isConvex(segments),
  };
}

/** One loop that only turns left. */
function isConvex(segments: readonly Segment[]): boolean {
  for (let i = 0; i < segments.length; i++) {
    const s = segments[i]!;
    const t = segments[i + 1 === segments.length ? 0 : i + 1]!;
    if (t.ax !== s.bx || t.ay !== s.by) return false;
    const cross = (s.bx - s.ax) * (t.by - t.ay) - (s.by - s.ay) * (t.bx - t.ax);
    if (cross < 0) return false;
  }
  return true;
}

/** Largest m such that the box of half-widths m round a point of the region meets no border: the point and m. Ties go to
 *  the middle of the deepest set, then to the lowest u. Exact to 1e-6.
 *  @param segments  all loops of one region, region on the left, consecutive within a loop; u, v in control bands
 *  @returns  the deepest point, null for an empty border
 *  @source  docs/method.md, step 6: linear programs for convex regions; else branch and bound whose bounds are linear
 *           programs too, so that long ridges of equal depth are cut off at once */
export function deepestPoint(segments: readonly Segment[]): Deepest | null {
  if (segments.length === 0) return null;
  const border = borderOf(segments);
  const start = border.convex ? convexOptimum(border) : branchAndBound(border);
  return start && middleOfDeepest(border, start);
}

const innerSide = (s: Segment): Affine => {
  const nx = -(s.by - s.ay);
  const ny = s.bx - s.ax;
  const size = Math.abs(nx) + Math.abs(ny);
  return [nx / size, ny / size, -(nx * s.ax + ny * s.ay) / size];
};

const asConstraint = (f: Affine): Constraint => [-f[0], -f[1], 1, f[2]];

function convexOptimum(border: Border): Deepest | null {
  const found = largest(
    border.segments.map((s) => asConstraint(innerSide(s))),
    border.box,
  );
  return found && { u: found[0], v: found[1], margin: found[2] };
}

/** From a point inside, climb: every segment keeps the clearance that is widest here; the linear program moves on. */
function climb(border: Border, u: number, v: number): Deepest {
  let best: Deepest = { u, v, margin: marginAt(border, u, v) };
  for (let step = 0; step < 40; step++) {
    const rows = border.functions.map((fs) => asConstraint(fs[widest(fs, best.u, best.v)[0]]!));
    const found = largest(rows, border.box);
    if (!found || found[2] <= best.margin + EXACT) break;
    best = { u: found[0], v: found[1], margin: found[2] };
  }
  return best;
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

/** An upper bound on the margin inside a square: exact where one clearance of a segment is widest at all four corners (it
 *  then is throughout), else its largest corner value, clearances being convex together. */
function upperBound(border: Border, u: number, v: number, half: number): number {
  const rows: Constraint[] = [
    [1, 0, 0, u + half],
    [-1, 0, 0, half - u],
    [0, 1, 0, v + half],
    [0, -1, 0, half - v],
  ];
  for (const fs of border.functions) {
    let same = -2;
    let most = -Infinity;
    for (const [du, dv] of CORNERS) {
      const [i, d] = widest(fs, u + du * half, v + dv * half);
      same = same === -2 || same === i ? i : -1;
      most = Math.max(most, d);
    }
    rows.push(same >= 0 ? asConstraint(fs[same]!) : [0, 0, 1, most]);
  }
  return largest(rows, border.box)?.[2] ?? -Infinity;
}

const CORNERS = [
  [-1, -1],
  [1, -1],
  [1, 1],
  [-1, 1],
] as const;

function branchAndBound(border: Border): Deepest | null {
  const { low, high } = border;
  let best: Deepest | null = null;
  const offer = (d: Deepest): void => {
    if (best === null || d.margin > best.margin + EXACT || (d.margin > best.margin - EXACT && d.u < best.u - EXACT))
      best = d;
  };
  const side = Math.max(high[0] - low[0], high[1] - low[1]) / 8;
  const queue: Cell[] = [];
  const push = (u: number, v: number, half: number): void => {
    const inside = insideOf(border.segments, u, v);
    const margin = marginAt(border, u, v);
    if (inside) offer(climb(border, u, v));
    const lipschitz = (inside ? margin : -margin) + half;
    if (best !== null && lipschitz <= best.margin + EXACT) return;
    if (lipschitz <= 0) return;
    const bound = Math.min(lipschitz, upperBound(border, u, v, half));
    if (best === null || bound > best.margin + EXACT) queue.push({ u, v, half, bound });
  };
  for (let u = low[0] + side / 2; u < high[0]; u += side)
    for (let v = low[1] + side / 2; v < high[1]; v += side) push(u, v, side / 2);
  for (let steps = 0; queue.length > 0 && steps < 20_000; steps++) {
    let top = 0;
    for (let i = 1; i < queue.length; i++) if (queue[i]!.bound > queue[top]!.bound) top = i;
    const cell = queue[top]!;
    queue[top] = queue.at(-1)!;
    queue.pop();
    const known: Deepest | null = best;
    if (known !== null && cell.bound <= (known as Deepest).margin + EXACT) continue;
    if (cell.half < 1e-7) continue;
    const half = cell.half / 2;
    for (const [du, dv] of CORNERS) push(cell.u + du * half, cell.v + dv * half, half);
  }
  return best;
}

/** The set of points as deep as the best is a point or a segment: its middle. */
function middleOfDeepest(border: Border, start: Deepest): Deepest {
  let best = start;
  for (let round = 0; round < 3; round++) {
    const level = best.margin - EXACT;
    const kept = border.functions.map((fs) => fs[widest(fs, best.u, best.v)[0]]!);
    const face = kept.reduce<[number, number][]>(
      (polygon, f) => cut(polygon, [f[0], f[1], f[2] - level]),
      [
        [-border.box, -border.box],
        [border.box, -border.box],
        [border.box, border.box],
        [-border.box, border.box],
      ],
    );
    const middle = middleOf(face);
    if (!middle || Math.hypot(middle[0] - best.u, middle[1] - best.v) < 1e-7) break;
    const margin = marginAt(border, middle[0], middle[1]);
    if (margin < best.margin - 4 * EXACT) break;
    best = { u: middle[0], v: middle[1], margin: Math.max(margin, best.margin) };
  }
  return best;
}

function cut(polygon: readonly [number, number][], f: Affine): [number, number][] {
  const out: [number, number][] = [];
  polygon.forEach((p, i) => {
    const q = polygon[i + 1 === polygon.length ? 0 : i + 1]!;
    const a = at(f, p[0], p[1]);
    const b = at(f, q[0], q[1]);
    if (a >= 0) out.push(p);
    if (a >= 0 !== b >= 0) {
      const t = a / (a - b);
      out.push([p[0] + t * (q[0] - p[0]), p[1] + t * (q[1] - p[1])]);
    }
  });
  return out;
}

/** Middle of the longest distance between two corners. */
function middleOf(polygon: readonly (readonly [number, number])[]): [number, number] | null {
  let most = -1;
  let middle: [number, number] | null = null;
  for (const p of polygon)
    for (const q of polygon) {
      const d = Math.hypot(p[0] - q[0], p[1] - q[1]);
      if (d > most) {
        most = d;
        middle = [(p[0] + q[0]) / 2, (p[1] + q[1]) / 2];
      }
    }
  return middle;
}
