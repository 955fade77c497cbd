import { measure } from "../entry/measure";
import type { Interval } from "../entry/interval";
import { liquorContext } from "../metallurgy/account/liquor";
import { say } from "../metallurgy/account/words";
import { gammaOf } from "../plan/toProblem";
import type { CampaignStage } from "../schemas/campaign";
import type { SolutionAssay } from "../schemas/entry";
import type { PlanInputs, PlanMetal } from "../schemas/plan";
import type { ComparedTrial } from "../schemas/trialRows";
import type { ChemicalData } from "../species/chemicalData";
import { ligandTotalIn } from "./ligandTotal";

/** How far a trial may stand from the plan before its place on the plan's map means little: common practice, no source. */
const MOST_KELVIN = 5;
const MOST_FACTOR = 3;

/** Whether two temperatures count as one.
 *  @param a, b  C     @source  common practice, no source */
export const sameTemperature = (a: number, b: number): boolean => Math.abs(a - b) <= MOST_KELVIN;

export interface Comparability {
  /** false: drawn open and counted apart */
  readonly comparable: boolean;
  /** why not, each with both values */
  readonly reasons: readonly string[];
  /** what could not be compared, and is therefore not held against the trial */
  readonly unknown: readonly string[];
}

/** Where two intervals come closest, how far apart they are as a factor. */
const factorBetween = (a: Interval, b: number): number => (b < a.lo ? a.lo / b : b > a.hi ? b / a.hi : 1);

const tenorIn = (
  assays: readonly SolutionAssay[],
  trial: ComparedTrial,
  metal: string,
  data: ChemicalData,
  when: "start" | "end",
) => {
  const entry = assays.find(({ analyte }) => analyte === metal)?.value;
  const found = entry && measure(entry, "solutionAssay", liquorContext(trial, metal, data.molarMass, when));
  return found?.kind === "value" ? found.value : null;
};

/** Up to here an activity at gamma 1 says the tenor within the factor allowed: at 0.02 mol/L of MSO4 (I = 0.08) Davies gives 0.40. */
const DILUTE_MOL = 0.02;

/** Whether gamma is no more than the 1 that stands where nobody gave one. */
const gammaLeftAtOne = ({ gammaFrom, gamma }: PlanMetal, ionicStrength: number | null): boolean =>
  gammaFrom === "typed" ? gamma === null : gammaFrom === "one" || ionicStrength === null;

/** Tenor that a line of a plan stands for.
 *  @param line  metal     @param inputs  of the revision     @param data  library
 *  @returns  g/L: as entered, else the activity over its gamma; null where gamma was left at 1 and the activity is not dilute: in a
 *            strong sulfate liquor it is a small part of the tenor, so that it says nothing of it
 *  @source  common practice, no source; docs/decisions/0009-comparable-trials.md */
export function tenorOfLine(
  line: PlanMetal,
  { ionicStrength, temperatureC }: Pick<PlanInputs, "ionicStrength" | "temperatureC">,
  data: ChemicalData,
): number | null {
  if (line.entry === "gPerL") return line.value;
  const mass = data.molarMass.get(line.element);
  if (mass === undefined || (gammaLeftAtOne(line, ionicStrength) && line.value > DILUTE_MOL)) return null;
  return (line.value / gammaOf(data, line, ionicStrength, temperatureC)) * mass;
}

/** Tenor the plan stands for: in g/L as entered; else what the trial was laid out on; else what its activity says. In a
 *  cementation the plan's activity is what may be left, so that only the trial's own planned tenor counts. */
function plannedTenor(trial: ComparedTrial, target: string, inputs: PlanInputs, data: ChemicalData): number | null {
  const line = inputs.metals.find((m) => m.element === target);
  if (trial.kind === "leach" && line?.entry === "gPerL") return line.value;
  const own = measure(trial.planned.tenor, "solutionAssay", liquorContext(trial, target, data.molarMass, "end"));
  if (own.kind === "value") return own.value.lo;
  return trial.kind === "leach" && line !== undefined ? tenorOfLine(line, inputs, data) : null;
}

/** What stands against the plan's tenor: in a leach what the liquor could carry, so that a poor recovery does not excuse itself,
 *  else what it does carry; in a cementation what it carried at the start. */
function tenorOf(trial: ComparedTrial, target: string, data: ChemicalData): Interval | null {
  if (trial.kind === "cementation") return tenorIn(trial.charge.liquorAssays, trial, target, data, "start");
  const { couldCarry } = trial;
  if (couldCarry !== undefined && couldCarry !== null) return { lo: couldCarry, hi: couldCarry };
  return tenorIn(trial.products.finalAssays, trial, target, data, "end");
}

/** Whether a trial may be judged on a plan's map: within 5 K, and within a factor 3 in the target's tenor and in each ligand's
 *  total. A plan's totals are activities; where the trial was laid out on a total of its own, that one counts.
 *  @param trial  record     @param temperatureC  measured, C; null where not recorded     @param stage  its stage
 *  @param inputs  of the revision shown     @param data  library     @returns  the verdict with its reasons
 *  @source  common practice, no source; docs/decisions/0009-comparable-trials.md */
export function comparable(
  trial: ComparedTrial,
  temperatureC: number | null,
  stage: CampaignStage,
  inputs: PlanInputs,
  data: ChemicalData,
): Comparability {
  const reasons: string[] = [];
  const unknown: string[] = [];
  if (temperatureC === null) unknown.push("temperature not recorded");
  else if (!sameTemperature(temperatureC, inputs.temperatureC))
    reasons.push(`${say(temperatureC)} °C, the plan ${say(inputs.temperatureC)} °C: more than ${MOST_KELVIN} K apart`);

  const { target } = stage;
  const tenor = tenorOf(trial, target, data);
  const wanted = plannedTenor(trial, target, inputs, data);
  if (tenor === null || wanted === null)
    unknown.push(`${target} tenor ${tenor === null ? "not assayed" : "not planned"}`);
  else if (factorBetween(tenor, wanted) > MOST_FACTOR)
    reasons.push(
      `${target} ${say(tenor.lo, 3)} g/L, the plan ${say(wanted, 3)} g/L: more than a factor ${MOST_FACTOR} apart`,
    );

  const onRecord = (list: ComparedTrial["measured"]["ligands"], component: string) =>
    ligandTotalIn(list, component, data, inputs.sulfateReduction);
  for (const { component, activity } of inputs.ligands) {
    const found = onRecord(trial.measured.ligands, component);
    const laidOut = onRecord(trial.planned.ligands, component)?.lo ?? activity;
    if (found === null) unknown.push(`${component} total not measured`);
    else if (factorBetween(found, laidOut) > MOST_FACTOR)
      reasons.push(
        `${component} ${say(found.lo, 3)} mol/L, the plan ${say(laidOut, 3)} mol/L: more than a factor ${MOST_FACTOR} apart`,
      );
  }
  return { comparable: reasons.length === 0, reasons, unknown };
}
