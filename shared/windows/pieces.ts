import { LIGAND_EDGE, type LigandCell } from "../fields/ligandCells";
import type { MetalFields } from "../fields/fields";
import { areaOf, clip, type Convex } from "../geometry/convex";
import { flipped, type Line } from "../geometry/line";
import type { HazardGround, HazardPart } from "../hazards/excluded";
import { fulfils } from "./requirement";

/** What an edge of a window piece is, packed in its tag: frame sides and ligand-cell edges keep theirs (negative). */
export type EdgeMeaning =
  | { readonly kind: "frame"; readonly side: number }
  | { readonly kind: "ligand" }
  | { readonly kind: "water"; readonly side: "oxygen" | "hydrogen" }
  | { readonly kind: "hazard"; readonly hazard: number; readonly plane: number | null }
  | { readonly kind: "metal"; readonly metal: number; readonly inside: number; readonly outside: number };

const SPECIES = 4096;
const WATER = SPECIES * SPECIES * 64;
export const OXYGEN_TAG = WATER;
export const HYDROGEN_TAG = WATER + 1;
const HAZARD = WATER + 2;
const hazardTag = (hazard: number, plane: number | null): number => HAZARD + hazard * SPECIES + (plane ?? SPECIES - 1);
const metalTag = (metal: number, inside: number, outside: number): number =>
  (metal * SPECIES + inside) * SPECIES + outside;

/** Reads a tag back.
 *  @param tag  of an edge of a window piece     @returns  what it means */
export function meaningOf(tag: number): EdgeMeaning {
  if (tag === LIGAND_EDGE) return { kind: "ligand" };
  if (tag < 0) return { kind: "frame", side: -1 - tag };
  if (tag >= HAZARD) {
    const plane = (tag - HAZARD) % SPECIES;
    return {
      kind: "hazard",
      hazard: Math.floor((tag - HAZARD) / SPECIES),
      plane: plane === SPECIES - 1 ? null : plane,
    };
  }
  if (tag >= WATER) return { kind: "water", side: tag === OXYGEN_TAG ? "oxygen" : "hydrogen" };
  return {
    kind: "metal",
    metal: Math.floor(tag / (SPECIES * SPECIES)),
    inside: Math.floor(tag / SPECIES) % SPECIES,
    outside: tag % SPECIES,
  };
}

export interface WindowPiece {
  readonly piece: Convex;
  /** ligand cell it lies in */
  readonly cell: number;
}

/** A line that bounds windows besides the metals: positive where allowed. */
export interface Bound {
  readonly line: Line;
  readonly tag: number;
}

/** Whether all of one list lies above, or all below, all of another. */
function apartAlong(a: readonly number[], b: readonly number[]): boolean {
  let [lowA, highA, lowB, highB] = [Infinity, -Infinity, Infinity, -Infinity];
  for (const v of a) {
    if (v < lowA) lowA = v;
    if (v > highA) highA = v;
  }
  for (const v of b) {
    if (v < lowB) lowB = v;
    if (v > highB) highB = v;
  }
  return lowA > highB || highA < lowB;
}

const apart = (a: Convex, b: Convex): boolean => apartAlong(a.x, b.x) || apartAlong(a.y, b.y);

/** Where all metals are as required and no excluded hazard stands: per ligand cell, the intersection of each metal's fulfilled fields, less
 *  the hazards' ground.
 *  @param cells  ligand cells     @param metals  fields of each metal over the same cells     @param bounds  water lines that bind
 *  @param hazards  ground kept out
 *  @returns  convex pieces with disjoint interiors; none where all of them are slivers     @source  docs/method.md, section 5 */
export function windowPieces(
  cells: readonly LigandCell[],
  metals: readonly MetalFields[],
  bounds: readonly Bound[],
  hazards: readonly HazardGround[] = [],
): WindowPiece[] {
  const out: WindowPiece[] = [];
  cells.forEach((cell, c) => {
    let pieces: Convex[] = [cell.piece];
    // where a water line runs along a ligand edge it is the water that shuts
    for (const { line, tag } of bounds)
      pieces = pieces.flatMap((p) => clip(p, line, tag, (edge) => p.tags[edge] === LIGAND_EDGE) ?? []);
    for (let m = 0; m < metals.length && pieces.length > 0; m++) {
      const { metal, states, cells: perCell } = metals[m]!;
      const all = perCell[c]!.pieces;
      const fulfilled = all.filter((f) => fulfils(metal.requirement, states[f.plane]!));
      if (fulfilled.length === all.length) continue;
      pieces = pieces.flatMap((p) => fulfilled.flatMap((f) => within(p, f.piece, f.plane, m) ?? []));
    }
    for (let h = 0; h < hazards.length && pieces.length > 0; h++) {
      const parts = hazards[h]!.cells[c]!;
      if (parts.length > 0) pieces = pieces.flatMap((p) => parts.flatMap((part) => clearOf(p, part, h) ?? []));
    }
    for (const piece of pieces) out.push({ piece, cell: c });
  });
  return out.some((p) => !isSliver(p.piece)) ? out : [];
}

/** Two limits that differ by less than the grid can tell leave ground that is none: thinner than 1e-9 pH on average.
 *  @param piece  convex     @returns  true for such a hair */
export const isSliver = (piece: Convex): boolean =>
  areaOf(piece) < 1e-9 * (Math.max(...piece.y) - Math.min(...piece.y));

/** Part of a piece inside one field; only edges against other fields cut, the cell's own are the piece's already. */
function within(piece: Convex, field: Convex, species: number, metal: number): Convex | null {
  if (apart(piece, field)) return null;
  let part: Convex | null = piece;
  for (let e = 0; e < field.lines.length; e++) {
    const neighbour = field.tags[e]!;
    if (neighbour < 0) continue;
    part = clip(part, field.lines[e]!, metalTag(metal, species, neighbour));
    if (part === null) return null;
  }
  return part;
}

/** Part of a piece inside one part of a hazard's cell and clear of the hazard. Edges between two parts become plain inner edges: pressure
 *  does not jump there, so what one side shuts along them the other shuts too, and a hazard's line that runs along one takes its name. */
function clearOf(piece: Convex, { field, height, plane }: HazardPart, hazard: number): Convex | null {
  let part: Convex | null = piece;
  if (field !== null) {
    if (apart(piece, field)) return null;
    for (let e = 0; e < field.lines.length && part !== null; e++)
      if (field.tags[e]! >= 0) part = clip(part, field.lines[e]!, LIGAND_EDGE);
    if (part === null) return null;
  }
  if (height[1] === 0 && height[2] === 0) return height[0] < 0 ? part : null;
  const here = part;
  return clip(here, flipped(height), hazardTag(hazard, plane), (edge) => here.tags[edge] === LIGAND_EDGE);
}
