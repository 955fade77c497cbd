import { pageQuery } from "../../../shared/schemas/api";
import { preferences } from "../../../shared/schemas/member";
import type { Deps } from "../../deps";
import { ok } from "../../http/answer";
import { page } from "../../http/pages";
import { route } from "../../http/route";
import { countMembers, listMembers, preferencesOf, setPreferences } from "./service";

export const memberRoutes = ({ db }: Deps) => [
  route({
    method: "GET",
    path: "/api/members",
    roles: ["admin"],
    query: pageQuery,
    handle: ({ query }) => ok(page(listMembers(db, query), countMembers(db), query)),
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
