import { and, count, eq, isNull, ne, notInArray } from "drizzle-orm";
import type { z } from "zod";
import type { CampaignCreate, CampaignRow, campaignUpdate } from "../../../shared/schemas/campaign";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import { deleteRow, requireThere, restoreRow, writeRow, type RecordedTable } from "../history/rowWrites";
import { recordWrite, type Author } from "../history/service";
import { revisionOf, storedPlan } from "../plans/rows";
import { projectOf } from "../projects/service";
import { refreshFigures, workOffDueLater } from "../trials/refresh";
import { trials } from "../trials/schema";
import type { Workings } from "../trials/workedOut";
import { campaignOf } from "./rows";
import { campaigns } from "./schema";

const nameOf = ({ code }: CampaignRow) => `Campaign ${code}`;

export const recordedCampaigns: RecordedTable<CampaignRow> = {
  entity: "campaign",
  rowOf: campaignOf,
  nameOf,
  keptOf: ({ projectId, code, title, question, planId, planRevision, notes, stages, deletedAt, version }) => ({
    projectId,
    code,
    title,
    question,
    planId,
    planRevision,
    notes,
    stages,
    deletedAt,
    version,
  }),
  set: (db, id, values) => void db.update(campaigns).set(values).where(eq(campaigns.id, id)).run(),
};

type Placed = Pick<CampaignRow, "projectId" | "code" | "planId" | "planRevision">;

/** @throws Refusal NOT_FOUND, INVALID_INPUT: the plan, its revision, its project */
function requirePlan(db: Db, { projectId, planId, planRevision }: Placed): void {
  const plan = storedPlan(db, planId, "planId");
  if (plan.projectId !== projectId)
    throw new Refusal(
      "INVALID_INPUT",
      "planId",
      `Plan ${plan.name} is of the project ${plan.projectName}, not of the campaign's.`,
    );
  revisionOf(db, planId, planRevision, "planRevision");
}

/** @throws Refusal CONFLICT when another campaign of the project has the code */
function requireFreeCode(db: Db, { projectId, code }: Placed, id: string): void {
  const taken = and(
    eq(campaigns.projectId, projectId),
    eq(campaigns.code, code),
    isNull(campaigns.deletedAt),
    ne(campaigns.id, id),
  );
  if (db.select().from(campaigns).where(taken).get())
    throw new Refusal("CONFLICT", "code", `The project has a campaign ${code} already.`);
}

/** @throws Refusal NOT_FOUND, INVALID_INPUT, CONFLICT */
export function createCampaign(db: Db, values: CampaignCreate, author: Author, own?: { id: string }): CampaignRow {
  const { invented } = projectOf(db, values.projectId);
  const id = own?.id ?? crypto.randomUUID();
  const at = author.now.toISOString();
  return db.transaction((tx) => {
    requirePlan(tx, values);
    requireFreeCode(tx, values, id);
    tx.insert(campaigns)
      .values({ id, ...values, invented, createdAt: at, updatedAt: at })
      .run();
    const made = campaignOf(tx, id);
    const after = recordedCampaigns.keptOf(made);
    recordWrite(tx, { entity: "campaign", id, action: "create", before: null, after }, author);
    return made;
  });
}

/** A stage that trials name cannot go.
 *  @throws Refusal CONFLICT */
function requireStagesKept(db: Db, id: string, stages: CampaignRow["stages"]): void {
  const codes = stages.map(({ code }) => code);
  const without = and(eq(trials.campaignId, id), isNull(trials.deletedAt), notInArray(trials.stage, codes));
  const found = db.select({ stage: trials.stage, n: count() }).from(trials).where(without).groupBy(trials.stage).all();
  if (found.length === 0) return;
  const which = found.map(({ stage, n }) => `${stage} (${n})`).join(", ");
  throw new Refusal(
    "CONFLICT",
    "stages",
    `Stages that trials name cannot go: ${which}. Give those trials another stage first.`,
  );
}

/** Figures of its trials follow the target and the gangue of its stages.
 *  @throws Refusal NOT_FOUND, STALE, INVALID_INPUT, CONFLICT */
export const updateCampaign = (
  db: Db,
  workings: Workings,
  id: string,
  seen: number,
  { reason, ...yours }: z.output<typeof campaignUpdate> & { reason: string },
  author: Author,
): CampaignRow =>
  writeRow(
    db,
    recordedCampaigns,
    id,
    {
      seen,
      action: "change",
      reason,
      yours,
      check: (tx, current) => {
        requireThere(nameOf(current), current);
        const next = { ...current, ...yours };
        requirePlan(tx, next);
        requireFreeCode(tx, next, id);
        requireStagesKept(tx, id, next.stages);
      },
      then: (tx, _before, { code }) => {
        if (!yours.stages) return;
        const due = refreshFigures(tx, workings, { campaignId: id }, `Stages of campaign ${code} changed`, author);
        if (due > 0) workOffDueLater(db, workings);
      },
    },
    author,
  );

/** Its trials stay with it, out of every list until it is restored.
 *  @throws Refusal NOT_FOUND, STALE, CONFLICT */
export const deleteCampaign = (db: Db, id: string, seen: number, reason: string, author: Author): CampaignRow =>
  deleteRow(db, recordedCampaigns, id, { seen, reason }, author);

/** @throws Refusal NOT_FOUND, STALE, CONFLICT */
export const restoreCampaign = (db: Db, id: string, seen: number, reason: string, author: Author): CampaignRow =>
  restoreRow(
    db,
    recordedCampaigns,
    id,
    { seen, reason, check: (tx, current) => requireFreeCode(tx, current, id) },
    author,
  );
