import type { Convex } from "../geometry/convex";
import { lowerEnvelope, type Plane } from "../geometry/envelope";
import { formationOf, perAtom } from "../planes/formation";
import type { Basis } from "../planes/grid";
import type { PreparedComponent } from "../selection/prepare";
import type { Species } from "../species/chemicalData";

/** Edge tags of a cell. Below LIGAND_EDGE: inner borders between ligand cells; the frame's own sides keep theirs. */
export const FRAME_SIDES = ["low Eh", "high pH", "high Eh", "low pH"] as const;
export const frameTag = (side: number): number => -1 - side;
export const LIGAND_EDGE = -100;

/** A convex cell of the frame in which every ligand's potential is linear. */
export interface LigandCell {
  readonly piece: Convex;
  /** component -> its potential per atom here, and the species that holds it */
  readonly holders: ReadonlyMap<string, { readonly species: Species; readonly potential: Plane }>;
}

/** Overlays the lower envelopes of all ligands, each at its total activity.
 *  @param components  ligands and partners with totals     @param frame  rectangle with frame tags     @param basis  prices at T
 *  @returns  cells that partition the frame     @source  docs/method.md, section 3 */
export function ligandCells(components: readonly PreparedComponent[], frame: Convex, basis: Basis): LigandCell[] {
  let cells: LigandCell[] = [{ piece: frame, holders: new Map() }];
  for (const { component, activity, species } of components) {
    const main = component.startsWith("S(") ? "S" : component;
    const planes = species.map((s) => perAtom(formationOf(s, main, activity, [], basis)));
    cells = cells.flatMap((cell) =>
      lowerEnvelope(planes, cell.piece).map(({ plane, piece }) => ({
        piece: withInnerTags(piece),
        holders: new Map(cell.holders).set(component, { species: species[plane]!, potential: planes[plane]! }),
      })),
    );
  }
  return cells;
}

/** Edges between two cells of one ligand become plain inner edges. */
const withInnerTags = (piece: Convex): Convex =>
  piece.tags.some((t) => t >= 0) ? { ...piece, tags: piece.tags.map((t) => (t >= 0 ? LIGAND_EDGE : t)) } : piece;
