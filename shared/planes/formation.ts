import type { Plane } from "../geometry/envelope";
import type { Species } from "../species/chemicalData";
import { snap, type Basis } from "./grid";

/** A species written over its main element, ligands, H2O, H^+ and e^-. */
export interface Formation {
  readonly species: Species;
  /** everything but the ligands' potentials, for the whole formula unit */
  readonly plane: Plane;
  /** ligand component -> number in the formula unit (whole) */
  readonly ligands: readonly (readonly [component: string, count: number])[];
}

/** Smallest factor that makes every number whole: pentlandite is written with 4.5 iron.
 *  @param numbers  atoms and groups of a formula unit     @returns  1 to 12, null where none will do
 *  @source  arithmetic     @example wholeFactor([4.5, 4.5, 8]) // => 2 */
export function wholeFactor(numbers: readonly number[]): number | null {
  for (let f = 1; f <= 12; f++) if (numbers.every((n) => Math.abs(n * f - Math.round(n * f)) < 1e-9)) return f;
  return null;
}

/** What of a plane hangs on the formula alone. */
interface Makeup {
  readonly factor: number;
  readonly atoms: number;
  readonly oxygen: number;
  readonly electrons: number;
  readonly whole: { readonly atoms: number; readonly protons: number; readonly electrons: number };
}

const makeups = new WeakMap<Species, Map<string, Makeup>>();

/** The makeup of a species over one main element, counted once. */
function makeupOf(species: Species, main: string): Makeup {
  let ofSpecies = makeups.get(species);
  if (ofSpecies === undefined) makeups.set(species, (ofSpecies = new Map<string, Makeup>()));
  let makeup = ofSpecies.get(main);
  if (makeup === undefined) ofSpecies.set(main, (makeup = count(species, main)));
  return makeup;
}

function count({ composition, charge, id }: Species, main: string): Makeup {
  const factor = wholeFactor(Object.values(composition));
  if (factor === null) throw new Error(`no small factor makes the atoms of ${id} whole`);
  const atoms = composition[main]!;
  const oxygen = composition["O"] ?? 0;
  const protons = (composition["H"] ?? 0) - 2 * oxygen;
  const electrons = protons - charge;
  const [a, p, e] = [Math.round(factor * atoms), Math.round(factor * protons), Math.round(factor * electrons)];
  return { factor, atoms, oxygen, electrons, whole: { atoms: a, protons: p, electrons: e } };
}

type Numbers = readonly (readonly [component: string, count: number])[];

function wholeNumbers(numbers: Numbers, factor: number): Numbers {
  let whole = factor === 1;
  for (const [, n] of numbers) if (!Number.isInteger(n)) whole = false;
  return whole ? numbers : numbers.map(([c, n]) => [c, Math.round(factor * n)] as const);
}

/** Plane of a species per formula unit: k + x pH + y E is its free energy less that of its H2O, H^+ and e^-, at the given
 *  total activity of the main element. With nu atoms a dissolved species carries RT ln(a / nu).
 *  @param species  holds `main`     @param main  element or ligand group     @param activity  total, > 0     @param ligands  numbers of the other components
 *  @param basis  prices at T     @returns  snapped plane; `atoms` = nu (times the factor that makes the formula whole)
 *  @throws Error where its atoms come in fractions finer than a twelfth (prepare refuses such rows)
 *  @source  docs/method.md, section 2: sp = nu M + l L + o H2O + (h - 2o) H^+ + (h - 2o - z) e^- */
export function formationOf(
  species: Species,
  main: string,
  activity: number,
  ligands: Numbers,
  basis: Basis,
): Formation {
  const { factor, atoms, oxygen, electrons, whole } = makeupOf(species, main);
  const dissolved = species.phase === "aq" ? basis.thermal * Math.log(activity / atoms) : 0;
  const k = basis.energies.of(species.id).G + dissolved - oxygen * basis.water - electrons * basis.electronAtZero;
  return {
    species,
    plane: {
      k: snap(factor * k),
      x: whole.protons * basis.proton,
      y: whole.electrons * basis.electron,
      atoms: whole.atoms,
    },
    ligands: wholeNumbers(ligands, factor),
  };
}

/** The same per atom of the main element, snapped again: the potential of a ligand in a cell where this species holds it. */
export const perAtom = ({ plane: p }: Formation): Plane => ({
  k: Math.round(p.k / p.atoms),
  x: Math.round(p.x / p.atoms),
  y: Math.round(p.y / p.atoms),
  atoms: 1,
});
