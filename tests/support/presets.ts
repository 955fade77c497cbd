import type { Problem } from "../../shared/schemas/problem";
import { library } from "./solver";

export interface PresetChoice {
  ligands: { component: string; activity: number }[];
  leftOut: string[];
}

/** Rows of presets.csv as ligands and left-out species. */
export function presetChoice(name: string, totals: Readonly<Record<string, number>> = {}): PresetChoice {
  const rows = library.tables.presets.filter((r) => r.preset === name);
  if (rows.length === 0) throw new Error(`no preset ${name}`);
  const ligands = new Map<string, number>();
  for (const r of rows) if (r.component !== "" && r.total_activity !== null) ligands.set(r.component, r.total_activity);
  for (const [component, activity] of Object.entries(totals)) ligands.set(component, activity);
  return {
    ligands: [...ligands].map(([component, activity]) => ({ component, activity })),
    leftOut: rows[0]!.exclude_ids.split(";").filter((id) => id !== ""),
  };
}

export const presetsOfData = [...new Set(library.tables.presets.map((r) => r.preset))];

export const reductionOf = (preset: string): Pick<Problem, "sulfateReduction"> => ({
  sulfateReduction: preset === "sulfate_sulfide",
});
