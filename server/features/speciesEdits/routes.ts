import { z } from "../../../shared/schemas/z";
import { withReason } from "../../../shared/schemas/history";
import { speciesEditCreate, speciesEditsQuery } from "../../../shared/schemas/speciesEdit";
import type { Deps } from "../../deps";
import { created, ok } from "../../http/answer";
import { page } from "../../http/pages";
import { route } from "../../http/route";
import { requiredVersion, versionHeaders } from "../../http/version";
import { editOf, listEdits } from "./rows";
import { addEdit, revertEdit } from "./service";

const writers = ["metallurgist", "admin"] as const;
const byId = z.object({ id: z.string().min(1) });

export const speciesEditRoutes = ({ db, chemistry, clock }: Deps) => [
  route({
    method: "GET",
    path: "/api/chemistry/edits",
    roles: "signed-in",
    query: speciesEditsQuery,
    handle: ({ query }) => {
      const { rows, total } = listEdits(db, chemistry, query);
      return ok(page(rows, total, query));
    },
  }),
  route({
    method: "POST",
    path: "/api/chemistry/edits",
    roles: writers,
    body: speciesEditCreate,
    handle: ({ body, user, req }) => {
      const seen = requiredVersion(req.get("if-match"));
      const edit = addEdit(db, chemistry, seen, body, { authorId: user.id, now: clock() });
      return created(edit, versionHeaders(edit.version));
    },
  }),
  route({
    method: "GET",
    path: "/api/chemistry/edits/:id",
    roles: "signed-in",
    params: byId,
    handle: ({ params }) => {
      const edit = editOf(db, chemistry, params.id);
      return ok(edit, versionHeaders(edit.version));
    },
  }),
  route({
    method: "DELETE",
    path: "/api/chemistry/edits/:id",
    roles: writers,
    params: byId,
    query: withReason,
    handle: ({ params, query, user, req }) => {
      const seen = requiredVersion(req.get("if-match"));
      const edit = revertEdit(db, chemistry, params.id, seen, query.reason, { authorId: user.id, now: clock() });
      return ok(edit, versionHeaders(edit.version));
    },
  }),
];
