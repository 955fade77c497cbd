import request, { type Agent } from "supertest";
import { expect, test } from "vitest";
import { createApp } from "../../server/app";
import { createChemistry } from "../../server/features/chemistry/library";
import type { Page } from "../../shared/schemas/api";
import type { SpeciesRow } from "../../shared/schemas/chemistry";
import type { PlanRow } from "../../shared/schemas/plan";
import type { ChemistryAnswer, SpeciesEditRow } from "../../shared/schemas/speciesEdit";
import { unusualInputs } from "../support/planInputs";
import { idOf, library, tables, temporaryFolder, testServer } from "../support/testServer";

const edits = "/api/chemistry/edits";
const citation = "Site report 12 (invented), table 3: solubility in return acid";
const shippedRow = (id: string): SpeciesRow => library.species.get(id)?.row ?? expect.fail(`no ${id}`);

/** A species the library does not have, no field of it as usual. Energies follow dG = dH - T dS with the elements' entropies. */
const own: SpeciesRow = {
  id: "Zn(OH)2(s,site)",
  formula: "Zn(OH)2",
  name: "aged zinc hydroxide of the site",
  phase: "s",
  charge: 0,
  composition: "Zn:1 O:2 H:2",
  dGf_kJ: -555.25,
  dHf_kJ: null,
  S_J: null,
  Cp_J: 74.5,
  Cp_a: null,
  Cp_b: null,
  Cp_c: null,
  Cp_Tmax_K: 360,
  ion_class: null,
  grade: "C",
  source: "",
  note: "from three filtrations",
};

const chemistryOf = async (client: Agent) => (await client.get("/api/chemistry").expect(200)).body as ChemistryAnswer;
const add = (client: Agent, values: object, version = 0) =>
  client.post(edits).set("If-Match", `"${version}"`).send(values);
const takeBack = (client: Agent, id: string, version = 1) =>
  client.delete(`${edits}/${id}`).set("If-Match", `"${version}"`).query({ reason: "a slip" });

test("an added species comes back as it was made, with who, when and from where", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const extrapolation = {
    hold: "dG",
    reaction: "ZnO(s) + H2O(l) = Zn(OH)2(s,site)",
    logK_25: -0.42,
    note: "as the oxide",
  };
  const { body, headers } = await add(metallurgist, {
    row: own,
    citation,
    extrapolation,
    reason: "our cake is not ZnO",
  }).expect(201);
  const wanted: SpeciesEditRow = {
    id: (body as SpeciesEditRow).id,
    speciesId: own.id,
    kind: "added",
    row: own,
    curated: null,
    citation,
    extrapolation: extrapolation as SpeciesEditRow["extrapolation"],
    reason: "our cake is not ZnO",
    author: "The metallurgist",
    createdAt: "2026-05-04T03:02:01.000Z",
    inForce: true,
    unfit: null,
    version: 1,
    revertedAt: null,
    revertedBy: null,
    revertReason: "",
  };
  expect(body).toEqual(wanted);
  expect(headers.etag).toBe('"1"');
  const technician = await as("technician");
  expect((await technician.get(`${edits}/${wanted.id}`).expect(200)).body).toEqual(wanted);
  expect((await technician.get(`${edits}?species=${encodeURIComponent(own.id)}&active=true`).expect(200)).body).toEqual(
    {
      rows: [wanted],
      total: 1,
      limit: 50,
      offset: 0,
    },
  );
  await technician.get(`${edits}/99`).expect(404);
});

test("the library in force holds the added species, says so, and is a version of its own for good", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const before = await metallurgist.get("/api/chemistry");
  const { body } = await add(metallurgist, { row: own, citation }).expect(201);
  const { id } = body as SpeciesEditRow;
  const now = await chemistryOf(metallurgist);
  const code = `EDIT${id}`;
  expect(now.version).not.toBe(tables.version);
  expect(now.curatedVersion).toBe(tables.version);
  expect(now.edited).toEqual([{ id: own.id, state: "added", editId: id, version: 1 }]);
  expect(now.species).toEqual([...tables.species, { ...own, source: code }]);
  expect(now.references.at(-1)).toEqual({ code, citation });
  expect(now.extrapolation.at(-1)).toMatchObject({ id: own.id, hold: "none" });
  const again = await metallurgist.get("/api/chemistry").set("If-None-Match", before.headers.etag ?? "");
  expect(again.status).toBe(200);
  expect((await metallurgist.get("/api/health")).body).toMatchObject({ dataVersion: now.version });
  expect((await metallurgist.get(`/api/chemistry/versions/${now.version}`).expect(200)).body).toEqual(now);

  // The solver works with it from now on.
  const problem = {
    temperatureC: 25,
    metals: [{ element: "Zn", requirement: "dissolved", activity: 0.1 }],
    ligands: [],
    only: [own.id, "Zn^2+(aq)"],
    frame: { pH: [0, 12], Eh: [-0.5, 0.5] },
    controlBand: { pH: 0.2, Eh: 0.04 },
  };
  const solved = await metallurgist.post("/api/solve").send(problem).expect(200);
  expect((solved.body as { fields: { species: string }[] }).fields.map(({ species }) => species)).toContain(own.id);
});

