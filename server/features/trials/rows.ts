import { eq, getTableColumns, inArray } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import type { TrialRow } from "../../../shared/schemas/trial";
import type { TrialListRow } from "../../../shared/schemas/trialRows";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import { campaigns } from "../campaigns/schema";
import { feeds } from "../feeds/schema";
import type { Kept } from "../history/service";
import { trialRecords, trials } from "./schema";
import { figuresOf } from "./workedOut";

type StoredTrial = typeof trials.$inferSelect;
type LightTrial = Omit<StoredTrial, "compared">;
type StoredRecord = Omit<typeof trialRecords.$inferSelect, "trialId">;

/** What is joined to a trial. */
interface Joined {
  campaignCode: string;
  feedName: string;
}

/** The light row of a trial, as its table holds it, in the words of the API. */
const light = (trial: LightTrial, { campaignCode, feedName }: Joined) => ({
  id: trial.id,
  campaignId: trial.campaignId,
  campaignCode,
  feedId: trial.feedId,
  feedName,
  code: trial.code,
  kind: trial.kind,
  stage: trial.stage,
  status: trial.status,
  statusReason: trial.statusReason,
  operator: trial.operator,
  startedAt: trial.startedAt,
  endedAt: trial.endedAt,
  replicateOf: trial.replicateOf,
  notes: trial.notes,
  invented: trial.invented,
  version: trial.version,
  createdAt: trial.createdAt,
  updatedAt: trial.updatedAt,
  deletedAt: trial.deletedAt,
  figures: figuresOf(trial),
});

const { trialId: _, ...recordColumns } = getTableColumns(trialRecords);

const selectTrials = (db: Db) =>
  db
    .select({ trial: trials, record: recordColumns, campaignCode: campaigns.code, feedName: feeds.name })
    .from(trials)
    .innerJoin(trialRecords, eq(trialRecords.trialId, trials.id))
    .innerJoin(campaigns, eq(campaigns.id, trials.campaignId))
    .innerJoin(feeds, eq(feeds.id, trials.feedId));
type Selected = Joined & { trial: StoredTrial; record: StoredRecord };

export const asRow = ({ trial, record, ...joined }: Selected): TrialRow => ({ ...light(trial, joined), ...record });

/** @throws Refusal NOT_FOUND with the path of the field that named it */
export function trialOf(db: Db, id: string, path = "id"): TrialRow {
  const found = selectTrials(db).where(eq(trials.id, id)).get();
  if (!found) throw new Refusal("NOT_FOUND", path, `There is no trial ${id}.`);
  return asRow(found);
}

const inOrder = <Row extends { id: string }>(ids: readonly string[], rows: readonly Row[]): Row[] => {
  const byId = new Map(rows.map((row) => [row.id, row]));
  return ids.flatMap((id) => byId.get(id) ?? []);
};

/** Whole trials, in the order of the ids; an id that is none is left out. */
export function trialsOf(
  db: Db,
  ids: readonly string[],
): (TrialRow & { electrode: string | null; formulaVersion: string })[] {
  const found = selectTrials(db)
    .where(inArray(trials.id, [...ids]))
    .all();
  const rows = found.map((one) => ({
    ...asRow(one),
    electrode: one.trial.electrode,
    formulaVersion: one.trial.formulaVersion,
  }));
  return inOrder(ids, rows);
}

const { compared: _compared, ...lightColumns } = getTableColumns(trials);
const repeated = alias(trials, "repeated");

/** Trials without their records, in the order of the ids. */
export function listRowsOf(db: Db, ids: readonly string[]): TrialListRow[] {
  const found = db
    .select({ trial: lightColumns, campaignCode: campaigns.code, feedName: feeds.name, replicateOfCode: repeated.code })
    .from(trials)
    .innerJoin(campaigns, eq(campaigns.id, trials.campaignId))
    .innerJoin(feeds, eq(feeds.id, trials.feedId))
    .leftJoin(repeated, eq(repeated.id, trials.replicateOf))
    .where(inArray(trials.id, [...ids]))
    .all();
  const rows = found.map(({ trial, replicateOfCode, ...joined }): TrialListRow => {
    return { ...light(trial, joined), replicateOfCode };
  });
  return inOrder(ids, rows);
}

/** What the history keeps: the record as it was typed, nothing that is worked out from it. */
export function keptTrial(row: TrialRow): Kept {
  const {
    id: _id,
    campaignCode: _campaign,
    feedName: _feed,
    figures: _figures,
    invented: _invented,
    createdAt: _created,
    updatedAt: _updated,
    ...kept
  } = row;
  return kept;
}
