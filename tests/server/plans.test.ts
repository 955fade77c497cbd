import type { Agent } from "supertest";
import { expect, test } from "vitest";
import type { Page, ProjectRow } from "../../shared/schemas/api";
import type { PlanRow, RevisionRow } from "../../shared/schemas/plan";
import { unusualInputs } from "../support/planInputs";
import { tables, testServer } from "../support/testServer";

async function projectOf(client: Agent): Promise<ProjectRow> {
  const { body } = await client
    .post("/api/projects")
    .send({ siteName: "North works", name: "Second stage" })
    .expect(201);
  return body as ProjectRow;
}

async function planOf(client: Agent, name = "tank 3"): Promise<PlanRow> {
  const { id: projectId } = await projectOf(client);
  const values = { projectId, name, description: "Only for the second shift.", inputs: unusualInputs };
  return (await client.post("/api/plans").send(values).expect(201)).body as PlanRow;
}

const rowsOf = <Row>({ body }: { body: unknown }) => (body as Page<Row>).rows;

test("a project comes back as it was made, with the number of its plans", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const made = await projectOf(metallurgist);
  expect(made).toMatchObject({ siteName: "North works", name: "Second stage", invented: false, planCount: 0 });
  const { body } = await metallurgist.get("/api/projects").expect(200);
  expect(body).toEqual({ rows: [made], total: 1, limit: 50, offset: 0 });
});

test("a plan comes back as it was made: every field, author, moment and data version", async () => {
  const { as } = await testServer();
  const [metallurgist, technician] = [await as("metallurgist"), await as("technician")];
  const made = await planOf(metallurgist);
  const at = "2026-05-04T03:02:01.000Z";
  expect(made).toEqual({
    id: made.id,
    projectId: made.projectId,
    projectName: "Second stage",
    siteName: "North works",
    name: "tank 3",
    description: "Only for the second shift.",
    invented: false,
    archived: false,
    version: 1,
    createdAt: at,
    updatedAt: at,
    revisionCount: 1,
    commentCount: 0,
    dataOutdated: false,
    changedSpecies: [],
    latest: {
      planId: made.id,
      number: 1,
      note: "",
      author: "The metallurgist",
      createdAt: at,
      dataVersion: tables.version,
      inputs: unusualInputs,
    },
  });
  const { body, headers } = await technician.get(`/api/plans/${made.id}`).expect(200);
  expect(body).toEqual(made);
  expect(headers.etag).toBe('"1"');
  expect(rowsOf<ProjectRow>(await technician.get("/api/projects"))[0]?.planCount).toBe(1);
});

test("a plan for a project that is not there is refused", async () => {
  const { as } = await testServer();
  const admin = await as("admin");
  const values = { projectId: "none", name: "tank 3", inputs: unusualInputs };
  const { body } = await admin.post("/api/plans").send(values).expect(404);
  expect(body).toMatchObject({ error: { code: "NOT_FOUND", path: "projectId" } });
});

test("wrong inputs are refused with the path and the value, and nothing is stored", async () => {
  const { as } = await testServer();
  const admin = await as("admin");
  const { id: projectId } = await projectOf(admin);
  const [copper, zinc] = unusualInputs.metals;
  const inputs = { ...unusualInputs, metals: [copper, { ...zinc, value: -4 }] };
  const { body } = await admin.post("/api/plans").send({ projectId, name: "tank 3", inputs }).expect(400);
  expect(body).toMatchObject({ error: { code: "INVALID_INPUT", path: "inputs.metals.1.value" } });
  expect(JSON.stringify(body)).toContain("got -4");
  expect((await admin.get("/api/plans")).body).toMatchObject({ total: 0 });
});

test("renaming, describing and archiving raise the version", async () => {
  const { as, now } = await testServer();
  const metallurgist = await as("metallurgist");
  const made = await planOf(metallurgist);
  now("2026-05-05T06:07:08.000Z");
  const change = { name: "tank 4", description: "Both shifts.", archived: true };
  const path = `/api/plans/${made.id}`;
  const { body, headers } = await metallurgist.patch(path).set("If-Match", '"1"').send(change).expect(200);
  const wanted = { ...made, ...change, version: 2, updatedAt: "2026-05-05T06:07:08.000Z" };
  expect(body).toEqual(wanted);
  expect(headers.etag).toBe('"2"');
  expect((await metallurgist.get(path)).body).toEqual(wanted);
  const { body: named } = await metallurgist.patch(path).set("If-Match", "2").send({ name: "tank 5" }).expect(200);
  expect(named).toMatchObject({ name: "tank 5", description: "Both shifts.", archived: true, version: 3 });
});

