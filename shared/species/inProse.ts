import { parseFormula } from "./formula";

/** `Cu(NH3)4^2+(aq)`, in the middle of a sentence: bracket and comma before and behind are not part of it. */
const token = /^([([]?)(.+?)(\((?:aq|s|l|g)(?:,[^)]*)?\))?([\]),.;:]*)$/;
/** codes of sources look like formulas: BF01, PIC07 */
const code = /^[A-Z]{2,}\d{2}[a-z]?$/;

/** The formula in a word of prose, with what stands before and behind it; null where the word holds none.
 *  @param word  without spaces     @returns  bracket in front, formula, phase, punctuation behind
 *  @example formulaIn("Fe(OH)3(s),")?.length // => 4 */
export function formulaIn(word: string): [before: string, formula: string, phase: string, after: string] | null {
  const [, before = "", body = "", phase = "", after = ""] = token.exec(word) ?? [];
  if (!/\d|\^/.test(body) || code.test(body) || !parseFormula(body).ok) return null;
  return [before, body, phase, after];
}
