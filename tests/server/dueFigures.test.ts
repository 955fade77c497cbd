import { eq, like } from "drizzle-orm";
import { expect, test } from "vitest";
import { history, trials } from "../../server/db/schema";
import { trialRecords } from "../../server/features/trials/schema";
import { refreshOutdatedFigures, workOffDue, workOffDueLater } from "../../server/features/trials/refresh";
import { workingsOf } from "../../server/features/trials/workedOut";
import { formulaVersion } from "../../shared/metallurgy/formulaVersion";
import type { CampaignRow } from "../../shared/schemas/campaign";
import type { FeedRow } from "../../shared/schemas/feed";
import { bench, typed, unusualFeed } from "../support/records";
import { testServer } from "../support/testServer";

const heads = (zinc: string) => [
  { element: "Zn", value: typed(zinc, "%"), method: "", laboratory: "", head: true },
  ...unusualFeed.heads.filter(({ element }) => element !== "Zn"),
];

/** A feed with more trials than are worked out before a write is answered; the first of them is approved. */
async function many(n: number) {
  const server = await testServer();
  const metallurgist = await server.as("metallurgist");
  const { addTrial, feed } = await bench(metallurgist);
  const first = await addTrial({ code: "T-0", status: "approved" });
  const [light] = server.db.select().from(trials).all();
  const [record] = server.db.select().from(trialRecords).all();
  for (let i = 1; i < n; i += 1) {
    const id = `copy-${i}`;
    server.db
      .insert(trials)
      .values({ ...light!, id, code: `T-${i}`, codeKey: `t-${i}`, status: "balanced" })
      .run();
    server.db
      .insert(trialRecords)
      .values({ ...record!, trialId: id })
      .run();
  }
  const account = (id: string) =>
    server.db.select().from(trials).where(eq(trials.id, id)).get()?.accountabilityPct ?? 0;
  const due = () => server.db.select().from(trials).where(like(trials.formulaVersion, "due%")).all().length;
  const feedNow = async () => (await metallurgist.get(`/api/feeds/${feed.id}`).expect(200)).body as FeedRow;
  const change = (version: number, zinc: string) =>
    metallurgist
      .patch(`/api/feeds/${feed.id}`)
      .set("If-Match", `"${version}"`)
      .send({ heads: heads(zinc), reason: "umpire" })
      .expect(200);
  return {
    ...server,
    metallurgist,
    feed,
    first,
    account,
    due,
    feedNow,
    change,
    workings: workingsOf(server.deps.chemistry),
  };
}

test("a head assay moves the figures of a few trials before the answer", async () => {
  const { change, feed, first, account, due } = await many(3);
  const before = account(first.id);
  const { body } = await change(feed.version, "60");
  expect((body as FeedRow).figuresDue).toBe(0);
  expect(due()).toBe(0);
  expect(account(first.id)).not.toBe(before);
  expect(account("copy-2")).toBe(account(first.id));
});

test("those of many are worked out after the answer, are counted meanwhile, and an approved one says so on record", async () => {
  const { change, feed, first, account, due, feedNow, db } = await many(130);
  const before = account(first.id);
  const { body } = await change(feed.version, "60");
  expect((body as FeedRow).figuresDue).toBe(130);
  await expect.poll(async () => (await feedNow()).figuresDue, { timeout: 15_000 }).toBe(0);
  expect(due()).toBe(0);
  expect(account(first.id)).not.toBe(before);
  expect(account("copy-129")).toBe(account(first.id));
  const moved = db.select().from(history).where(eq(history.action, "recalculate")).all();
  expect(moved.map(({ entityId, reason }) => [entityId, reason])).toEqual([
    [first.id, `Feed ${feed.name}: heads changed (umpire)`],
  ]);
});

test("changed stages of a campaign say how many figures they made due, until none is", async () => {
  const { metallurgist, first } = await many(130);
  const campaign = `/api/campaigns/${first.campaignId}`;
  const now = async () => (await metallurgist.get(campaign).expect(200)).body as CampaignRow;
  const { version, stages, figuresDue } = await now();
  expect(figuresDue).toBe(0);
  const { body } = await metallurgist
    .patch(campaign)
    .set("If-Match", `"${version}"`)
    .send({ stages: stages.map((stage) => ({ ...stage, gangue: null })) })
    .expect(200);
  expect((body as CampaignRow).figuresDue).toBe(130);
  await expect.poll(async () => (await now()).figuresDue, { timeout: 15_000 }).toBe(0);
});

test("what was due when the server stopped is still due, is left to itself by a change of formulas, and is worked off", async () => {
  const { change, feed, first, account, due, db, raw, workings } = await many(130);
  const before = account(first.id);
  await change(feed.version, "60");
  await expect.poll(due, { timeout: 15_000 }).toBe(0);
  const after = account(first.id);
  raw.prepare("update trials set accountability_pct = ?, formula_version = 'due to write 1'").run(before);
  expect(refreshOutdatedFigures(db, workings)).toBe(0);
  expect(account("copy-7")).toBe(before);
  while (workOffDue(db, workings));
  expect(due()).toBe(0);
  expect([account(first.id), account("copy-7")]).toEqual([after, after]);
  expect(
    db
      .select()
      .from(trials)
      .all()
      .every((t) => t.formulaVersion === formulaVersion),
  ).toBe(true);
  workOffDueLater(db, workings);
});
