import { and, count, desc, eq, getTableColumns, inArray, like, ne, not, type SQL } from "drizzle-orm";
import { formulaVersion } from "../../../shared/metallurgy/formulaVersion";
import type { Db } from "../../db/open";
import { campaigns } from "../campaigns/schema";
import { feeds } from "../feeds/schema";
import { history } from "../history/schema";
import { recordWrite, type Author } from "../history/service";
import { asRow } from "./rows";
import { trialRecords, trials } from "./schema";
import { figuresOf, workedOut, type WorkedOut, type Workings } from "./workedOut";

const { trialId: _, ...recordColumns } = getTableColumns(trialRecords);

/** Trials with all that their figures rest on. */
const selectWhole = (db: Db, ids: readonly string[]) =>
  db
    .select({ trial: trials, record: recordColumns, feed: feeds, campaign: campaigns })
    .from(trials)
    .innerJoin(trialRecords, eq(trialRecords.trialId, trials.id))
    .innerJoin(feeds, eq(feeds.id, trials.feedId))
    .innerJoin(campaigns, eq(campaigns.id, trials.campaignId))
    .where(inArray(trials.id, [...ids]))
    .all();
type Whole = ReturnType<typeof selectWhole>[number];

function workedAnew({ trial, record, feed, campaign }: Whole, workings: Workings): WorkedOut | null {
  const stage = campaign.stages.find(({ code }) => code === trial.stage);
  if (!stage) return null; // of a deleted trial, whose stage went with it
  const row = asRow({ trial, record, campaignCode: campaign.code, feedName: feed.name });
  return workedOut(row, feed, stage, workings);
}

/** Puts on record that figures of an approved trial moved without a write to it. */
function recordMove(db: Db, trial: Whole["trial"], worked: WorkedOut, why: string, author: Author): void {
  const { id, version } = trial;
  const [before, after] = [
    { figures: figuresOf(trial), version },
    { figures: figuresOf(worked), version },
  ];
  if (JSON.stringify(before) === JSON.stringify(after)) return;
  recordWrite(db, { entity: "trial", id, action: "recalculate", before, after, reason: why.slice(0, 500) }, author);
}

/** Works the figures of some trials out anew and stores them. */
function refreshTrials(
  db: Db,
  workings: Workings,
  ids: readonly string[],
  moved: (trial: Whole["trial"], worked: WorkedOut) => void = () => undefined,
): void {
  for (const whole of selectWhole(db, ids)) {
    const worked = workedAnew(whole, workings);
    // Of a deleted trial without its stage nothing can be worked out, and nothing is due.
    const values = worked ?? { formulaVersion };
    db.update(trials).set(values).where(eq(trials.id, whole.trial.id)).run();
    if (worked) moved(whole.trial, worked);
  }
}

const idsWhere = (db: Db, filter: SQL, most = -1): string[] =>
  db
    .select({ id: trials.id })
    .from(trials)
    .where(filter)
    .limit(most)
    .all()
    .map(({ id }) => id);

/** About a millisecond each: so many are worked out before the write is answered, the rest after it, a few at a time. */
const AT_ONCE = 100;
const AT_A_TIME = 20;

/** In `formula_version` of a trial whose figures wait: the write on record that made them due. It outlives a restart. */
const DUE = "due to write ";
const isDue = like(trials.formulaVersion, `${DUE}%`);

/** After a change of the feed or of the campaign's stages, which is on record; call it in the transaction of the change. An approved
 *  trial whose figures move says so in its record.
 *  @returns how many wait for `workOffDue` */
export function refreshFigures(
  db: Db,
  workings: Workings,
  of: { feedId: string } | { campaignId: string },
  why: string,
  author: Author,
): number {
  const [entity, entityId] = "feedId" in of ? (["feed", of.feedId] as const) : (["campaign", of.campaignId] as const);
  const filter = eq(entity === "feed" ? trials.feedId : trials.campaignId, entityId);
  const ids = idsWhere(db, filter);
  if (ids.length > AT_ONCE) {
    const write = and(eq(history.entity, entity), eq(history.entityId, entityId));
    const last = db.select({ id: history.id }).from(history).where(write).orderBy(desc(history.id)).limit(1).get();
    db.update(trials)
      .set({ formulaVersion: `${DUE}${last?.id}` })
      .where(filter)
      .run();
    return ids.length;
  }
  refreshTrials(db, workings, ids, (trial, worked) => {
    if (trial.status === "approved") recordMove(db, trial, worked, why, author);
  });
  return 0;
}

/** The write that made a trial's figures due, in words and with its author. */
function causeOf(db: Db, due: string): { why: string; author: Author } | null {
  const found = db
    .select()
    .from(history)
    .where(eq(history.id, Number(due.slice(DUE.length))))
    .get();
  if (!found) return null;
  const fields = [...new Set(found.changes.map(({ path }) => path.split(".")[0]))].join(", ");
  const kept = found.before as { name?: string; code?: string } | null;
  const what = found.entity === "feed" ? `Feed ${kept?.name}` : `Campaign ${kept?.code}`;
  const why = `${what}: ${fields} changed${found.reason === "" ? "" : ` (${found.reason})`}`;
  return { why, author: { authorId: found.authorId, now: new Date(found.at) } };
}

/** A few of the figures that are due.
 *  @returns false when none is left */
export function workOffDue(db: Db, workings: Workings): boolean {
  return db.transaction((tx) => {
    const ids = idsWhere(tx, isDue, AT_A_TIME);
    refreshTrials(tx, workings, ids, (trial, worked) => {
      const cause = trial.status === "approved" ? causeOf(tx, trial.formulaVersion) : null;
      if (cause) recordMove(tx, trial, worked, cause.why, cause.author);
    });
    return ids.length === AT_A_TIME;
  });
}

const working = new Set<Db>();
const isOpen = (db: Db): boolean => !("$client" in db) || (db.$client as { open: boolean }).open;

/** Works off all figures that are due, between requests. Once is enough, however often it is asked. */
export function workOffDueLater(db: Db, workings: Workings): void {
  if (working.has(db)) return;
  working.add(db);
  const on = () => {
    // The server may have stopped meanwhile; what is due stays due.
    if (isOpen(db) && workOffDue(db, workings)) setTimeout(on, 5);
    else working.delete(db);
  };
  setTimeout(on, 0);
}

/** How many trials of a feed or a campaign show figures that are being worked out anew. Nothing is counted while nothing is worked
 *  on. */
export function figuresDue(db: Db, of: { feedId: string } | { campaignId: string }): number {
  if (working.size === 0) return 0;
  return (
    db
      .select({ n: count() })
      .from(trials)
      .where(and("feedId" in of ? eq(trials.feedId, of.feedId) : eq(trials.campaignId, of.campaignId), isDue))
      .get()?.n ?? 0
  );
}

/** Figures worked out by formulas of another version, when the server starts; those that are due wait for `workOffDueLater`.
 *  @returns how many */
export const refreshOutdatedFigures = (db: Db, workings: Workings): number =>
  db.transaction((tx) => {
    const ids = idsWhere(tx, and(ne(trials.formulaVersion, formulaVersion), not(isDue))!);
    for (let start = 0; start < ids.length; start += AT_ONCE)
      refreshTrials(tx, workings, ids.slice(start, start + AT_ONCE));
    return ids.length;
  });
