import { FARADAY } from "../constants";
import { davies, daviesSlope } from "../activity/davies";
import type { PlanInputs, PlanMetal, PlanTotal, PresetName } from "../schemas/plan";
import type { Problem } from "../schemas/problem";
import { kelvin } from "../units";
import { SULFIDE_SULFUR } from "../selection/components";
import type { ChemicalData } from "../species/chemicalData";

/** Eh of an acid leach with air in it, V: by it the simple ion is chosen that the liquor holds. */
const AERATED = 0.7;

/** Charge of the simple ion a tenor's gamma is meant for: of the ions of the element alone the one that is stable at 0.7 V and 25 C,
 *  Fe^2+, Cu^2+, Ag^+, Cr^3+.
 *  @param data  library     @param element  metal     @returns  charge number, 0 without a simple ion
 *  @source  lowest dGf - z F E; common practice, no source, for the Eh
 *  @example simpleIonCharge(chemistry(), "Ag") // => 1 */
export function simpleIonCharge(data: ChemicalData, element: string): number {
  let charge = 0;
  let least = Infinity;
  for (const s of data.species.values()) {
    if (s.phase !== "aq" || s.charge === 0 || Object.keys(s.composition).length > 1 || s.composition[element] !== 1)
      continue;
    const cost = s.row.dGf_kJ * 1000 - s.charge * FARADAY * AERATED;
    if (cost < least) [charge, least] = [s.charge, cost];
  }
  return charge;
}

/** Activity coefficient of a metal line of a plan: 1, Davies at the plan's ionic strength, or typed.
 *  @param data  library     @param metal  line of the plan     @param ionicStrength  mol/kg or null (gamma 1)     @param temperatureC  C
 *  @returns  gamma; Davies is flagged beyond 0.5 mol/kg by the screen     @source  activity/davies.ts */
export function gammaOf(data: ChemicalData, metal: PlanMetal, ionicStrength: number | null, temperatureC = 25): number {
  if (metal.gammaFrom === "typed") return metal.gamma ?? 1;
  if (metal.gammaFrom === "davies" && ionicStrength !== null)
    return davies(simpleIonCharge(data, metal.element), ionicStrength, 0.3, daviesSlope(kelvin(temperatureC)));
  return 1;
}

/** What a problem needs of its plan to go to another temperature. */
export type Gammas = Pick<PlanInputs, "metals" | "ionicStrength">;

/** A plan's problem at another temperature: the activity coefficients by Davies follow it, all else stands.
 *  @param problem  of `toProblem`     @param gammas  of the same plan; none: gamma stands     @param data  library
 *  @returns  the problem at a temperature, C     @source  gammaOf */
export const atTemperature =
  (problem: Problem, gammas: Gammas | undefined, data: ChemicalData) =>
  (temperatureC: number): Problem => ({
    ...problem,
    temperatureC,
    metals: problem.metals.map((m) => {
      const line = gammas?.metals.find((l) => l.element === m.element);
      return line === undefined || m.gPerL === undefined
        ? m
        : { ...m, gamma: gammaOf(data, line, gammas?.ionicStrength ?? null, temperatureC) };
    }),
  });

/** Species a lixiviant preset leaves out (presets.csv). Where sulfur is to change state after all, the list of the full
 *  sulfur preset stands in for that of sulfate. */
export function presetLeavesOut(data: ChemicalData, preset: PresetName, fullSulfur: boolean): readonly string[] {
  const name = preset === "sulfate" && fullSulfur ? "sulfate_sulfide" : preset;
  const row = data.tables.presets.find((r) => r.preset === name);
  return (row?.exclude_ids ?? "").split(";").filter((id) => id !== "");
}

const total = ({ component, activity }: PlanTotal) => ({ component, activity });

/** The solver's question behind a plan.
 *  @param inputs  of a revision or a draft     @param data  library     @returns  a problem; the solver validates it
 *  @source  presets.csv for what the lixiviant leaves out, but for minerals of the feed, what is put back, and reagents dosed;
 *           the plan's own list comes last */
export function toProblem(inputs: PlanInputs, data: ChemicalData): Problem {
  const fullSulfur = inputs.sulfateReduction || inputs.ligands.some((l) => l.component === SULFIDE_SULFUR);
  const dosed = new Set(inputs.dosed.map((reagent) => `unless_dosed:${reagent}`));
  const reagents = data.tables.defaults.filter((r) => dosed.has(r.when)).map((r) => r.id);
  const kept = new Set([...inputs.putBack, ...inputs.feedMinerals, ...reagents]);
  const leftOut = new Set([
    ...presetLeavesOut(data, inputs.preset, fullSulfur).filter((id) => data.species.has(id) && !kept.has(id)),
    ...inputs.leftOut.map((l) => l.species),
  ]);
  return {
    temperatureC: inputs.temperatureC,
    metals: inputs.metals.map((m) => ({
      element: m.element,
      role: m.role,
      requirement: m.requirement,
      ...(m.entry === "activity"
        ? { activity: m.value }
        : { gPerL: m.value, gamma: gammaOf(data, m, inputs.ionicStrength, inputs.temperatureC) }),
    })),
    ligands: inputs.ligands.map(total),
    others: inputs.others.map(total),
    sulfateReduction: inputs.sulfateReduction,
    solidsBasis: inputs.solidsBasis,
    feedMinerals: inputs.feedMinerals,
    dosed: inputs.dosed,
    leftOut: [...leftOut],
    putBack: inputs.putBack,
    frame: inputs.frame,
    water: inputs.water,
    controlBand: inputs.controlBand,
    ...(inputs.excludedHazards?.length ? { excludedHazards: inputs.excludedHazards } : {}),
  };
}
