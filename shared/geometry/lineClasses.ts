import type { Convex } from "./convex";
import { flipped, orderAlong, sameLine, type Line } from "./line";

/** One edge of one piece, on its line. */
export interface Edge {
  readonly piece: number;
  readonly edge: number;
  readonly line: Line;
  /** lines that cut the edge at its start and end, walking counter-clockwise round the piece */
  readonly before: Line;
  readonly after: Line;
}

/** All edges that lie on one line, whichever way they face. Places along it are whole numbers: equal places, equal rank. */
export interface LineClass {
  readonly line: Line;
  readonly edges: readonly (Edge & { readonly facing: 1 | -1; readonly low: number; readonly high: number })[];
  /** drawn coordinates of each rank */
  readonly places: readonly (readonly [number, number])[];
}

interface Sortable {
  edge: Edge;
  slope: number;
  offset: number;
}

/** Pseudo-angle and offset of a line, direction ignored; only to bring equal lines near each other in a list. */
function sortable(edge: Edge): Sortable {
  const [k, x, y] = edge.line;
  const size = Math.abs(x) + Math.abs(y);
  const sign = x > 0 || (x === 0 && y > 0) ? 1 : -1;
  return { edge, slope: (sign * y) / size, offset: (sign * k) / size };
}

/** Splits a sorted list where neighbours differ by more than `gap`. */
function runs<T>(list: readonly T[], key: (item: T) => number, gap: number): T[][] {
  const out: T[][] = [];
  for (const item of list) {
    const last = out.at(-1);
    if (last && key(item) - key(last.at(-1)!) <= gap * (1 + Math.abs(key(item)))) last.push(item);
    else out.push([item]);
  }
  return out;
}

/** Groups the edges of many pieces by the line they lie on. Near lines are found by sorting, equal ones decided exactly.
 *  @param pieces  convex pieces with disjoint interiors     @returns  one class a line, places ranked along it
 *  @source  exact collinearity (line.ts) */
export function lineClasses(pieces: readonly Convex[]): LineClass[] {
  const all: Sortable[] = [];
  pieces.forEach((p, piece) => {
    const n = p.lines.length;
    for (let e = 0; e < n; e++) {
      all.push(
        sortable({
          piece,
          edge: e,
          line: p.lines[e]!,
          before: p.lines[e === 0 ? n - 1 : e - 1]!,
          after: p.lines[e + 1 === n ? 0 : e + 1]!,
        }),
      );
    }
  });
  all.sort((a, b) => a.slope - b.slope);
  const classes: LineClass[] = [];
  for (const parallel of runs(all, (s) => s.slope, 1e-9)) {
    parallel.sort((a, b) => a.offset - b.offset);
    for (const near of runs(parallel, (s) => s.offset, 1e-9)) {
      const groups: Edge[][] = [];
      for (const { edge } of near) {
        const home = groups.find((g) => sameLine(g[0]!.line, edge.line));
        if (home) home.push(edge);
        else groups.push([edge]);
      }
      for (const group of groups) classes.push(ranked(group, pieces));
    }
  }
  return classes;
}

interface End {
  t: number;
  error: number;
  cut: Line;
  place: readonly [number, number];
}

function ranked(group: readonly Edge[], pieces: readonly Convex[]): LineClass {
  const line = group[0]!.line;
  const axis = Math.abs(line[1]) > Math.abs(line[2]) ? 1 : 2;
  const size = Math.sqrt(line[1] * line[1] + line[2] * line[2]);
  const dx = line[2] / size;
  const dy = -line[1] / size;
  const ends: End[] = [];
  for (const e of group) {
    const p = pieces[e.piece]!;
    const n = p.lines.length;
    const start = e.edge === 0 ? n - 1 : e.edge - 1;
    for (const [corner, cut] of [
      [start, e.before],
      [e.edge, e.after],
    ] as const) {
      const x = p.x[corner]!;
      const y = p.y[corner]!;
      ends.push({
        t: x * dx + y * dy,
        error: p.ex[corner]! + p.ey[corner]! + 8 * Number.EPSILON * (Math.abs(x) + Math.abs(y)),
        cut,
        place: [x, y],
      });
    }
  }
  const { rank, places } = apart(ends) ?? ranks(line, ends);
  const edges = group.map(({ piece, edge, line: own, before, after }, i) => {
    const facing: 1 | -1 = Math.sign(own[axis]) === Math.sign(line[axis]) ? 1 : -1;
    const a = rank[2 * i]!;
    const b = rank[2 * i + 1]!;
    return { piece, edge, line: own, before, after, facing, low: Math.min(a, b), high: Math.max(a, b) };
  });
  return { line, edges, places };
}

interface Ranks {
  readonly rank: readonly number[];
  readonly places: readonly (readonly [number, number])[];
}

/** The ranks of a single edge whose ends lie clearly apart; null else. */
function apart(ends: readonly End[]): Ranks | null {
  const [p, q] = ends;
  if (ends.length !== 2 || !p || !q || !(Math.abs(p.t - q.t) > p.error + q.error)) return null;
  return p.t < q.t ? { rank: [0, 1], places: [p.place, q.place] } : { rank: [1, 0], places: [q.place, p.place] };
}

/** Ranks ends along their line. Floating point orders what its error bound allows; ends nearer than that are put in order,
 *  or found equal, exactly. */
function ranks(line: Line, ends: readonly End[]): Ranks {
  const sorted = ends.map((_, i) => i).sort((a, b) => ends[a]!.t - ends[b]!.t);
  const groups: number[][] = []; // equal ends, in order along the line
  let from = 0; // groups before this one lie clearly before the end in hand
  for (const i of sorted) {
    const end = ends[i]!;
    while (from < groups.length && groups[from]!.every((j) => end.t - ends[j]!.t > end.error + ends[j]!.error)) from++;
    let at = from;
    let order = -1;
    for (; at < groups.length; at++) {
      order = orderAlong(line, end.cut, ends[groups[at]![0]!]!.cut);
      if (order <= 0) break;
    }
    if (at < groups.length && order === 0) groups[at]!.push(i);
    else groups.splice(at, 0, [i]);
  }
  const rank = new Array<number>(ends.length);
  groups.forEach((g, r) => g.forEach((i) => (rank[i] = r)));
  return { rank, places: groups.map((g) => ends[g[0]!]!.place) };
}

/** The line of a class as an edge facing that way sees it. */
export const lineFacing = (c: LineClass, facing: 1 | -1): Line => (facing === 1 ? c.line : flipped(c.line));
