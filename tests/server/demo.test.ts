import { eq, inArray } from "drizzle-orm";
import { expect, test } from "vitest";
import type { OpenDatabase } from "../../server/db/open";
import {
  campaigns,
  feeds,
  history,
  planRevisions,
  plans,
  projects,
  trialRecords,
  trials,
  users,
} from "../../server/db/schema";
import { demoAccounts, demoPassword } from "../../server/demo/accounts";
import { demoPlans } from "../../server/demo/plans";
import { seedDemo, seedDemoAtStart } from "../../server/demo/seed";
import { demoCampaigns } from "../../server/demo/trials/campaigns";
import { demoFeeds } from "../../server/demo/trials/feeds";
import { demoTrials } from "../../server/demo/trials/trials";
import { electrodeSeries } from "../../shared/electrodes/series";
import { valueOf } from "../../shared/outcome";
import { toProblem } from "../../shared/plan/toProblem";
import type { CampaignSummaryAnswer } from "../../shared/schemas/campaignSummary";
import { planInputs } from "../../shared/schemas/plan";
import { memberRoles } from "../../shared/schemas/member";
import { solve } from "../../shared/solve";
import { unusualInputs } from "../support/planInputs";
import { library, tables, testServer } from "../support/testServer";

const everything = ({ db }: OpenDatabase) => ({
  users: db.select().from(users).all(),
  projects: db.select().from(projects).all(),
  plans: db.select().from(plans).all(),
  revisions: db.select().from(planRevisions).all(),
  feeds: db.select().from(feeds).all(),
  campaigns: db.select().from(campaigns).all(),
  trials: db.select().from(trials).all(),
  records: db.select().from(trialRecords).all(),
  history: db.select().from(history).all(),
});

test("an empty database gets one account a role, plans with revisions, and everything says that it is invented", async () => {
  const server = await testServer({ members: false });
  expect(await seedDemoAtStart(server.db, server.deps.chemistry)).toBe("whole");
  const rows = everything(server);
  const invented = [demoFeeds, demoCampaigns, demoTrials(electrodeSeries(tables))];
  expect([rows.feeds, rows.campaigns, rows.trials].map(({ length }) => length)).toEqual(
    invented.map(({ length }) => length),
  );
  expect(rows.users.map(({ role }) => role).sort()).toEqual([...memberRoles].sort());
  expect([...rows.projects, ...rows.plans].every(({ invented }) => invented)).toBe(true);
  expect(rows.projects.every(({ siteName }) => siteName.includes("invented"))).toBe(true);
  for (const { email } of demoAccounts) {
    await server.anyone.post("/api/session").send({ email, password: demoPassword }).expect(200);
  }
  const { body } = await server.anyone.get("/api/plans").expect(200);
  const found = (body as { rows: { name: string; revisionCount: number; latest: { inputs: unknown } }[] }).rows;
  expect(found).toHaveLength(demoPlans.length);
  for (const { name, revisions } of demoPlans) {
    const plan = found.find((row) => row.name === name);
    const { note, at: createdAt, inputs } = revisions.at(-1) ?? expect.fail(`${name} has no revision`);
    expect(plan).toMatchObject({ revisionCount: revisions.length, latest: { note, createdAt, inputs } });
  }
});

test("the demo has campaigns and trials with figures, all marked as invented, as if the bench had typed them", async () => {
  const server = await testServer({ members: false });
  await seedDemo(server.db, server.deps.chemistry);
  const rows = everything(server);
  expect(rows.campaigns.length).toBeGreaterThanOrEqual(4);
  expect(rows.trials.length).toBeGreaterThanOrEqual(60);
  expect(new Set(rows.trials.map(({ feedId }) => feedId)).size).toBeGreaterThanOrEqual(2);
  const marked = [...rows.feeds, ...rows.campaigns, ...rows.trials];
  expect(marked.every(({ invented }) => invented)).toBe(true);
  const closed = rows.trials.flatMap(({ accountabilityPct }) => accountabilityPct ?? []);
  const within = closed.filter((percent) => percent >= 95 && percent <= 105).length;
  expect(within / closed.length).toBeGreaterThan(0.75);
  const created = rows.history.filter(({ action, entity }) => action === "create" && entity === "trial");
  expect(created.length).toBe(rows.trials.length);
  const demoAdmin = { email: "admin@tarnhollow.example", password: demoPassword };
  await server.anyone.post("/api/session").send(demoAdmin).expect(200);
  for (const { id } of rows.campaigns) {
    const { body } = await server.anyone.get(`/api/campaigns/${id}/summary`).expect(200);
    const { plan, stages } = body as CampaignSummaryAnswer;
    expect(plan).toMatchObject({ failure: null, dataVersion: tables.version });
    expect(stages.every(({ recovery }) => recovery !== null)).toBe(true);
  }
});

