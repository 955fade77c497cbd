import { exactly, minus, plus, times, type Interval } from "../../entry/interval";
import type { Trial } from "../../schemas/trial";
import { acidDemand, ferricDemand, stoichiometricRatio } from "../cementation";
import type { MolarMasses } from "../molarMass";
import { reagentUse } from "./reagentUse";

/** A share of the cementing metal consumed. */
export interface ConsumedShare {
  /** a metal won, `Fe(III)`, `H2SO4`, or null for what nothing explains: air, and dust lost */
  readonly by: string | null;
  /** g of cementing metal */
  readonly grams: Interval;
  readonly note: string;
}

/** Where the consumed cementing metal went: metals won, ferric iron, free acid, and the rest.
 *  @param trial  record; ferric iron as `Fe(III)`, free acid as `H2SO4` in the assays     @param cementing  element
 *  @param consumed  g     @param won  g of each metal     @param masses  g/mol     @returns  g, the unexplained last
 *  @source  practice-checks.json, F15 */
export function consumedSplit(
  trial: Trial,
  cementing: string,
  consumed: number,
  won: readonly { metal: string; won: Interval }[],
  masses: MolarMasses,
): ConsumedShare[] {
  const shares: ConsumedShare[] = won.map(({ metal, won: grams }) => ({
    by: metal,
    grams: times(grams, stoichiometricRatio(cementing, metal, masses)),
    note: "won",
  }));
  for (const [by, demand] of [
    ["Fe(III)", ferricDemand(cementing, masses)],
    ["H2SO4", acidDemand(cementing, masses)],
  ] as const) {
    const use = reagentUse(trial, by, 0, masses);
    if (use.listed === false) continue;
    // Never assayed at the end: anything from none to all of it was used up.
    const used = use.consumed.value ?? (use.available && { lo: 0, hi: use.available.hi });
    if (!used) continue;
    const open = use.consumed.value === null;
    shares.push({
      by,
      grams: times({ lo: Math.max(0, used.lo), hi: Math.max(0, used.hi) }, demand),
      note: open
        ? "not assayed at the end: from none to all of it"
        : by === "H2SO4"
          ? "dissolved by free acid, with hydrogen"
          : "ferric iron reduced",
    });
  }
  const rest = minus(exactly(consumed), plus(...shares.map((s) => s.grams)));
  return [...shares, { by: null, grams: rest, note: "not explained by the assays: air, other metals, dust lost" }];
}