const other = (): SpeciesRow => ({ ...shippedRow("ZnO(s)"), dGf_kJ: -320.9, dHf_kJ: null, note: "Site value." });

test("a species is overridden in its place, again over that, and each taken back", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const row = other();
  const first = (await add(metallurgist, { row, citation }).expect(201)).body as SpeciesEditRow;
  expect(first).toMatchObject({ kind: "overridden", curated: shippedRow("ZnO(s)"), row });
  const one = await chemistryOf(metallurgist);
  const place = tables.species.findIndex(({ id }) => id === "ZnO(s)");
  expect(one.species.length).toBe(tables.species.length);
  expect(one.species[place]).toEqual({ ...row, source: `${row.source}; EDIT${first.id}` });

  const second = (await add(metallurgist, { row: { ...row, dGf_kJ: -320.1 }, citation }, 1).expect(201))
    .body as SpeciesEditRow;
  expect((await chemistryOf(metallurgist)).species[place]?.dGf_kJ).toBe(-320.1);
  expect((await metallurgist.get(`${edits}/${first.id}`)).body).toMatchObject({ inForce: false, revertedAt: null });

  const { body: back } = await takeBack(metallurgist, second.id).expect(200);
  expect(back).toMatchObject({
    version: 2,
    inForce: false,
    revertedAt: "2026-05-04T03:02:01.000Z",
    revertedBy: "The metallurgist",
    revertReason: "a slip",
  });
  const { version, species } = await chemistryOf(metallurgist);
  expect({ version, species }).toEqual({ version: one.version, species: one.species });
  await takeBack(metallurgist, first.id).expect(200);
  const shipped = await chemistryOf(metallurgist);
  expect(shipped).toEqual({
    ...tables,
    curatedVersion: tables.version,
    edited: [{ id: "ZnO(s)", state: "as shipped", editId: null, version: 4 }],
  });
  expect((await metallurgist.get(edits)).body).toMatchObject({ total: 2, rows: [{ id: second.id }, { id: first.id }] });
});

test("edits need the version they were made against, and lose nothing to a faster one", async () => {
  const { as } = await testServer();
  const [metallurgist, admin] = [await as("metallurgist"), await as("admin")];
  const row = other();
  await metallurgist.post(edits).send({ row, citation }).expect(428);
  const { id } = (await add(admin, { row, citation }).expect(201)).body as SpeciesEditRow;
  const late = await add(metallurgist, { row: { ...row, dGf_kJ: -321.5 }, citation }).expect(412);
  expect(late.body).toMatchObject({ error: { code: "STALE" }, current: { version: 1, row: { dGf_kJ: -320.9 } } });
  expect((late.body as { difference: unknown[] }).difference).toContainEqual({
    path: "dGf_kJ",
    base: shippedRow("ZnO(s)").dGf_kJ,
    yours: -321.5,
    theirs: -320.9,
  });
  await metallurgist.delete(`${edits}/${id}`).expect(428);
  await takeBack(metallurgist, id).expect(200);
  expect((await takeBack(admin, id).expect(412)).body).toMatchObject({
    error: { code: "STALE" },
    current: { version: 2 },
  });
  await takeBack(admin, id, 2).expect(409);
  expect((await admin.get(edits)).body).toMatchObject({ total: 1 });
});

