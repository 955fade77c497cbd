import { formulaIn } from "../../../shared/species/inProse";
import { needsPhase, speciesParts } from "../../../shared/species/parts";
import { typeset } from "../../../shared/species/typeset";
import type { ReactionTerm } from "../../../shared/solution";
import { fixed, MINUS, scientificParts, THIN_SPACE } from "../../../shared/words/numbers";
import { tenorParts } from "../../../shared/words/tenor";
import type { Inline, Piece } from "./pen";

/** A formula with true sub- and superscripts. */
export const formula = (text: string): Piece[] =>
  typeset(text).map(({ text: part, kind }) => (kind === "plain" ? { text: part } : { text: part, rise: kind }));

/** A species of the library: the formula set, the phase where it is not told by the charge, the name of the solid. */
export function speciesName(id: string): Inline {
  const parts = speciesParts(id);
  const phase = parts.phase === "s" || parts.phase === "l" || parts.phase === "g" || needsPhase(parts);
  return [formula(parts.formula), phase ? `(${parts.phase})` : "", parts.form ? `\u00a0${parts.form}` : ""];
}

/** Prose in which every formula is set. */
export const prose = (text: string): Inline =>
  text.split(/(\s+)/).map((word): Inline => {
    const found = formulaIn(word);
    if (word === "mg/m3") return ["mg/m", { text: "3", rise: "sup" }];
    if (!found) return word.replace(/^([([]?)-(?=\d)/, `$1${MINUS}`);
    const [before, body, phase, after] = found;
    return [before, formula(body), phase, after];
  });

/** "8.0×10⁻²", plain where that reads better; the unit behind a thin space. */
export function quantity(value: number, unit = "", figures = 2): Inline {
  const { sign, mantissa, exponent } = scientificParts(value, figures);
  return [
    { text: `${sign}${mantissa}`, face: "mono" },
    exponent === null
      ? ""
      : [
          { text: "×10", face: "mono" },
          { text: exponent, rise: "sup", face: "mono" },
        ],
    unit === "" ? "" : `${THIN_SPACE}${unit}`,
  ];
}

/** A tenor in the unit the trade would take. */
export function tenor(gPerL: number, figures = 3): Inline {
  const { text, unit } = tenorParts(gPerL, figures);
  return [{ text, face: "mono" }, `${THIN_SPACE}${unit}`];
}

const amount = (n: number): string =>
  Math.abs(n) === 1 ? "" : `${fixed(Math.abs(n), Number.isInteger(n) ? 0 : 2)}${THIN_SPACE}`;

const half = (terms: readonly ReactionTerm[]): Inline =>
  terms.map((term, i): Inline => [i > 0 ? " + " : "", amount(term.coefficient), formula(term.formula)]);

/** A balanced reaction, from the window's side to what lies beyond. */
export const reaction = (terms: readonly ReactionTerm[]): Inline => [
  half(terms.filter((t) => t.coefficient < 0)),
  " → ",
  half(terms.filter((t) => t.coefficient > 0)),
];

const months = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];
/** "1 Dec 2026, 08:30 UTC": the same on every machine. */
export function moment(iso: string): string {
  const at = new Date(iso);
  return `${at.getUTCDate()} ${months[at.getUTCMonth()]} ${at.getUTCFullYear()}, ${at.toISOString().slice(11, 16)} UTC`;
}

export const joined = (parts: readonly Inline[], by = ", "): Inline =>
  parts.map((part, i): Inline => [i > 0 ? by : "", part]);
