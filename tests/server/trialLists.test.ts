import { expect, test } from "vitest";
import type { Page } from "../../shared/schemas/api";
import { trialSorts, type TrialRow } from "../../shared/schemas/trial";
import type { MapTrial, MapTrials, TrialListRow } from "../../shared/schemas/trialRows";
import { comparable } from "../../shared/trials/comparable";
import { bench, typed, unusualCampaign, unusualTrial, zincInputs } from "../support/records";
import { library, testServer } from "../support/testServer";

const { planned: _p, measured: _m, charge: _c, samples: _s, products: _r, ...unusualLight } = unusualTrial;
const residue = (zn: string) => ({
  ...unusualTrial.products,
  residueAssays: [
    { analyte: "Zn", value: typed(zn, "%"), method: "" },
    ...unusualTrial.products.residueAssays.slice(1),
  ],
});

/** Five trials whose every sorted column differs; the last one knows nothing of itself. */
async function five() {
  const server = await testServer();
  const metallurgist = await server.as("metallurgist");
  const own = await bench(metallurgist);
  const rows: TrialRow[] = [];
  for (const [i, code] of ["NL-2", "NL-10", "nl-1", "CE-1"].entries()) {
    server.now(`2026-05-0${i + 4}T00:00:00.000Z`);
    const reading = unusualTrial.measured.readings[0]!;
    const readings = [
      {
        ...reading,
        temperature: typed(String(60 - i), "C"),
        pH: { ...reading.pH, value: typed(String(2 + i), "pH") },
        orp: { ...reading.orp, value: typed(String(100 * i - 150), "mV") },
      },
    ];
    rows.push(
      await own.addTrial({
        code,
        stage: i === 3 ? "CE" : "NL",
        status: (["running", "balanced", "planned", "awaiting assay"] as const)[i]!,
        operator: `Bench ${4 - i}`,
        startedAt: [
          "2026-04-02T08:00:00+02:00",
          "2026-04-02T07:00:00Z",
          "2026-04-02T08:30:00+03:00",
          "2026-04-01T00:00:00Z",
        ][i]!,
        products: residue(String(10 + 7 * ((i * 3) % 4))),
        measured: { ...unusualTrial.measured, readings },
        charge: { ...unusualTrial.charge, liquorVolume: typed(String(500 + i), "mL") },
        notes: i === 1 ? "re-assayed by hand" : "",
      }),
    );
  }
  server.now("2026-05-08T00:00:00.000Z");
  rows.push(
    await own.addTrial({
      code: "ZZ",
      operator: "",
      startedAt: null,
      endedAt: null,
      measured: {},
      charge: {},
      samples: [],
      products: {},
    }),
  );
  const list = async (query: object = {}) =>
    (await metallurgist.get("/api/trials").query(query).expect(200)).body as Page<TrialListRow>;
  return { ...own, server, metallurgist, rows, list };
}

test("a list row is the trial without its record, with the code of the one it repeats", async () => {
  const { list, rows, addTrial, campaign, feed } = await five();
  const again = await addTrial({ code: "NL-3", replicateOf: rows[0]!.id });
  const found = (await list({ limit: 200 })).rows.find(({ id }) => id === again.id);
  expect(found).toEqual({
    ...unusualLight,
    id: again.id,
    code: "NL-3",
    replicateOf: rows[0]!.id,
    replicateOfCode: "NL-2",
    campaignId: campaign.id,
    campaignCode: campaign.code,
    feedId: feed.id,
    feedName: feed.name,
    invented: false,
    version: 1,
    createdAt: again.createdAt,
    updatedAt: again.updatedAt,
    deletedAt: null,
    figures: again.figures,
  });
});

const keyOf: Record<(typeof trialSorts)[number], (row: TrialListRow) => string | number | null> = {
  code: ({ code }) => ({ "CE-1": 0, "nl-1": 1, "NL-2": 2, "NL-10": 3, ZZ: 4 })[code] ?? null,
  status: ({ status }) => status,
  stage: ({ stage }) => stage,
  operator: ({ operator }) => operator,
  startedAt: ({ startedAt }) => (startedAt === null ? null : Date.parse(startedAt)),
  updatedAt: ({ updatedAt }) => updatedAt,
  recoveryPct: ({ figures }) => figures.recoveryPct,
  gangueDissolvedPct: ({ figures }) => figures.gangueDissolvedPct,
  selectivityPct: ({ figures }) => figures.selectivityPct,
  accountabilityPct: ({ figures }) => figures.accountabilityPct,
  acidPerTonne: ({ figures }) => figures.acidPerTonne,
  reagentPerKg: ({ figures }) => figures.reagentPerKg,
  pH: ({ figures }) => figures.pH,
  Eh: ({ figures }) => figures.Eh,
  temperatureC: ({ figures }) => figures.temperatureC,
};

test("every column sorts both ways, what is not known last either way, and pages cut nothing and double nothing", async () => {
  const { list } = await five();
  for (const sort of trialSorts) {
    for (const order of ["asc", "desc"] as const) {
      const { rows, total } = await list({ sort, order });
      expect([rows.length, total]).toEqual([5, 5]);
      const keys = rows.map(keyOf[sort]);
      const known = keys.filter((key) => key !== null);
      const where = `${sort} ${order}: ${JSON.stringify(keys)}`;
      expect(
        keys.slice(known.length).every((key) => key === null),
        where,
      ).toBe(true);
      expect(new Set(known).size, where).toBeGreaterThan(1);
      const sorted = [...known].sort((a, b) => (a < b ? -1 : a > b ? 1 : 0));
      expect(known, where).toEqual(order === "asc" ? sorted : sorted.reverse());
      const paged = [];
      for (let offset = 0; offset < 5; offset += 2) paged.push(...(await list({ sort, order, limit: 2, offset })).rows);
      expect(
        paged.map(({ id }) => id),
        where,
      ).toEqual(rows.map(({ id }) => id));
    }
  }
});

