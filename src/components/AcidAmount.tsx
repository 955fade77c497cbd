import { fixed, THIN_SPACE } from "../lib/format";
import { Formula } from "./Formula";

export const acidFigures = (gPerL: number): string => fixed(gPerL, Math.abs(gPerL) < 9.95 ? 1 : 0);

/** Free acid worked out from pH: two figures and the word that says how sure they are. */
export function AcidAmount({ gPerL, sure = false }: { gPerL: number; sure?: boolean }) {
  return (
    <span className="font-mono whitespace-nowrap">
      {sure ? "" : "about "}
      {acidFigures(gPerL)}
      {THIN_SPACE}g/L <Formula formula="H2SO4" />
    </span>
  );
}
