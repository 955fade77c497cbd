import type { LigandCell } from "../fields/ligandCells";
import type { MetalFields } from "../fields/fields";
import type { HazardGround } from "../hazards/excluded";
import type { Demand, Solution } from "../solution";
import { windowPieces, type Bound } from "./pieces";

/** All minimal sets of 0 ... n - 1 that do not hold, as bit masks; whatever holds for a set must hold for its subsets. Each
 *  set found is made as small, each that holds as large, as it can be, so that few sets are ever tried.
 *  @param n  at most 24     @param holds  the test     @returns  masks, none inside another
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

/** One demand of a plan with what it leaves of the ground: a metal's fields, or a hazard's edge. */
type Asked = { readonly metal: MetalFields } | { readonly hazard: HazardGround };

const demandOf = (asked: Asked): Demand =>
  "metal" in asked
    ? { metal: asked.metal.metal.element, requirement: asked.metal.metal.requirement }
    : { ...asked.hazard.asked };

/** Why there is no window: the smallest sets of demands (requirements of metals, hazards kept out) that cannot hold together inside the
 *  frame and the binding water lines; every set is minimal, all minimal sets are listed.
 *  @param cells, metals, bounds, hazards  as for windowPieces
 *  @returns  sets in order of size, then of metals and hazards; none where frame and water lines alone leave no ground
 *  @source  minimalConflicts */
export function conflictsOf(
  cells: readonly LigandCell[],
  metals: readonly MetalFields[],
  bounds: readonly Bound[],
  hazards: readonly HazardGround[] = [],
): Solution["conflicts"] {
  const demanding: Asked[] = [
    ...metals.filter((m) => m.metal.requirement !== "free").map((metal) => ({ metal })),
    ...hazards.map((hazard) => ({ hazard })),
  ];
  const members = (mask: number): Asked[] => demanding.filter((_, i) => mask & (1 << i));
  const sets = minimalConflicts(demanding.length, (mask) => {
    const set = members(mask);
    const fields = set.flatMap((a) => ("metal" in a ? [a.metal] : []));
    const kept = set.flatMap((a) => ("hazard" in a ? [a.hazard] : []));
    return windowPieces(cells, fields, bounds, kept).length > 0;
  });
  return sets
    .map(members)
    .filter((set) => set.length > 0)
    .sort((a, b) => a.length - b.length || firstDifference(a, b, demanding))
    .map((set) => set.map(demandOf));
}

function firstDifference<T>(a: readonly T[], b: readonly T[], order: readonly T[]): number {
  const at = a.findIndex((m, i) => m !== b[i]);
  return at < 0 ? 0 : order.indexOf(a[at]!) - order.indexOf(b[at]!);
}
