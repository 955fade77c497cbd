import { and, count, eq, sql, type SQL } from "drizzle-orm";
import type { z } from "zod";
import type { CampaignRow, campaignsQuery } from "../../../shared/schemas/campaign";
import type { Db } from "../../db/open";
import { deletedIs, holds, isOf, ordered } from "../../http/listing";
import { Refusal } from "../../http/refusal";
import { plans } from "../plans/schema";
import { projects } from "../projects/schema";
import { figuresDue } from "../trials/refresh";
import { campaigns } from "./schema";

const trialCount = sql<number>`(select count(*) from trials t where t.campaign_id = ${campaigns.id} and t.deleted_at is null)`;

const selectCampaigns = (db: Db) =>
  db
    .select({ campaign: campaigns, projectName: projects.name, planName: plans.name, trialCount })
    .from(campaigns)
    .innerJoin(projects, eq(projects.id, campaigns.projectId))
    .innerJoin(plans, eq(plans.id, campaigns.planId));
type Selected = NonNullable<ReturnType<ReturnType<typeof selectCampaigns>["get"]>>;

const asRow = (db: Db, { campaign, ...joined }: Selected): CampaignRow => ({
  ...campaign,
  ...joined,
  figuresDue: figuresDue(db, { campaignId: campaign.id }),
});

type Query = z.output<typeof campaignsQuery>;
const sorts = {
  code: sql`${campaigns.code} collate nocase`,
  title: sql`${campaigns.title} collate nocase`,
  updatedAt: campaigns.updatedAt,
  trialCount,
} satisfies Record<Query["sort"], SQL | typeof campaigns.updatedAt>;

export function listCampaigns(db: Db, query: Query): { rows: CampaignRow[]; total: number } {
  const filter = and(
    isOf(campaigns.projectId, query.projectId),
    isOf(campaigns.planId, query.planId),
    deletedIs(campaigns.deletedAt, query.deleted),
    holds(query.search, [campaigns.code, campaigns.title, campaigns.question]),
  );
  const rows = selectCampaigns(db)
    .where(filter)
    .orderBy(ordered(sorts[query.sort], query.order), campaigns.id)
    .limit(query.limit)
    .offset(query.offset)
    .all();
  const total = db.select({ n: count() }).from(campaigns).where(filter).get()?.n ?? 0;
  return { rows: rows.map((row) => asRow(db, row)), total };
}

/** @param path  of the field that names it     @throws Refusal NOT_FOUND */
export function campaignOf(db: Db, id: string, path = "id"): CampaignRow {
  const found = selectCampaigns(db).where(eq(campaigns.id, id)).get();
  if (!found) throw new Refusal("NOT_FOUND", path, `There is no campaign ${id}.`);
  return asRow(db, found);
}
