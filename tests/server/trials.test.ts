import { expect, test } from "vitest";
import { trials } from "../../server/db/schema";
import { refreshOutdatedFigures } from "../../server/features/trials/refresh";
import { workingsOf } from "../../server/features/trials/workedOut";
import { electrodeSeries } from "../../shared/electrodes/series";
import { formulaVersion } from "../../shared/metallurgy/formulaVersion";
import type { Page, StaleAnswer } from "../../shared/schemas/api";
import type { TrialRow } from "../../shared/schemas/trial";
import type { HistoryRow } from "../../shared/schemas/history";
import { trialFigures } from "../../shared/trials/figures";
import { bareTrial, bench, typed, unusualTrial } from "../support/records";
import { library, tables, testServer } from "../support/testServer";

const at = "2026-05-04T03:02:01.000Z";

/** By the pure functions, straight from what was typed. */
const figuresOf = (row: TrialRow, { feed, campaign }: Awaited<ReturnType<typeof bench>>) => {
  const stage = campaign.stages.find(({ code }) => code === row.stage) ?? expect.fail(`no stage ${row.stage}`);
  return trialFigures(row, feed, stage, library.molarMass, electrodeSeries(tables));
};

test("a trial comes back as it was typed, every field, with its figures, to every role", async () => {
  const { as } = await testServer();
  const [metallurgist, technician] = [await as("metallurgist"), await as("technician")];
  const own = await bench(metallurgist);
  const first = await own.addTrial({ code: "NL-01" });
  const made = await own.addTrial({ replicateOf: first.id }, technician);
  const wanted: TrialRow = {
    ...unusualTrial,
    id: made.id,
    campaignId: own.campaign.id,
    campaignCode: "C-26A",
    feedId: own.feed.id,
    feedName: own.feed.name,
    replicateOf: first.id,
    invented: false,
    version: 1,
    createdAt: at,
    updatedAt: at,
    deletedAt: null,
    figures: figuresOf(made, own),
  };
  expect(made).toEqual(wanted);
  const { pH, Eh, temperatureC, recoveryPct, accountabilityPct, acidPerTonne, gangueDissolvedPct } = made.figures;
  // 412 mV on Ag/AgCl in 3 mol/L KCl at 25 C, 207 mV vs SHE (electrodes.csv); pH of the last reading, never corrected.
  expect([pH, Eh, temperatureC, made.figures.pHCooled]).toEqual([4.35, expect.closeTo(0.619, 4), 61, true]);
  for (const figure of [recoveryPct, accountabilityPct, acidPerTonne, gangueDissolvedPct])
    expect(figure).not.toBeNull();
  const manager = await as("manager");
  const { body, headers } = await manager.get(`/api/trials/${made.id}`).expect(200);
  expect(body).toEqual(wanted);
  expect(headers).toMatchObject({ etag: '"1"', "cache-control": "no-store" });
  await manager.get("/api/trials/none").expect(404);
});

test("a trial can be saved with hardly anything in it: blank is not zero", async () => {
  const { as } = await testServer();
  const { addTrial, campaign, feed } = await bench(await as("metallurgist"));
  const technician = await as("technician");
  const values = { campaignId: campaign.id, feedId: feed.id, ...bareTrial };
  const { body } = await technician.post("/api/trials").send(values).expect(201);
  const made = body as TrialRow;
  expect(made).toMatchObject({ status: "planned", startedAt: null, samples: [], charge: { dryMass: typed("", "g") } });
  expect(made.figures).toMatchObject({ recoveryPct: null, accountabilityPct: null, pH: null, Eh: null, flags: [] });
  await addTrial({ code: "NL-9" });
});

test("an ORP without its electrode is not saved, nor one against an electrode that the tables do not have", async () => {
  const { as } = await testServer();
  const { campaign, feed } = await bench(await as("metallurgist"));
  const technician = await as("technician");
  const send = (electrode: string | null) => {
    const measured = { readings: [{ orp: { value: typed("450", "mV"), electrode } }] };
    return technician.post("/api/trials").send({ campaignId: campaign.id, feedId: feed.id, ...bareTrial, measured });
  };
  const bare = await send(null).expect(400);
  expect(bare.body).toMatchObject({
    error: {
      path: "measured.readings.0.orp.electrode",
      message: expect.stringContaining("ORP 450 mV has no") as string,
    },
  });
  const unknown = await send("PENCIL").expect(400);
  expect(unknown.body).toMatchObject({
    error: { path: "measured.readings.0.orp.electrode", message: expect.stringContaining("known are SHE, ") as string },
  });
  expect((await technician.get("/api/trials")).body).toMatchObject({ total: 0 });
  await send("SHE").expect(201);
});

