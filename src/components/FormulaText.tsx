import { Fragment } from "react";
import { parseFormula } from "../../shared/species/formula";
import { MINUS } from "../lib/format";
import { Formula } from "./Formula";

/** `Cu(NH3)4^2+(aq)`, in the middle of a sentence: bracket and comma before and behind are not part of it. */
const token = /^([([]?)(.+?)(\((?:aq|s|l|g)(?:,[^)]*)?\))?([\]),.;:]*)$/;
/** codes of sources look like formulas: BF01, PIC07 */
const code = /^[A-Z]{2,}\d{2}[a-z]?$/;

function formulaIn(word: string): [before: string, formula: string, phase: string, after: string] | null {
  const [, before = "", body = "", phase = "", after = ""] = token.exec(word) ?? [];
  if (!/\d|\^/.test(body) || code.test(body) || !parseFormula(body).ok) return null;
  return [before, body, phase, after];
}

/** Prose and reactions from the tables, with every formula in it typeset: "Cu^2+ + 2 OH^- = Cu(OH)2(s)". */
export function FormulaText({ text }: { text: string }) {
  return (
    <>
      {text.split(/(\s+)/).map((word, i) => {
        const found = formulaIn(word);
        if (!found) return <Fragment key={i}>{word.replace(/^([([]?)-(?=\d)/, `$1${MINUS}`)}</Fragment>;
        const [before, formula, phase, after] = found;
        return (
          <Fragment key={i}>
            {before}
            <Formula formula={formula} />
            {phase && <span className="text-muted">{phase}</span>}
            {after}
          </Fragment>
        );
      })}
    </>
  );
}
