import { z } from "../../../shared/schemas/z";
import { campaignCreate, campaignsQuery, campaignUpdate } from "../../../shared/schemas/campaign";
import { campaignPairQuery } from "../../../shared/schemas/campaignSummary";
import type { Deps } from "../../deps";
import { ok } from "../../http/answer";
import { page } from "../../http/pages";
import { createdRow, okRow, recordWriteRoutes, writerOf } from "../../http/recordRoutes";
import { route } from "../../http/route";
import { historyRoutes } from "../history/routes";
import { workingsOf } from "../trials/workedOut";
import { campaignOf, listCampaigns } from "./rows";
import { createCampaign, deleteCampaign, recordedCampaigns, restoreCampaign, updateCampaign } from "./service";
import { revisionSolver } from "./solved";
import { pairOf, summaryOf } from "./summary";

const writers = ["metallurgist", "admin"] as const;
const path = "/api/campaigns";
const byId = z.object({ id: z.string().min(1) });

export function campaignRoutes(deps: Deps) {
  const { db, clock, chemistry } = deps;
  const solved = revisionSolver(deps);
  return [
    route({
      method: "GET",
      path,
      roles: "signed-in",
      query: campaignsQuery,
      handle: ({ query }) => {
        const { rows, total } = listCampaigns(db, query);
        return ok(page(rows, total, query));
      },
    }),
    route({
      method: "GET",
      path: `${path}/pair`,
      roles: "signed-in",
      query: campaignPairQuery,
      handle: ({ query }) => ok(pairOf(db, solved, workingsOf(chemistry), query)),
    }),
    route({
      method: "POST",
      path,
      roles: writers,
      body: campaignCreate,
      handle: ({ body, user }) => createdRow(createCampaign(db, body, writerOf(user, clock))),
    }),
    route({
      method: "GET",
      path: `${path}/:id`,
      roles: "signed-in",
      params: byId,
      handle: ({ params }) => okRow(campaignOf(db, params.id)),
    }),
    route({
      method: "GET",
      path: `${path}/:id/summary`,
      roles: "signed-in",
      params: byId,
      handle: ({ params }) => ok(summaryOf(db, solved, params.id)),
    }),
    ...recordWriteRoutes({
      path,
      roles: writers,
      clock,
      update: campaignUpdate,
      change: (id, seen, values, writer) => updateCampaign(db, workingsOf(chemistry), id, seen, values, writer),
      remove: (id, seen, reason, writer) => deleteCampaign(db, id, seen, reason, writer),
      restore: (id, seen, reason, writer) => restoreCampaign(db, id, seen, reason, writer),
    }),
    ...historyRoutes({
      db,
      entity: "campaign",
      path,
      roles: "signed-in",
      kept: (id) => recordedCampaigns.keptOf(campaignOf(db, id)),
    }),
  ];
}
