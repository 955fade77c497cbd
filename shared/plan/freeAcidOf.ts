import { freeAcidCurve, type FreeAcidCurve } from "../activity/freeAcid";
import type { PlanInputs } from "../schemas/plan";
import type { ChemicalData } from "../species/chemicalData";

/** Free acid against pH for a plan's liquor.
 *  @param data  library     @param liquor  totals and temperature of a plan     @returns  the curve; null without sulfate
 *  @source  activity/freeAcid.ts */
export function freeAcidOf(
  data: ChemicalData,
  { ligands, temperatureC }: Pick<PlanInputs, "ligands" | "temperatureC">,
): FreeAcidCurve | null {
  const sulfate = ligands.find((l) => l.component === "S")?.activity;
  if (sulfate === undefined) return null;
  const curve = freeAcidCurve(data, sulfate, temperatureC);
  return curve.ok ? curve.value : null;
}
