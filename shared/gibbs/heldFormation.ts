import type { ChemicalData, Species } from "../species/chemicalData";
import { isSulfate } from "../species/sulfur";

type Partners = readonly (readonly [id: string, n: number])[];

/** Free form of each ligand; every other component but H and O counts as the element in its reference state. */
const freeForm: Readonly<Record<string, string>> = {
  Cl: "Cl^-(aq)",
  F: "F^-(aq)",
  C: "CO3^2-(aq)",
  N: "NO3^-(aq)",
  P: "PO4^3-(aq)",
  NH3: "NH3(aq)",
  CN: "CN^-(aq)",
  S2O3: "S2O3^2-(aq)",
  SCN: "SCN^-(aq)",
  GLY: "C2H4NO2^-(aq)",
  OX: "C2O4^2-(aq)",
};

/** Sulfate sulfur as the ion, any other as the element. */
const freeFormOf = (component: string, formula: string): string | undefined =>
  component === "S" && isSulfate(formula) ? "SO4^2-(aq)" : freeForm[component];

/** The element in its reference state: one component, and nothing to form. */
function referenceOf(data: ChemicalData, component: string): Species | undefined {
  for (const species of data.species.values()) {
    const { phase, composition, row } = species;
    if (
      phase !== "aq" &&
      row.dGf_kJ === 0 &&
      row.dHf_kJ === 0 &&
      Object.keys(composition).length === 1 &&
      component in composition
    )
      return species;
  }
  return undefined;
}

/** What a species without any temperature data is counted from, so that its dG can be held: its elements in their reference states, free
 *  ligands, H2O, H^+ (zero, left out) and e^- (half of H2 less H^+).
 *  @param data  the library     @param species  to be formed
 *  @returns  partners and how many of each make one of the species; the electrons as H2(g)
 *  @throws Error where a component has no free form in the library
 *  @source  docs/method.md, section 1: a choice, no source */
export function heldFormation(data: ChemicalData, species: Species): Partners {
  const partners = new Map<string, number>();
  const open = new Map<string, number>(Object.entries(species.composition));
  let charge = species.charge;
  const take = (from: Species, n: number) => {
    partners.set(from.id, (partners.get(from.id) ?? 0) + n);
    for (const [c, m] of Object.entries(from.composition)) open.set(c, (open.get(c) ?? 0) - n * m);
    charge -= n * from.charge;
  };
  for (const [component, n] of Object.entries(species.composition)) {
    if (component === "H" || component === "O") continue;
    const free = freeFormOf(component, species.formula);
    const from = free === undefined ? referenceOf(data, component) : data.species.get(free);
    if (from === undefined) throw new Error(`${species.id}: no free form of ${component} to count it from`);
    take(from, n / (from.composition[component] ?? 1));
  }
  const water = data.species.get("H2O(l)");
  if (water !== undefined) take(water, open.get("O") ?? 0);
  // The hydrogen still open is H^+; what charge is then missing is made of electrons, and e^- is half of H2 less H^+.
  const protons = open.get("H") ?? 0;
  const electrons = protons - charge;
  if (electrons !== 0) partners.set("H2(g)", (partners.get("H2(g)") ?? 0) + electrons / 2);
  return [...partners].filter(([, n]) => n !== 0);
}
