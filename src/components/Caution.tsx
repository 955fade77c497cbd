import type { ReactNode } from "react";
import { LIMITS_ARE, SCREENING } from "../../shared/hazards/deference";
import { FormulaText } from "./FormulaText";

/** A caution beside the number that calls for it: a bar in the signal colour, text, and the deference wording.
 *  Formulas in plain text are typeset. */
export function Caution({
  title,
  children,
  limits = false,
  defer = true,
}: {
  title?: string;
  children: ReactNode;
  /** true where exposure limits are quoted */
  limits?: boolean;
  /** false only where a neighbouring caution already carries the wording */
  defer?: boolean;
}) {
  return (
    <aside role="note" className="border-l-4 border-signal bg-sheet px-3 py-2 text-sm">
      {title !== undefined && <p className="font-bold">{title}</p>}
      <div>{typeof children === "string" ? <FormulaText text={children} /> : children}</div>
      {defer && (
        <p className="mt-1 text-xs text-muted">
          {SCREENING}
          {limits && ` ${LIMITS_ARE}`}
        </p>
      )}
    </aside>
  );
}
