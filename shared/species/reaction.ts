import { fail, ok, type Outcome } from "../outcome";
import type { Reaction } from "./chemicalData";

const term = /^(?:(\d+(?:\.\d+)?) )?(\S+\(.+\)|e\^-)$/;

/** Reads a reaction over species ids, `CuO(s) + 2 H^+(aq) = Cu^2+(aq) + H2O(l)`: terms joined by " + ", sides by " = ".
 *  Ids are not looked up here. A species on both sides is netted.
 *  @param text  the reaction     @param path  where it stands, for the failure
 *  @returns  coefficients by id, products positive; BAD_DATA names the term that cannot be read
 *  @source  the notation of shared/data/extrapolation.csv
 *  @example valueOf(parseReaction("CuO(s) + 2 H^+(aq) = Cu^2+(aq) + H2O(l)")).terms.get("H^+(aq)") // => -2 */
export function parseReaction(text: string, path = "reaction"): Outcome<Reaction> {
  const sides = text.split(" = ");
  if (sides.length !== 2) return fail("BAD_DATA", path, `"${text}": a reaction needs two sides joined by " = "`);
  const terms = new Map<string, number>();
  for (const [i, side] of sides.entries()) {
    for (const piece of side.trim().split(" + ")) {
      const [, coefficient, id] = term.exec(piece.trim()) ?? [];
      if (id === undefined) return fail("BAD_DATA", path, `"${piece}" in "${text}" is no term: write "2 H^+(aq)"`);
      const n = (coefficient === undefined ? 1 : Number(coefficient)) * (i === 0 ? -1 : 1);
      terms.set(id, (terms.get(id) ?? 0) + n);
    }
  }
  for (const [id, n] of terms) if (n === 0) terms.delete(id);
  return ok({ terms });
}
