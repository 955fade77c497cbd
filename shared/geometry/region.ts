import { areaOf, type Convex } from "./convex";
import { flipped, turn, type Line } from "./line";
import { lineClasses, type LineClass } from "./lineClasses";

/** A stretch of a region's border: part of one edge of one piece, walked with the region on the left. */
export interface Stretch {
  readonly piece: number;
  readonly edge: number;
  readonly from: readonly [number, number];
  readonly to: readonly [number, number];
}

/** A connected region: its pieces, and its border as closed loops, outer ones counter-clockwise, holes clockwise. */
export interface Region {
  readonly pieces: readonly number[];
  readonly outer: readonly Stretch[];
  readonly holes: readonly (readonly Stretch[])[];
  readonly area: number;
}

class Groups {
  private readonly parent: number[];
  constructor(n: number) {
    this.parent = Array.from({ length: n }, (_, i) => i);
  }
  of(i: number): number {
    let root = i;
    while (this.parent[root] !== root) root = this.parent[root]!;
    while (this.parent[i] !== root) {
      const next = this.parent[i]!;
      this.parent[i] = root;
      i = next;
    }
    return root;
  }
  join(a: number, b: number): void {
    const ra = this.of(a);
    const rb = this.of(b);
    if (ra !== rb) this.parent[Math.max(ra, rb)] = Math.min(ra, rb);
  }
}

interface Half extends Stretch {
  readonly start: number;
  readonly end: number;
  used: boolean;
}

/** Joins convex pieces with disjoint interiors into connected regions. Two pieces join when they share a stretch of a line
 *  of positive length; a shared point does not join (the one tie rule). Which stretches are shared is decided by exact
 *  ranks along exact lines; computed corners are only drawn.
 *  @param pieces  convex pieces     @returns  regions in the order of their first piece
 *  @source  half-edge walk; exact predicates of line.ts */
export function connect(pieces: readonly Convex[]): Region[] {
  if (pieces.length === 0) return [];
  const classes = lineClasses(pieces);
  const owner = new Groups(pieces.length);
  const base: number[] = [];
  let total = 0;
  for (const c of classes) {
    base.push(total);
    total += c.places.length;
  }
  const vertex = new Groups(total);
  const ends = pieces.map((p) => ({
    start: new Array<number>(p.lines.length),
    end: new Array<number>(p.lines.length),
  }));
  classes.forEach((c, k) => {
    for (const e of c.edges) {
      ends[e.piece]!.start[e.edge] = base[k]! + (e.facing === 1 ? e.low : e.high);
      ends[e.piece]!.end[e.edge] = base[k]! + (e.facing === 1 ? e.high : e.low);
    }
  });
  for (const e of ends) {
    const n = e.start.length;
    for (let i = 0; i < n; i++) vertex.join(e.end[i]!, e.start[i + 1 === n ? 0 : i + 1]!);
  }
  const halves: Half[] = [];
  classes.forEach((c, k) => border(c, base[k]!, owner, vertex, halves));
  return loopsOf(pieces, owner, halves);
}

/** Joins the owners of facing edges and collects what no facing edge covers. */
function border(c: LineClass, base: number, owner: Groups, vertex: Groups, halves: Half[]): void {
  for (const e of c.edges) {
    const facing =
      c.edges.length === 1
        ? []
        : c.edges
            .filter((o) => o.facing !== e.facing && o.low < e.high && o.high > e.low)
            .sort((a, b) => a.low - b.low);
    let at = e.low;
    const free: [number, number][] = [];
    for (const o of facing) {
      owner.join(e.piece, o.piece);
      if (o.low > at) free.push([at, o.low]);
      at = Math.max(at, o.high);
    }
    if (at < e.high) free.push([at, e.high]);
    for (const [low, high] of free) {
      const [a, b] = e.facing === 1 ? [low, high] : [high, low];
      halves.push({
        piece: e.piece,
        edge: e.edge,
        from: c.places[a]!,
        to: c.places[b]!,
        start: vertex.of(base + a),
        end: vertex.of(base + b),
        used: false,
      });
    }
  }
}

/** Which of two lines is met first by a ray that starts along the way back and turns clockwise; the way back itself last. */
function firstClockwise(back: Line, a: Line, b: Line): number {
  const half = (o: Line): number => {
    const side = turn(back, o);
    return side < 0 ? 0 : side > 0 ? 2 : back[1] * o[1] + back[2] * o[2] < 0 ? 1 : 3;
  };
  return half(a) - half(b) || turn(a, b);
}

/** Where several stretches leave one point, the next is the first met turning clockwise from where we came: the other side
 *  of the same wedge of ground. A region that meets itself in a point is walked through it, wedge by wedge. Exact. */
function following(h: Half, leaving: readonly Half[], pieces: readonly Convex[]): Half {
  if (leaving.length === 1) return leaving[0]!;
  const lineOf = (s: Half): Line => pieces[s.piece]!.lines[s.edge]!;
  const back = flipped(lineOf(h));
  return leaving.reduce((best, o) => (firstClockwise(back, lineOf(o), lineOf(best)) < 0 ? o : best));
}

const signedArea = (loop: readonly Stretch[]): number => {
  const [ox, oy] = loop[0]!.from;
  let twice = 0;
  for (const { from, to } of loop) twice += (from[0] - ox) * (to[1] - oy) - (to[0] - ox) * (from[1] - oy);
  return twice / 2;
};

function loopsOf(pieces: readonly Convex[], owner: Groups, halves: readonly Half[]): Region[] {
  const leaving = new Map<number, Half[]>();
  for (const h of halves) {
    const list = leaving.get(h.start);
    if (list) list.push(h);
    else leaving.set(h.start, [h]);
  }
  const found = new Map<number, { pieces: number[]; loops: Stretch[][]; area: number }>();
  pieces.forEach((p, i) => {
    const root = owner.of(i);
    const region = found.get(root) ?? { pieces: [], loops: [], area: 0 };
    region.pieces.push(i);
    region.area += areaOf(p);
    found.set(root, region);
  });
  for (const first of halves) {
    if (first.used) continue;
    const loop: Stretch[] = [];
    let h = first;
    do {
      if (h.used) throw new Error("border stretches that close no loop: the pieces overlap");
      h.used = true;
      loop.push(h);
      h = following(h, leaving.get(h.end)!, pieces);
    } while (h !== first);
    found.get(owner.of(first.piece))!.loops.push(loop);
  }
  return [...found.values()].map(({ pieces: members, loops, area }) => {
    const byArea = loops.map((loop) => ({ loop, area: signedArea(loop) })).sort((a, b) => b.area - a.area);
    return {
      pieces: members,
      outer: byArea[0]?.loop ?? [],
      holes: byArea.slice(1).map((l) => l.loop),
      area,
    };
  });
}
