import { massOf } from "../metallurgy/molarMass";
import type { ChemicalData, Species } from "../species/chemicalData";
import type { Coefficients } from "./halfReaction";
import type { RedoxReagent } from "./redoxReagents";

export const acids = { H2SO4: 2, HCl: 1, HNO3: 1, CH3SO3H: 1 } as const;
export const bases = { CaO: 2, "Ca(OH)2": 2, CaCO3: 2, MgO: 2, NaOH: 1, Na2CO3: 2, NH3: 1 } as const;
export type Acid = keyof typeof acids;
export type Base = keyof typeof bases;

/** What brings a ligand into the liquor, and how many units of the ligand one of it holds. Sulfate comes with the acid. */
const carriers: Readonly<Record<string, { formula: string; holds: number }>> = {
  CN: { formula: "NaCN", holds: 1 },
  NH3: { formula: "NH3", holds: 1 },
  C: { formula: "Na2CO3", holds: 1 },
  Cl: { formula: "NaCl", holds: 1 },
  S2O3: { formula: "Na2S2O3", holds: 1 },
  SCN: { formula: "NaSCN", holds: 1 },
  GLY: { formula: "C2H5NO2", holds: 1 },
  OX: { formula: "H2C2O4", holds: 1 },
  "S(sulfide)": { formula: "NaHS", holds: 1 },
  K: { formula: "K2SO4", holds: 2 },
  Na: { formula: "Na2SO4", holds: 2 },
};

export interface Amount {
  /** formula as weighed */
  readonly formula: string;
  /** mol per mol of the mineral, metal or ion the reaction starts from */
  readonly molPerMol: number;
  /** kg per kg of the metal counted; null where it holds none */
  readonly kgPerKgMetal: number | null;
  /** kg per tonne of the pure mineral, metal or ion */
  readonly kgPerTonne: number;
}
export interface Demand extends Amount {
  readonly role: "acid" | "base" | "ligand" | "salt" | RedoxReagent["role"];
  /** "made": the reaction gives it back */
  readonly direction: "used" | "made";
}

/** H^+ that an acid must bring to one run of the reaction; below zero the reaction makes acid. Bisulfate is sulfate with its proton still to
 *  give; a ligand counts from the form it is sold in, so that cyanide drawn as HCN asks for no acid less.
 *  @param data  the library     @param reaction  coefficients     @returns  mol     @source  proton balance */
export function acidNeeded(data: ChemicalData, reaction: Coefficients): number {
  let protons = 0;
  for (const [id, n] of reaction) {
    const species = data.species.get(id);
    if (species === undefined) continue;
    if (id === "H^+(aq)") protons -= n;
    else if (id === "OH^-(aq)") protons += n;
    else if (id === "HSO4^-(aq)" || (id === "H2S(aq)" && n < 0)) protons -= n;
    else if (n < 0) protons -= n * spareProtons(species);
  }
  return protons === 0 ? 0 : protons;
}

/** Protons a ligand carries beyond the form it is sold in. */
function spareProtons({ composition, charge }: Species): number {
  const parts = Object.keys(composition).filter((c) => c !== "H" && c !== "O");
  if (parts.length !== 1) return 0;
  const [component = ""] = parts;
  const soldCharge: Readonly<Record<string, number>> = { CN: -1, NH3: 0, C: -2, S2O3: -2, SCN: -1, GLY: 0, OX: 0 };
  const sold = soldCharge[component];
  return sold === undefined ? 0 : charge - sold * (composition[component] ?? 1);
}

interface Question {
  readonly from: Species;
  /** element or component whose kg are counted */
  readonly metal: string;
  readonly reaction: Coefficients;
  readonly redox: RedoxReagent | null;
  readonly acid: Acid;
  readonly base: Base;
  /** the reaction is written with OH^- */
  readonly basic: boolean;
  /** component -> species that holds it as ligand */
  readonly ligands: ReadonlyMap<string, string>;
}

/** Amounts per mole, per kg of metal, per tonne. */
function amounts(data: ChemicalData, { from, metal, reaction }: Question): (formula: string, mol: number) => Amount {
  const runs = -(reaction.get(from.id) ?? -1);
  const ownMass = massOf(from.formula, data.molarMass);
  const held = from.composition[metal] ?? 0;
  return (formula, mol) => {
    const grams = (massOf(formula, data.molarMass) * mol) / runs;
    return {
      formula,
      molPerMol: mol / runs,
      kgPerKgMetal: held === 0 ? null : grams / (held * massOf(metal, data.molarMass)),
      kgPerTonne: (1000 * grams) / ownMass,
    };
  };
}

/** Reagents one reaction takes or gives back: acid or base, oxidant, reductant or cementing metal, ligands.
 *  @param data  the library     @param question  the balanced reaction and what its parts are     @returns  one row a reagent, used first
 *  @source  stoichiometry of the balanced reaction; molar masses of elements.csv */
export function demandOf(data: ChemicalData, question: Question): Demand[] {
  const { reaction, redox, ligands } = question;
  const amount = amounts(data, question);
  const rows: Demand[] = [];
  const protons = acidNeeded(data, reaction);
  const { acid, base, basic } = question;
  const asAcid = amount(acid, Math.abs(protons) / acids[acid]);
  const asBase = amount(base, Math.abs(protons) / bases[base]);
  // Nobody is told to add acid to a basic liquor, which may hold cyanide: what uses acid there makes base.
  if (protons > 0 && basic) rows.push({ ...asBase, role: "base", direction: "made" });
  if (protons > 0 && !basic) rows.push({ ...asAcid, role: "acid", direction: "used" });
  if (protons < 0 && !basic) rows.push({ ...asAcid, role: "acid", direction: "made" });
  if (protons < 0) rows.push({ ...asBase, role: "base", direction: "used" });
  const taken = redox === null ? 0 : -(reaction.get(redox.used) ?? 0);
  if (redox?.sold && taken > 0)
    rows.push({ ...amount(redox.sold.formula, taken / redox.sold.holds), role: redox.role, direction: "used" });
  for (const [component, id] of ligands) {
    const n = reaction.get(id) ?? 0;
    const carrier = carriers[component];
    const held = data.species.get(id)?.composition[component === "S(sulfide)" ? "S" : component] ?? 0;
    if (n >= 0 || carrier === undefined || id === question.from.id || id === redox?.used) continue;
    const role = carrier.holds > 1 ? "salt" : "ligand";
    // Hydrochloric acid brings its own chloride.
    const brought = component === "Cl" && acid === "HCl" && !basic ? Math.max(0, protons) : 0;
    const mol = Math.max(0, -n * held - brought) / carrier.holds;
    if (mol > 0) rows.push({ ...amount(carrier.formula, mol), role, direction: "used" });
  }
  return rows;
}

/** What the reaction makes, by weight: residues, products, gases; water, H^+ and OH^- left away.
 *  @param data  the library     @param question  as `demandOf`     @returns  one row a species     @source  stoichiometry */
export function madeBy(data: ChemicalData, question: Question): (Amount & { species: string })[] {
  const amount = amounts(data, question);
  return [...question.reaction].flatMap(([id, n]) => {
    const species = data.species.get(id);
    if (species === undefined || n <= 0 || ["H2O(l)", "H^+(aq)", "OH^-(aq)"].includes(id)) return [];
    return [{ species: id, ...amount(species.formula, n) }];
  });
}