test("a change without a version is refused, one against an old version gets the current row", async () => {
  const { as } = await testServer();
  const [metallurgist, admin] = [await as("metallurgist"), await as("admin")];
  const { id } = await planOf(metallurgist);
  const path = `/api/plans/${id}`;
  const blind = await metallurgist.patch(path).send({ name: "mine" }).expect(428);
  expect(blind.body).toMatchObject({ error: { code: "VERSION_REQUIRED", path: "If-Match" } });
  const odd = await metallurgist.patch(path).set("If-Match", "*").send({ name: "mine" }).expect(400);
  expect(odd.body).toMatchObject({ error: { code: "INVALID_INPUT", path: "If-Match" } });

  const first = await admin.patch(path).set("If-Match", '"1"').send({ name: "the admin's" }).expect(200);
  const stale = await metallurgist.patch(path).set("If-Match", '"1"').send({ name: "mine" }).expect(412);
  expect(stale.body).toMatchObject({ error: { code: "STALE" }, current: first.body as object });
  expect((await admin.get(path)).body).toEqual(first.body);
});

test("revisions are numbered, frozen and listed newest first", async () => {
  const { as, now } = await testServer();
  const [metallurgist, manager] = [await as("metallurgist"), await as("manager")];
  const made = await planOf(metallurgist);
  const path = `/api/plans/${made.id}/revisions`;
  now("2026-06-01T00:00:00.000Z");
  const inputs = { ...unusualInputs, temperatureC: 81 };
  const second = await (await as("admin")).post(path).send({ note: "Hotter.", inputs }).expect(201);
  const wanted: RevisionRow = {
    planId: made.id,
    number: 2,
    note: "Hotter.",
    author: "The admin",
    createdAt: "2026-06-01T00:00:00.000Z",
    dataVersion: tables.version,
    inputs,
  };
  expect(second.body).toEqual(wanted);
  expect((await manager.get(path).expect(200)).body).toEqual({
    rows: [wanted, made.latest],
    total: 2,
    limit: 50,
    offset: 0,
  });
  expect(rowsOf<RevisionRow>(await manager.get(`${path}?limit=1&offset=1`))).toEqual([made.latest]);
  expect((await manager.get(`${path}/1`).expect(200)).body).toEqual(made.latest);
  expect((await manager.get(`${path}/2`).expect(200)).body).toEqual(wanted);
  expect((await manager.get(`${path}/3`).expect(404)).body).toMatchObject({ error: { path: "number" } });
  const plan = (await manager.get(`/api/plans/${made.id}`)).body as PlanRow;
  expect(plan).toMatchObject({ version: 2, revisionCount: 2, latest: wanted, updatedAt: wanted.createdAt });
});

test("a revision against an old version is refused when the writer says which, and kept when not", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const { id } = await planOf(metallurgist);
  const path = `/api/plans/${id}/revisions`;
  const revision = { note: "again", inputs: unusualInputs };
  await metallurgist.post(path).set("If-Match", '"1"').send(revision).expect(201);
  const stale = await metallurgist.post(path).set("If-Match", '"1"').send(revision).expect(412);
  expect(stale.body).toMatchObject({ error: { code: "STALE" }, current: { id, version: 2, revisionCount: 2 } });
  expect((await metallurgist.post(path).send(revision).expect(201)).body).toMatchObject({ number: 3 });
});

test("a copy holds the latest inputs and says where they come from", async () => {
  const { as } = await testServer();
  const metallurgist = await as("metallurgist");
  const made = await planOf(metallurgist);
  const inputs = { ...unusualInputs, temperatureC: 12 };
  await metallurgist.post(`/api/plans/${made.id}/revisions`).send({ note: "Colder.", inputs }).expect(201);
  const path = `/api/plans/${made.id}/duplicate`;
  const copy = (await metallurgist.post(path).send({}).expect(201)).body as PlanRow;
  expect(copy).toMatchObject({ name: "tank 3 (copy)", description: made.description, projectId: made.projectId });
  expect(copy.latest).toMatchObject({ number: 1, note: "Copied from “tank 3”, revision 2.", inputs });

  const other = await projectOf(metallurgist);
  const named = await metallurgist.post(path).send({ name: "tank 9", projectId: other.id }).expect(201);
  expect(named.body).toMatchObject({ name: "tank 9", projectId: other.id, version: 1, revisionCount: 1 });
});

