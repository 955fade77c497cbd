import type { PresetName } from "../../shared/schemas/plan";
import type { ComponentTotal, ExcludedHazard } from "../../shared/schemas/problem";
import { HCN_PH } from "../../shared/hazards/words";
import type { ChemicalData } from "../../shared/species/chemicalData";

/** Totals a lixiviant preset starts from, as presets.csv gives them. */
export const presetLigands = (data: ChemicalData, preset: PresetName): ComponentTotal[] =>
  data.tables.presets.flatMap((row) =>
    row.preset === preset && row.component !== "" && row.total_activity !== null
      ? [{ component: row.component, activity: row.total_activity }]
      : [],
  );

/** A cyanide liquor is kept at pH 10.5 or above, so that its cyanide does not leave as HCN; a site may set another rule.
 *  @source  common practice (hazards/rules.ts) */
export const cyanideRule: ExcludedHazard = { gas: "HCN", pHAtLeast: HCN_PH };
