import { Fragment, memo } from "react";
import type { ReactionTerm } from "../../../../shared/solution";
import { Link } from "react-router-dom";
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
        {term.species === "e^-" ? (
          <Formula formula={term.formula} />
        ) : (
          <Link
            to={`/chemistry/${encodeURIComponent(term.species)}`}
            title={`${term.species}: its row of the library`}
            className="relative no-underline hover:underline"
          >
            <Formula formula={term.formula} />
          </Link>
        )}
      </span>
    </Fragment>
  ));
}

/** A balanced reaction, typeset, from the window's side to what lies beyond; each species leads to its row of the library. */
export const Reaction = memo(function Reaction({ terms }: { terms: readonly ReactionTerm[] }) {
  return (
    <span className="font-sans">
      <Half terms={terms.filter((t) => t.coefficient < 0)} />
      <span className="font-mono"> → </span>
      <Half terms={terms.filter((t) => t.coefficient > 0)} />
    </span>
  );
}, sameReaction);

/** Every solution brings terms of its own; most of them say the same. */
function sameReaction(
  { terms: a }: { terms: readonly ReactionTerm[] },
  { terms: b }: { terms: readonly ReactionTerm[] },
) {
  return (
    a.length === b.length &&
    a.every((term, i) => term.species === b[i]?.species && term.coefficient === b[i]?.coefficient)
  );
}