test("the sign-in page is told the demo's accounts while they are there, and nobody who is signed in", async () => {
  const server = await testServer({ members: false });
  expect((await server.anyone.get("/api/session").expect(200)).body).not.toHaveProperty("demo");
  await seedDemo(server.db, server.deps.chemistry);
  const { body } = await server.anyone.get("/api/session").expect(200);
  expect(body).toEqual({
    user: null,
    needsFirstAdmin: false,
    demo: { accounts: demoAccounts.map(({ email, role }) => ({ email, role })), password: demoPassword },
  });
  const [first] = demoAccounts;
  await server.anyone.post("/api/session").send({ email: first?.email, password: demoPassword }).expect(200);
  expect((await server.anyone.get("/api/session").expect(200)).body).not.toHaveProperty("demo");
});

test("what the demo asks fits the schema of a plan", () => {
  for (const { name, revisions } of demoPlans) {
    for (const { inputs } of revisions) expect(planInputs.safeParse(inputs).error, name).toBeUndefined();
  }
});

test("every revision of the demo opens a window that its loops can hold", () => {
  for (const { name, revisions } of demoPlans) {
    for (const { inputs } of revisions) {
      const { windows } = valueOf(solve(toProblem(inputs, library), library));
      expect(windows[0]?.controllable, name).toBe(true);
    }
  }
});

test("seeding twice changes nothing, not even what was edited or archived since", async () => {
  const server = await testServer({ members: false });
  await seedDemo(server.db, server.deps.chemistry);
  server.db.update(plans).set({ name: "Renamed", archived: true }).where(eq(plans.id, "demo-neutral-leach")).run();
  server.db
    .update(trials)
    .set({ deletedAt: "2026-10-01T00:00:00.000Z" })
    .where(eq(trials.campaignId, "demo-campaign-nl-1"))
    .run();
  server.db.update(feeds).set({ name: "Renamed" }).run();
  server.db.update(users).set({ passwordHash: "changed" }).where(eq(users.id, "demo-admin")).run();
  const before = everything(server);
  await seedDemo(server.db, server.deps.chemistry);
  expect(everything(server)).toEqual(before);
});

test("a database with an earlier demo gets what was invented since, and keeps every edit, deletion and account as it is", async () => {
  const server = await testServer({ members: false });
  const { db, deps } = server;
  await seedDemo(db, deps.chemistry);
  const latest = everything(server);
  // As it was before two campaigns and a plan were invented, and edited since.
  const [gone, shut] = ["demo-campaign-ox-1", "demo-campaign-zd-1"];
  const lost = latest.trials.filter(({ campaignId }) => campaignId === gone || campaignId === shut).map(({ id }) => id);
  db.delete(trialRecords).where(inArray(trialRecords.trialId, lost)).run();
  db.update(trials).set({ replicateOf: null }).where(inArray(trials.id, lost)).run();
  db.delete(trials).where(inArray(trials.id, lost)).run();
  db.delete(campaigns)
    .where(inArray(campaigns.id, [gone, shut]))
    .run();
  db.update(campaigns).set({ title: "Ours now", version: 2 }).where(eq(campaigns.id, "demo-campaign-nl-1")).run();
  db.update(users).set({ disabledAt: "2026-10-01T00:00:00.000Z" }).where(eq(users.id, "demo-manager")).run();
  // A campaign of the members' own has taken the code of one.
  const login = { email: "metallurgist@tarnhollow.example", password: demoPassword };
  await server.anyone.post("/api/session").send(login).expect(200);
  const [first] = demoCampaigns;
  const own = { ...first, id: undefined, code: "ZD-1", title: "Members' own" };
  await server.anyone.post("/api/campaigns").send(own).expect(201);
  const before = everything(server);

  const added = await seedDemoAtStart(db, deps.chemistry);
  const after = everything(server);
  for (const name of Object.keys(before) as (keyof typeof before)[])
    for (const row of before[name]) expect(after[name]).toContainEqual(row);
  expect(after.users).toEqual(before.users);
  const back = latest.trials.filter(({ campaignId }) => campaignId === gone).length;
  expect(added).toBe(1 + back);
  expect(after.campaigns.length).toBe(before.campaigns.length + 1);
  expect(after.trials.length).toBe(before.trials.length + back);
  expect(await seedDemoAtStart(db, deps.chemistry)).toBe(0);
  expect(everything(server)).toEqual(after);
});

test("real members and plans are not touched, and beside them the demo is not written of itself", async () => {
  const server = await testServer();
  const metallurgist = await server.as("metallurgist");
  const project = await metallurgist.post("/api/projects").send({ siteName: "North works", name: "Calcine circuit" });
  const projectId = (project.body as { id: string }).id;
  const plan = { projectId, name: "Neutral leach, second tank", inputs: unusualInputs };
  await metallurgist.post("/api/plans").send(plan).expect(201);
  const before = everything(server);
  expect(await seedDemoAtStart(server.db, server.deps.chemistry)).toBe(0);
  expect(everything(server)).toEqual(before);

  await seedDemo(server.db, server.deps.chemistry);
  const after = everything(server);
  for (const name of Object.keys(before) as (keyof typeof before)[]) {
    for (const row of before[name]) expect(after[name]).toContainEqual(row);
    expect(after[name].length).toBeGreaterThan(before[name].length);
  }
});
