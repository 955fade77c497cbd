import type { Deps } from "../../deps";
import { ok } from "../../http/answer";
import { route } from "../../http/route";

export const healthRoutes = ({ chemistry }: Deps) => [
  route({
    method: "GET",
    path: "/api/health",
    roles: "public",
    handle: () => ok({ status: "ok", dataVersion: chemistry.current.version }),
  }),
];
