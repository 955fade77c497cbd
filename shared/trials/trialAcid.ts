import { FREE_ACID_BELOW, freeAcidCurve } from "../activity/freeAcid";
import { numberIn } from "../entry/measure";
import { liquorContext } from "../metallurgy/account/liquor";
import type { MolarMasses } from "../metallurgy/molarMass";
import type { PlanInputs } from "../schemas/plan";
import type { Trial } from "../schemas/trial";
import type { LigandTotal } from "../schemas/trialRecord";
import type { ChemicalData } from "../species/chemicalData";
import { ligandTotalIn } from "./ligandTotal";

/** Free acid of a trial whose pH is below 1.5: what the titration found, and what its pH stands for. */
export interface TrialAcid {
  /** g/L H2SO4 in the final liquor, as titrated; null where it was not, or only bounded */
  readonly titrated: number | null;
  /** g/L H2SO4 by pH, sulfate and temperature; null where one of them is not known */
  readonly byPH: number | null;
  /** titrated less by pH; null unless both are there */
  readonly difference: number | null;
  /** mol/L of sulfate that was taken, and whose number it is */
  readonly sulfate: { readonly molPerL: number; readonly from: "measured" | "planned" | "plan" } | null;
  /** why the second number is no more than an order of things; empty where it holds */
  readonly doubts: readonly string[];
}

/** Free acid titrated in a trial's final liquor.
 *  @param trial  record     @param masses  g/mol     @returns  g/L H2SO4; null where it is not among the assays, blank or a limit
 *  @source  the assay of H2SO4 as typed */
export function titratedAcid(trial: Pick<Trial, "charge" | "products">, masses: MolarMasses): number | null {
  const entry = trial.products.finalAssays.find(({ analyte }) => analyte === "H2SO4")?.value;
  return entry ? numberIn(entry, "solutionAssay", liquorContext(trial, "H2SO4", masses, "end")) : null;
}

/** What a trial's plan says of its sulfur. */
export interface AcidPlan {
  /** mol/L; null where it names none */
  readonly sulfate: number | null;
  readonly sulfateReduction: boolean;
}

/** @param inputs  of the plan     @returns  what it says of its sulfur */
export const acidPlan = ({
  ligands,
  sulfateReduction,
}: Pick<PlanInputs, "ligands" | "sulfateReduction">): AcidPlan => ({
  sulfate: ligands.find(({ component }) => component === "S")?.activity ?? null,
  sulfateReduction,
});

export interface AcidTrial {
  readonly planned: { readonly ligands: readonly LigandTotal[] };
  readonly measured: { readonly ligands: readonly LigandTotal[] };
}

const sulfateIn = (list: readonly LigandTotal[], data: ChemicalData, onePool: boolean): number | null => {
  const found = ligandTotalIn(list, "S", data, onePool);
  return found !== null && found.lo === found.hi && found.lo > 0 ? found.lo : null;
};

/** What a pH below 1.5 of a trial is in free acid, beside what was titrated. Neither corrects the other.
 *  @param trial  its ligand totals, measured before planned     @param at  pH and temperature it was held at; pH null: nothing to say
 *  @param titrated  of `titratedAcid`     @param plan  its mol/L of sulfate, where the trial names none, and whether its sulfur is one pool;
 *    null without a plan     @param data  library
 *  @returns  null at pH 1.5 and above, or without a pH     @source  activity/freeAcid.ts; docs/method.md, section 11 */
export function trialAcid(
  trial: AcidTrial,
  at: { readonly pH: number | null; readonly temperatureC: number | null },
  titrated: number | null,
  plan: AcidPlan | null,
  data: ChemicalData,
): TrialAcid | null {
  const { pH, temperatureC } = at;
  if (pH === null || pH >= FREE_ACID_BELOW) return null;
  const onePool = plan?.sulfateReduction ?? false;
  const candidates = [
    ["measured", sulfateIn(trial.measured.ligands, data, onePool)],
    ["planned", sulfateIn(trial.planned.ligands, data, onePool)],
    ["plan", plan?.sulfate ?? null],
  ] as const;
  const [from, molPerL = null] = candidates.find(([, total]) => total !== null) ?? [];
  const sulfate = from === undefined || molPerL === null ? null : { molPerL, from };
  const curve = sulfate && temperatureC !== null ? freeAcidCurve(data, sulfate.molPerL, temperatureC) : null;
  if (!curve?.ok) return { titrated, byPH: null, difference: null, sulfate, doubts: [] };
  const { gPerL, withinDavies, withinSulfate } = curve.value.at(pH);
  const byPH = withinSulfate ? gPerL : null;
  return {
    titrated,
    byPH,
    difference: titrated === null || byPH === null ? null : titrated - byPH,
    sulfate,
    doubts: [
      ...(withinDavies ? [] : ["the ionic strength is beyond what the activity coefficients hold for"]),
      ...(withinSulfate ? [] : ["this pH takes more acid than the sulfate balances"]),
    ],
  };
}
