import { z } from "../../../shared/schemas/z";
import { pageQuery } from "../../../shared/schemas/api";
import type { Db } from "../../db/open";
import { ok } from "../../http/answer";
import { page } from "../../http/pages";
import { Refusal } from "../../http/refusal";
import { route, type Roles } from "../../http/route";
import type { HistoryEntity } from "./schema";
import { keptAt, listHistory, type Kept } from "./service";

interface Recorded {
  db: Db;
  entity: HistoryEntity;
  /** as `/api/feeds` */
  path: `/api/${string}`;
  roles: Roles;
  /** the row's own fields as they stand now; refuses an id that is none */
  kept: (id: string) => Kept;
}

const byId = z.object({ id: z.string().min(1) });

/** The two reading routes of a recorded row: what was written to it, and how it stood at a version. */
export const historyRoutes = ({ db, entity, path, roles, kept }: Recorded) => [
  route({
    method: "GET",
    path: `${path}/:id/history`,
    roles,
    params: byId,
    query: pageQuery,
    handle: ({ params, query }) => {
      kept(params.id);
      const { rows, total } = listHistory(db, entity, params.id, query);
      return ok(page(rows, total, query));
    },
  }),
  route({
    method: "GET",
    path: `${path}/:id/history/:version`,
    roles,
    params: byId.extend({ version: z.coerce.number().int().min(1) }),
    handle: ({ params: { id, version } }) => {
      const now = kept(id);
      const then = now.version === version ? now : keptAt(db, entity, id, version);
      if (!then)
        throw new Refusal(
          "NOT_FOUND",
          "version",
          `There is no version ${version} of it; the newest is ${now.version}.`,
        );
      return ok(then);
    },
  }),
];
