import { eq } from "drizzle-orm";
import { electrodeSeries } from "../../shared/electrodes/series";
import { campaignCreate } from "../../shared/schemas/campaign";
import { feedCreate } from "../../shared/schemas/feed";
import { trialCreate } from "../../shared/schemas/trial";
import type { Db } from "../db/open";
import { campaigns, feeds, trials } from "../db/schema";
import { createCampaign } from "../features/campaigns/service";
import type { Chemistry } from "../features/chemistry/library";
import { createFeed } from "../features/feeds/service";
import { Refusal } from "../http/refusal";
import { createTrial } from "../features/trials/service";
import { workingsOf } from "../features/trials/workedOut";
import { demoCampaigns } from "./trials/campaigns";
import { demoFeeds } from "./trials/feeds";
import { demoTrials } from "./trials/trials";

const metallurgist = { authorId: "demo-metallurgist", role: "metallurgist" } as const;
/** Trials are typed by the bench; approved ones need the rights of who approved them. */
const bench = { authorId: "demo-technician", role: "metallurgist" } as const;
const sampled = new Date("2026-09-21T07:00:00.000Z");
const day = 86_400_000;

/** A row the site's own rows leave no room for, as where a campaign of theirs has its code, is left out.
 *  @returns 1 when it was written */
function written(create: () => void): 0 | 1 {
  try {
    create();
    return 1;
  } catch (error) {
    if (error instanceof Refusal) return 0;
    throw error;
  }
}

/** Feeds, campaigns and trials of the demo, through the same doors as everybody's; a row that is there, deleted or not, stays as it is.
 *  @returns how many were written */
export function seedDemoRecords(db: Db, chemistry: Chemistry): number {
  const there = (table: typeof feeds | typeof campaigns | typeof trials, id: string) =>
    db.select({ id: table.id }).from(table).where(eq(table.id, id)).get() !== undefined;
  let added = 0;
  for (const { id, ...values } of demoFeeds) {
    if (there(feeds, id)) continue;
    added += written(() => createFeed(db, feedCreate.parse(values), { ...metallurgist, now: sampled }, { id }));
  }
  const typed = demoTrials(electrodeSeries(chemistry.current));
  for (const { id, ...values } of demoCampaigns) {
    if (there(campaigns, id)) continue;
    const starts = typed.flatMap(({ campaignId, startedAt }) =>
      campaignId === id && startedAt ? Date.parse(startedAt) : [],
    );
    const author = { ...metallurgist, now: new Date(Math.min(...starts) - day) };
    added += written(() => createCampaign(db, campaignCreate.parse(values), author, { id }));
  }
  const workings = workingsOf(chemistry);
  let now = sampled;
  for (const { id, ...values } of typed) {
    // One that is only planned was typed after the one before it.
    now = new Date(values.endedAt ?? values.startedAt ?? now);
    if (there(trials, id)) continue;
    added += written(() => createTrial(db, workings, trialCreate.parse(values), { ...bench, now }, { id }));
  }
  return added;
}
