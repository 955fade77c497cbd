import { and, asc, eq, inArray, isNull } from "drizzle-orm";
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

/** The trials of some campaigns as points, without their records. */
export function pointsOf(db: Db, campaignIds: readonly string[]): MapTrial[] {
  const found = db
    .select({ trial: trials, feedName: feeds.name })
    .from(trials)
    .innerJoin(feeds, eq(feeds.id, trials.feedId))
    .where(and(inArray(trials.campaignId, [...campaignIds]), isNull(trials.deletedAt)))
    .orderBy(asc(trials.codeKey), asc(trials.id))
    .all();
  return found.map(({ trial, feedName }) => {
    const { id, code, campaignId, stage, status, feedId, startedAt, electrode, compared } = trial;
    return {
      id,
      code,
      campaignId,
      stage,
      status,
      feedId,
      feedName,
      startedAt,
      electrode,
      compared,
      figures: figuresOf(trial),
    };
  });
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
