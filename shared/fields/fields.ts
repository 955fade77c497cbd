import { lowerEnvelope, type EnvelopeCell, type Plane } from "../geometry/envelope";
import { formationOf, type Formation } from "../planes/formation";
import type { Basis } from "../planes/grid";
import { ligandNumbers } from "../selection/components";
import type { PreparedMetal } from "../selection/prepare";
import type { Species } from "../species/chemicalData";
import type { State } from "../solution";
import type { LigandCell } from "./ligandCells";

/** One metal over all cells: its species as planes, and who rules where. */
export interface MetalFields {
  readonly metal: PreparedMetal;
  readonly formations: readonly Formation[];
  readonly states: readonly State[];
  /** per ligand cell: the planes there and the pieces of the envelope */
  readonly cells: readonly { readonly planes: readonly Plane[]; readonly pieces: readonly EnvelopeCell[] }[];
}

/** Dissolved, the metal itself, or a compound of it.
 *  @param species  holds the metal     @returns  the state a requirement speaks of */
export function stateOf(species: Species): State {
  if (species.phase === "aq") return "dissolved";
  return Object.keys(species.composition).length === 1 ? "metal" : "compound";
}

const known = new WeakMap<readonly Species[], readonly State[]>();

/** States of a choice of species, read once: `chooseSpecies` hands out the same choice again. */
function statesOf(species: readonly Species[]): readonly State[] {
  let states = known.get(species);
  if (states === undefined) known.set(species, (states = species.map(stateOf)));
  return states;
}

/** Predominance fields of one metal: in every ligand cell the lower envelope of its species per mole of metal, each less
 *  the potentials of its ligands there. Across a cell's border the two planes of one species meet exactly on it.
 *  @param metal  chosen species and activity     @param cells  ligand cells     @param basis  prices at T
 *  @returns  exact convex pieces     @source  docs/method.md, section 4 */
export function fieldsOf(
  metal: PreparedMetal,
  cells: readonly LigandCell[],
  basis: Basis,
  sulfateReduction: boolean,
): MetalFields {
  const formations = metal.species.map((s) =>
    formationOf(s, metal.element, metal.activity, ligandNumbers(s, metal.element, sulfateReduction), basis),
  );
  return {
    metal,
    formations,
    states: statesOf(metal.species),
    cells: cells.map((cell) => {
      const planes = formations.map((f) => planeIn(f, cell));
      return { planes, pieces: lowerEnvelope(planes, cell.piece) };
    }),
  };
}

function planeIn({ plane, ligands }: Formation, cell: LigandCell): Plane {
  if (ligands.length === 0) return plane;
  let { k, x, y } = plane;
  for (const [component, count] of ligands) {
    const { potential } = cell.holders.get(component)!;
    k -= count * potential.k;
    x -= count * potential.x;
    y -= count * potential.y;
  }
  return { k, x, y, atoms: plane.atoms };
}
