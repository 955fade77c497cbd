import { clip, type Convex, type PrefersNew } from "./convex";
import type { Line } from "./line";

/** A plane alpha + beta pH + gamma E on the snapped grid, of a species with `atoms` atoms of its main element. Heights are
 *  compared per atom; cross products with `atoms` keep every difference exact. */
export interface Plane {
  readonly k: number;
  readonly x: number;
  readonly y: number;
  readonly atoms: number;
}

export interface EnvelopeCell {
  /** index of the plane in the list given */
  readonly plane: number;
  /** edge tags: index of the neighbouring plane, or the tag (negative) the cell's own edge carried */
  readonly piece: Convex;
}

/** How much plane j stands above plane i, times atoms of both: a line, exact on the grid. */
export const difference = (i: Plane, j: Plane): Line => [
  i.atoms * j.k - j.atoms * i.k,
  i.atoms * j.x - j.atoms * i.x,
  i.atoms * j.y - j.atoms * i.y,
];

/** Scratch of `candidates`: heights of every plane at every corner. */
let heights = new Float64Array(1024);

const slack = 16; // grid units: far above the rounding of a height, far below any chemistry

/** Whether plane j lies below plane i at every corner by more than rounding can hide. */
function undercuts(j: number, i: number, corners: number): boolean {
  const own = i * corners;
  const other = j * corners;
  for (let c = 0; c < corners; c++) if (!(heights[other + c]! < heights[own + c]! - slack)) return false;
  return true;
}

/** Planes that no other plane undercuts at every corner; the rest own no part of the cell. Most fall to one that is lowest at some corner, so
 *  those are asked first.
 *  @returns  indices, ascending */
function candidates(planes: readonly Plane[], cell: Convex): number[] {
  const corners = cell.x.length;
  const count = planes.length;
  if (heights.length < count * corners) heights = new Float64Array(2 * count * corners);
  for (let i = 0; i < count; i++) {
    const { k, x, y, atoms } = planes[i]!;
    for (let c = 0; c < corners; c++) heights[i * corners + c] = (k + x * cell.x[c]! + y * cell.y[c]!) / atoms;
  }
  const lowest: number[] = [];
  for (let c = 0; c < corners; c++) {
    let low = 0;
    for (let i = 1; i < count; i++) if (heights[i * corners + c]! < heights[low * corners + c]!) low = i;
    if (!lowest.includes(low)) lowest.push(low);
  }
  const alive: number[] = [];
  for (let i = 0; i < count; i++) {
    let beaten = false;
    for (let l = 0; l < lowest.length && !beaten; l++) beaten = undercuts(lowest[l]!, i, corners);
    for (let j = 0; j < count && !beaten; j++) beaten = undercuts(j, i, corners);
    if (!beaten) alive.push(i);
  }
  return alive;
}

/** The lower envelope of planes over a convex cell: who is lowest where.
 *  Ties: equal planes go to the lower index; where several neighbours share one line, the one that falls away fastest
 *  beyond it is the neighbour, then the lower index.
 *  @param planes  heights; index order is the tie order     @param cell  its edge tags must be negative
 *  @returns  pieces that partition the cell, each with its plane's index; order of the index
 *  @source  intersection of half-planes per plane, exact signs */
export function lowerEnvelope(planes: readonly Plane[], cell: Convex): EnvelopeCell[] {
  const alive = candidates(planes, cell);
  const cells: EnvelopeCell[] = [];
  const prefers: PrefersNew = (edge, piece, d, j) => fallsFaster(planes, piece, edge, d, j);
  for (const i of alive) {
    let piece: Convex | null = cell;
    const p = planes[i]!;
    for (const j of alive) {
      if (j === i) continue;
      const q = planes[j]!;
      const d = difference(p, q);
      if (d[0] === 0 && d[1] === 0 && d[2] === 0) {
        if (j < i) piece = null; // equal planes: the lower index keeps the ground
        if (piece === null) break;
        continue;
      }
      piece = clip(piece, d, j, prefers);
      if (piece === null) break;
    }
    if (piece) cells.push({ plane: i, piece });
  }
  return cells;
}

/** Whether neighbour j is lower just beyond the shared line than the neighbour that edge already has. */
function fallsFaster(planes: readonly Plane[], piece: Convex, edge: number, d: Line, j: number): boolean {
  const old = piece.tags[edge]!;
  if (old < 0) return false; // the cell's own edge stays the cell's
  const was = piece.lines[edge]!;
  const axis = Math.abs(d[1]) > Math.abs(d[2]) ? 1 : 2;
  const fresh = Math.abs(d[axis]) * planes[old]!.atoms;
  const before = Math.abs(was[axis]) * planes[j]!.atoms;
  return fresh > before || (fresh === before && j < old);
}
