import { fieldsOf, type MetalFields } from "./fields/fields";
import { frameTag, ligandCells, type LigandCell } from "./fields/ligandCells";
import { rectangle } from "./geometry/convex";
import { energiesAt } from "./gibbs/energies";
import { excludedGround, type HazardGround } from "./hazards/excluded";
import { ok, type Outcome } from "./outcome";
import { basisAt, hydrogenLine, oxygenLine, type Basis } from "./planes/grid";
import { prepare, type Prepared } from "./selection/prepare";
import type { ChemicalData } from "./species/chemicalData";
import { kelvin } from "./units";
import { HYDROGEN_TAG, OXYGEN_TAG, windowPieces, type Bound, type WindowPiece } from "./windows/pieces";

/** A problem worked out as far as exact pieces: what windows, proposals, robust windows and hazards all start from. */
export interface Analysis {
  readonly prepared: Prepared;
  readonly basis: Basis;
  readonly cells: readonly LigandCell[];
  readonly metals: readonly MetalFields[];
  readonly bounds: readonly Bound[];
  /** ground of the hazards kept out */
  readonly hazards: readonly HazardGround[];
  readonly pieces: readonly WindowPiece[];
}

/** Steps 1 to 5 of the method, in order.
 *  @param input  a problem (schemas/problem.ts)     @param library  chemistry
 *  @returns  the analysis, or the first failure with code, path, bound and value     @source  docs/method.md */
export function analyse(input: unknown, library: ChemicalData): Outcome<Analysis> {
  const prepared = prepare(input, library);
  if (!prepared.ok) return prepared;
  const { problem, data, components, sulfateReduction } = prepared.value;
  const energies = energiesAt(data, kelvin(problem.temperatureC)); // 1 G of every species at T
  const basis = basisAt(energies); // 2 prices of H^+, e^-, water: planes on an exact grid
  const frame = rectangle(problem.frame.pH, problem.frame.Eh, [frameTag(0), frameTag(1), frameTag(2), frameTag(3)]);
  const cells = ligandCells(components, frame, basis); // 3 where every ligand's potential is linear
  const metals = prepared.value.metals.map((m) => fieldsOf(m, cells, basis, sulfateReduction)); // 4 who rules where
  const bounds = waterBounds(prepared.value, basis);
  const hazards = excludedGround({ prepared: prepared.value, basis, cells, metals });
  const pieces = windowPieces(cells, metals, bounds, hazards); // 5 where all metals are as required and no hazard stands
  return ok({ prepared: prepared.value, basis, cells, metals, bounds, hazards, pieces });
}

/** Which water lines bind: as asked, else both, but only oxygen's where a metal is to be won as metal (hydrogen is then a
 *  hazard and a loss, not a limit). */
function waterBounds({ problem }: Prepared, basis: Basis): Bound[] {
  const winsMetal = problem.metals.some((m) => m.requirement === "metal");
  const water = problem.water ?? { bound: winsMetal ? ("upper" as const) : ("both" as const) };
  const bounds: Bound[] = [];
  if (water.bound === "both" || water.bound === "upper")
    bounds.push({ line: oxygenLine(basis, water.oxygenV), tag: OXYGEN_TAG });
  if (water.bound === "both" || water.bound === "lower")
    bounds.push({ line: hydrogenLine(basis, water.hydrogenV), tag: HYDROGEN_TAG });
  return bounds;
}
