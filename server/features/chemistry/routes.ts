import { z } from "../../../shared/schemas/z";
import type { ChemistryAnswer } from "../../../shared/schemas/speciesEdit";
import type { Deps } from "../../deps";
import { ok } from "../../http/answer";
import { route } from "../../http/route";
import { tagOf } from "../../http/version";
import { keptAnswer } from "./service";

export const chemistryRoutes = ({ db, chemistry }: Deps) => [
  route({
    method: "GET",
    path: "/api/chemistry",
    roles: "signed-in",
    handle: () => {
      const { current, curated, edited } = chemistry;
      const answer: ChemistryAnswer = { ...current, curatedVersion: curated.version, edited: [...edited] };
      // Taking an edit back brings an older version again, with other marks: both stand in the tag.
      const marks = edited.reduce((sum, { version }) => sum + version, 0);
      return ok(answer, { ETag: tagOf(`${current.version}.${marks}`), "Cache-Control": "private, no-cache" });
    },
  }),
  route({
    method: "GET",
    path: "/api/chemistry/versions/:id",
    roles: "signed-in",
    params: z.object({ id: z.string().min(1) }),
    handle: ({ params }) =>
      ok(keptAnswer(db, params.id), {
        ETag: tagOf(params.id),
        "Cache-Control": "private, max-age=31536000, immutable",
      }),
  }),
];
