import { eq } from "drizzle-orm";
import type { z } from "zod";
import type { TrialCreate, TrialRow, trialUpdate } from "../../../shared/schemas/trial";
import type { Db } from "../../db/open";
import type { Writer } from "../../http/recordRoutes";
import { Refusal } from "../../http/refusal";
import { deleteRow, requireThere, restoreRow, writeRow, type RecordedTable } from "../history/rowWrites";
import { recordWrite } from "../history/service";
import {
  placeOf,
  requireElectrodes,
  requireFreeCode,
  requireLive,
  requireOpen,
  requireOrder,
  requireReplicate,
  requireReviewer,
  type Placed,
} from "./checks";
import { keptTrial, trialOf } from "./rows";
import { trialRecords, trials } from "./schema";
import { workedOut, type Workings } from "./workedOut";

const nameOf = ({ code }: { code: string }) => `Trial ${code}`;

/** NL-2 before NL-10. */
const sortKey = (code: string) => code.toLowerCase().replace(/\d+/g, (digits) => digits.padStart(8, "0"));

const recordParts = ["planned", "measured", "charge", "samples", "products"] as const;
type RecordPart = (typeof recordParts)[number];

/** Parts a write to the two tables of a trial. */
function parted(values: Record<string, unknown>) {
  const isRecord = (key: string) => recordParts.includes(key as RecordPart);
  const entries = Object.entries(values);
  const light = Object.fromEntries(entries.filter(([key]) => !isRecord(key)));
  return { light, record: Object.fromEntries(entries.filter(([key]) => isRecord(key))) };
}

/** Columns that follow from others. */
const derived = ({ code, startedAt }: Pick<TrialCreate, "code" | "startedAt">) => ({
  codeKey: sortKey(code),
  startedMs: startedAt === null ? null : Date.parse(startedAt),
});

export const recordedTrials: RecordedTable<TrialRow> = {
  entity: "trial",
  rowOf: trialOf,
  nameOf,
  keptOf: keptTrial,
  set: (db, id, values) => {
    const { light, record } = parted(values);
    db.update(trials).set(light).where(eq(trials.id, id)).run();
    if (Object.keys(record).length > 0) db.update(trialRecords).set(record).where(eq(trialRecords.trialId, id)).run();
  },
};

/** What must hold of a trial as a whole.
 *  @throws Refusal */
function requireSound(db: Db, trial: TrialCreate, id: string, workings: Workings): Placed {
  const place = placeOf(db, trial);
  requireFreeCode(db, trial, id);
  requireReplicate(db, trial.replicateOf, id, place);
  requireElectrodes(trial, workings);
  requireOrder(trial);
  return place;
}

/** @param own  id and mark of a demo trial
 *  @throws Refusal NOT_FOUND, INVALID_INPUT, CONFLICT, FORBIDDEN */
export function createTrial(
  db: Db,
  workings: Workings,
  values: TrialCreate,
  writer: Writer,
  own?: { id: string },
): TrialRow {
  requireReviewer(null, values.status, writer.role);
  const id = own?.id ?? crypto.randomUUID();
  const at = writer.now.toISOString();
  const { planned, measured, charge, samples, products, ...light } = values;
  return db.transaction((tx) => {
    const place = requireSound(tx, values, id, workings);
    requireLive(place);
    const { projectId, invented } = place.campaign;
    const row = { id, ...light, projectId, invented, createdAt: at, updatedAt: at };
    tx.insert(trials)
      .values({ ...row, ...derived(values), ...workedOut(values, place.feed, place.stage, workings) })
      .run();
    tx.insert(trialRecords).values({ trialId: id, planned, measured, charge, samples, products }).run();
    const made = trialOf(tx, id);
    recordWrite(tx, { entity: "trial", id, action: "create", before: null, after: keptTrial(made) }, writer);
    return made;
  });
}

/** Works the figures of a written trial out anew. */
function refreshOne(db: Db, workings: Workings, row: TrialRow): void {
  const { feed, stage } = placeOf(db, row);
  db.update(trials)
    .set({ ...derived(row), ...workedOut(row, feed, stage, workings) })
    .where(eq(trials.id, row.id))
    .run();
}

/** @throws Refusal NOT_FOUND, STALE, INVALID_INPUT, CONFLICT, LOCKED, FORBIDDEN */
export const updateTrial = (
  db: Db,
  workings: Workings,
  id: string,
  seen: number,
  { reason, ...yours }: z.output<typeof trialUpdate> & { reason: string },
  writer: Writer,
): TrialRow =>
  writeRow(
    db,
    recordedTrials,
    id,
    {
      seen,
      action: "change",
      reason,
      yours,
      check: (tx, current) => {
        requireThere(nameOf(current), current);
        requireOpen(current);
        const next = { ...current, ...yours };
        requireReviewer(current.status, next.status, writer.role);
        const place = requireSound(tx, next, id, workings);
        if (next.feedId !== current.feedId) requireLive(place);
      },
      then: (tx, _before, after) => refreshOne(tx, workings, after),
    },
    writer,
  );

/** Unlocks an approved trial.
 *  @throws Refusal NOT_FOUND, STALE; CONFLICT when it is not approved */
export const reopenTrial = (db: Db, id: string, seen: number, reason: string, writer: Writer): TrialRow =>
  writeRow(
    db,
    recordedTrials,
    id,
    {
      seen,
      action: "reopen",
      reason,
      yours: { status: "balanced", statusReason: reason },
      check: (_tx, current) => {
        requireThere(nameOf(current), current);
        if (current.status !== "approved")
          throw new Refusal(
            "CONFLICT",
            "status",
            `${nameOf(current)} is ${current.status}; only an approved one is locked.`,
          );
      },
    },
    writer,
  );

/** @throws Refusal NOT_FOUND, STALE, CONFLICT, LOCKED */
export const deleteTrial = (db: Db, id: string, seen: number, reason: string, writer: Writer): TrialRow =>
  deleteRow(db, recordedTrials, id, { seen, reason, check: (_tx, current) => requireOpen(current) }, writer);

/** @throws Refusal NOT_FOUND, STALE, CONFLICT */
export const restoreTrial = (
  db: Db,
  workings: Workings,
  id: string,
  seen: number,
  reason: string,
  writer: Writer,
): TrialRow =>
  restoreRow(
    db,
    recordedTrials,
    id,
    { seen, reason, check: (tx, current) => requireLive(requireSound(tx, current, id, workings)) },
    writer,
  );
