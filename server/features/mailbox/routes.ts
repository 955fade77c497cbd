import { pageQuery } from "../../../shared/schemas/api";
import type { Deps } from "../../deps";
import { ok } from "../../http/answer";
import { page } from "../../http/pages";
import { route } from "../../http/route";
import { listMails } from "./service";

export const mailboxRoutes = ({ db, clock }: Deps) => [
  route({
    method: "GET",
    path: "/api/outbox",
    roles: ["admin"],
    query: pageQuery,
    handle: ({ query }) => {
      const { rows, total } = listMails(db, clock(), query);
      return ok(page(rows, total, query), { "Cache-Control": "no-store" });
    },
  }),
];
