import { and, asc, eq, getTableColumns, inArray, isNull } from "drizzle-orm";
import type { z } from "zod";
import type { MapTrial, MapTrials, mapTrialsQuery } from "../../../shared/schemas/trialRows";
import type { Db } from "../../db/open";
import { campaigns } from "../campaigns/schema";
import { feeds } from "../feeds/schema";
import { storedPlan } from "../plans/rows";
import { trials } from "./schema";
import { figuresOf } from "./workedOut";

type Query = z.output<typeof mapTrialsQuery>;

/** Which campaigns a map shows: the named ones of the plan's project, else those laid out on the plan, else all of the project. */
function campaignsOf(db: Db, planId: string, { campaignIds, scope }: Query): MapTrials["campaigns"] {
  const { projectId } = storedPlan(db, planId);
  const chosen = campaignIds
    ? inArray(campaigns.id, campaignIds)
    : scope === "plan"
      ? eq(campaigns.planId, planId)
      : undefined;
  return db
    .select({
      id: campaigns.id,
      code: campaigns.code,
      title: campaigns.title,
      planId: campaigns.planId,
      planRevision: campaigns.planRevision,
      stages: campaigns.stages,
    })
    .from(campaigns)
    .where(and(eq(campaigns.projectId, projectId), isNull(campaigns.deletedAt), chosen))
    .orderBy(asc(campaigns.code))
    .all();
}

/** What a point is made of: reading a whole row takes twice as long. */
const { id, code, campaignId, stage, status, feedId, startedAt, electrode, compared, ...others } =
  getTableColumns(trials);
const pointColumns = { id, code, campaignId, stage, status, feedId, startedAt, electrode, compared };
const { recoveryPct, recoveryLow, recoveryHigh, recoveryBasis, gangueDissolvedPct, selectivityPct } = others;
const { accountabilityPct, acidPerTonne, reagentPerKg, pH, pHCooled, Eh, EhUncertainty, temperatureC, flags } = others;
const figureColumns = {
  ...{ recoveryPct, recoveryLow, recoveryHigh, recoveryBasis, gangueDissolvedPct, selectivityPct, accountabilityPct },
  ...{ acidPerTonne, reagentPerKg, pH, pHCooled, Eh, EhUncertainty, temperatureC, flags },
};

/** The trials of some campaigns as points, without their records. */
export function pointsOf(db: Db, campaignIds: readonly string[]): MapTrial[] {
  const names = new Map(
    db
      .select({ id: feeds.id, name: feeds.name })
      .from(feeds)
      .all()
      .map((feed) => [feed.id, feed.name]),
  );
  const found = db
    .select({ ...pointColumns, ...figureColumns })
    .from(trials)
    .where(and(inArray(trials.campaignId, [...campaignIds]), isNull(trials.deletedAt)))
    .orderBy(asc(trials.codeKey), asc(trials.id))
    .all();
  return found.map((trial) => ({
    id: trial.id,
    code: trial.code,
    campaignId: trial.campaignId,
    stage: trial.stage,
    status: trial.status,
    feedId: trial.feedId,
    feedName: names.get(trial.feedId) ?? "",
    startedAt: trial.startedAt,
    electrode: trial.electrode,
    compared: trial.compared,
    figures: figuresOf(trial),
  }));
}

/** Everything the map of a plan draws of trials, in one answer.
 *  @throws Refusal NOT_FOUND for the plan */
export function mapTrials(db: Db, planId: string, query: Query): MapTrials {
  const shown = campaignsOf(db, planId, query);
  return {
    rows: pointsOf(
      db,
      shown.map(({ id }) => id),
    ),
    campaigns: shown,
  };
}
