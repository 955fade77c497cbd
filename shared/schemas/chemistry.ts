import { z } from "./z";

/** Empty cell of a table (blanks are empty too) means "unknown", never zero. */
const empty = (v: unknown): boolean => v === undefined || (typeof v === "string" && v.trim() === "");
const optionalNumber = z.preprocess((v) => (empty(v) ? null : v), z.coerce.number().nullable());
const requiredNumber = z.preprocess((v) => (empty(v) ? Number.NaN : v), z.coerce.number());
const text = z.string();

export const phases = ["aq", "s", "l", "g"] as const;
export const ionClasses = ["cation", "anion", "oxyanion", "acid_oxyanion"] as const;
export const grades = ["A", "B", "C"] as const;

/** One row of species-*.csv, in the columns of the tables (see docs/data.md). */
export const speciesRow = z.object({
  id: text.min(1),
  formula: text.min(1),
  name: text,
  phase: z.enum(phases),
  charge: z.coerce.number().int(),
  /** `Cu:1 NH3:4` over components plus H and O */
  composition: text.min(1),
  dGf_kJ: requiredNumber,
  dHf_kJ: optionalNumber,
  S_J: optionalNumber,
  Cp_J: optionalNumber,
  Cp_a: optionalNumber,
  Cp_b: optionalNumber,
  Cp_c: optionalNumber,
  Cp_Tmax_K: optionalNumber,
  ion_class: z.preprocess((v) => (empty(v) ? null : v), z.enum(ionClasses).nullable()),
  grade: z.enum(grades),
  source: text,
  note: text,
});
export type SpeciesRow = z.infer<typeof speciesRow>;

export const elementRow = z.object({
  symbol: text,
  name: text,
  molar_mass_g_mol: requiredNumber,
  reference_state: text,
  S_element_J_mol_K: optionalNumber,
  source: text,
});
export const componentRow = z.object({
  component: text,
  kind: z.enum(["element", "ligand_group"]),
  elements: text,
  note: text,
});
export const referenceRow = z.object({ code: text, citation: text });
export const correspondenceRow = z.object({
  ion_class: text,
  T_C: requiredNumber,
  T_K: requiredNumber,
  a_T_J_mol_K: optionalNumber,
  b_T: optionalNumber,
  S_abs_H_J_mol_K: optionalNumber,
  status: text,
  grade: text,
  source: text,
  note: text,
});
export const extrapolationRow = z.object({
  id: text,
  hold: z.enum(["logK", "dG", "none"]),
  reaction: text,
  logK_25: optionalNumber,
  note: text,
});
export const presetRow = z.object({
  preset: text,
  component: text,
  total_activity: optionalNumber,
  exclude_ids: text,
  note: text,
});
export const defaultRow = z.object({ id: text, when: text, reason: text });
export const solidsBasisRow = z.object({
  id: text,
  fresh: z.enum(["in", "out"]),
  below_C: optionalNumber,
  reason: text,
});
export const electrodeRow = z.object({
  id: text,
  kind: text,
  name: text,
  filling_or_solution: text,
  T_C: requiredNumber,
  E_mV: requiredNumber,
  versus: text,
  source: text,
  grade: text,
  note: text,
});

/** The chemistry library as plain rows: what the server stores, serves and freezes with a revision. */
export const chemicalTables = z.object({
  /** content hash of the tables; a revision of a plan names the one it used */
  version: text,
  elements: z.array(elementRow),
  components: z.array(componentRow),
  species: z.array(speciesRow),
  references: z.array(referenceRow),
  correspondence: z.array(correspondenceRow),
  extrapolation: z.array(extrapolationRow),
  presets: z.array(presetRow),
  defaults: z.array(defaultRow),
  solidsBasis: z.array(solidsBasisRow),
  electrodes: z.array(electrodeRow),
});
export type ChemicalTables = z.infer<typeof chemicalTables>;
export type TableName = Exclude<keyof ChemicalTables, "version">;

/** Which files of shared/data make which table. */
export const tableFiles: Record<TableName, readonly string[]> = {
  elements: ["elements.csv"],
  components: ["components.csv"],
  species: ["species-ligands.csv", "species-base-metals.csv", "species-gangue-precious.csv"],
  references: ["references.csv"],
  correspondence: ["criss-cobble.csv"],
  extrapolation: ["extrapolation.csv"],
  presets: ["presets.csv"],
  defaults: ["defaults.csv"],
  solidsBasis: ["solids-basis.csv"],
  electrodes: ["electrodes.csv"],
};
