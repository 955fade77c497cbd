import { memo, type ReactNode } from "react";
import { Link } from "react-router-dom";
import { type Source, sourcePath, sources } from "../lib/sources";
import { SpeciesName } from "./Formula";

const quiet = "underline decoration-rule underline-offset-3 hover:decoration-ink";

/** Leads to the paragraph of the method or the data that a line rests on. */
export const MethodLink = memo(function MethodLink({ to, children }: { to: Source; children?: ReactNode }) {
  const [document, , words] = sources[to];
  return (
    <Link
      to={sourcePath(to)}
      className={`touch-word no-print whitespace-nowrap ${quiet}`}
      {...(children === undefined
        ? { "aria-label": `The ${document}: ${words}`, title: `The ${document}: ${words}` }
        : {})}
    >
      {children ?? document}
    </Link>
  );
});

/** A species' name that leads to its row of the library: values, source and grade. */
export const SpeciesLink = memo(function SpeciesLink({ id, withPhase = false }: { id: string; withPhase?: boolean }) {
  return (
    <Link
      to={`/chemistry/${encodeURIComponent(id)}`}
      title="Its row of the library, with source and grade"
      className="relative no-underline hover:underline"
    >
      <SpeciesName id={id} withPhase={withPhase} />
    </Link>
  );
});
