import type { CampaignStage } from "../../shared/schemas/campaign";
import type { PlanInputs } from "../../shared/schemas/plan";
import type { MapTrial, MapTrials } from "../../shared/schemas/trialRows";
import type { Solution } from "../../shared/solution";
import type { ChemicalData } from "../../shared/species/chemicalData";
import { comparable, type Comparability } from "../../shared/trials/comparable";
import { judge, type Judgement } from "../../shared/trials/judge";
import { countOf, type Count } from "../../shared/trials/tally";

/** A trial with its place on one map: judged against the solution shown, not against the one it was laid out on. */
export interface PlacedTrial extends MapTrial {
  campaignCode: string;
  stageOf: CampaignStage;
  judgement: Judgement | null;
  comparability: Comparability;
  count: Count;
}

export interface JudgedAgainst {
  inputs: Pick<PlanInputs, "temperatureC" | "metals" | "ligands" | "ionicStrength" | "controlBand">;
  /** null where the plan cannot be solved: nothing is placed then */
  solution: Solution | null;
  data: ChemicalData;
}

/** A trial judged where it stands.
 *  @param inputs, solution, data  of the revision or draft shown */
export function placed(
  trial: MapTrial,
  campaignCode: string,
  stage: CampaignStage,
  { inputs, solution, data }: JudgedAgainst,
): PlacedTrial {
  const { pH, Eh, EhUncertainty, temperatureC } = trial.figures;
  const judgement =
    solution === null || pH === null || Eh === null
      ? null
      : judge({ pH, Eh, EhUncertainty: EhUncertainty ?? 0 }, solution, inputs.controlBand);
  const comparability = comparable(trial.compared, temperatureC, stage, inputs as PlanInputs, data);
  const count = countOf({ ...trial, judgement, comparability });
  return { ...trial, campaignCode, stageOf: stage, judgement, comparability, count };
}

/** All trials of a map's answer judged; those of a stage their campaign no longer names are left out.
 *  @param against  what a campaign's trials are judged against; undefined leaves them out */
export function placedTrials(
  { rows, campaigns }: MapTrials,
  against: (campaignId: string) => JudgedAgainst | undefined,
): PlacedTrial[] {
  const known = new Map(
    campaigns.map(({ id, code, stages }) => [id, { code, stages: new Map(stages.map((s) => [s.code, s])) }]),
  );
  return rows.flatMap((row) => {
    const campaign = known.get(row.campaignId);
    const stage = campaign?.stages.get(row.stage);
    const ground = against(row.campaignId);
    return campaign && stage && ground ? [placed(row, campaign.code, stage, ground)] : [];
  });
}