test("lists filter by project, campaign, feed, kind, stage, status and words", async () => {
  const { list, project, campaign, feed, metallurgist, addTrial } = await five();
  const other = await bench(metallurgist);
  await other.addTrial({ code: "OTHER" });
  await addTrial({ code: "NL-50", kind: "cementation" });
  const codes = async (query: object) =>
    (await list({ sort: "code", order: "asc", ...query })).rows.map(({ code }) => code);
  expect((await list()).total).toBe(7);
  expect(await codes({ projectId: other.project.id })).toEqual(["OTHER"]);
  expect((await list({ projectId: project.id })).total).toBe(6);
  expect(await codes({ campaignId: other.campaign.id })).toEqual(["OTHER"]);
  expect((await list({ campaignId: campaign.id, feedId: feed.id })).total).toBe(6);
  expect(await codes({ feedId: other.feed.id })).toEqual(["OTHER"]);
  expect(await codes({ kind: "cementation" })).toEqual(["NL-50"]);
  expect(await codes({ stage: "CE" })).toEqual(["CE-1"]);
  expect(await codes({ status: "awaiting assay" })).toEqual(["CE-1"]);
  expect(await codes({ search: "RE-ASSAYED" })).toEqual(["NL-10"]);
  expect(await codes({ search: "bench 4" })).toEqual(["NL-2"]);
  expect(await codes({ search: "nl-1" })).toEqual(["nl-1", "NL-10"]);
  expect(await codes({ search: "%" })).toEqual([]);
  await metallurgist.get("/api/trials?sort=notes").expect(400);
});

test("the map gets every trial of the plan's campaigns in one answer, with what judging needs", async () => {
  const { metallurgist, plan, campaign, rows, addCampaign, addTrial } = await five();
  const second = await addCampaign({ code: "C-30" });
  await addTrial({ code: "NL-1", campaignId: second.id });
  const gone = await addTrial({ code: "gone" });
  await metallurgist.delete(`/api/trials/${gone.id}`).set("If-Match", "1").expect(200);
  const get = async (query: object) =>
    (await metallurgist.get(`/api/plans/${plan.id}/trials`).query(query).expect(200)).body as MapTrials;
  const all = await get({});
  expect(all.campaigns).toEqual([
    {
      id: campaign.id,
      code: "C-26A",
      title: campaign.title,
      planId: plan.id,
      planRevision: 1,
      stages: unusualCampaign.stages,
    },
    {
      id: second.id,
      code: "C-30",
      title: campaign.title,
      planId: plan.id,
      planRevision: 1,
      stages: unusualCampaign.stages,
    },
  ]);
  expect(all.rows.length).toBe(6);
  const point = all.rows.find(({ id }) => id === rows[0]!.id);
  const trial = rows[0]!;
  expect(point).toEqual({
    id: trial.id,
    code: "NL-2",
    campaignId: campaign.id,
    stage: "NL",
    status: "running",
    feedId: trial.feedId,
    feedName: trial.feedName,
    startedAt: trial.startedAt,
    electrode: "SCE",
    compared: expect.objectContaining({
      kind: "leach",
      planned: { tenor: trial.planned.tenor, ligands: trial.planned.ligands },
      measured: { ligands: trial.measured.ligands },
      charge: { liquorAssays: [trial.charge.liquorAssays[0]], liquorDensity: trial.charge.liquorDensity },
      products: { finalAssays: [trial.products.finalAssays[0]], liquorDensity: trial.products.liquorDensity },
    }) as MapTrial["compared"],
    figures: trial.figures,
  });
  // The light row is judged as the whole record would be.
  const stage = unusualCampaign.stages[0]!;
  for (const inputs of [zincInputs, { ...zincInputs, temperatureC: 30, ligands: [{ component: "S", activity: 9 }] }]) {
    const whole = comparable({ ...point!.compared, ...trial }, trial.figures.temperatureC, stage, inputs, library);
    expect(comparable(point!.compared, point!.figures.temperatureC, stage, inputs, library)).toEqual(whole);
  }

  const one = await get({ campaignIds: second.id });
  expect([one.rows.length, one.campaigns.length]).toEqual([1, 1]);
  expect((await get({ campaignIds: `${second.id},${campaign.id}` })).rows.length).toBe(6);
  await metallurgist.get("/api/plans/none/trials").expect(404);
});

test("the map can show the campaigns of the whole project, and those of no other", async () => {
  const { metallurgist, project, campaign, plan } = await five();
  const values = { projectId: project.id, name: "tank 3", inputs: zincInputs };
  const sibling = ((await metallurgist.post("/api/plans").send(values).expect(201)).body as { id: string }).id;
  const other = await bench(metallurgist);
  await other.addTrial();
  const count = async (query: object) =>
    ((await metallurgist.get(`/api/plans/${sibling}/trials`).query(query)).body as MapTrials).rows.length;
  expect(await count({})).toBe(0);
  expect(await count({ scope: "project" })).toBe(5);
  expect(await count({ campaignIds: campaign.id })).toBe(5);
  expect(await count({ campaignIds: other.campaign.id })).toBe(0);
  expect(plan.projectId).toBe(project.id);
});

test("a long answer is sent compressed", async () => {
  const { metallurgist, plan } = await five();
  const { headers } = await metallurgist.get(`/api/plans/${plan.id}/trials`).set("Accept-Encoding", "gzip").expect(200);
  expect(headers["content-encoding"]).toBe("gzip");
});
