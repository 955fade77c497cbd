import { and, eq, sql } from "drizzle-orm";
import type { z } from "zod";
import type { planDuplicate } from "../../../shared/schemas/api";
import type {
  PlanInputs,
  planCreate,
  PlanRow,
  planUpdate,
  revisionCreate,
  RevisionRow,
} from "../../../shared/schemas/plan";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import { recordWrite, requireSeen, type Author } from "../history/service";
import { projectOf } from "../projects/service";
import type { OutdatedSpecies } from "./outdated";
import { keptPlan, planOf, revisionOf, storedPlan } from "./rows";
import { planRevisions, plans } from "./schema";

/** Who writes, when, and with which version of the chemistry library. */
export interface Writing extends Author {
  dataVersion: string;
  outdated: OutdatedSpecies;
}

interface NewPlan {
  projectId: string;
  name: string;
  description: string;
  inputs: PlanInputs;
  note: string;
  invented: boolean;
}

/** @param history  a plan whose revisions the new one takes over; without it the inputs are revision 1 */
function insertPlan(db: Db, { note, inputs, ...plan }: NewPlan, writing: Writing, history?: string): PlanRow {
  const id = crypto.randomUUID();
  const at = writing.now.toISOString();
  return db.transaction((tx) => {
    tx.insert(plans)
      .values({ id, ...plan, createdAt: at, updatedAt: at })
      .run();
    const past = history === undefined ? [] : revisionsFor(tx, history);
    if (past.length === 0) insertRevision(tx, { planId: id, number: 1, note, inputs }, writing);
    else
      tx.insert(planRevisions)
        .values(past.map((revision) => ({ ...revision, planId: id })))
        .run();
    const after = keptPlan(storedPlan(tx, id));
    recordWrite(tx, { entity: "plan", id, action: "create", before: null, after, reason: note }, writing);
    return planOf(tx, id, writing.outdated);
  });
}

const revisionsFor = (db: Db, planId: string) =>
  db.select().from(planRevisions).where(eq(planRevisions.planId, planId)).orderBy(planRevisions.number).all();

function insertRevision(
  db: Db,
  revision: { planId: string; number: number; note: string; inputs: PlanInputs },
  { authorId, now, dataVersion }: Writing,
): void {
  db.insert(planRevisions)
    .values({ ...revision, authorId, dataVersion, createdAt: now.toISOString() })
    .run();
}

export function createPlan(db: Db, values: z.output<typeof planCreate>, writing: Writing): PlanRow {
  const { invented } = projectOf(db, values.projectId);
  return insertPlan(db, { ...values, note: "", invented }, writing);
}

/** Refuses a name that a plan of the project bears already: two of one name cannot be told apart in a list.
 *  @throws Refusal CONFLICT */
function requireFreeName(db: Db, projectId: string, name: string): void {
  const same = and(eq(plans.projectId, projectId), eq(sql`lower(${plans.name})`, name.toLowerCase()));
  const found = db.select({ archived: plans.archived }).from(plans).where(same).get();
  if (!found) return;
  const where = found.archived ? ", in the archive" : "";
  throw new Refusal(
    "CONFLICT",
    "name",
    `The project has a plan “${name}” already${where}: give the copy another name.`,
  );
}

/** A new plan that begins with what another holds: its latest inputs as revision 1, or all its revisions with author, note, moment and
 *  data version. What stems from invented data stays marked; where the copy comes from stands in its first note and on record.
 *  @throws Refusal NOT_FOUND; CONFLICT where the name asked for is taken in that project */
export function duplicatePlan(
  db: Db,
  id: string,
  { name, projectId, revisions }: z.output<typeof planDuplicate>,
  writing: Writing,
): PlanRow {
  const source = storedPlan(db, id);
  const project = projectOf(db, projectId ?? source.projectId);
  if (name !== undefined) requireFreeName(db, project.id, name);
  const from = `Copied from “${source.name}”, revision ${source.latest.number}`;
  const where = project.id === source.projectId ? "" : `, of ${source.siteName} / ${source.projectName}`;
  const note = `${from}${where}.`;
  const values: NewPlan = {
    projectId: project.id,
    name: name ?? `${source.name.slice(0, 113)} (copy)`,
    // Revisions that are taken over keep their own notes.
    description: revisions === "all" ? `${source.description}\n\n${note}`.trim().slice(0, 2000) : source.description,
    inputs: source.latest.inputs,
    note,
    invented: source.invented || project.invented,
  };
  return insertPlan(db, values, writing, revisions === "all" ? source.id : undefined);
}

/** Raises the version, if it still is the one the writer saw, and puts the write on record.
 *  @throws Refusal STALE with the current row and the difference beside it */
function change(
  db: Db,
  id: string,
  seen: number,
  { reason, write, ...yours }: z.output<typeof planUpdate> & { reason: string; write?: () => void },
  writing: Writing,
): void {
  const current = planOf(db, id, writing.outdated);
  const before = keptPlan(current);
  requireSeen(db, { entity: "plan", what: "The plan", current, fields: before, seen, yours });
  db.update(plans)
    .set({ ...yours, version: seen + 1, updatedAt: writing.now.toISOString() })
    .where(and(eq(plans.id, id), eq(plans.version, seen)))
    .run();
  write?.();
  const after = keptPlan(storedPlan(db, id));
  recordWrite(db, { entity: "plan", id, action: "change", before, after, reason }, writing);
}

/** @throws Refusal NOT_FOUND, STALE */
export function updatePlan(
  db: Db,
  id: string,
  seen: number,
  values: z.output<typeof planUpdate> & { reason: string },
  writing: Writing,
): PlanRow {
  return db.transaction((tx) => {
    change(tx, id, seen, values, writing);
    return planOf(tx, id, writing.outdated);
  });
}

/** @param seen  the plan's version the writer saw; null: append whatever happened meanwhile
 *  @throws Refusal NOT_FOUND, STALE */
export function addRevision(
  db: Db,
  planId: string,
  seen: number | null,
  { note, inputs }: z.output<typeof revisionCreate>,
  writing: Writing,
): RevisionRow {
  return db.transaction((tx) => {
    const current = storedPlan(tx, planId);
    const number = current.revisionCount + 1;
    const write = () => insertRevision(tx, { planId, number, note, inputs }, writing);
    change(tx, planId, seen ?? current.version, { reason: note, write }, writing);
    return revisionOf(tx, planId, number);
  });
}
