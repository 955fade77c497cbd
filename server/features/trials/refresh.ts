import { eq, getTableColumns, ne, type SQL } from "drizzle-orm";
import { formulaVersion } from "../../../shared/metallurgy/formulaVersion";
import type { Db } from "../../db/open";
import { campaigns } from "../campaigns/schema";
import { feeds } from "../feeds/schema";
import { recordWrite, type Author } from "../history/service";
import { asRow } from "./rows";
import { trialRecords, trials } from "./schema";
import { figuresOf, workedOut, type Workings } from "./workedOut";

const { trialId: _, ...recordColumns } = getTableColumns(trialRecords);

/** Works out the figures of some trials anew. An approved trial whose figures move says so in its record. */
function refreshWhere(db: Db, workings: Workings, filter: SQL | undefined, why: string, author: Author | null): number {
  const ids = db.select({ id: trials.id }).from(trials).where(filter).all();
  for (const { id } of ids) {
    const found = db
      .select({ trial: trials, record: recordColumns, feed: feeds, campaign: campaigns })
      .from(trials)
      .innerJoin(trialRecords, eq(trialRecords.trialId, trials.id))
      .innerJoin(feeds, eq(feeds.id, trials.feedId))
      .innerJoin(campaigns, eq(campaigns.id, trials.campaignId))
      .where(eq(trials.id, id))
      .get();
    const stage = found?.campaign.stages.find(({ code }) => code === found.trial.stage);
    if (!found || !stage) continue;
    const { trial, record, feed, campaign } = found;
    const row = asRow({ trial, record, campaignCode: campaign.code, feedName: feed.name });
    const worked = workedOut(row, feed, stage, workings);
    db.update(trials).set(worked).where(eq(trials.id, id)).run();
    if (trial.status !== "approved" || author === null) continue;
    const { version } = trial;
    const [before, after] = [
      { figures: figuresOf(trial), version },
      { figures: figuresOf(worked), version },
    ];
    if (JSON.stringify(before) === JSON.stringify(after)) continue;
    recordWrite(db, { entity: "trial", id, action: "recalculate", before, after, reason: why.slice(0, 500) }, author);
  }
  return ids.length;
}

/** After a change of the feed or of the campaign's stages; call it in the transaction of the change. */
export function refreshFigures(
  db: Db,
  workings: Workings,
  of: { feedId: string } | { campaignId: string },
  why: string,
  author: Author,
): void {
  const filter = "feedId" in of ? eq(trials.feedId, of.feedId) : eq(trials.campaignId, of.campaignId);
  refreshWhere(db, workings, filter, why, author);
}

/** Figures worked out by formulas of another version, when the server starts.
 *  @returns how many */
export function refreshOutdatedFigures(db: Db, workings: Workings): number {
  return db.transaction((tx) => refreshWhere(tx, workings, ne(trials.formulaVersion, formulaVersion), "", null));
}
