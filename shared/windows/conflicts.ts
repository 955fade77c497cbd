import type { LigandCell } from "../fields/ligandCells";
import type { MetalFields } from "../fields/fields";
import type { Solution } from "../solution";
import { windowPieces, type Bound } from "./pieces";

function* subsets(n: number, size: number, from = 0): Generator<number[]> {
  if (size === 0) {
    yield [];
    return;
  }
  for (let i = from; i <= n - size; i++) for (const rest of subsets(n, size - 1, i + 1)) yield [i, ...rest];
}

/** Why there is no window: the smallest sets of requirements that cannot hold together inside the frame and the binding
 *  water lines; every set is minimal, all minimal sets are listed.
 *  @param cells, metals, bounds  as for windowPieces     @returns  sets in order of size
 *  @source  search over subsets by size; supersets of a found set are skipped */
export function conflictsOf(
  cells: readonly LigandCell[],
  metals: readonly MetalFields[],
  bounds: readonly Bound[],
): Solution["conflicts"] {
  const demanding = metals.filter((m) => m.metal.requirement !== "free");
  const found: number[][] = [];
  for (let size = 1; size <= demanding.length; size++) {
    for (const set of subsets(demanding.length, size)) {
      if (found.some((f) => f.every((i) => set.includes(i)))) continue;
      if (
        windowPieces(
          cells,
          set.map((i) => demanding[i]!),
          bounds,
        ).length === 0
      )
        found.push(set);
    }
  }
  return found.map((set) =>
    set.map((i) => ({ metal: demanding[i]!.metal.element, requirement: demanding[i]!.metal.requirement })),
  );
}
