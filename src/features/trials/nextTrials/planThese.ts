import { referencePotential } from "../../../../shared/electrodes/convert";
import type { ElectrodeSeries } from "../../../../shared/electrodes/series";
import { numberIn } from "../../../../shared/entry/measure";
import type { CampaignRow, CampaignStage } from "../../../../shared/schemas/campaign";
import type { TrialRow } from "../../../../shared/schemas/trial";
import type { OrpReading, Planned } from "../../../../shared/schemas/trialRecord";
import type { TrialListRow } from "../../../../shared/schemas/trialRows";
import type { SolvedRevision } from "../../../lib/solvedRevision";
import { plannedFromPlan } from "../model/fromPlan";
import { isBlank, type TrialValues } from "../model/trialValues";
import { emptyTrial, kindOf, nextCode } from "../plan/newTrial";

/** The conditions all of them share; pH and potential are each trial's own. */
export const sharedConditions = ["temperature", "tenor", "freeAcid", "solids", "p80", "duration"] as const;
export type SharedCondition = (typeof sharedConditions)[number];
export type Conditions = Omit<Planned, "pH" | "orp">;

export interface Prefilled {
  conditions: Conditions;
  /** where each filled one comes from; what is blank has no entry */
  from: Partial<Record<SharedCondition | "ligands" | "cementingMetal", string>>;
}

/** What can be filled in beforehand: temperature, tenor and ligand totals as the plan has them; acid, solids, grind, duration and
 *  cementing metal as in the campaign's last trial of the stage. */
export function prefilled(
  values: TrialValues,
  plan: SolvedRevision,
  stage: CampaignStage,
  last: Pick<TrialRow, "code" | "planned"> | null,
): Prefilled {
  const { pH: _, orp: __, ...ofPlan } = plannedFromPlan(values, plan, 0, stage, null);
  const conditions: Conditions = { ...ofPlan };
  const from: Prefilled["from"] = {};
  for (const key of ["temperature", "tenor"] as const) if (!isBlank(conditions[key])) from[key] = "the plan";
  if (conditions.ligands.length > 0) from.ligands = "the plan";
  if (last === null) return { conditions, from };
  for (const key of sharedConditions)
    if (isBlank(conditions[key]) && !isBlank(last.planned[key])) {
      conditions[key] = last.planned[key];
      from[key] = last.code;
    }
  if (last.planned.cementingMetal !== null) {
    conditions.cementingMetal = last.planned.cementingMetal;
    from.cementingMetal = last.code;
  }
  return { conditions, from };
}

/** A potential as the bench will read it; null where the electrode's own potential is not known at its temperature.
 *  @param Eh  V vs SHE     @param electrodeC  blank: the electrode stands in the liquor     @param liquorC  planned, C */
export function orpAgainst(
  Eh: number,
  electrode: string,
  electrodeC: string,
  liquorC: number,
  electrodes: readonly ElectrodeSeries[],
): OrpReading | null {
  const electrodeTemperature = { text: electrode === "SHE" ? "" : electrodeC, unit: "C" };
  const reading = (volts: number): OrpReading => ({
    value: { text: String(Math.round(volts * 1000)), unit: "mV" },
    electrode,
    electrodeTemperature,
  });
  if (electrode === "SHE") return reading(Eh);
  const series = electrodes.find(({ id }) => id === electrode);
  const offset = series && referencePotential(series, numberIn(electrodeTemperature, "temperature") ?? liquorC);
  return offset?.ok ? reading(Eh - offset.value.E) : null;
}

export interface ToPlan {
  campaign: Pick<CampaignRow, "code">;
  stage: CampaignStage;
  feedId: string;
  /** every code the campaign ever gave */
  codes: readonly string[];
  before: readonly Pick<TrialListRow, "stage" | "kind">[];
  inputs: SolvedRevision["inputs"];
  conditions: Conditions;
  proposals: readonly { pH: number; reason: string; orp: OrpReading }[];
}

/** One planned trial a proposal, coded on from the campaign's last; the reason stands in its notes. */
export function trialsToPlan({ campaign, stage, feedId, before, inputs, conditions, proposals, ...rest }: ToPlan) {
  const codes = [...rest.codes];
  return proposals.map(({ pH, reason, orp }): TrialValues => {
    const code = nextCode(campaign, codes);
    codes.push(code);
    const empty = emptyTrial({ feedId, code, kind: kindOf(stage, before, inputs), stage: stage.code });
    return {
      ...empty,
      notes: `Proposed. ${reason}`,
      planned: { ...conditions, pH: { text: pH.toFixed(2), unit: "pH" }, orp },
    };
  });
}
