import { Fragment } from "react";
import { formulaIn } from "../../shared/species/inProse";
import { MINUS } from "../lib/format";
import { Formula } from "./Formula";

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
