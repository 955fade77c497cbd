import { FARADAY, GAS_CONSTANT, LN10 } from "../constants";
import type { PlanInputs, PresetName } from "../schemas/plan";
import { kelvin } from "../units";
import { type Couple, type Reagent, reagents } from "./reagents";

/** Nernst line of a couple with every activity one: E0 - (R T ln 10 / F)(h / n) pH, E0 held at its 25 C value.
 *  @param couple  E0 in V vs SHE     @param pH  at T     @param temperatureC  C, 0 to 150     @returns  V vs SHE
 *  @source  Nernst equation; the temperature moves the slope alone, E0 does not follow it
 *  @example equilibriumEh({ oxidised: "O2", reduced: "H2O", E0: 1.229, electrons: 4, protons: 4 }, 7, 25) // => 0.8149 */
export function equilibriumEh(couple: Couple, pH: number, temperatureC: number): number {
  const decade = (GAS_CONSTANT * kelvin(temperatureC) * LN10) / FARADAY;
  return couple.E0 - decade * (couple.protons / couple.electrons) * pH;
}

/** Reagents shown before the user chooses: what is common in the liquor, or the cementing metals where a metal is to be won as metal. */
export function usualReagents(inputs: Pick<PlanInputs, "preset" | "metals">): string[] {
  const cements = inputs.metals.some((m) => m.requirement === "metal");
  if (cements) {
    const carried = new Set(inputs.metals.filter((m) => m.requirement === "dissolved").map((m) => m.element));
    // Zinc liquors are cleaned with zinc: a second metal would only foul them.
    return carried.has("Zn")
      ? ["zinc-dust"]
      : inputs.preset === "cyanide"
        ? ["zinc-dust"]
        : ["iron-scrap", "zinc-dust"];
  }
  return [...(usual[inputs.preset] ?? [])];
}

const usual: Record<PresetName, readonly string[]> = {
  sulfate: ["air", "manganese-dioxide", "peroxide"],
  sulfate_sulfide: ["air", "ferric", "sulfide"],
  chloride: ["air", "cupric-chloride", "chlorine"],
  ammonia: ["air"],
  ammonia_carbonate: ["air"],
  cyanide: ["air"],
  carbonate: ["air", "peroxide"],
  thiosulfate_ammonia: ["air"],
  glycine: ["air", "peroxide"],
  water: ["air", "ferric", "peroxide"],
};

export interface Reach {
  reagent: Reagent;
  /** V vs SHE; null where no range is on record for this liquor */
  reached: readonly [lo: number, hi: number | null] | null;
  /** V vs SHE at the pH asked; null without a couple */
  equilibrium: number | null;
}

/** What each reagent named can bring the slurry to at one pH, in the order of the table.
 *  @param ids  reagent ids     @param pH  where the equilibrium is read     @returns  V vs SHE */
export function reachAt(ids: readonly string[], preset: PresetName, pH: number, temperatureC: number): Reach[] {
  return reagents
    .filter((r) => ids.includes(r.id))
    .map((reagent) => ({
      reagent,
      reached: reagent.reached && reagent.reachedIn.includes(preset) ? reagent.reached : null,
      equilibrium: reagent.couple ? equilibriumEh(reagent.couple, pH, temperatureC) : null,
    }));
}

/** holds: the practical range spans the set point; inside: it enters the window but not at the set point; short: it does not get that far;
 *  beyond: it goes past the window; equilibrium-only: no practical range on record for the liquor. */
export type ReachVerdict = "holds" | "inside" | "short" | "beyond" | "equilibrium-only" | "unknown";

/** How a practical range stands to the potentials a window allows at the set point's pH. An oxidant is short when its range ends below
 *  the window, a reductant when its range ends above it.
 *  @param allowed  V vs SHE, lower and upper end of the window on that line     @param target  V vs SHE
 *  @returns  a verdict, and the overlap of range and window in V vs SHE */
export function judgeReach(
  reach: Reach,
  allowed: readonly [number, number],
  target: number,
): { verdict: ReachVerdict; overlap: [number, number] | null } {
  if (reach.reached === null)
    return { verdict: reach.equilibrium === null ? "unknown" : "equilibrium-only", overlap: null };
  const [lo, hi] = [reach.reached[0], reach.reached[1] ?? Number.POSITIVE_INFINITY];
  const below = hi < allowed[0];
  if (below || lo > allowed[1]) {
    const oxidises = reach.reagent.kind === "oxidant";
    return { verdict: below === oxidises ? "short" : "beyond", overlap: null };
  }
  return {
    verdict: target >= lo && target <= hi ? "holds" : "inside",
    overlap: [Math.max(lo, allowed[0]), Math.min(hi, allowed[1])],
  };
}
