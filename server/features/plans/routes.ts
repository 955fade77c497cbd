import { z } from "../../../shared/schemas/z";
import { pageQuery, planDuplicate, plansQuery } from "../../../shared/schemas/api";
import { withReason } from "../../../shared/schemas/history";
import type { Member } from "../../../shared/schemas/member";
import { planCreate, planUpdate, revisionCreate, type PlanRow } from "../../../shared/schemas/plan";
import type { Deps } from "../../deps";
import { created, ok, type Answer } from "../../http/answer";
import { page } from "../../http/pages";
import { route } from "../../http/route";
import { ifMatch, requiredVersion, versionHeaders } from "../../http/version";
import { historyRoutes } from "../history/routes";
import { outdatedSpecies } from "./outdated";
import { keptPlan, listPlans, listRevisions, planOf, revisionOf, storedPlan } from "./rows";
import { addRevision, createPlan, duplicatePlan, updatePlan, type Writing } from "./service";

const writers = ["metallurgist", "admin"] as const;
const byId = z.object({ id: z.string().min(1) });
const byNumber = byId.extend({ number: z.coerce.number().int().min(1) });

const tagged = (answer: (body: unknown, headers: Record<string, string>) => Answer, plan: PlanRow) =>
  answer(plan, versionHeaders(plan.version));

export function planRoutes({ db, clock, chemistry }: Deps) {
  const outdated = outdatedSpecies(chemistry);
  const writing = (user: Member): Writing => ({
    authorId: user.id,
    now: clock(),
    dataVersion: chemistry.current.version,
    outdated,
  });
  return [
    route({
      method: "GET",
      path: "/api/plans",
      roles: "signed-in",
      query: plansQuery,
      handle: ({ query }) => {
        const { rows, total } = listPlans(db, query, outdated);
        return ok(page(rows, total, query));
      },
    }),
    route({
      method: "POST",
      path: "/api/plans",
      roles: writers,
      body: planCreate,
      handle: ({ body, user }) => tagged(created, createPlan(db, body, writing(user))),
    }),
    route({
      method: "GET",
      path: "/api/plans/:id",
      roles: "signed-in",
      params: byId,
      handle: ({ params }) => tagged(ok, planOf(db, params.id, outdated)),
    }),
    route({
      method: "PATCH",
      path: "/api/plans/:id",
      roles: writers,
      params: byId,
      body: z.intersection(planUpdate, withReason),
      handle: ({ params, body, user, req }) =>
        tagged(ok, updatePlan(db, params.id, requiredVersion(req.get("if-match")), body, writing(user))),
    }),
    route({
      method: "POST",
      path: "/api/plans/:id/duplicate",
      roles: writers,
      params: byId,
      body: planDuplicate,
      handle: ({ params, body, user }) => tagged(created, duplicatePlan(db, params.id, body, writing(user))),
    }),
    route({
      method: "GET",
      path: "/api/plans/:id/revisions",
      roles: "signed-in",
      params: byId,
      query: pageQuery,
      handle: ({ params, query }) => {
        const { rows, total } = listRevisions(db, params.id, query);
        return ok(page(rows, total, query));
      },
    }),
    route({
      method: "POST",
      path: "/api/plans/:id/revisions",
      roles: writers,
      params: byId,
      body: revisionCreate,
      handle: ({ params, body, user, req }) =>
        created(addRevision(db, params.id, ifMatch(req.get("if-match")), body, writing(user))),
    }),
    route({
      method: "GET",
      path: "/api/plans/:id/revisions/:number",
      roles: "signed-in",
      params: byNumber,
      handle: ({ params }) => ok(revisionOf(db, params.id, params.number)),
    }),
    ...historyRoutes({
      db,
      entity: "plan",
      path: "/api/plans",
      roles: "signed-in",
      kept: (id) => keptPlan(storedPlan(db, id)),
    }),
  ];
}
