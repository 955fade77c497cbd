import { and, count, eq, sql, type SQL } from "drizzle-orm";
import type { z } from "zod";
import type { FeedRow, feedsQuery } from "../../../shared/schemas/feed";
import type { Db } from "../../db/open";
import { deletedIs, holds, isOf, ordered } from "../../http/listing";
import { Refusal } from "../../http/refusal";
import { projects } from "../projects/schema";
import { figuresDue } from "../trials/refresh";
import { feeds } from "./schema";

const trialCount = sql<number>`(select count(*) from trials t where t.feed_id = ${feeds.id} and t.deleted_at is null)`;

const selectFeeds = (db: Db) =>
  db
    .select({ feed: feeds, projectName: projects.name, trialCount })
    .from(feeds)
    .innerJoin(projects, eq(projects.id, feeds.projectId));
type Selected = NonNullable<ReturnType<ReturnType<typeof selectFeeds>["get"]>>;

const asRow = (db: Db, { feed, ...joined }: Selected): FeedRow => ({
  ...feed,
  ...joined,
  figuresDue: figuresDue(db, { feedId: feed.id }),
});

type Query = z.output<typeof feedsQuery>;
const sorts = { name: sql`${feeds.name} collate nocase`, updatedAt: feeds.updatedAt, trialCount } satisfies Record<
  Query["sort"],
  SQL | typeof feeds.updatedAt
>;

export function listFeeds(db: Db, query: Query): { rows: FeedRow[]; total: number } {
  const filter = and(
    isOf(feeds.projectId, query.projectId),
    deletedIs(feeds.deletedAt, query.deleted),
    holds(query.search, [feeds.name, feeds.description]),
  );
  const rows = selectFeeds(db)
    .where(filter)
    .orderBy(ordered(sorts[query.sort], query.order), feeds.id)
    .limit(query.limit)
    .offset(query.offset)
    .all();
  const total = db.select({ n: count() }).from(feeds).where(filter).get()?.n ?? 0;
  return { rows: rows.map((row) => asRow(db, row)), total };
}

/** @param path  of the field that names it     @throws Refusal NOT_FOUND */
export function feedOf(db: Db, id: string, path = "id"): FeedRow {
  const found = selectFeeds(db).where(eq(feeds.id, id)).get();
  if (!found) throw new Refusal("NOT_FOUND", path, `There is no feed ${id}.`);
  return asRow(db, found);
}
