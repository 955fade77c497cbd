import type { ChemicalData, Species } from "../species/chemicalData";
import { isSulfate } from "../species/sulfur";

/** Sulfur that never meets sulfate while sulfate reduction is off: sulfide, S(0), sulfite. Own total, none by default. */
export const SULFIDE_SULFUR = "S(sulfide)";

const LIGAND_ELEMENTS: ReadonlySet<string> = new Set(["S", "N", "C", "Cl", "F", "P"]);
/** "other components" of a plan: not ligands of the lixiviant, but partners of jarosites, gypsum, silicates */
const PARTNERS: ReadonlySet<string> = new Set(["K", "Na", "Li", "Mg", "Ca", "Si", "NH3"]);

/** The component through which a species takes its `S`, given whether sulfate reduction is on. */
export const sulfurComponent = (species: Species, sulfateReduction: boolean): string =>
  sulfateReduction || isSulfate(species.formula) ? "S" : SULFIDE_SULFUR;

export type ComponentKind = "ligand" | "partner" | "metal" | "unknown";

/** What a component is to the solver: a ligand, a partner with its own total, or a metal.
 *  @param data  library     @param component  as in components.csv, or `S(sulfide)` */
export function componentKind(data: ChemicalData, component: string): ComponentKind {
  if (component === SULFIDE_SULFUR) return "ligand";
  const entry = data.components.get(component);
  if (!entry || component === "H" || component === "O") return "unknown";
  if (entry.kind === "ligand_group" || LIGAND_ELEMENTS.has(component)) return "ligand";
  return PARTNERS.has(component) ? "partner" : "metal";
}

type Numbers = readonly (readonly [component: string, count: number])[];

const onePool = new WeakMap<Species, Map<string, Numbers>>();
const twoPools = new WeakMap<Species, Map<string, Numbers>>();

/** Composition of a species without its main element, H and O, sulfur named by the pool it belongs to; counted once a species.
 *  @returns  component -> atoms or groups */
export function ligandNumbers(species: Species, main: string, sulfateReduction: boolean): Numbers {
  const counted = sulfateReduction ? onePool : twoPools;
  let ofSpecies = counted.get(species);
  if (ofSpecies === undefined) counted.set(species, (ofSpecies = new Map<string, Numbers>()));
  let numbers = ofSpecies.get(main);
  if (numbers === undefined) ofSpecies.set(main, (numbers = countLigands(species, main, sulfateReduction)));
  return numbers;
}

function countLigands(species: Species, main: string, sulfateReduction: boolean): Numbers {
  const out: [string, number][] = [];
  for (const [component, count] of Object.entries(species.composition)) {
    if (component === main || component === "H" || component === "O") continue;
    out.push([component === "S" ? sulfurComponent(species, sulfateReduction) : component, count]);
  }
  return out;
}

const byMain = new WeakMap<ChemicalData, Map<string, Species[]>>();

/** All species that hold a component, in the order of their ids, so that no tie hangs on the order of a table; indexed once
 *  per library. */
export function speciesHolding(data: ChemicalData, component: string): readonly Species[] {
  let index = byMain.get(data);
  if (!index) {
    index = new Map();
    for (const species of [...data.species.values()].sort((a, b) => (a.id < b.id ? -1 : 1))) {
      for (const part of Object.keys(species.composition)) {
        const list = index.get(part);
        if (list) list.push(species);
        else index.set(part, [species]);
      }
    }
    byMain.set(data, index);
  }
  return index.get(component) ?? [];
}
