import { expect, test } from "vitest";
import { speciesRows } from "../../server/db/schema";
import { keepVersion, tablesOf } from "../../server/features/chemistry/service";
import { valueOf } from "../../shared/outcome";
import { solve } from "../../shared/solve";
import { library, tables, testDatabase, testServer } from "../support/testServer";

test("the library comes out of the database as it went in", () => {
  const { db } = testDatabase();
  expect(tablesOf(db, tables.version)).toEqual(tables);
});

test("species can be asked for in SQL", () => {
  const { raw } = testDatabase();
  const jarosites = raw.prepare("select id from species_rows where name like '%jarosite%' order by id").all();
  expect(jarosites).toContainEqual({ id: "KFe3(SO4)2(OH)6(s,jarosite)" });
  expect(jarosites.length).toBeLessThan(10);
});

test("a new version is kept beside the old one, a known one is left alone", () => {
  const { db } = testDatabase();
  const revised = { ...tables, version: "revised", species: tables.species.slice(0, 10), references: [] };
  const now = new Date("2026-06-01T00:00:00Z");
  expect(keepVersion(db, revised, now)).toBe(true);
  expect(keepVersion(db, revised, now)).toBe(false);
  expect(keepVersion(db, tables, now)).toBe(false);
  expect(db.select().from(speciesRows).all()).toHaveLength(tables.species.length + 10);
  expect(tablesOf(db, "revised")).toEqual(revised);
  expect(tablesOf(db, tables.version)).toEqual(tables);
});

test("GET /api/chemistry is the current version, 304 for those who have it", async () => {
  const { as } = await testServer();
  const technician = await as("technician");
  const { body, headers } = await technician.get("/api/chemistry").expect(200);
  expect(body).toEqual({ ...tables, curatedVersion: tables.version, edited: [] });
  expect(headers.etag).toContain(tables.version);
  await technician
    .get("/api/chemistry")
    .set("If-None-Match", headers.etag ?? "")
    .expect(304);
});

test("GET /api/chemistry/versions/:id is that version for good, 404 for one that is not kept", async () => {
  const { as, db } = await testServer();
  const technician = await as("technician");
  const old = { ...tables, version: "old", presets: tables.presets.slice(0, 3) };
  keepVersion(db, old, new Date("2026-06-01T00:00:00Z"));
  const { body, headers } = await technician.get("/api/chemistry/versions/old").expect(200);
  expect(body).toEqual({ ...old, curatedVersion: "old", edited: [] });
  expect(headers["cache-control"]).toContain("immutable");
  const missing = await technician.get("/api/chemistry/versions/none").expect(404);
  expect(missing.body).toMatchObject({ error: { code: "NOT_FOUND", path: "id" } });
});

const problem = {
  temperatureC: 40,
  metals: [{ element: "Cu", requirement: "dissolved", activity: 0.03 }],
  ligands: [{ component: "S", activity: 0.2 }],
  frame: { pH: [0, 6], Eh: [-0.1, 1.1] },
  water: { bound: "both" },
  controlBand: { pH: 0.2, Eh: 0.04 },
};

test("POST /api/solve answers as the solver does", async () => {
  const { as } = await testServer();
  const manager = await as("manager");
  const { body } = await manager.post("/api/solve").send(problem).expect(200);
  const expected = valueOf(solve(problem, library));
  expect(expected.windows.length).toBeGreaterThan(0);
  expect(body).toEqual(JSON.parse(JSON.stringify(expected)));
});

test.each([
  ["no activity", { ...problem, metals: [{ element: "Cu", requirement: "dissolved", activity: 0 }] }, /activity/],
  ["no such metal", { ...problem, metals: [{ element: "Xx", requirement: "dissolved", activity: 1 }] }, /element/],
  ["too hot", { ...problem, temperatureC: 900 }, /temperatureC/],
  ["nothing at all", {}, /./],
])("POST /api/solve refuses a problem with %s in the solver's own words", async (_what, wrong, path) => {
  const { as } = await testServer();
  const manager = await as("manager");
  const { body } = await manager.post("/api/solve").send(wrong).expect(400);
  const outcome = solve(wrong, library);
  expect(body).toEqual({ error: outcome.ok ? null : outcome.error });
  expect((body as { error: { path: string } }).error.path).toMatch(path);
});
