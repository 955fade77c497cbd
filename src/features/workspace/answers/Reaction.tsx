import { Fragment } from "react";
import type { ReactionTerm } from "../../../../shared/solution";
import { Formula } from "../../../components/Formula";
import { fixed } from "../../../lib/format";

const amount = (n: number): string =>
  Math.abs(n) === 1 ? "" : `${fixed(Math.abs(n), Number.isInteger(n) ? 0 : 2)}\u2009`;

function Half({ terms }: { terms: readonly ReactionTerm[] }) {
  return terms.map((term, i) => (
    <Fragment key={term.species}>
      {i > 0 && " + "}
      <span className="whitespace-nowrap">
        {amount(term.coefficient)}
        <Formula formula={term.formula} />
      </span>
    </Fragment>
  ));
}

/** A balanced reaction, typeset, from the window's side to what lies beyond. */
export function Reaction({ terms }: { terms: readonly ReactionTerm[] }) {
  return (
    <span className="font-sans">
      <Half terms={terms.filter((t) => t.coefficient < 0)} />
      <span className="font-mono"> → </span>
      <Half terms={terms.filter((t) => t.coefficient > 0)} />
    </span>
  );
}
