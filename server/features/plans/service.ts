import { and, eq } from "drizzle-orm";
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

function insertPlan(db: Db, { note, inputs, ...plan }: NewPlan, writing: Writing): PlanRow {
  const id = crypto.randomUUID();
  const at = writing.now.toISOString();
  return db.transaction((tx) => {
    tx.insert(plans)
      .values({ id, ...plan, createdAt: at, updatedAt: at })
      .run();
    insertRevision(tx, { planId: id, number: 1, note, inputs }, writing);
    const after = keptPlan(storedPlan(tx, id));
    recordWrite(tx, { entity: "plan", id, action: "create", before: null, after, reason: note }, writing);
    return planOf(tx, id, writing.outdated);
  });
}

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

/** A new plan whose first revision holds the latest inputs of another. What stems from invented data stays marked. */
export function duplicatePlan(
  db: Db,
  id: string,
  { name, projectId }: z.output<typeof planDuplicate>,
  writing: Writing,
): PlanRow {
  const source = storedPlan(db, id);
  const project = projectOf(db, projectId ?? source.projectId);
  const values: NewPlan = {
    projectId: project.id,
    name: name ?? `${source.name.slice(0, 113)} (copy)`,
    description: source.description,
    inputs: source.latest.inputs,
    note: `Copied from “${source.name}”, revision ${source.latest.number}.`,
    invented: source.invented || project.invented,
  };
  return insertPlan(db, values, writing);
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
