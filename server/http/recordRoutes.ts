import { z } from "../../shared/schemas/z";
import { withReason } from "../../shared/schemas/history";
import type { Member, MemberRole } from "../../shared/schemas/member";
import type { Author } from "../features/history/service";
import { created, ok, type Answer } from "./answer";
import { route } from "./route";
import { requiredVersion, versionHeaders } from "./version";

const byId = z.object({ id: z.string().min(1) });

/** Who calls, as services want it. */
export type Writer = Author & { role: MemberRole };

/** Answers a row whose version the client needs for its next write. */
export const okRow = (row: { version: number }): Answer => ok(row, versionHeaders(row.version));
export const createdRow = (row: { version: number }): Answer => created(row, versionHeaders(row.version));

interface Writes<U extends z.ZodType> {
  /** as `/api/feeds` */
  path: `/api/${string}`;
  roles: readonly [MemberRole, ...MemberRole[]];
  clock: () => Date;
  update: U;
  change: (id: string, seen: number, values: z.output<U> & { reason: string }, writer: Writer) => { version: number };
  remove: (id: string, seen: number, reason: string, writer: Writer) => { version: number };
  restore: (id: string, seen: number, reason: string, writer: Writer) => { version: number };
}

export const writerOf = (user: Member, clock: () => Date): Writer => ({
  authorId: user.id,
  role: user.role,
  now: clock(),
});

/** PATCH, DELETE and restore of a recorded row: each needs If-Match, and takes a reason. */
export const recordWriteRoutes = <U extends z.ZodType>({
  path,
  roles,
  clock,
  update,
  change,
  remove,
  restore,
}: Writes<U>) => [
  route({
    method: "PATCH",
    path: `${path}/:id`,
    roles,
    params: byId,
    body: z.intersection(update, withReason),
    handle: ({ params, body, user, req }) =>
      okRow(change(params.id, requiredVersion(req.get("if-match")), body, writerOf(user, clock))),
  }),
  route({
    method: "DELETE",
    path: `${path}/:id`,
    roles,
    params: byId,
    query: withReason,
    handle: ({ params, query, user, req }) =>
      okRow(remove(params.id, requiredVersion(req.get("if-match")), query.reason, writerOf(user, clock))),
  }),
  route({
    method: "POST",
    path: `${path}/:id/restore`,
    roles,
    params: byId,
    body: withReason,
    handle: ({ params, body, user, req }) =>
      okRow(restore(params.id, requiredVersion(req.get("if-match")), body.reason, writerOf(user, clock))),
  }),
];
