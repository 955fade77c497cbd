import { needsPhase, speciesParts } from "../../shared/species/parts";
import { formulaHtml, typeset } from "../../shared/species/typeset";

/** width of one character of the map's type, in ems */
const ADVANCE = 0.6;
const SMALL = 0.7;

/** A species' name for the map, and how wide it will stand.
 *  @param id  as in the tables     @param size  px     @returns  markup for Plotly and a width in px */
export function speciesHtml(id: string, size: number): { html: string; width: number } {
  const parts = speciesParts(id);
  const tail = needsPhase(parts) ? "(aq)" : "";
  const set = typeset(parts.formula);
  const letters = set.reduce((n, p) => n + p.text.length * (p.kind === "plain" ? 1 : SMALL), 0) + tail.length;
  return { html: formulaHtml(parts.formula) + tail, width: letters * ADVANCE * size };
}
