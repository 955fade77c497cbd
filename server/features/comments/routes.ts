import { z } from "../../../shared/schemas/z";
import { commentCreate, commentsQuery, commentUpdate } from "../../../shared/schemas/comment";
import { memberRoles } from "../../../shared/schemas/member";
import type { Deps } from "../../deps";
import { ok } from "../../http/answer";
import { page } from "../../http/pages";
import { createdRow, okRow, recordWriteRoutes, writerOf } from "../../http/recordRoutes";
import { route } from "../../http/route";
import { historyRoutes } from "../history/routes";
import {
  commentOf,
  createComment,
  deleteComment,
  listComments,
  recordedComments,
  restoreComment,
  updateComment,
} from "./service";

const byId = z.object({ id: z.string().min(1) });
const path = "/api/comments";

/** Everyone signed in may say something, and change what is his own. */
export const commentRoutes = ({ db, clock }: Deps) => [
  route({
    method: "GET",
    path: "/api/plans/:id/comments",
    roles: "signed-in",
    params: byId,
    query: commentsQuery,
    handle: ({ params, query }) => {
      const { rows, total } = listComments(db, params.id, query);
      return ok(page(rows, total, query));
    },
  }),
  route({
    method: "POST",
    path: "/api/plans/:id/comments",
    roles: "signed-in",
    params: byId,
    body: commentCreate,
    handle: ({ params, body, user }) => createdRow(createComment(db, params.id, body, writerOf(user, clock))),
  }),
  route({
    method: "GET",
    path: `${path}/:id`,
    roles: "signed-in",
    params: byId,
    handle: ({ params }) => okRow(commentOf(db, params.id)),
  }),
  ...recordWriteRoutes({
    path,
    roles: memberRoles,
    clock,
    update: commentUpdate,
    change: (id, seen, values, writer) => updateComment(db, id, seen, values, writer),
    remove: (id, seen, reason, writer) => deleteComment(db, id, seen, reason, writer),
    restore: (id, seen, reason, writer) => restoreComment(db, id, seen, reason, writer),
  }),
  ...historyRoutes({
    db,
    entity: "comment",
    path,
    roles: "signed-in",
    kept: (id) => recordedComments.keptOf(commentOf(db, id)),
  }),
];
