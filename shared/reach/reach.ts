import { FARADAY, GAS_CONSTANT, LN10 } from "../constants";
import type { PlanInputs, PresetName } from "../schemas/plan";
import type { ChemicalData } from "../species/chemicalData";
import { kelvin } from "../units";
import { type EquilibriumLine, equilibriumLine } from "./equilibrium";
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

/** One reagent of the map: what it commonly shows in the liquor, and where its couple would stand. */
export interface Reach {
  reagent: Reagent;
  /** V vs SHE; null where no range is on record for this liquor */
  practical: readonly [lo: number, hi: number | null] | null;
  /** null without a couple */
  line: EquilibriumLine | null;
}

/** What the reagents named can bring a liquor to, in the order of the table.
 *  @param data  the library     @param ids  reagent ids     @param preset, temperatureC  of the liquor, C     @returns  V vs SHE at T */
export const reachesOf = (
  data: ChemicalData,
  ids: readonly string[],
  preset: PresetName,
  temperatureC: number,
): Reach[] =>
  reagents
    .filter((r) => ids.includes(r.id))
    .map((reagent) => ({
      reagent,
      practical: reagent.reached && reagent.reachedIn.includes(preset) ? reagent.reached : null,
      line: equilibriumLine(data, reagent, temperatureC),
    }));

/** Where the couple of a reagent would stand at a pH with every activity one, V vs SHE; null without a couple. */
export const standsAt = ({ line }: Pick<Reach, "line">, pH: number): number | null =>
  line && line.intercept + line.slope * pH;
