import { FARADAY, GAS_CONSTANT, LN10 } from "../../shared/constants";
import type { Problem } from "../../shared/schemas/problem";
import { library } from "./solver";

/** Invented species that are any plane one likes: k + p RT ln 10 pH + q F Eh per formula unit at 25 C and activity 1, in J/mol.
 *  A solid is uncharged, so that its p and q are the same. */
export interface Wanted {
  name: string;
  phase: "aq" | "s";
  k: number;
  p?: number;
  /** dissolved species only; a solid's is p */
  q?: number;
  /** atoms of the main element, 1 by default */
  atoms?: number;
  /** ligand component -> number */
  ligands?: Record<string, number>;
}

export type Row = NonNullable<Problem["species"]>[number];

const T = 298.15;
/** J/mol a pH unit, and a volt */
export const PROTON = GAS_CONSTANT * T * LN10;
export const ELECTRON = FARADAY;
const WATER = library.species.get("H2O(l)")!.row.dGf_kJ * 1000;

const count = (symbol: string, n: number): string => (n === 0 ? "" : n === 1 ? symbol : `${symbol}${n}`);
const chargeText = (z: number): string =>
  z === 0 ? "" : `^${Math.abs(z) === 1 ? "" : Math.abs(z)}${z > 0 ? "+" : "-"}`;

/** A row of the tables for a wanted plane.
 *  @param main  element, or ligand component, that the species is one of */
export function synthetic(main: string, { name, phase, k, p = 0, q = p, atoms = 1, ligands = {} }: Wanted): Row {
  const O = p < 0 ? Math.ceil(-p / 2) : 0;
  const H = p + 2 * O;
  const parts: [string, number][] = [[main, atoms], ...Object.entries(ligands), ["O", O], ["H", H]];
  const present = parts.filter(([, n]) => n !== 0);
  const charge = p - q;
  const formula = `${present.map(([c, n]) => count(c, n)).join("")}${chargeText(charge)}`;
  return {
    id: `${formula}(${phase},${name})`,
    formula,
    name,
    phase,
    charge,
    composition: present.map(([c, n]) => `${c}:${n}`).join(" "),
    dGf_kJ: (k + O * WATER) / 1000,
    dHf_kJ: null,
    S_J: null,
    Cp_J: null,
    Cp_a: null,
    Cp_b: null,
    Cp_c: null,
    Cp_Tmax_K: null,
    ion_class: null,
    grade: "C",
    source: "invented",
    note: "invented",
  };
}

/** All species of the library that hold one component, H and O alone, and so would share its total. */
export const holdersOf = (component: string): string[] =>
  [...library.species.values()]
    .filter(
      (s) => component in s.composition && Object.keys(s.composition).every((c) => [component, "H", "O"].includes(c)),
    )
    .map((s) => s.id);

/** A question at 25 C, activity 1, about invented species alone; frame and bands in whole numbers, water lines off. */
export function invented(
  metals: Record<string, { requirement: Problem["metals"][number]["requirement"]; species: Wanted[] }>,
  rest: Partial<Problem> = {},
): Problem {
  const rows = Object.entries(metals).flatMap(([element, { species }]) => species.map((s) => synthetic(element, s)));
  return {
    temperatureC: 25,
    metals: Object.entries(metals).map(([element, { requirement }]) => ({ element, requirement, activity: 1 })),
    ligands: [],
    only: rows.map((r) => r.id),
    frame: { pH: [0, 14], Eh: [-1, 1] },
    water: { bound: "none" },
    controlBand: { pH: 1, Eh: 0.1 },
    ...rest,
    species: [...rows, ...(rest.species ?? [])],
  };
}

/** A component whose only species are invented. */
export function inventedLigand(component: string, species: Wanted[]): Pick<Problem, "ligands" | "species" | "leftOut"> {
  return {
    ligands: [{ component, activity: 1 }],
    species: species.map((s) => synthetic(component, s)),
    leftOut: holdersOf(component),
  };
}
