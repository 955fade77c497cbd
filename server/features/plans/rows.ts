import { and, count, desc, eq, sql, type SQL } from "drizzle-orm";
import type { z } from "zod";
import type { plansQuery } from "../../../shared/schemas/api";
import type { PlanRow, RevisionRow } from "../../../shared/schemas/plan";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import type { Kept } from "../history/service";
import { users } from "../members/schema";
import { projects } from "../projects/schema";
import type { OutdatedSpecies } from "./outdated";
import { planRevisions, plans } from "./schema";

const revisionColumns = {
  planId: planRevisions.planId,
  number: planRevisions.number,
  note: planRevisions.note,
  author: users.name,
  createdAt: planRevisions.createdAt,
  dataVersion: planRevisions.dataVersion,
  inputs: planRevisions.inputs,
};

/** Revisions are numbered without gaps and never deleted: the highest number is also how many there are. */
const highestNumber = sql`(select max(number) from plan_revisions where plan_id = ${plans.id})`;

const commentCount = sql<number>`(select count(*) from comments c where c.plan_id = ${plans.id} and c.deleted_at is null)`;

const selectPlans = (db: Db) =>
  db
    .select({
      plan: plans,
      commentCount,
      projectName: projects.name,
      siteName: projects.siteName,
      latest: revisionColumns,
    })
    .from(plans)
    .innerJoin(projects, eq(projects.id, plans.projectId))
    .innerJoin(planRevisions, and(eq(planRevisions.planId, plans.id), eq(planRevisions.number, highestNumber)))
    .innerJoin(users, eq(users.id, planRevisions.authorId));
type Selected = NonNullable<ReturnType<ReturnType<typeof selectPlans>["get"]>>;

type StoredPlan = Omit<PlanRow, "dataOutdated" | "changedSpecies">;

const stored = ({ plan, latest, commentCount, projectName, siteName }: Selected): StoredPlan => ({
  ...plan,
  projectName,
  siteName,
  revisionCount: latest.number,
  commentCount,
  latest,
});

function shown(plan: StoredPlan, outdated: OutdatedSpecies): PlanRow {
  const changed = outdated(plan.latest);
  return { ...plan, dataOutdated: changed === null || changed.length > 0, changedSpecies: changed ?? [] };
}

type Query = z.output<typeof plansQuery>;

function filterOf({ projectId, archived }: Query): SQL | undefined {
  return and(
    projectId === undefined ? undefined : eq(plans.projectId, projectId),
    archived === "all" ? undefined : eq(plans.archived, archived === "true"),
  );
}

/** Newest change first. */
export function listPlans(db: Db, query: Query, outdated: OutdatedSpecies): { rows: PlanRow[]; total: number } {
  const filter = filterOf(query);
  const rows = selectPlans(db)
    .where(filter)
    .orderBy(desc(plans.updatedAt), plans.id)
    .limit(query.limit)
    .offset(query.offset)
    .all();
  const total = db.select({ n: count() }).from(plans).where(filter).get()?.n ?? 0;
  return { rows: rows.map((row) => shown(stored(row), outdated)), total };
}

/** @throws Refusal NOT_FOUND */
export function storedPlan(db: Db, id: string, path = "id"): StoredPlan {
  const found = selectPlans(db).where(eq(plans.id, id)).get();
  if (!found) throw new Refusal("NOT_FOUND", path, `There is no plan ${id}.`);
  return stored(found);
}

/** As `storedPlan`, with what has changed in the library since.
 *  @throws Refusal NOT_FOUND */
export const planOf = (db: Db, id: string, outdated: OutdatedSpecies): PlanRow => shown(storedPlan(db, id), outdated);

/** What the history keeps of a plan; the revisions themselves are never changed. */
export const keptPlan = ({ name, description, archived, revisionCount, version }: StoredPlan): Kept => ({
  name,
  description,
  archived,
  revision: revisionCount,
  version,
});

const selectRevisions = (db: Db) =>
  db.select(revisionColumns).from(planRevisions).innerJoin(users, eq(users.id, planRevisions.authorId));

/** Newest first. */
export function listRevisions(db: Db, planId: string, { limit, offset }: { limit: number; offset: number }) {
  const total = storedPlan(db, planId).revisionCount;
  const rows: RevisionRow[] = selectRevisions(db)
    .where(eq(planRevisions.planId, planId))
    .orderBy(desc(planRevisions.number))
    .limit(limit)
    .offset(offset)
    .all();
  return { rows, total };
}

/** @throws Refusal NOT_FOUND */
export function revisionOf(db: Db, planId: string, number: number, path = "number"): RevisionRow {
  const wanted = and(eq(planRevisions.planId, planId), eq(planRevisions.number, number));
  const found = selectRevisions(db).where(wanted).get();
  if (!found) throw new Refusal("NOT_FOUND", path, `Plan ${planId} has no revision ${number}.`);
  return found;
}
