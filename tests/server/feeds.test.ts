import type { Agent } from "supertest";
import { expect, test } from "vitest";
import type { Page, StaleAnswer } from "../../shared/schemas/api";
import type { FeedRow } from "../../shared/schemas/feed";
import type { TrialRow } from "../../shared/schemas/trial";
import { bench, typed, unusualFeed } from "../support/records";
import { testServer } from "../support/testServer";

const at = "2026-05-04T03:02:01.000Z";
const names = ({ body }: { body: unknown }) => (body as Page<FeedRow>).rows.map(({ name }) => name);

test("a feed comes back as it was typed, every field, to every role", async () => {
  const { as } = await testServer();
  const { feed, project } = await bench(await as("metallurgist"));
  const wanted: FeedRow = {
    ...unusualFeed,
    id: feed.id,
    projectId: project.id,
    projectName: "Calcine",
    invented: false,
    version: 1,
    createdAt: at,
    updatedAt: at,
    deletedAt: null,
    trialCount: 0,
    figuresDue: 0,
  };
  expect(feed).toEqual(wanted);
  const manager = await as("manager");
  const { body, headers } = await manager.get(`/api/feeds/${feed.id}`).expect(200);
  expect(body).toEqual(wanted);
  expect(headers).toMatchObject({ etag: '"1"', "cache-control": "no-store" });
  expect((await manager.get("/api/feeds")).body).toEqual({ rows: [wanted], total: 1, limit: 50, offset: 0 });
  await manager.get("/api/feeds/none").expect(404);
});

test("wrong numbers are refused with path, value and bound, a feed of no project with its path", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { project } = await bench(metallurgist);
  const values = { ...unusualFeed, projectId: project.id };
  const moisture = await metallurgist
    .post("/api/feeds")
    .send({ ...values, moisture: typed("150", "%") })
    .expect(400);
  expect(moisture.body).toMatchObject({
    error: { path: "moisture.text", message: /150 % is too high: the most is 1 g\/g/ },
  });
  const nowhere = await metallurgist
    .post("/api/feeds")
    .send({ ...values, projectId: "none" })
    .expect(404);
  expect(nowhere.body).toMatchObject({ error: { path: "projectId" } });
  expect((await metallurgist.get("/api/feeds")).body).toMatchObject({ total: 1 });
});

/** A new value for every field that can change. */
const change = {
  name: "Roast 8",
  description: "One shift.",
  heads: [{ element: "Zn", value: typed("57", "%"), method: "XRF", laboratory: "outside", head: true }],
  minerals: [{ mineral: "ZnFe2O4(s)", element: "Fe", share: typed("60", "%") }],
  carbonate: typed("0.6", "%"),
  moisture: typed("", "%"),
  p80: typed("90", "um"),
  solidDensity: typed("5000", "kg/m3"),
};

test("every field can be changed; the record keeps the row as it stood, who, when and why", async () => {
  const { as, now } = await testServer();
  const [metallurgist, admin] = [await as("metallurgist"), await as("admin")];
  const { feed } = await bench(metallurgist);
  const path = `/api/feeds/${feed.id}`;
  now("2026-05-05T06:07:08.000Z");
  const { body } = await admin
    .patch(path)
    .set("If-Match", '"1"')
    .send({ ...change, reason: "new bin" })
    .expect(200);
  const wanted = { ...feed, ...change, version: 2, updatedAt: "2026-05-05T06:07:08.000Z" };
  expect(body).toEqual(wanted);
  expect((await admin.get(path)).body).toEqual(wanted);

  const { body: record } = await metallurgist.get(`${path}/history`).expect(200);
  const rows = (record as Page<{ changes: { path: string }[] }>).rows;
  expect(rows[0]).toMatchObject({
    version: 2,
    action: "change",
    at: "2026-05-05T06:07:08.000Z",
    author: "The admin",
    reason: "new bin",
  });
  // A typed number is one change, not one of its text and one of its unit.
  expect(rows[0]?.changes).toContainEqual({ path: "p80", old: unusualFeed.p80, new: change.p80 });
  expect(rows[0]?.changes).toContainEqual({ path: "heads.0.value", old: typed("56,4", "%"), new: typed("57", "%") });
  expect(new Set(rows[0]?.changes.map((one) => one.path.split(".")[0]))).toEqual(new Set(Object.keys(change)));
  expect(rows[1]).toMatchObject({ version: 1, action: "create", author: "The metallurgist", changes: [] });
  const then = await metallurgist.get(`${path}/history/1`).expect(200);
  expect(then.body).toMatchObject({ ...unusualFeed, version: 1 });
});

test("a change without a version is refused, a stale one is told field by field and loses nothing", async () => {
  const { as } = await testServer();
  const [metallurgist, admin] = [await as("metallurgist"), await as("admin")];
  const { feed } = await bench(metallurgist);
  const path = `/api/feeds/${feed.id}`;
  await metallurgist.patch(path).send({ name: "mine" }).expect(428);
  const first = await admin
    .patch(path)
    .set("If-Match", "1")
    .send({ name: "theirs", p80: typed("90", "um") })
    .expect(200);
  const mine = { name: "mine", p80: typed("90", "um"), description: feed.description };
  const { body } = await metallurgist.patch(path).set("If-Match", "1").send(mine).expect(412);
  expect(body as StaleAnswer<FeedRow>).toMatchObject({
    error: { code: "STALE", path: "If-Match" },
    current: first.body as FeedRow,
    difference: [{ path: "name", base: "Roast 7, north bin", yours: "mine", theirs: "theirs" }],
  });
  expect((await metallurgist.get(path)).body).toEqual(first.body);
  expect((await metallurgist.get(`${path}/history`)).body).toMatchObject({ total: 2 });
});

