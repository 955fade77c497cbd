import { needsPhase, speciesParts } from "../../shared/species/parts";
import { type FormulaPart, typeset } from "../../shared/species/typeset";

/** width of one character of the map's type, in ems */
const ADVANCE = 0.6;
/** size of what stands below or above the line */
export const SMALL = 0.7;

export const plainText = (text: string): FormulaPart[] => [{ text, kind: "plain" }];

/** How wide a text will stand in the map's type, px. */
export const textWidth = (parts: readonly FormulaPart[], size: number): number =>
  parts.reduce((n, p) => n + p.text.length * (p.kind === "plain" ? 1 : SMALL), 0) * ADVANCE * size;

/** Every name is set once: a map names the same few dozen species at each step of a drag. */
const set = new Map<string, readonly FormulaPart[]>();

/** A species' name for the map.
 *  @param id  as in the tables     @returns  its parts, typeset; a neutral dissolved species says so */
export function speciesText(id: string): readonly FormulaPart[] {
  const known = set.get(id);
  if (known) return known;
  const parts = speciesParts(id);
  const text = [...typeset(parts.formula), ...(needsPhase(parts) ? plainText("(aq)") : [])];
  set.set(id, text);
  return text;
}