test.each([
  [
    "a charge its formula does not have",
    { ...own, charge: 1 },
    "row.charge",
    /Zn\(OH\)2\(s,site\), charge: 1, but the formula/,
  ],
  ["an unknown component", { ...own, composition: "Qq:1" }, "row.composition", /composition: no component "Qq"/],
  [
    "energies that contradict each other",
    { ...own, dHf_kJ: -900, S_J: 80 },
    "row.dGf_kJ",
    /dGf_kJ: -555.25 differs by/,
  ],
  [
    "an id that is not formula and phase",
    { ...own, id: "zinc hydroxide" },
    "row.id",
    /should be the formula and the phase/,
  ],
  [
    "a source the references do not have",
    { ...own, source: "NOBODY99" },
    "row.source",
    /source "NOBODY99" is not in references/,
  ],
  ["no number where one is needed", { ...own, dGf_kJ: "much" }, "row.dGf_kJ", /must be a number/],
  ["the zero of the scale", { ...shippedRow("H^+(aq)"), dGf_kJ: 1 }, "row.id", /zero of the scale/],
])("a row with %s is refused with row and column, and nothing changes", async (_what, row, path, words) => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { body } = await add(metallurgist, { row, citation }).expect(400);
  expect(body).toMatchObject({ error: { path, message: expect.stringMatching(words) as string } });
  expect((await metallurgist.get(edits)).body).toMatchObject({ total: 0 });
  expect((await chemistryOf(metallurgist)).version).toBe(tables.version);
});

test("a log K that the energies contradict is refused with both numbers", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const extrapolation = { hold: "logK", reaction: "ZnO(s) + H2O(l) = Zn(OH)2(s,site)", logK_25: 3, note: "" };
  const { body } = await add(metallurgist, { row: own, citation, extrapolation }).expect(400);
  expect(body).toMatchObject({
    error: {
      path: "extrapolation.logK_25",
      message: expect.stringContaining("log K 3, but the energies give -0.42") as string,
    },
  });
});

test("a source is needed: a code of the references or a citation", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const bare = await add(metallurgist, { row: own }).expect(400);
  expect(bare.body).toMatchObject({ error: { path: "citation" } });
  const code = tables.references[0]?.code ?? "";
  await add(metallurgist, { row: { ...own, source: code } }).expect(201);
  const { species, references } = await chemistryOf(metallurgist);
  expect(species.at(-1)?.source).toBe(code);
  expect(references).toEqual(tables.references);
});

test("a species that another edit leans on cannot be taken back before it", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { id } = (await add(metallurgist, { row: own, citation }).expect(201)).body as SpeciesEditRow;
  const second = { ...own, id: "Zn(OH)2(s,second)" };
  const extrapolation = { hold: "dG", reaction: "Zn(OH)2(s,site) = Zn(OH)2(s,second)", logK_25: null, note: "" };
  const leaning = (await add(metallurgist, { row: second, citation, extrapolation }).expect(201))
    .body as SpeciesEditRow;
  const { body } = await takeBack(metallurgist, id).expect(400);
  expect(body).toMatchObject({ error: { message: /Zn\(OH\)2\(s,second\): its reaction names Zn\(OH\)2\(s,site\)/ } });
  await takeBack(metallurgist, leaning.id).expect(200);
  await takeBack(metallurgist, id).expect(200);
});

test("an edit that a newly shipped library does not take is left out and named, and stands in nobody's way", async () => {
  const { as, db, deps } = await testServer();
  const metallurgist = await as("metallurgist");
  const extrapolation = { hold: "dG", reaction: "ZnO(s) + H2O(l) = Zn(OH)2(s,site)", logK_25: -0.42, note: "" };
  const leaning = (await add(metallurgist, { row: own, citation, extrapolation }).expect(201)).body as SpeciesEditRow;
  const kept = { ...shippedRow("ZnO(s)"), id: "ZnO(s,site)", name: "site oxide" };
  const { id } = (await add(metallurgist, { row: kept, citation }).expect(201)).body as SpeciesEditRow;
  // In the library of tomorrow the log K that was typed with the edit is another one.
  const species = tables.species.map((row) => (row.id === "ZnO(s)" ? { ...row, dGf_kJ: row.dGf_kJ - 0.9 } : row));
  const tomorrow = createChemistry(db, { ...tables, version: "tomorrow", species }, deps.clock());
  expect(tomorrow.unfit.map(({ edit, why }) => [String(edit.number), why])).toEqual([
    [leaning.id, expect.stringMatching(/Zn\(OH\)2\(s,site\): log K -0.42, but/)],
  ]);
  expect(tomorrow.inForce.map(({ number }) => String(number))).toEqual([id]);
  expect(tomorrow.data.species.has("ZnO(s,site)")).toBe(true);
  expect(tomorrow.data.species.has(own.id)).toBe(false);
  const next = createApp({ ...deps, chemistry: tomorrow }, temporaryFolder());
  const cookie = (await deps.sessions.start(idOf("metallurgist"))).split(";")[0] ?? "";
  const client = request.agent(next).set("Cookie", cookie);
  expect((await client.get(`${edits}/${leaning.id}`)).body).toMatchObject({ inForce: false, unfit: /log K/ });
  await add(client, { row: { ...kept, id: "ZnO(s,third)" }, citation }).expect(201);
  await takeBack(client, leaning.id).expect(200);
});

