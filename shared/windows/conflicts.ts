import type { LigandCell } from "../fields/ligandCells";
import type { MetalFields } from "../fields/fields";
import type { Solution } from "../solution";
import { windowPieces, type Bound } from "./pieces";

/** All minimal sets of 0 ... n - 1 that do not hold, as bit masks; whatever holds for a set must hold for its subsets. Each
 *  set found is made as small, each that holds as large, as it can be, so that few sets are ever tried.
 *  @param n  at most 16     @param holds  the test     @returns  masks, none inside another
 *  @source  the map of what is still unknown: sets that neither hold a found one nor lie in one that holds */
export function minimalConflicts(n: number, holds: (mask: number) => boolean): number[] {
  const failing: number[] = [];
  const holding: number[] = [];
  const bits = Array.from({ length: n }, (_, i) => 1 << i);
  for (let seed = (1 << n) - 1; seed >= 0; seed--) {
    if (failing.some((f) => (f & seed) === f) || holding.some((h) => (h & seed) === seed)) continue;
    let set = seed;
    if (holds(set)) {
      for (const bit of bits) if (!(set & bit) && holds(set | bit)) set |= bit;
      holding.push(set);
    } else {
      for (const bit of bits) if (set & bit && !holds(set & ~bit)) set &= ~bit;
      failing.push(set);
    }
  }
  return failing;
}

/** Why there is no window: the smallest sets of requirements that cannot hold together inside the frame and the binding
 *  water lines; every set is minimal, all minimal sets are listed.
 *  @param cells, metals, bounds  as for windowPieces
 *  @returns  sets in order of size, then of the metals; none where frame and water lines alone leave no ground
 *  @source  minimalConflicts */
export function conflictsOf(
  cells: readonly LigandCell[],
  metals: readonly MetalFields[],
  bounds: readonly Bound[],
): Solution["conflicts"] {
  const demanding = metals.filter((m) => m.metal.requirement !== "free");
  const members = (mask: number): MetalFields[] => demanding.filter((_, i) => mask & (1 << i));
  const sets = minimalConflicts(demanding.length, (mask) => windowPieces(cells, members(mask), bounds).length > 0);
  return sets
    .map(members)
    .filter((set) => set.length > 0)
    .sort((a, b) => a.length - b.length || firstDifference(a, b, demanding))
    .map((set) => set.map(({ metal }) => ({ metal: metal.element, requirement: metal.requirement })));
}

function firstDifference(a: readonly MetalFields[], b: readonly MetalFields[], order: readonly MetalFields[]): number {
  const at = a.findIndex((m, i) => m !== b[i]);
  return at < 0 ? 0 : order.indexOf(a[at]!) - order.indexOf(b[at]!);
}