test("a trial names a campaign, a feed and a stage that belong together, and a code of its own", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { campaign, feed, addTrial } = await bench(metallurgist);
  const other = await bench(metallurgist);
  const elsewhere = await other.addTrial();
  await addTrial();
  const values = { campaignId: campaign.id, feedId: feed.id, ...bareTrial };
  for (const [change, status, path] of [
    [{ campaignId: "none" }, 404, "campaignId"],
    [{ feedId: "none" }, 404, "feedId"],
    [{ feedId: other.feed.id }, 400, "feedId"],
    [{ stage: "XX" }, 400, "stage"],
    [{ code: "NL-07" }, 409, "code"],
    [{ replicateOf: "none" }, 404, "replicateOf"],
    [{ replicateOf: elsewhere.id }, 400, "replicateOf"],
    [{ startedAt: "2026-05-01T10:00:00+02:00", endedAt: "2026-05-01T09:00:00+02:00" }, 400, "endedAt"],
    [{ charge: { wetMass: typed("1.000,5", "g") } }, 400, "charge.wetMass.text"],
    [{ status: "rejected" }, 400, "statusReason"],
  ] as const) {
    const { body } = await metallurgist
      .post("/api/trials")
      .send({ ...values, ...change })
      .expect(status);
    expect(body).toMatchObject({ error: { path } });
  }
  expect((await metallurgist.get("/api/trials")).body).toMatchObject({ total: 2 });
});

test("every field can be changed by a technician; figures follow, and the record keeps what was typed before", async () => {
  const { as, now } = await testServer();
  const [metallurgist, technician] = [await as("metallurgist"), await as("technician")];
  const own = await bench(metallurgist);
  const second = await own.addFeed({ name: "Second feed" });
  const first = await own.addTrial({ code: "NL-01" });
  const made = await own.addTrial();
  const path = `/api/trials/${made.id}`;
  now("2026-05-05T06:07:08.000Z");
  const change = {
    feedId: second.id,
    code: "CE-1",
    kind: "cementation",
    stage: "CE",
    status: "awaiting assay",
    statusReason: "",
    operator: "Bench 1",
    startedAt: "2026-04-30T08:00:00Z",
    endedAt: null,
    replicateOf: first.id,
    planned: { ...made.planned, pH: typed("3.5", "pH") },
    measured: { ...made.measured, readings: made.measured.readings.slice(0, 1) },
    charge: { ...made.charge, dryMass: typed("49,9", "g") },
    samples: [],
    products: { ...made.products, washVolume: typed("", "L") },
    notes: "moved",
    reason: "wrong sheet",
  } as const;
  const { body } = await technician.patch(path).set("If-Match", '"1"').send(change).expect(200);
  const { reason: _, ...fields } = change;
  const row = body as TrialRow;
  expect(row).toEqual({
    ...made,
    ...fields,
    feedName: "Second feed",
    version: 2,
    updatedAt: "2026-05-05T06:07:08.000Z",
    figures: figuresOf(row, { ...own, feed: second }),
  });
  expect(row.figures).not.toEqual(made.figures);
  expect((await technician.get(path)).body).toEqual(row);

  const { body: record } = await metallurgist.get(`${path}/history`).expect(200);
  const [latest, creation] = (record as Page<HistoryRow>).rows;
  expect(latest).toMatchObject({ version: 2, action: "change", author: "The technician", reason: "wrong sheet" });
  const changes = new Map(latest?.changes.map((one) => [one.path, one]));
  expect(changes.get("charge.dryMass")).toEqual({
    path: "charge.dryMass",
    old: typed("50,0", "g"),
    new: typed("49,9", "g"),
  });
  expect(changes.get("samples.0")?.old).toEqual(unusualTrial.samples[0]);
  expect(changes.has("figures.pH")).toBe(false);
  expect(creation).toMatchObject({ version: 1, action: "create", changes: [] });
  const then = await metallurgist.get(`${path}/history/1`).expect(200);
  expect(then.body).toMatchObject({ ...unusualTrial, version: 1 });
  const nowThere = await metallurgist.get(`${path}/history/2`).expect(200);
  expect(nowThere.body).toMatchObject(fields);
});

