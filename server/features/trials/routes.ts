import { z } from "../../../shared/schemas/z";
import { reasonRequired } from "../../../shared/schemas/history";
import { trialCreate, trialsQuery, trialUpdate } from "../../../shared/schemas/trial";
import { mapTrialsQuery, trialsCsvQuery } from "../../../shared/schemas/trialRows";
import type { Deps } from "../../deps";
import { ok, okJson, streamed } from "../../http/answer";
import { page } from "../../http/pages";
import { createdRow, okRow, recordWriteRoutes, writerOf } from "../../http/recordRoutes";
import { route } from "../../http/route";
import { requiredVersion } from "../../http/version";
import { historyRoutes } from "../history/routes";
import { trialsCsv } from "./csv";
import { listTrials } from "./list";
import { mapTrials } from "./map";
import { keptTrial, trialOf } from "./rows";
import { createTrial, deleteTrial, reopenTrial, restoreTrial, updateTrial } from "./service";
import { workingsOf } from "./workedOut";

const writers = ["technician", "metallurgist", "admin"] as const;
const reviewers = ["metallurgist", "admin"] as const;
const path = "/api/trials";
const byId = z.object({ id: z.string().min(1) });

export function trialRoutes({ db, clock, chemistry }: Deps) {
  const workings = () => workingsOf(chemistry);
  return [
    route({
      method: "GET",
      path,
      roles: "signed-in",
      query: trialsQuery,
      handle: ({ query }) => {
        const { rows, total } = listTrials(db, query);
        return ok(page(rows, total, query));
      },
    }),
    route({
      method: "GET",
      path: "/api/trials.csv",
      roles: "signed-in",
      query: trialsCsvQuery,
      handle: ({ query }) =>
        streamed(trialsCsv(db, workings(), query), {
          "Content-Type": "text/csv; charset=utf-8",
          "Content-Disposition": `attachment; filename="${query.lines}-${clock().toISOString().slice(0, 10)}.csv"`,
          "Cache-Control": "no-store",
        }),
    }),
    route({
      method: "GET",
      path: "/api/plans/:id/trials",
      roles: "signed-in",
      params: byId,
      query: mapTrialsQuery,
      handle: ({ params, query }) => okJson(mapTrials(db, params.id, query)),
    }),
    route({
      method: "POST",
      path,
      roles: writers,
      body: trialCreate,
      handle: ({ body, user }) => createdRow(createTrial(db, workings(), body, writerOf(user, clock))),
    }),
    route({
      method: "GET",
      path: `${path}/:id`,
      roles: "signed-in",
      params: byId,
      handle: ({ params }) => okRow(trialOf(db, params.id)),
    }),
    ...recordWriteRoutes({
      path,
      roles: writers,
      clock,
      update: trialUpdate,
      change: (id, seen, values, writer) => updateTrial(db, workings(), id, seen, values, writer),
      remove: (id, seen, reason, writer) => deleteTrial(db, id, seen, reason, writer),
      restore: (id, seen, reason, writer) => restoreTrial(db, workings(), id, seen, reason, writer),
    }),
    route({
      method: "POST",
      path: `${path}/:id/reopen`,
      roles: reviewers,
      params: byId,
      body: reasonRequired,
      handle: ({ params, body, user, req }) => {
        const seen = requiredVersion(req.get("if-match"));
        return okRow(reopenTrial(db, params.id, seen, body.reason, writerOf(user, clock)));
      },
    }),
    ...historyRoutes({ db, entity: "trial", path, roles: "signed-in", kept: (id) => keptTrial(trialOf(db, id)) }),
  ];
}