test("a copy in another project may take every revision along, and says where it comes from", async () => {
  const { as, now } = await testServer();
  const metallurgist = await as("metallurgist");
  const made = await planOf(metallurgist);
  now("2026-06-01T00:00:00.000Z");
  const inputs = { ...unusualInputs, temperatureC: 12 };
  await (await as("admin")).post(`/api/plans/${made.id}/revisions`).send({ note: "Colder.", inputs }).expect(201);
  now("2026-07-01T00:00:00.000Z");
  const other = (
    await metallurgist.post("/api/projects").send({ siteName: "South works", name: "Trial mill" }).expect(201)
  ).body as ProjectRow;
  const path = `/api/plans/${made.id}/duplicate`;
  const copied = await metallurgist
    .post(path)
    .send({ name: "tank 9", projectId: other.id, revisions: "all" })
    .expect(201);
  const copy = copied.body as PlanRow;
  expect(copy).toMatchObject({ name: "tank 9", projectId: other.id, revisionCount: 2, version: 1 });
  expect(copy.description).toBe(
    "Only for the second shift.\n\nCopied from “tank 3”, revision 2, of North works / Second stage.",
  );
  const rows = rowsOf<RevisionRow>(await metallurgist.get(`/api/plans/${copy.id}/revisions`).expect(200));
  const own = rowsOf<RevisionRow>(await metallurgist.get(`/api/plans/${made.id}/revisions`).expect(200));
  expect(rows).toEqual(own.map((row) => ({ ...row, planId: copy.id })));
  const { body } = await metallurgist.get(`/api/plans/${copy.id}/history`).expect(200);
  expect(body).toMatchObject({
    rows: [{ reason: "Copied from “tank 3”, revision 2, of North works / Second stage." }],
  });

  const latest = await metallurgist.post(path).send({ name: "tank 10", projectId: other.id }).expect(201);
  expect((latest.body as PlanRow).latest).toMatchObject({
    number: 1,
    inputs,
    note: "Copied from “tank 3”, revision 2, of North works / Second stage.",
  });
  const clash = await metallurgist.post(path).send({ name: "Tank 9", projectId: other.id }).expect(409);
  expect(clash.body).toMatchObject({ error: { code: "CONFLICT", path: "name" } });
  expect((clash.body as { error: { message: string } }).error.message).toContain("“Tank 9”");
  await (await as("technician")).post(path).send({ name: "tank 11" }).expect(403);
});

test("lists are filtered by project and archive, newest change first", async () => {
  const { as, now } = await testServer();
  const admin = await as("admin");
  const one = await planOf(admin, "one");
  now("2026-07-01T00:00:00.000Z");
  const two = await planOf(admin, "two");
  const names = async (query: string) =>
    rowsOf<PlanRow>(await admin.get(`/api/plans${query}`).expect(200)).map((p) => p.name);
  expect(await names("")).toEqual(["two", "one"]);
  expect(await names(`?projectId=${one.projectId}`)).toEqual(["one"]);
  await admin.patch(`/api/plans/${two.id}`).set("If-Match", '"1"').send({ archived: true }).expect(200);
  expect(await names("")).toEqual(["one"]);
  expect(await names("?archived=true")).toEqual(["two"]);
  expect(await names("?archived=all&limit=1&offset=1")).toEqual(["one"]);
  expect((await admin.get("/api/plans?archived=all&limit=1")).body).toMatchObject({ total: 2, limit: 1, offset: 0 });
  await admin.get("/api/plans?archived=perhaps").expect(400);
});

test("the record of a plan says who changed what and why, and how the plan stood before", async () => {
  const { as, now } = await testServer();
  const [metallurgist, admin] = [await as("metallurgist"), await as("admin")];
  const { id, latest } = await planOf(metallurgist);
  const path = `/api/plans/${id}`;
  now("2026-05-05T06:07:08.000Z");
  const change = { name: "tank 4", reason: "renumbered" };
  await admin.patch(path).set("If-Match", "1").send(change).expect(200);
  await metallurgist.post(`${path}/revisions`).send({ note: "second thoughts", inputs: latest.inputs }).expect(201);
  const { body } = await admin.get(`${path}/history`).expect(200);
  expect(body).toMatchObject({
    total: 3,
    rows: [
      {
        version: 3,
        author: "The metallurgist",
        reason: "second thoughts",
        changes: [{ path: "revision", old: 1, new: 2 }],
      },
      {
        version: 2,
        action: "change",
        at: "2026-05-05T06:07:08.000Z",
        author: "The admin",
        reason: "renumbered",
        changes: [{ path: "name", old: "tank 3", new: "tank 4" }],
      },
      { version: 1, action: "create", author: "The metallurgist", changes: [] },
    ],
  });
  const then = await admin.get(`${path}/history/1`).expect(200);
  expect(then.body).toMatchObject({ name: "tank 3", revision: 1, version: 1 });
  const stale = await metallurgist.patch(path).set("If-Match", "1").send({ name: "mine" }).expect(412);
  expect((stale.body as { difference: unknown }).difference).toEqual([
    { path: "name", base: "tank 3", yours: "mine", theirs: "tank 4" },
  ]);
});