test("where a species has a value of the site's own, the log K beside its reactions follows, and both stand in the note", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const row = { ...shippedRow("Cu^2+(aq)"), dGf_kJ: shippedRow("Cu^2+(aq)").dGf_kJ + 0.5 };
  await add(metallurgist, { row, citation }).expect(201);
  const rule = (await chemistryOf(metallurgist)).extrapolation.find(({ id }) => id === "CuOH^+(aq)");
  const shipped = tables.extrapolation.find(({ id }) => id === "CuOH^+(aq)");
  // 0.5 kJ/mol / (RT ln 10) at 298.15 K
  expect(rule?.logK_25).toBeCloseTo((shipped?.logK_25 ?? 0) + 0.5 / 5.708, 1);
  expect(rule?.note).toContain(`${shipped?.logK_25} as shipped`);
});

test("plans say which of their species changed, keep their own numbers, and are up to date once saved again", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const project = await metallurgist.post("/api/projects").send({ siteName: "North works", name: "Second" });
  const projectId = (project.body as { id: string }).id;
  const make = async (name: string, elements: string[]) => {
    const metals = unusualInputs.metals.filter(({ element }) => elements.includes(element));
    const inputs = { ...unusualInputs, metals, leftOut: [], feedMinerals: [], putBack: [] };
    return (await metallurgist.post("/api/plans").send({ projectId, name, inputs }).expect(201)).body as PlanRow;
  };
  const zinc = await make("zinc", ["Zn"]);
  const copper = await make("copper", ["Cu"]);
  expect(zinc).toMatchObject({ dataOutdated: false, changedSpecies: [] });
  const { id } = (await add(metallurgist, { row: other(), citation }).expect(201)).body as SpeciesEditRow;

  const marks = async () => {
    const { rows } = (await metallurgist.get("/api/plans").expect(200)).body as Page<PlanRow>;
    return Object.fromEntries(rows.map((plan) => [plan.name, plan.changedSpecies]));
  };
  expect(await marks()).toEqual({ zinc: ["ZnO(s)"], copper: [] });
  const outdated = await metallurgist.get(`/api/plans/${zinc.id}`).expect(200);
  expect(outdated.body).toEqual({ ...zinc, dataOutdated: true, changedSpecies: ["ZnO(s)"] });
  expect((outdated.body as PlanRow).latest.dataVersion).toBe(tables.version);
  expect(outdated.headers["cache-control"]).toBe("no-store");

  await metallurgist
    .post(`/api/plans/${zinc.id}/revisions`)
    .send({ note: "solved again", inputs: zinc.latest.inputs })
    .expect(201);
  expect(await marks()).toEqual({ zinc: [], copper: [] });
  await takeBack(metallurgist, id).expect(200);
  expect(await marks()).toEqual({ zinc: ["ZnO(s)"], copper: [] });
  expect((await metallurgist.get(`/api/plans/${copper.id}`)).body).toMatchObject({ dataOutdated: false });
});

test("a plan that leaves the changed species out is not outdated; a change of words alone outdates none", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const project = await metallurgist.post("/api/projects").send({ siteName: "North works", name: "Second" });
  const projectId = (project.body as { id: string }).id;
  const inputs = { ...unusualInputs, leftOut: [{ species: "ZnO(s)", reason: "passive" }] };
  const made = await metallurgist.post("/api/plans").send({ projectId, name: "without", inputs }).expect(201);
  const path = `/api/plans/${(made.body as PlanRow).id}`;
  await add(metallurgist, { row: other(), citation }).expect(201);
  const words = { ...shippedRow("Zn^2+(aq)"), note: "checked against our own titration" };
  await add(metallurgist, { row: words, citation }).expect(201);
  expect((await metallurgist.get(path)).body).toMatchObject({ dataOutdated: false, changedSpecies: [] });
});
