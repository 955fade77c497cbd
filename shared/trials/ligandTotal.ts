import type { Interval } from "../entry/interval";
import { measure } from "../entry/measure";
import { gramsPerMole } from "../plan/totals";
import type { LigandTotal } from "../schemas/trialRecord";
import { SULFIDE_SULFUR } from "../selection/components";
import type { ChemicalData } from "../species/chemicalData";

/** A ligand's total on a trial's record, in mol/L. Grams are weighed as those of a plan: sulfate for S, carbonate for C (plan/totals.ts);
 *  where the plan lets sulfate be reduced, S is all sulfur and weighed as S.
 *  @param list  totals of the record     @param component  as the plan names it     @param data  library, for molar masses
 *  @param sulfateReduction  as the trial's plan has it: all sulfur is one pool
 *  @returns  mol/L, both ends the same unless "<" or ">"; null where it is not on record, blank, or cannot be used
 *  @source  `gramsPerMole`, a plan's */
export function ligandTotalIn(
  list: readonly LigandTotal[],
  component: string,
  data: ChemicalData,
  sulfateReduction: boolean,
): Interval | null {
  const entry = list.find((l) => l.component === component)?.value;
  if (entry === undefined) return null;
  if (!data.components.has(component) && component !== SULFIDE_SULFUR) return null;
  const molarMass = gramsPerMole(data, component, sulfateReduction);
  const found = measure(entry, "solutionAssay", { molarMass });
  return found.kind === "value" ? { lo: found.value.lo / molarMass, hi: found.value.hi / molarMass } : null;
}
