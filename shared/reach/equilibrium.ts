import { FARADAY, GAS_CONSTANT, LN10 } from "../constants";
import { reactionAtT } from "../reactions/atTemperature";
import { redoxReagentById } from "../reactions/redoxReagents";
import type { ChemicalData } from "../species/chemicalData";
import { kelvin } from "../units";
import type { Reagent } from "./reagents";

/** Eh = intercept + slope pH, every activity one and gases at 1 bar; V vs SHE at T. */
export interface EquilibriumLine {
  readonly intercept: number;
  readonly slope: number;
  /** "library": E0 at T from the library's G; "handbook": E0 of 25 C, only the slope follows T */
  readonly from: "library" | "handbook";
}

/** Equilibrium line of a reagent's couple: what it would give if it were reversible, which in a slurry it seldom is.
 *  @param data  the library     @param reagent  of the table     @param temperatureC  C, 0 to 250
 *  @returns  the line; null for a reagent without a couple     @source  Nernst equation; E0(T) of the half-reaction in reactions/redoxReagents
 *  @example equilibriumLine(chemistry(), reagentById.get("air"), 25).intercept // => 1.229
 *  @example equilibriumLine(chemistry(), reagentById.get("manganese-dioxide"), 25).slope // => -0.118 */
export function equilibriumLine(data: ChemicalData, reagent: Reagent, temperatureC: number): EquilibriumLine | null {
  const decade = (GAS_CONSTANT * kelvin(temperatureC) * LN10) / FARADAY;
  const half = redoxReagentById.get(reagent.id)?.half;
  const values =
    half && [...half.keys()].every((id) => id === "e^-" || data.species.has(id))
      ? reactionAtT(data, { species: Object.fromEntries(half), temperatureC })
      : null;
  if (half !== undefined && values?.ok && values.value.E0_V !== null) {
    const ratio = (half.get("H^+(aq)") ?? 0) / (half.get("e^-") ?? 1);
    return { intercept: values.value.E0_V, slope: -decade * ratio, from: "library" };
  }
  const { couple } = reagent;
  if (couple === undefined) return null;
  return { intercept: couple.E0, slope: (-decade * couple.protons) / couple.electrons, from: "handbook" };
}
