import { z } from "zod";
import type { Deps } from "../../deps";
import { ok } from "../../http/answer";
import { route } from "../../http/route";
import { tagOf } from "../../http/version";
import { keptVersion } from "./service";

export const chemistryRoutes = ({ db, chemistry }: Deps) => [
  route({
    method: "GET",
    path: "/api/chemistry",
    roles: "signed-in",
    handle: () =>
      ok(chemistry.current, { ETag: tagOf(chemistry.current.version), "Cache-Control": "private, no-cache" }),
  }),
  route({
    method: "GET",
    path: "/api/chemistry/versions/:id",
    roles: "signed-in",
    params: z.object({ id: z.string().min(1) }),
    handle: ({ params }) =>
      ok(keptVersion(db, params.id), {
        ETag: tagOf(params.id),
        "Cache-Control": "private, max-age=31536000, immutable",
      }),
  }),
];
