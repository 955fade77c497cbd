import { z } from "../../../shared/schemas/z";
import { pageQuery } from "../../../shared/schemas/api";
import { memberUpdate } from "../../../shared/schemas/invitation";
import { preferences } from "../../../shared/schemas/member";
import type { Deps } from "../../deps";
import { ok } from "../../http/answer";
import { page } from "../../http/pages";
import { route } from "../../http/route";
import { requiredVersion, versionHeaders } from "../../http/version";
import { historyRoutes } from "../history/routes";
import {
  countMembers,
  keptMember,
  listMembers,
  memberOf,
  preferencesOf,
  setPreferences,
  updateMember,
} from "./service";

const byId = z.object({ id: z.string().min(1) });

export const memberRoutes = ({ db, clock }: Deps) => [
  route({
    method: "GET",
    path: "/api/members",
    roles: ["admin"],
    query: pageQuery,
    handle: ({ query }) => ok(page(listMembers(db, query), countMembers(db), query)),
  }),
  route({
    method: "GET",
    path: "/api/members/:id",
    roles: ["admin"],
    params: byId,
    handle: ({ params }) => {
      const member = memberOf(db, params.id);
      return ok(member, versionHeaders(member.version));
    },
  }),
  route({
    method: "PATCH",
    path: "/api/members/:id",
    roles: ["admin"],
    params: byId,
    body: memberUpdate,
    handle: ({ params, body, user, req }) => {
      const author = { authorId: user.id, now: clock() };
      const member = updateMember(db, params.id, requiredVersion(req.get("if-match")), body, author);
      return ok(member, versionHeaders(member.version));
    },
  }),
  ...historyRoutes({
    db,
    entity: "member",
    path: "/api/members",
    roles: ["admin"],
    kept: (id) => keptMember(memberOf(db, id)),
  }),
  route({
    method: "GET",
    path: "/api/me/preferences",
    roles: "signed-in",
    handle: ({ user }) => ok(preferencesOf(db, user.id)),
  }),
  route({
    method: "PUT",
    path: "/api/me/preferences",
    roles: "signed-in",
    body: preferences,
    handle: ({ user, body }) => ok(setPreferences(db, user.id, body)),
  }),
];
