import { and, asc, eq, inArray, isNull } from "drizzle-orm";
import type { z } from "zod";
import type { MapTrials, mapTrialsQuery } from "../../../shared/schemas/trialRows";
import type { Db } from "../../db/open";
import { campaigns } from "../campaigns/schema";
import { storedPlan } from "../plans/rows";
import { pointsJson } from "./points";

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

/** Everything the map of a plan draws of trials, in one answer.
 *  @returns  `MapTrials` as JSON text     @throws Refusal NOT_FOUND for the plan */
export function mapTrials(db: Db, planId: string, query: Query): string {
  const campaigns = campaignsOf(db, planId, query);
  const rows = pointsJson(
    db,
    campaigns.map(({ id }) => id),
  );
  return `{"rows":${rows},"campaigns":${JSON.stringify(campaigns)}}`;
}
