import { eq, getTableColumns, inArray, ne, type SQL } from "drizzle-orm";
import { formulaVersion } from "../../../shared/metallurgy/formulaVersion";
import type { Db } from "../../db/open";
import { campaigns } from "../campaigns/schema";
import { feeds } from "../feeds/schema";
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

/** How many trials are read at a time. */
const chunk = 200;

function refreshWhere(
  db: Db,
  workings: Workings,
  filter: SQL,
  moved: (tx: Db, trial: Whole["trial"], worked: WorkedOut) => void = () => undefined,
): number {
  const ids = db
    .select({ id: trials.id })
    .from(trials)
    .where(filter)
    .all()
    .map(({ id }) => id);
  for (let start = 0; start < ids.length; start += chunk) {
    for (const whole of selectWhole(db, ids.slice(start, start + chunk))) {
      const worked = workedAnew(whole, workings);
      if (!worked) continue;
      db.update(trials).set(worked).where(eq(trials.id, whole.trial.id)).run();
      moved(db, whole.trial, worked);
    }
  }
  return ids.length;
}

/** After a change of the feed or of the campaign's stages; call it in the transaction of the change. An approved trial whose
 *  figures move says so in its record. */
export function refreshFigures(
  db: Db,
  workings: Workings,
  of: { feedId: string } | { campaignId: string },
  why: string,
  author: Author,
): void {
  const filter = "feedId" in of ? eq(trials.feedId, of.feedId) : eq(trials.campaignId, of.campaignId);
  refreshWhere(db, workings, filter, (tx, trial, worked) => {
    if (trial.status === "approved") recordMove(tx, trial, worked, why, author);
  });
}

/** Figures worked out by formulas of another version, when the server starts.
 *  @returns how many */
export const refreshOutdatedFigures = (db: Db, workings: Workings): number =>
  db.transaction((tx) => refreshWhere(tx, workings, ne(trials.formulaVersion, formulaVersion)));
