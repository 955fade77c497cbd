import type { Agent } from "supertest";
import { expect, test } from "vitest";
import type { Page, ProjectRow } from "../../shared/schemas/api";
import type { CommentRow } from "../../shared/schemas/comment";
import { memberRoles } from "../../shared/schemas/member";
import type { PlanRow } from "../../shared/schemas/plan";
import { unusualInputs } from "../support/planInputs";
import { idOf, testServer } from "../support/testServer";

async function planOf(client: Agent): Promise<PlanRow> {
  const site = { siteName: "North works", name: "Second stage" };
  const project = (await client.post("/api/projects").send(site).expect(201)).body as ProjectRow;
  const values = { projectId: project.id, name: "tank 3", description: "", inputs: unusualInputs };
  return (await client.post("/api/plans").send(values).expect(201)).body as PlanRow;
}

const said = {
  text: "Zinc drops out here.\n\nSeen twice in March.",
  revision: 1,
  point: { pH: 5.25, Eh: 0.615 },
  limit: "window A, high pH: zinc precipitates",
};
const listed = async (client: Agent, path: string) => (await client.get(path).expect(200)).body as Page<CommentRow>;

test("a comment comes back as it was made, with what it points at; every role may make one, and the plan counts them", async () => {
  const server = await testServer();
  const { id } = await planOf(await server.as("metallurgist"));
  const path = `/api/plans/${id}/comments`;
  const rows: CommentRow[] = [];
  for (const [i, role] of memberRoles.entries()) {
    server.now(`2026-06-01T00:00:0${i}.000Z`);
    const client = await server.as(role);
    const { body, headers } = await client.post(path).send(said).expect(201);
    const made = body as CommentRow;
    expect(made).toEqual({
      ...said,
      id: made.id,
      planId: id,
      authorId: idOf(role),
      author: `The ${role}`,
      version: 1,
      createdAt: `2026-06-01T00:00:0${i}.000Z`,
      updatedAt: `2026-06-01T00:00:0${i}.000Z`,
      deletedAt: null,
    });
    expect(headers.etag).toBe('"1"');
    expect((await client.get(`/api/comments/${made.id}`).expect(200)).body).toEqual(made);
    rows.push(made);
  }
  const manager = await server.as("manager");
  expect(await listed(manager, path)).toEqual({ rows, total: 4, limit: 50, offset: 0 });
  expect((await listed(manager, `${path}?limit=1&offset=2`)).rows).toEqual([rows[2]]);
  expect((await manager.get(`/api/plans/${id}`)).body).toMatchObject({ commentCount: 4, version: 1 });
  const { body: bare } = await manager.post(path).send({ text: "  Just this.  " }).expect(201);
  expect(bare).toMatchObject({ text: "Just this.", revision: null, point: null, limit: null });
});

test("what a comment needs is told: words, a plan, a revision that is there, a point on a map", async () => {
  const { as } = await testServer();
  const client = await as("technician");
  const { id } = await planOf(await as("metallurgist"));
  const path = `/api/plans/${id}/comments`;
  for (const [body, status, where] of [
    [{ text: "   " }, 400, "text"],
    [{ text: "x".repeat(4001) }, 400, "text"],
    [{ text: "Here.", point: { pH: 400, Eh: 0 } }, 400, "point.pH"],
    [{ text: "Here.", revision: 7 }, 404, "revision"],
  ] as const) {
    const refused = await client.post(path).send(body).expect(status);
    expect(refused.body).toMatchObject({ error: { path: where } });
  }
  await client.post("/api/plans/nothing/comments").send({ text: "Here." }).expect(404);
  await client.get("/api/plans/nothing/comments").expect(404);
  expect((await listed(client, path)).total).toBe(0);
});

test("only who wrote it rewords, removes and brings back; every write is on record; a late one is told", async () => {
  const { as, now } = await testServer();
  const [technician, admin] = [await as("technician"), await as("admin")];
  const { id } = await planOf(await as("metallurgist"));
  const made = (await technician.post(`/api/plans/${id}/comments`).send(said).expect(201)).body as CommentRow;
  const path = `/api/comments/${made.id}`;
  for (const client of [admin, await as("metallurgist"), await as("manager")]) {
    const refused = await client.patch(path).set("If-Match", '"1"').send({ text: "Nonsense." }).expect(403);
    expect(refused.body).toMatchObject({ error: { code: "FORBIDDEN" } });
    await client.delete(path).set("If-Match", '"1"').expect(403);
  }
  await technician.patch(path).send({ text: "Zinc drops out." }).expect(428);
  now("2026-06-02T00:00:00.000Z");
  const change = { text: "Zinc drops out.", revision: 9 };
  const changed = (await technician.patch(path).set("If-Match", '"1"').send(change).expect(200)).body as CommentRow;
  expect(changed).toEqual({ ...made, text: "Zinc drops out.", version: 2, updatedAt: "2026-06-02T00:00:00.000Z" });
  const stale = await technician.patch(path).set("If-Match", '"1"').send({ text: "Or not." }).expect(412);
  expect(stale.body).toMatchObject({
    error: { code: "STALE" },
    current: changed,
    difference: [{ path: "text", base: said.text, yours: "Or not.", theirs: "Zinc drops out." }],
  });

  await technician.delete(`${path}?reason=mistaken`).set("If-Match", '"2"').expect(200);
  expect((await listed(admin, `/api/plans/${id}/comments`)).total).toBe(0);
  expect((await listed(admin, `/api/plans/${id}/comments?deleted=all`)).rows).toMatchObject([{ version: 3 }]);
  expect((await admin.get(`/api/plans/${id}`)).body).toMatchObject({ commentCount: 0 });
  await technician.patch(path).set("If-Match", '"3"').send({ text: "Still." }).expect(409);
  await technician.post(`${path}/restore`).set("If-Match", '"3"').send({ reason: "" }).expect(200);
  expect((await listed(admin, `/api/plans/${id}/comments`)).rows).toMatchObject([{ version: 4, deletedAt: null }]);
  const { body } = await admin.get(`${path}/history`).expect(200);
  expect(body).toMatchObject({
    total: 4,
    rows: [
      { action: "restore" },
      { action: "delete", reason: "mistaken" },
      { action: "change", changes: [{ path: "text", old: said.text, new: "Zinc drops out." }] },
      { action: "create", author: "The technician" },
    ],
  });
});
