import { and, count, desc, eq, ne } from "drizzle-orm";
import type { HistoryAction, HistoryRow } from "../../../shared/schemas/history";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import { users } from "../members/schema";
import { changesBetween, differenceBetween } from "./difference";
import { history, type HistoryEntity } from "./schema";

/** Who writes, and when. */
export interface Author {
  authorId: string;
  now: Date;
}

type Fields = Record<string, unknown>;
/** What the history keeps of a row: its own fields and its version, nothing joined or worked out. */
export type Kept = Fields & { version: number };

interface Write {
  entity: HistoryEntity;
  id: string;
  action: HistoryAction;
  before: Kept | null;
  after: Kept;
  reason?: string;
}

const withoutVersion = ({ version: _, ...fields }: Kept): Fields => fields;

/** Puts a write on record; call it in the transaction of the write. */
export function recordWrite(
  db: Db,
  { entity, id, action, before, after, reason = "" }: Write,
  { authorId, now }: Author,
): void {
  const changes = before ? changesBetween(withoutVersion(before), withoutVersion(after)) : [];
  db.insert(history)
    .values({
      entity,
      entityId: id,
      version: after.version,
      action,
      at: now.toISOString(),
      authorId,
      reason,
      before,
      changes,
    })
    .run();
}

const ofRow = (entity: HistoryEntity, id: string) => and(eq(history.entity, entity), eq(history.entityId, id));

/** Newest write first. */
export function listHistory(
  db: Db,
  entity: HistoryEntity,
  id: string,
  { limit, offset }: { limit: number; offset: number },
): { rows: HistoryRow[]; total: number } {
  const rows = db
    .select({
      id: history.id,
      version: history.version,
      action: history.action,
      at: history.at,
      author: users.name,
      reason: history.reason,
      changes: history.changes,
    })
    .from(history)
    .innerJoin(users, eq(users.id, history.authorId))
    .where(ofRow(entity, id))
    .orderBy(desc(history.id))
    .limit(limit)
    .offset(offset)
    .all();
  const total = db.select({ n: count() }).from(history).where(ofRow(entity, id)).get()?.n ?? 0;
  return { rows, total };
}

/** The row as it stood at a version: what the next write found there.
 *  @returns  null for the version that stands now, and for one that never was */
export function keptAt(db: Db, entity: HistoryEntity, id: string, version: number): Fields | null {
  const next = and(ofRow(entity, id), eq(history.version, version + 1), ne(history.action, "recalculate"));
  return db.select({ before: history.before }).from(history).where(next).get()?.before ?? null;
}

interface Seen<Row> {
  entity: HistoryEntity;
  /** for the sentence: "trial NL-07" */
  what: string;
  current: Row;
  /** the row's own fields, as the writer would send them */
  fields: Kept;
  seen: number;
  /** what the writer sent */
  yours: Fields;
}

/** Lets a write through if the row still is the one its writer saw.
 *  @throws Refusal STALE with the current row and, field by field, what the writer saw, sent, and finds */
export function requireSeen<Row extends { id: string; version: number }>(db: Db, write: Seen<Row>): void {
  const { entity, what, current, fields, seen, yours } = write;
  if (current.version === seen) return;
  const base = keptAt(db, entity, current.id, seen);
  const message = `${what} is at version ${current.version} by now, you changed version ${seen}.`;
  throw new Refusal("STALE", "If-Match", message, { current, difference: differenceBetween(base, yours, fields) });
}
