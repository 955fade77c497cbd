import { FREE_ACID_BELOW } from "../../../../shared/activity/freeAcid";
import type { PlanInputs, PlanRow } from "../../../../shared/schemas/plan";
import type { Problem } from "../../../../shared/schemas/problem";
import type { Solution } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { api } from "../../../lib/api";
import { toCsv } from "../../../lib/csv";
import { celsius, fixed, significant } from "../../../lib/format";
import { amountWord, lixiviantName, requirementWord, solidsBasisWord } from "../../../lib/planWords";
import type { PotentialScale } from "../../../lib/potential";
import { saveFile, saveJson } from "../../../lib/saveFile";
import { mapContent } from "../../../map/content";
import { drawnMetals } from "../../../map/view";
import { captionedPicture, mapPicture } from "../../../map/picture";
import type { ExportKind } from "../header/WorkspaceHeader";
import { planFile, reactionsTable, sheetQuery } from "./exportReactions";
import { fileStem, limitsTable, polygonsTable, type Table, windowsTable, withOrigin } from "./exports";
import type { MapModel } from "./useMapModel";

export interface Exported {
  plan: Pick<PlanRow, "id" | "name" | "invented">;
  /** "revision 3" or "draft on revision 3" */
  state: string;
  /** the saved one that is shown, or that the draft stands on */
  revision: number;
  scale: Pick<PotentialScale, "reference">;
  inputs: PlanInputs;
  problem: Problem;
  solution: Solution;
  model: MapModel;
  data: ChemicalData;
  /** what the marks of trials mean; null while none is shown */
  trialWords: string | null;
}

/** What a picture rests on: data, temperature, activities, basis; and whether it is invented. */
export function captionLines(exported: Exported): string[] {
  const { plan, state, inputs, solution, model, data, trialWords } = exported;
  const drawn = new Set(drawnMetals(model.view).map(({ element }) => element));
  const unseen = inputs.metals.filter(({ element }) => !drawn.has(element)).map(({ element }) => element);
  const metals = solution.metals.map(({ metal, activity }) => {
    const line = inputs.metals.find((m) => m.element === metal);
    const asks = line
      ? `${line.role === "watched" ? "watched" : requirementWord[line.requirement]}, ${amountWord(line)} `
      : "";
    return `${metal} ${asks}${significant(activity)}`;
  });
  const totals = [...inputs.ligands, ...inputs.others].map((c) => `${c.component} ${significant(c.activity)}`);
  const { freeAcid } = model.asked;
  const pH = solution.windows[model.view.window]?.setPoint.pH;
  const acid =
    freeAcid && pH !== undefined && pH < FREE_ACID_BELOW
      ? `set point pH ${fixed(pH, 2)}, about ${fixed(freeAcid.at(pH).gPerL, 0)} g/L free acid by pK2 and Davies, indicative`
      : null;
  return [
    `${state.charAt(0).toUpperCase()}${state.slice(1)}; chemistry data ${data.version.slice(0, 12)}${plan.invented ? "; invented data" : ""}`,
    `${celsius(solution.temperatureC, 1)}, ${lixiviantName[inputs.preset]}${totals.length > 0 ? ` (totals ${totals.join(", ")} mol/L)` : ""}, solids ${solidsBasisWord[inputs.solidsBasis]}`,
    `activities: ${metals.join("; ")}${unseen.length > 0 ? `; not drawn: ${unseen.join(", ")}` : ""}`,
    ...(trialWords === null || !model.view.layers.trials ? [] : [trialWords]),
    ...(acid === null ? [] : [acid]),
    `Eh vs ${model.view.scale.short}. What can happen, not how fast. Screening only.`,
  ];
}

// The mark in front makes spreadsheets read UTF-8.
function saveTable(name: string, table: Table, { plan, state, data, solution }: Exported): void {
  const T: Record<string, number> = table.header.includes("temperature_C")
    ? {}
    : { temperature_C: solution.temperatureC };
  const invented = plan.invented ? ", invented data" : "";
  const origin = { plan: plan.name, state: `${state}${invented}`, ...T, chemistry_data: data.version.slice(0, 12) };
  const { header, rows } = withOrigin(table, origin);
  saveFile(name, new Blob(["\ufeff", toCsv(header, rows)], { type: "text/csv;charset=utf-8" }));
}

/** Writes one export as a file. */
export async function exportPlan(kind: ExportKind, e: Exported): Promise<void> {
  const stem = fileStem(e.plan.name);
  switch (kind) {
    case "problem":
      return saveJson(`${stem}-problem.json`, e.problem);
    case "solution":
      return saveJson(`${stem}-solution.json`, e.solution);
    case "csv":
      return saveTable(`${stem}-limits.csv`, limitsTable(e.solution.windows, e.model.asked.freeAcid), e);
    case "windows":
      return saveTable(`${stem}-windows.csv`, windowsTable(e.solution), e);
    case "polygons":
      return saveTable(`${stem}-polygons.csv`, polygonsTable(e.solution), e);
    case "reactions": {
      const table = reactionsTable(e);
      if (!table) throw new Error("There is no set point to write reactions at.");
      return saveTable(`${stem}-reactions.csv`, table, e);
    }
    case "plan":
      return saveJson(`${stem}-plan.json`, planFile(e));
    case "sheet": {
      const path = `/plans/${encodeURIComponent(e.plan.id)}/revisions/${e.revision}/window-sheet.pdf${sheetQuery(e)}`;
      return saveFile(`${stem}-window-sheet-revision-${e.revision}.pdf`, await api.file(path));
    }
    case "png":
    case "svg": {
      const wanted = captionedPicture(mapContent(e.model.asked), e.model.view, e.plan.name, captionLines(e));
      return saveFile(`${stem}-map.${kind}`, await mapPicture(wanted, kind));
    }
  }
}
