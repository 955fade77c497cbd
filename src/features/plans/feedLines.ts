import type { ChemicalData } from "../../../shared/species/chemicalData";
import { SUGGESTED_EXTRACTION, tenorFromHead, type HeadOf, type SuggestedLine } from "../../../shared/plan/fromFeed";

/** A metal of the new plan as it stands in the table. */
export interface ShownLine extends SuggestedLine {
  head: HeadOf;
  gPerL: number;
  /** the tenor was typed over, so that head and extraction no longer make it */
  typedTenor: boolean;
}

/** What the user changed of a line. */
export type LineEdit = Partial<Pick<SuggestedLine, "role" | "extraction" | "drawn">> & { gPerL?: number };
export type LineEdits = Readonly<Record<string, LineEdit>>;

/** A suggestion with what the user changed; another role brings its own extraction, a tenor typed over stays. */
export function lineOf(
  suggested: SuggestedLine,
  heads: readonly HeadOf[],
  solids: number,
  edit: LineEdit = {},
): ShownLine {
  const role = edit.role ?? suggested.role;
  const extraction = edit.extraction ?? SUGGESTED_EXTRACTION[role];
  const head = heads.find((h) => h.element === suggested.element)!;
  const tenor = Number(tenorFromHead(head.head, solids, extraction).toPrecision(3));
  return {
    element: suggested.element,
    role,
    extraction,
    drawn: edit.drawn ?? suggested.drawn,
    head,
    gPerL: edit.gPerL ?? Math.min(1000, Math.max(1e-9, tenor)),
    typedTenor: edit.gPerL !== undefined,
  };
}

/** Sulfate that comes with the metals dissolved, one to a metal, as MSO4; never less than the preset's total.
 *  @returns  mol/L, two figures */
export function sulfateBrought(lines: readonly ShownLine[], data: ChemicalData, least: number): number {
  const brought = lines
    .filter((l) => l.drawn && l.role !== "gangue")
    .reduce((sum, { element, gPerL }) => sum + gPerL / (data.molarMass.get(element) ?? Infinity), 0);
  return Math.min(100, Number(Math.max(least, brought).toPrecision(2)));
}
