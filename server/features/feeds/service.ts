import { eq } from "drizzle-orm";
import type { z } from "zod";
import type { FeedCreate, FeedRow, feedUpdate } from "../../../shared/schemas/feed";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import { deleteRow, requireThere, restoreRow, writeRow, type RecordedTable } from "../history/rowWrites";
import { recordWrite, type Author } from "../history/service";
import { projectOf } from "../projects/service";
import { refreshFigures, workOffDueLater } from "../trials/refresh";
import type { Workings } from "../trials/workedOut";
import { feedOf } from "./rows";
import { feeds } from "./schema";

const nameOf = ({ name }: FeedRow) => `Feed ${name}`;

export const recordedFeeds: RecordedTable<FeedRow> = {
  entity: "feed",
  rowOf: feedOf,
  nameOf,
  keptOf: ({
    projectId,
    name,
    description,
    heads,
    minerals,
    carbonate,
    moisture,
    p80,
    solidDensity,
    deletedAt,
    version,
  }) => ({
    projectId,
    name,
    description,
    heads,
    minerals,
    carbonate,
    moisture,
    p80,
    solidDensity,
    deletedAt,
    version,
  }),
  set: (db, id, values) => void db.update(feeds).set(values).where(eq(feeds.id, id)).run(),
};

/** @param own  id and mark of a demo feed; a feed that members type is invented where its project is
 *  @throws Refusal NOT_FOUND for the project */
export function createFeed(db: Db, values: FeedCreate, author: Author, own?: { id: string }): FeedRow {
  const { invented } = projectOf(db, values.projectId);
  const id = own?.id ?? crypto.randomUUID();
  const at = author.now.toISOString();
  return db.transaction((tx) => {
    tx.insert(feeds)
      .values({ id, ...values, invented, createdAt: at, updatedAt: at })
      .run();
    const made = feedOf(tx, id);
    recordWrite(tx, { entity: "feed", id, action: "create", before: null, after: recordedFeeds.keptOf(made) }, author);
    return made;
  });
}

const words = new Set(["name", "description", "minerals"]);

/** Figures of its trials follow its head, moisture and the like, those of many after the answer.
 *  @throws Refusal NOT_FOUND, STALE, CONFLICT */
export const updateFeed = (
  db: Db,
  workings: Workings,
  id: string,
  seen: number,
  { reason, ...yours }: z.output<typeof feedUpdate> & { reason: string },
  author: Author,
): FeedRow =>
  writeRow(
    db,
    recordedFeeds,
    id,
    {
      seen,
      action: "change",
      reason,
      yours,
      check: (_tx, current) => requireThere(nameOf(current), current),
      then: (tx, _before, feed) => {
        if (Object.keys(yours).every((key) => words.has(key))) return;
        const why = `Feed ${feed.name}: ${Object.keys(yours).join(", ")} changed${reason === "" ? "" : ` (${reason})`}`;
        if (refreshFigures(tx, workings, { feedId: id }, why, author) > 0) workOffDueLater(db, workings);
      },
    },
    author,
  );

/** @throws Refusal NOT_FOUND, STALE; CONFLICT while trials use it */
export const deleteFeed = (db: Db, id: string, seen: number, reason: string, author: Author): FeedRow =>
  deleteRow(
    db,
    recordedFeeds,
    id,
    {
      seen,
      reason,
      check: (_tx, { name, trialCount }) => {
        if (trialCount === 0) return;
        const those = trialCount === 1 ? "a trial" : `${trialCount} trials`;
        const message = `Feed ${name} has ${those}, whose accounts rest on it: delete them or give them another feed.`;
        throw new Refusal("CONFLICT", "trialCount", message);
      },
    },
    author,
  );

/** @throws Refusal NOT_FOUND, STALE, CONFLICT */
export const restoreFeed = (db: Db, id: string, seen: number, reason: string, author: Author): FeedRow =>
  restoreRow(db, recordedFeeds, id, { seen, reason }, author);
