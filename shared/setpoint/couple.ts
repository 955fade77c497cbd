import type { LigandCell } from "../fields/ligandCells";
import type { MetalFields } from "../fields/fields";
import { valueAt } from "../geometry/line";
import { asLine, STEPS_PER_JOULE, type Basis } from "../planes/grid";
import type { ChemicalData } from "../species/chemicalData";

/** Below this in either form a couple sets no potential on platinum (practice brief, section 4: about 10 mg/L). */
const COUPLE_MG_PER_L = 10;

/** The dissolved couple that sets Eh at a point: two oxidation states of one metal, each above about 10 mg/L.
 *  @param data  molar masses     @param cells, metals, basis  the solved plane     @param at  pH, Eh
 *  @returns  [reduced, oxidised] of the couple whose scarcer form is most plentiful, or null: a mixed potential
 *  @source  activity of each dissolved species against the ruling one, a exp(-nu dG / RT), taken as mol/L */
export function coupleAt(
  data: ChemicalData,
  cells: readonly LigandCell[],
  metals: readonly MetalFields[],
  basis: Basis,
  at: readonly [number, number],
): [string, string] | null {
  const c = cells.findIndex((cell) => cell.piece.lines.every((l) => valueAt(l, at[0], at[1]) >= 0));
  const cell = cells[c];
  if (!cell) return null;
  let best: { pair: [string, string]; scarcer: number } | null = null;
  for (const { metal, formations, states, cells: perCell } of metals) {
    const { planes } = perCell[c]!;
    let floor = Infinity;
    for (const p of planes) floor = Math.min(floor, valueAt(asLine(p), at[0], at[1]) / p.atoms);
    const mgPerMol = 1000 * data.molarMass.get(metal.element)!;
    const byState = new Map<number, { id: string; mg: number }>();
    for (const [i, f] of formations.entries()) {
      if (states[i] !== "dissolved") continue;
      const p = planes[i]!;
      const height = valueAt(asLine(p), at[0], at[1]) / p.atoms;
      const excess = ((height - floor) * f.plane.atoms) / STEPS_PER_JOULE / basis.thermal;
      const mg = metal.activity * Math.exp(-excess) * mgPerMol;
      if (!(mg >= COUPLE_MG_PER_L)) continue;
      let electrons = f.plane.y;
      for (const [component, n] of f.ligands) electrons -= n * cell.holders.get(component)!.potential.y;
      const oxidation = Math.round((-electrons / f.plane.atoms / basis.electron) * 12);
      const known = byState.get(oxidation);
      if (!known || known.mg < mg) byState.set(oxidation, { id: f.species.id, mg });
    }
    if (byState.size < 2) continue;
    const rich = [...byState.entries()].sort((a, b) => b[1].mg - a[1].mg);
    const [low, high] = [rich[0]!, rich[1]!].sort((a, b) => a[0] - b[0]) as [(typeof rich)[0], (typeof rich)[0]];
    const scarcer = Math.min(low[1].mg, high[1].mg);
    if (!best || scarcer > best.scarcer) best = { pair: [low[1].id, high[1].id], scarcer };
  }
  return best?.pair ?? null;
}
