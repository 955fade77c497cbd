import { asc, count, eq } from "drizzle-orm";
import type { z } from "zod";
import type { ProjectRow, projectCreate } from "../../../shared/schemas/api";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import { plans } from "../plans/schema";
import { projects } from "./schema";

const columns = {
  id: projects.id,
  siteName: projects.siteName,
  name: projects.name,
  invented: projects.invented,
  planCount: count(plans.id),
};

const selectProjects = (db: Db) =>
  db
    .select(columns)
    .from(projects)
    .leftJoin(plans, eq(plans.projectId, projects.id))
    .groupBy(projects.id)
    .orderBy(asc(projects.siteName), asc(projects.name));

export const countProjects = (db: Db): number => db.select({ n: count() }).from(projects).get()?.n ?? 0;

export function listProjects(db: Db, { limit, offset }: { limit: number; offset: number }): ProjectRow[] {
  return selectProjects(db).limit(limit).offset(offset).all();
}

export function createProject(db: Db, now: Date, values: z.output<typeof projectCreate>): ProjectRow {
  const id = crypto.randomUUID();
  db.insert(projects)
    .values({ id, ...values, createdAt: now.toISOString() })
    .run();
  return { id, ...values, invented: false, planCount: 0 };
}

/** @throws Refusal NOT_FOUND with the path of the field that named it */
export function projectOf(db: Db, id: string): typeof projects.$inferSelect {
  const found = db.select().from(projects).where(eq(projects.id, id)).get();
  if (!found) throw new Refusal("NOT_FOUND", "projectId", `There is no project ${id}.`);
  return found;
}