test("what is left away in a change stays as it is", async () => {
  const { as } = await testServer();
  const technician = await as("technician");
  const { addTrial } = await bench(await as("metallurgist"));
  const made = await addTrial();
  const path = `/api/trials/${made.id}`;
  const { body } = await technician.patch(path).set("If-Match", "1").send({ notes: "more" }).expect(200);
  expect(body).toEqual({ ...made, notes: "more", version: 2 });
});

test("two at the bench: the late write is told what changed down to the field, and nothing of either is lost", async () => {
  const { as } = await testServer();
  const [technician, metallurgist] = [await as("technician"), await as("metallurgist")];
  const { addTrial } = await bench(metallurgist);
  const made = await addTrial();
  const path = `/api/trials/${made.id}`;
  await technician.patch(path).send({ notes: "x" }).expect(428);
  const theirs = { ...made.charge, dryMass: typed("50.3", "g"), wetMass: typed("51", "g") };
  const first = await metallurgist.patch(path).set("If-Match", "1").send({ charge: theirs }).expect(200);
  const yours = { ...made.charge, dryMass: typed("49,8", "g") };
  const late = await technician.patch(path).set("If-Match", "1").send({ charge: yours, notes: "mine" }).expect(412);
  const { current, difference } = late.body as StaleAnswer<TrialRow>;
  expect(current).toEqual(first.body);
  expect(difference).toEqual([
    { path: "charge.wetMass", base: typed("50.76", "g"), yours: typed("50.76", "g"), theirs: typed("51", "g") },
    { path: "charge.dryMass", base: typed("50,0", "g"), yours: typed("49,8", "g"), theirs: typed("50.3", "g") },
    { path: "notes", base: unusualTrial.notes, yours: "mine", theirs: unusualTrial.notes },
  ]);
  expect((await technician.get(path)).body).toEqual(first.body);
  const merged = { charge: { ...theirs, dryMass: yours.dryMass }, notes: "mine" };
  await technician.patch(path).set("If-Match", "2").send(merged).expect(200);
});

test("approving and rejecting are a metallurgist's; an approved trial is locked until it is reopened with a reason", async () => {
  const { as } = await testServer();
  const [technician, metallurgist, manager] = [await as("technician"), await as("metallurgist"), await as("manager")];
  const { addTrial, campaign, feed } = await bench(metallurgist);
  const { id } = await addTrial();
  const path = `/api/trials/${id}`;
  const approve = { status: "approved" };
  const reject = { status: "rejected", statusReason: "spilt" };
  for (const change of [approve, reject]) {
    const { body } = await technician.patch(path).set("If-Match", "1").send(change).expect(403);
    expect(body).toMatchObject({ error: { code: "FORBIDDEN", path: "status" } });
  }
  const fresh = { campaignId: campaign.id, feedId: feed.id, ...bareTrial, ...approve };
  await technician.post("/api/trials").send(fresh).expect(403);
  await manager.patch(path).set("If-Match", "1").send({ notes: "x" }).expect(403);

  await metallurgist.patch(path).set("If-Match", "1").send(reject).expect(200);
  await technician.patch(path).set("If-Match", "2").send({ status: "balanced" }).expect(403);
  await technician.patch(path).set("If-Match", "2").send({ notes: "on the floor" }).expect(200);
  await metallurgist
    .patch(path)
    .set("If-Match", "3")
    .send({ ...approve, statusReason: "" })
    .expect(200);

  for (const client of [technician, metallurgist]) {
    const { body } = await client.patch(path).set("If-Match", "4").send({ notes: "x" }).expect(409);
    expect(body).toMatchObject({ error: { code: "LOCKED", path: "status" } });
    await client.delete(path).set("If-Match", "4").expect(409);
  }
  const reopen = (client: typeof metallurgist) => client.post(`${path}/reopen`);
  await reopen(metallurgist).set("If-Match", "4").send({ reason: " " }).expect(400);
  await reopen(metallurgist).send({ reason: "re-assay" }).expect(428);
  await reopen(metallurgist).set("If-Match", "3").send({ reason: "re-assay" }).expect(412);
  await reopen(technician).set("If-Match", "4").send({ reason: "re-assay" }).expect(403);
  const opened = await reopen(metallurgist).set("If-Match", "4").send({ reason: "re-assay" }).expect(200);
  expect(opened.body).toMatchObject({ status: "balanced", statusReason: "re-assay", version: 5 });
  await reopen(metallurgist).set("If-Match", "5").send({ reason: "again" }).expect(409);
  await technician.patch(path).set("If-Match", "5").send({ notes: "x" }).expect(200);
  expect((await manager.get(`${path}/history`)).body).toMatchObject({
    rows: [{ version: 6 }, { action: "reopen", reason: "re-assay", author: "The metallurgist" }, {}, {}, {}, {}],
  });
});

