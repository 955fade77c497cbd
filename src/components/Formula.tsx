import { Fragment, memo } from "react";
import { formulaPlain, typeset } from "../../shared/species/typeset";

/** A chemical formula with true sub- and superscripts; read aloud as one word. */
export const Formula = memo(function Formula({ formula, className }: { formula: string; className?: string }) {
  return (
    <span className={className} aria-label={formulaPlain(formula)} role="text" style={{ whiteSpace: "nowrap" }}>
      {typeset(formula).map(({ text, kind }, i) =>
        kind === "sub" ? (
          <sub key={i}>{text}</sub>
        ) : kind === "sup" ? (
          <sup key={i}>{text}</sup>
        ) : (
          <Fragment key={i}>{text}</Fragment>
        ),
      )}
    </span>
  );
});

const phase = /\((aq|s|l|g)(?:,\s*([^)]*))?\)$/;

/** A species id of the library, `Fe(OH)3(s,ferrihydrite)`: the formula set, the name of the solid in words. */
export function SpeciesName({
  id,
  withPhase = false,
  className,
}: {
  id: string;
  withPhase?: boolean;
  className?: string;
}) {
  const match = phase.exec(id);
  const formula = match ? id.slice(0, match.index) : id;
  const [, state, polymorph] = match ?? [];
  return (
    <span className={className}>
      <Formula formula={formula} />
      {withPhase && state && <span className="text-muted">({state})</span>}
      {polymorph && <span className="text-muted"> {polymorph}</span>}
    </span>
  );
}
