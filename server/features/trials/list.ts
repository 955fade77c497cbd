import { and, asc, count, desc, sql, type SQL } from "drizzle-orm";
import type { SQLiteColumn } from "drizzle-orm/sqlite-core";
import type { z } from "zod";
import type { trialSorts, trialsQuery } from "../../../shared/schemas/trial";
import type { TrialListRow } from "../../../shared/schemas/trialRows";
import type { Db } from "../../db/open";
import { holds, isOf, ordered } from "../../http/listing";
import { listRowsOf } from "./rows";
import { trials } from "./schema";

const sorts: Record<(typeof trialSorts)[number], SQLiteColumn> = {
  code: trials.codeKey,
  status: trials.status,
  stage: trials.stage,
  operator: trials.operator,
  startedAt: trials.startedMs,
  updatedAt: trials.updatedAt,
  recoveryPct: trials.recoveryPct,
  gangueDissolvedPct: trials.gangueDissolvedPct,
  selectivityPct: trials.selectivityPct,
  accountabilityPct: trials.accountabilityPct,
  acidPerTonne: trials.acidPerTonne,
  reagentPerKg: trials.reagentPerKg,
  pH: trials.pH,
  Eh: trials.Eh,
  temperatureC: trials.temperatureC,
};

/** What a list and its export have in common. */
export type TrialFilter = Omit<z.output<typeof trialsQuery>, "limit" | "offset">;

/** Trials of a deleted campaign show when the campaign is asked for, and nowhere else. */
function inCampaigns(campaign: SQL, { campaignId, projectId }: TrialFilter): SQL {
  if (campaignId !== undefined) return sql`${campaign} = ${campaignId}`;
  if (projectId === undefined) return sql`${campaign} not in (select id from campaigns where deleted_at is not null)`;
  return sql`${campaign} in (select id from campaigns where deleted_at is null and project_id = ${projectId})`;
}

const told = { true: sql`is not null`, false: sql`is null` };

/** @param walk  the page is walked to along the index of the sorted column: the plus signs keep the database from gathering all
 *    that fit and sorting them */
function filterOf(query: TrialFilter, walk = false): SQL | undefined {
  const [campaign, deletedAt] = walk
    ? [sql`+${trials.campaignId}`, sql`+${trials.deletedAt}`]
    : [sql`${trials.campaignId}`, sql`${trials.deletedAt}`];
  return and(
    inCampaigns(campaign, query),
    query.deleted === "all" ? undefined : sql`${deletedAt} ${told[query.deleted]}`,
    isOf(trials.feedId, query.feedId),
    isOf(trials.kind, query.kind),
    isOf(trials.stage, query.stage),
    isOf(trials.status, query.status),
    holds(query.search, [trials.code, trials.operator, trials.notes]),
  );
}

const orderOf = ({ sort, order }: TrialFilter): [SQL, SQL] => [
  ordered(sorts[sort], order),
  order === "asc" ? asc(trials.id) : desc(trials.id),
];

/** Ids of all trials that a query asks for, in its order. */
export const trialIds = (db: Db, query: TrialFilter): string[] =>
  db
    .select({ id: trials.id })
    .from(trials)
    .where(filterOf(query))
    .orderBy(...orderOf(query))
    .all()
    .map(({ id }) => id);

/** Are the indexes of the sorted columns enough to say what fits? Then a page is walked to and the rest counted; else every row
 *  must be looked at, and that once: counting goes along. */
const indexed = ({ campaignId, feedId, kind, stage, status, search, deleted }: TrialFilter) =>
  [campaignId, feedId, kind, stage, status, search || undefined].every((asked) => asked === undefined) &&
  deleted !== "true";

const countOf = (db: Db, query: TrialFilter): number =>
  db.select({ n: count() }).from(trials).where(filterOf(query)).get()?.n ?? 0;

/** Ids of one page: the rest of a row is fetched for those that are shown alone. */
function pageOf(db: Db, query: z.output<typeof trialsQuery>): { ids: string[]; total: number } {
  const walk = indexed(query);
  const found = db
    .select({ id: trials.id, total: walk ? sql<null>`null` : sql<number>`count(*) over ()` })
    .from(trials)
    .where(filterOf(query, walk))
    .orderBy(...orderOf(query))
    .limit(query.limit)
    .offset(query.offset)
    .all();
  // An empty first page says that nothing fits; one past the end says nothing.
  const none = found.length === 0 && query.offset === 0;
  return { ids: found.map(({ id }) => id), total: none ? 0 : (found[0]?.total ?? countOf(db, query)) };
}

export function listTrials(db: Db, query: z.output<typeof trialsQuery>): { rows: TrialListRow[]; total: number } {
  const { ids, total } = pageOf(db, query);
  return { rows: listRowsOf(db, ids), total };
}
