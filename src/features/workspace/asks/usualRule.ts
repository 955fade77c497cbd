import type { HazardGas } from "../../../../shared/hazards/gases";
import { usualThreshold } from "../../../../shared/hazards/thresholds";
import { HCN_PH } from "../../../../shared/hazards/words";
import type { ExcludedHazard } from "../../../../shared/schemas/problem";

/** How a gas is kept out unless somebody says otherwise: cyanide by its pH, the rest by what is immediately dangerous. */
export const usualRule = (gas: HazardGas): ExcludedHazard =>
  gas === "HCN" ? { gas, pHAtLeast: HCN_PH } : { gas, bar: usualThreshold[gas].bar };