test("a deleted trial leaves the lists, frees its code, and comes back while its code is free", async () => {
  const { as } = await testServer();
  const technician = await as("technician");
  const { addTrial, plan } = await bench(await as("metallurgist"));
  const { id } = await addTrial();
  const path = `/api/trials/${id}`;
  const gone = await technician.delete(path).set("If-Match", "1").query({ reason: "typed twice" }).expect(200);
  expect(gone.body).toMatchObject({ deletedAt: at, version: 2 });
  expect((await technician.get("/api/trials")).body).toMatchObject({ total: 0 });
  expect((await technician.get("/api/trials?deleted=true")).body).toMatchObject({
    total: 1,
    rows: [{ id, deletedAt: at }],
  });
  expect((await technician.get(`/api/plans/${plan.id}/trials`)).body).toMatchObject({ rows: [] });
  await technician.patch(path).set("If-Match", "2").send({ notes: "x" }).expect(409);
  const other = await addTrial();
  const taken = await technician.post(`${path}/restore`).set("If-Match", "2").expect(409);
  expect(taken.body).toMatchObject({ error: { path: "code" } });
  await technician.patch(`/api/trials/${other.id}`).set("If-Match", "1").send({ code: "NL-99" }).expect(200);
  const back = await technician.post(`${path}/restore`).set("If-Match", "2").send({ reason: "it was not" }).expect(200);
  expect(back.body).toMatchObject({ deletedAt: null, version: 3 });
});

test("figures worked out by an older formula version are worked out anew when the server starts", async () => {
  const { as, db, deps } = await testServer();
  const metallurgist = await as("metallurgist");
  const { addTrial } = await bench(metallurgist);
  const made = await addTrial();
  db.update(trials).set({ recoveryPct: 1, flags: [], formulaVersion: "0" }).run();
  expect((await metallurgist.get(`/api/trials/${made.id}`)).body).toMatchObject({ figures: { recoveryPct: 1 } });
  expect(refreshOutdatedFigures(db, workingsOf(deps.chemistry))).toBe(1);
  expect(refreshOutdatedFigures(db, workingsOf(deps.chemistry))).toBe(0);
  expect((await metallurgist.get(`/api/trials/${made.id}`)).body).toEqual(made);
});

test("figures move with their formula version alone: changed on purpose? raise formulaVersion, move the pins, say so in the changelog", async () => {
  const { as } = await testServer();
  const { addTrial } = await bench(await as("metallurgist"));
  const { figures } = await addTrial();
  const rounded = Object.entries({ ...figures } as Record<string, unknown>).map(([key, value]): [string, unknown] => [
    key,
    typeof value === "number" ? Number(value.toPrecision(8)) : value,
  ]);
  expect({ formulaVersion, ...Object.fromEntries(rounded) }).toEqual({
    Eh: 0.619,
    EhUncertainty: 0,
    accountabilityPct: 99.592832,
    acidPerTonne: 1370.6149,
    flags: [],
    formulaVersion: "3",
    gangueDissolvedPct: -0.17527473,
    pH: 4.35,
    pHCooled: true,
    reagentPerKg: 2.6927602,
    recoveryBasis: "calculated head",
    recoveryPct: 91.59157,
    recoveryRangePct: null,
    selectivityPct: 91.766845,
    temperatureC: 61,
  });
});
