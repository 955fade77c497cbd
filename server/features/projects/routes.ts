import { pageQuery, projectCreate } from "../../../shared/schemas/api";
import type { Deps } from "../../deps";
import { created, ok } from "../../http/answer";
import { page } from "../../http/pages";
import { route } from "../../http/route";
import { countProjects, createProject, listProjects } from "./service";

export const projectRoutes = ({ db, clock }: Deps) => [
  route({
    method: "GET",
    path: "/api/projects",
    roles: "signed-in",
    query: pageQuery,
    handle: ({ query }) => ok(page(listProjects(db, query), countProjects(db), query)),
  }),
  route({
    method: "POST",
    path: "/api/projects",
    roles: ["metallurgist", "admin"],
    body: projectCreate,
    handle: ({ body }) => created(createProject(db, clock(), body)),
  }),
];
