import type { LigandCell } from "../fields/ligandCells";
import { speciesAt } from "../setpoint/crosscut";
import type { Field, Limit, Window } from "../solution";
import type { WindowPiece } from "../windows/pieces";
import type { Problem } from "../schemas/problem";

/** What a warning must touch to be worth reading. */
export interface Relevant {
  /** metal and species: on either side of a window's limit, at a set point, or the target's own; in that order, each once */
  readonly species: readonly { readonly metal: string; readonly id: string }[];
  /** limits of all windows where a metal changes */
  readonly limits: readonly Limit[];
  /** species that hold a ligand where there is window, or anywhere without one */
  readonly holders: ReadonlySet<string>;
}

/** The species that the answer rests on: fields far from every window and set point decide nothing.
 *  @param problem, fields, windows  solved     @param cells, pieces  ligand cells and window pieces
 *  @returns  species, limits and ligand holders     @source  arithmetic on the solution */
export function relevantTo(
  { metals }: Pick<Problem, "metals">,
  fields: readonly Field[],
  windows: readonly Window[],
  cells: readonly LigandCell[],
  pieces: readonly WindowPiece[],
): Relevant {
  const limits = windows.flatMap((w) => w.limits.filter((l) => l.kind === "metal"));
  const asked = metals.map((m) => ({ metal: m.element, requirement: m.requirement, activity: 1 }));
  const solution = { fields: [...fields], metals: asked };
  const targets = new Set(metals.filter((m) => m.role === "target").map((m) => m.element));
  const all = [
    ...limits.flatMap((l) => [l.inside, l.outside].map((id) => ({ metal: l.metal ?? "", id: id ?? "" }))),
    ...windows.flatMap(({ setPoint: at }) =>
      speciesAt(solution, at.pH, at.Eh).map(({ metal, species }) => ({ metal, id: species })),
    ),
    ...fields.filter((f) => targets.has(f.metal)).map((f) => ({ metal: f.metal, id: f.species })),
  ];
  const seen = new Set<string>();
  const species = all.filter(({ metal, id }) => {
    const key = `${metal} ${id}`;
    const fresh = id !== "" && !seen.has(key);
    seen.add(key);
    return fresh;
  });
  const touched = pieces.length > 0 ? [...new Set(pieces.map((p) => p.cell))].flatMap((c) => cells[c] ?? []) : cells;
  const holders = new Set(touched.flatMap((c) => [...c.holders.values()].map((h) => h.species.id)));
  return { species, limits, holders };
}
