import { and, asc, count, eq } from "drizzle-orm";
import type { z } from "zod";
import type { commentCreate, CommentRow, commentsQuery, commentUpdate } from "../../../shared/schemas/comment";
import type { Db } from "../../db/open";
import { deletedIs } from "../../http/listing";
import type { Writer } from "../../http/recordRoutes";
import { Refusal } from "../../http/refusal";
import { deleteRow, requireThere, restoreRow, writeRow, type RecordedTable } from "../history/rowWrites";
import { recordWrite } from "../history/service";
import { users } from "../members/schema";
import { revisionOf, storedPlan } from "../plans/rows";
import { comments } from "./schema";

const selectComments = (db: Db) =>
  db.select({ comment: comments, author: users.name }).from(comments).innerJoin(users, eq(users.id, comments.authorId));

const asRow = ({ comment, author }: NonNullable<ReturnType<ReturnType<typeof selectComments>["get"]>>): CommentRow => ({
  ...comment,
  author,
});

/** Oldest first, as they were said.
 *  @throws Refusal NOT_FOUND for the plan */
export function listComments(db: Db, planId: string, { deleted, limit, offset }: z.output<typeof commentsQuery>) {
  storedPlan(db, planId);
  const filter = and(eq(comments.planId, planId), deletedIs(comments.deletedAt, deleted));
  const rows = selectComments(db)
    .where(filter)
    .orderBy(asc(comments.createdAt), comments.id)
    .limit(limit)
    .offset(offset)
    .all();
  const total = db.select({ n: count() }).from(comments).where(filter).get()?.n ?? 0;
  return { rows: rows.map(asRow), total };
}

/** @throws Refusal NOT_FOUND */
export function commentOf(db: Db, id: string): CommentRow {
  const found = selectComments(db).where(eq(comments.id, id)).get();
  if (!found) throw new Refusal("NOT_FOUND", "id", `There is no comment ${id}.`);
  return asRow(found);
}

export const recordedComments: RecordedTable<CommentRow> = {
  entity: "comment",
  rowOf: commentOf,
  nameOf: ({ author }) => `The comment of ${author}`,
  keptOf: ({ planId, text, revision, point, limit, deletedAt, version }) => ({
    planId,
    text,
    revision,
    point,
    limit,
    deletedAt,
    version,
  }),
  set: (db, id, values) => void db.update(comments).set(values).where(eq(comments.id, id)).run(),
};

/** @throws Refusal NOT_FOUND for the plan, and for a revision it does not have */
export function createComment(
  db: Db,
  planId: string,
  values: z.output<typeof commentCreate>,
  author: Writer,
): CommentRow {
  storedPlan(db, planId);
  if (values.revision !== null) revisionOf(db, planId, values.revision, "revision");
  const id = crypto.randomUUID();
  const at = author.now.toISOString();
  return db.transaction((tx) => {
    tx.insert(comments)
      .values({ id, planId, authorId: author.authorId, ...values, createdAt: at, updatedAt: at })
      .run();
    const made = commentOf(tx, id);
    const after = recordedComments.keptOf(made);
    recordWrite(tx, { entity: "comment", id, action: "create", before: null, after }, author);
    return made;
  });
}

/** Nobody's words are changed by somebody else, whatever the role. */
function requireOwn({ authorId, author }: CommentRow, writer: Writer): void {
  if (authorId === writer.authorId) return;
  throw new Refusal("FORBIDDEN", "", `This comment is ${author}'s: only who wrote it may change or remove it.`);
}

/** @throws Refusal NOT_FOUND, FORBIDDEN, STALE, CONFLICT */
export const updateComment = (
  db: Db,
  id: string,
  seen: number,
  { reason, ...yours }: z.output<typeof commentUpdate> & { reason: string },
  writer: Writer,
): CommentRow => {
  requireOwn(commentOf(db, id), writer);
  const check = (_tx: Db, current: CommentRow) => requireThere(recordedComments.nameOf(current), current);
  return writeRow(db, recordedComments, id, { seen, action: "change", reason, yours, check }, writer);
};

/** @throws Refusal NOT_FOUND, FORBIDDEN, STALE, CONFLICT */
export const deleteComment = (db: Db, id: string, seen: number, reason: string, writer: Writer): CommentRow => {
  requireOwn(commentOf(db, id), writer);
  return deleteRow(db, recordedComments, id, { seen, reason }, writer);
};

/** @throws Refusal NOT_FOUND, FORBIDDEN, STALE, CONFLICT */
export const restoreComment = (db: Db, id: string, seen: number, reason: string, writer: Writer): CommentRow => {
  requireOwn(commentOf(db, id), writer);
  return restoreRow(db, recordedComments, id, { seen, reason }, writer);
};