test("lists filter by project, search and deletion, sort either way, and page", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { project, addFeed, addTrial } = await bench(metallurgist);
  await addFeed({ name: "alpha 100%", description: "_under" });
  const gone = await addFeed({ name: "Beta" });
  await addTrial();
  await metallurgist.delete(`/api/feeds/${gone.id}`).set("If-Match", "1").query({ reason: "typed twice" }).expect(200);
  const list = (query: object) => metallurgist.get("/api/feeds").query(query).expect(200);
  expect(names(await list({}))).toEqual(["alpha 100%", "Roast 7, north bin"]);
  expect(names(await list({ order: "desc" }))).toEqual(["Roast 7, north bin", "alpha 100%"]);
  expect(names(await list({ deleted: "true" }))).toEqual(["Beta"]);
  expect(names(await list({ deleted: "all", sort: "trialCount", order: "desc" }))[0]).toBe("Roast 7, north bin");
  expect(names(await list({ search: "100%" }))).toEqual(["alpha 100%"]);
  expect(names(await list({ search: "0%0" }))).toEqual([]);
  expect(names(await list({ search: "_UND" }))).toEqual(["alpha 100%"]);
  expect(names(await list({ projectId: "none" }))).toEqual([]);
  expect(names(await list({ projectId: project.id, limit: 1, offset: 1 }))).toEqual(["Roast 7, north bin"]);
  expect((await list({ limit: 1 })).body).toMatchObject({ total: 2 });
  await metallurgist.get("/api/feeds?sort=colour").expect(400);
});

test("a deleted feed can be brought back, is not changed meanwhile, and one with trials is not deleted", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { feed, addFeed, addTrial } = await bench(metallurgist);
  const { id } = await addFeed({ name: "Beta" });
  const path = `/api/feeds/${id}`;
  await metallurgist.delete(path).expect(428);
  const deleted = await metallurgist.delete(path).set("If-Match", "1").query({ reason: "typed twice" }).expect(200);
  expect(deleted.body).toMatchObject({ version: 2, deletedAt: at });
  await metallurgist.patch(path).set("If-Match", "2").send({ name: "x" }).expect(409);
  await metallurgist.delete(path).set("If-Match", "2").expect(409);
  await metallurgist.post(`${path}/restore`).set("If-Match", "1").expect(412);
  const back = await metallurgist
    .post(`${path}/restore`)
    .set("If-Match", "2")
    .send({ reason: "it was not" })
    .expect(200);
  expect(back.body).toMatchObject({ version: 3, deletedAt: null, name: "Beta" });
  await metallurgist.post(`${path}/restore`).set("If-Match", "3").expect(409);
  expect((await metallurgist.get(`${path}/history`)).body).toMatchObject({
    rows: [
      { action: "restore", reason: "it was not" },
      { action: "delete", reason: "typed twice" },
      { action: "create" },
    ],
  });

  const trial = await addTrial();
  const used = await metallurgist.delete(`/api/feeds/${feed.id}`).set("If-Match", "1").expect(409);
  expect(used.body).toMatchObject({ error: { code: "CONFLICT", message: /has a trial, whose accounts/ } });
  await metallurgist.delete(`/api/trials/${trial.id}`).set("If-Match", "1").expect(200);
  await metallurgist.delete(`/api/feeds/${feed.id}`).set("If-Match", "1").expect(200);
});

const figuresOf = async (client: Agent, id: string) =>
  ((await client.get(`/api/trials/${id}`).expect(200)).body as TrialRow).figures;

test("figures of the trials follow the head of their feed; an approved trial says so in its record", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { feed, addTrial } = await bench(metallurgist);
  const trial = await addTrial();
  const approved = await addTrial({ code: "NL-09" });
  await metallurgist.patch(`/api/trials/${approved.id}`).set("If-Match", "1").send({ status: "approved" }).expect(200);
  const before = await figuresOf(metallurgist, trial.id);
  expect(before.accountabilityPct).not.toBeNull();

  const words = { name: "Roast 7b", description: "Same stuff." };
  await metallurgist.patch(`/api/feeds/${feed.id}`).set("If-Match", "1").send(words).expect(200);
  expect(await figuresOf(metallurgist, trial.id)).toEqual(before);

  const heads = unusualFeed.heads.map((one) =>
    one.element === "Zn" && one.head ? { ...one, value: typed("27.9", "%") } : one,
  );
  await metallurgist
    .patch(`/api/feeds/${feed.id}`)
    .set("If-Match", "2")
    .send({ heads, reason: "re-assay" })
    .expect(200);
  const after = await figuresOf(metallurgist, trial.id);
  // Half the head: twice the metal found.
  expect(after.accountabilityPct).toBeCloseTo(2 * (before.accountabilityPct ?? 0), 6);
  expect(await figuresOf(metallurgist, approved.id)).toEqual(after);
  const { body } = await metallurgist.get(`/api/trials/${approved.id}/history`);
  expect((body as Page<object>).rows[0]).toMatchObject({
    version: 2,
    action: "recalculate",
    reason: "Feed Roast 7b: heads changed (re-assay)",
    author: "The metallurgist",
  });
  expect((await metallurgist.get(`/api/trials/${approved.id}`)).body).toMatchObject({ version: 2 });
  expect((await metallurgist.get(`/api/trials/${trial.id}/history`)).body).toMatchObject({ total: 1 });
});
