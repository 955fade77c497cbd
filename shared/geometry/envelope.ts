import { clip, type Convex } from "./convex";
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

/** Planes that another plane undercuts at every corner by more than rounding can hide: they own no part of the cell. A plane that undercuts
 *  has the lower mean, and whoever undercuts it undercuts all that it does: taken from the lowest mean up, only those that stand are asked.
 *  @returns  indices, ascending */
function candidates(planes: readonly Plane[], cell: Convex): number[] {
  const corners = cell.x.length;
  const count = planes.length;
  const heights = new Float64Array(count * corners);
  const means = new Float64Array(count);
  for (let i = 0; i < count; i++) {
    const p = planes[i]!;
    let sum = 0;
    for (let c = 0; c < corners; c++)
      sum += heights[i * corners + c] = (p.k + p.x * cell.x[c]! + p.y * cell.y[c]!) / p.atoms;
    means[i] = sum;
  }
  const order = Array.from({ length: count }, (_, i) => i).sort((a, b) => means[a]! - means[b]!);
  const slack = 16; // grid units: far above the rounding of a height, far below any chemistry
  const alive: number[] = [];
  for (const i of order) {
    let beaten = false;
    for (let a = 0; a < alive.length && !beaten; a++) {
      const j = alive[a]!;
      beaten = true;
      for (let c = 0; c < corners && beaten; c++)
        beaten = heights[j * corners + c]! < heights[i * corners + c]! - slack;
    }
    if (!beaten) alive.push(i);
  }
  return alive.sort((a, b) => a - b);
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
      const current: Convex = piece;
      piece = clip(current, d, j, (edge) => fallsFaster(planes, current, edge, d, j));
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
