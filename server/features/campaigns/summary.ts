import type { ElectrodeSeries } from "../../../shared/electrodes/series";
import type { CampaignRow, CampaignStage } from "../../../shared/schemas/campaign";
import type { CampaignPairAnswer, CampaignSummaryAnswer, SummaryHead } from "../../../shared/schemas/campaignSummary";
import type { MapTrial } from "../../../shared/schemas/trialRows";
import { comparable, type Comparability } from "../../../shared/trials/comparable";
import { judge, type Judgement } from "../../../shared/trials/judge";
import { campaignPair } from "../../../shared/trials/pair";
import { campaignSummary, type SummarisedTrial } from "../../../shared/trials/summary";
import type { Db } from "../../db/open";
import { storedPlan } from "../plans/rows";
import { pointsOf } from "../trials/points";
import type { Workings } from "../trials/workedOut";
import { campaignOf } from "./rows";
import type { RevisionSolver, SolvedRevision } from "./solved";

function judgementOf(
  { figures: { pH, Eh, EhUncertainty } }: MapTrial,
  { solution, revision }: SolvedRevision,
): Judgement | null {
  if (!solution.ok || pH === null || Eh === null) return null;
  return judge({ pH, Eh, EhUncertainty: EhUncertainty ?? 0 }, solution.value, revision.inputs.controlBand);
}

function comparabilityOf(
  { compared, figures }: MapTrial,
  stage: CampaignStage,
  { data, revision }: SolvedRevision,
): Comparability {
  if (!data.ok) return { comparable: true, reasons: [], unknown: [data.error.message] };
  return comparable(compared, figures.temperatureC, stage, revision.inputs, data.value);
}

interface Side {
  head: SummaryHead;
  campaign: CampaignRow;
  trials: SummarisedTrial[];
}

function feedsOf(trials: readonly SummarisedTrial[]): SummaryHead["feeds"] {
  const counted = new Map<string, SummaryHead["feeds"][number]>();
  for (const { feedId: id, feedName: name, status } of trials) {
    if (status === "rejected") continue;
    counted.set(id, { id, name, n: (counted.get(id)?.n ?? 0) + 1 });
  }
  return [...counted.values()].sort((p, q) => q.n - p.n || p.name.localeCompare(q.name));
}

/** A campaign's trials judged against the plan revision it was laid out on. */
function sideOf(db: Db, solved: RevisionSolver, id: string, path: string): Side {
  const campaign = campaignOf(db, id, path);
  const against = solved(campaign.planId, campaign.planRevision);
  const { revision, solution } = against;
  const stages = new Map(campaign.stages.map((stage) => [stage.code, stage]));
  const trials = pointsOf(db, [id]).flatMap((point): SummarisedTrial[] => {
    const stage = stages.get(point.stage);
    if (!stage) return [];
    const judgement = judgementOf(point, against);
    return [{ ...point, kind: point.compared.kind, judgement, comparability: comparabilityOf(point, stage, against) }];
  });
  const { code, title, question, projectId, projectName, invented, planId } = campaign;
  return {
    campaign,
    trials,
    head: {
      campaign: { id, code, title, question, projectId, projectName, invented },
      plan: {
        id: planId,
        name: storedPlan(db, planId).name,
        revision: revision.number,
        dataVersion: revision.dataVersion,
        temperatureC: revision.inputs.temperatureC,
        windows: solution.ok ? solution.value.windows.length : 0,
        failure: solution.ok ? null : solution.error.message,
      },
      feeds: feedsOf(trials),
    },
  };
}

/** @throws Refusal NOT_FOUND */
export function summaryOf(db: Db, solved: RevisionSolver, id: string): CampaignSummaryAnswer {
  const { head, campaign, trials } = sideOf(db, solved, id, "id");
  return { ...head, stages: campaignSummary(campaign, trials) };
}

/** "Ag/AgCl 3 mol/L KCl" for its id, so that a list of electrodes parts them by commas. */
const withNames = (side: Side, electrodes: readonly ElectrodeSeries[]): Side => {
  const names = new Map(electrodes.map(({ id, label }) => [id, label.replaceAll(", ", " ")]));
  const named = (id: string | null) => (id === null ? null : (names.get(id) ?? id));
  return { ...side, trials: side.trials.map((trial) => ({ ...trial, electrode: named(trial.electrode) })) };
};

/** @throws Refusal NOT_FOUND */
export function pairOf(
  db: Db,
  solved: RevisionSolver,
  { electrodes }: Pick<Workings, "electrodes">,
  { a, b }: { a: string; b: string },
): CampaignPairAnswer {
  const [left, right] = [sideOf(db, solved, a, "a"), sideOf(db, solved, b, "b")].map((side) =>
    withNames(side, electrodes),
  ) as [Side, Side];
  const { stages, cautions } = campaignPair(left, right);
  return { left: left.head, right: right.head, stages, cautions };
}
