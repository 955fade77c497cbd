import type { SpeciesRow } from "../../../shared/schemas/chemistry";
import type { SpeciesEditRow } from "../../../shared/schemas/speciesEdit";
import { parseFormula } from "../../../shared/species/formula";
import { MINUS } from "../../lib/format";

/** The numbers of a row, in the order in which one doubts them. */
export const numbers = [
  { key: "dGf_kJ", label: "G of formation", unit: "kJ/mol" },
  { key: "dHf_kJ", label: "H of formation", unit: "kJ/mol" },
  { key: "S_J", label: "Entropy", unit: "J/(mol K)" },
  { key: "Cp_J", label: "Heat capacity", unit: "J/(mol K)" },
  { key: "Cp_a", label: "Cp polynomial, a", unit: "J/(mol K)" },
  { key: "Cp_b", label: "b", unit: "J/(mol K²)" },
  { key: "Cp_c", label: "c", unit: "J K/mol" },
  { key: "Cp_Tmax_K", label: "valid to", unit: "K" },
] as const satisfies { key: keyof SpeciesRow; label: string; unit: string }[];
export type NumberKey = (typeof numbers)[number]["key"];

export const blankSpecies: SpeciesRow = {
  id: "",
  formula: "",
  name: "",
  phase: "aq",
  charge: 0,
  composition: "",
  dGf_kJ: Number.NaN,
  dHf_kJ: null,
  S_J: null,
  Cp_J: null,
  Cp_a: null,
  Cp_b: null,
  Cp_c: null,
  Cp_Tmax_K: null,
  ion_class: null,
  grade: "C",
  source: "",
  note: "",
};

/** What follows from a formula: its id, its charge, and its composition while nobody wrote another. */
export function fromFormula(row: SpeciesRow, formula: string, solid: string): SpeciesRow {
  const parsed = parseFormula(formula);
  const id = `${formula}(${row.phase}${solid === "" ? "" : `,${solid}`})`;
  if (!parsed.ok) return { ...row, formula, id };
  const { charge } = parsed.value;
  const own = row.composition === "" || row.composition === compositionOf(row.formula);
  return { ...row, formula, id, charge, composition: own ? compositionOf(formula) : row.composition };
}

export function compositionOf(formula: string): string {
  const parsed = parseFormula(formula);
  return parsed.ok ? Object.entries(parsed.value.atoms).map(([symbol, n]) => `${symbol}:${n}`).join(" ") : ""; // prettier-ignore
}

export interface Difference {
  label: string;
  from: string;
  to: string;
}

const shown = (x: number | null | undefined, unit: string) =>
  x === null || x === undefined || Number.isNaN(x) ? "not known" : `${String(x).replace("-", MINUS)} ${unit}`;

/** What an edit changed against the row it lies on. */
export function differencesOf(before: SpeciesRow | null, { row }: Pick<SpeciesEditRow, "row">): Difference[] {
  const changed: Difference[] = numbers.flatMap(({ key, label, unit }) =>
    (before?.[key] ?? null) === row[key]
      ? []
      : [{ label, from: before ? shown(before[key], unit) : "", to: shown(row[key], unit) }],
  );
  for (const key of ["name", "composition", "ion_class", "grade", "source", "note"] as const)
    // A source given in full stands above; its code is made by the library.
    if (!(key === "source" && row.source === "") && (before?.[key] ?? "") !== (row[key] ?? ""))
      changed.push({
        label: key === "ion_class" ? "class of ion" : key,
        from: String(before?.[key] ?? ""),
        to: String(row[key] ?? ""),
      });
  return changed;
}

/** A refusal of the core in the words of the form: "ZnO(s), dGf_kJ: -300 differs … from dHf_kJ and S_J" names columns. */
export const inFormWords = (message: string): string =>
  message
    .replace(/^[^,]+(?:,[^,)]*\))?, \w+: /, "")
    .replaceAll("dGf_kJ", "G")
    .replaceAll("dHf_kJ", "H")
    .replaceAll("S_J", "S")
    .replaceAll("-", MINUS);

/** Field of the form that a refusal's path means: "row.dGf_kJ" → "dGf_kJ". */
export const fieldOf = (path: string): string => path.replace(/^row\./, "");
