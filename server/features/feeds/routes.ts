import { z } from "../../../shared/schemas/z";
import { feedCreate, feedsQuery, feedUpdate } from "../../../shared/schemas/feed";
import type { Deps } from "../../deps";
import { ok } from "../../http/answer";
import { page } from "../../http/pages";
import { createdRow, okRow, recordWriteRoutes, writerOf } from "../../http/recordRoutes";
import { route } from "../../http/route";
import { historyRoutes } from "../history/routes";
import { workingsOf } from "../trials/workedOut";
import { feedOf, listFeeds } from "./rows";
import { createFeed, deleteFeed, recordedFeeds, restoreFeed, updateFeed } from "./service";

const writers = ["metallurgist", "admin"] as const;
const path = "/api/feeds";

export const feedRoutes = ({ db, clock, chemistry }: Deps) => [
  route({
    method: "GET",
    path,
    roles: "signed-in",
    query: feedsQuery,
    handle: ({ query }) => {
      const { rows, total } = listFeeds(db, query);
      return ok(page(rows, total, query));
    },
  }),
  route({
    method: "POST",
    path,
    roles: writers,
    body: feedCreate,
    handle: ({ body, user }) => createdRow(createFeed(db, body, writerOf(user, clock))),
  }),
  route({
    method: "GET",
    path: `${path}/:id`,
    roles: "signed-in",
    params: z.object({ id: z.string().min(1) }),
    handle: ({ params }) => okRow(feedOf(db, params.id)),
  }),
  ...recordWriteRoutes({
    path,
    roles: writers,
    clock,
    update: feedUpdate,
    change: (id, seen, values, writer) => updateFeed(db, workingsOf(chemistry), id, seen, values, writer),
    remove: (id, seen, reason, writer) => deleteFeed(db, id, seen, reason, writer),
    restore: (id, seen, reason, writer) => restoreFeed(db, id, seen, reason, writer),
  }),
  ...historyRoutes({
    db,
    entity: "feed",
    path,
    roles: "signed-in",
    kept: (id) => recordedFeeds.keptOf(feedOf(db, id)),
  }),
];
