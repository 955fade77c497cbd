import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { users } from "../../server/db/schema";
import type { Preferences } from "../../shared/schemas/member";
import { emailOf, idOf, password, testServer } from "../support/testServer";

test("the administrator sees the members, page by page, and no hash", async () => {
  const { as } = await testServer();
  const admin = await as("admin");
  const { body, text } = await admin.get("/api/members?limit=2&offset=1").expect(200);
  const row = (role: "manager" | "metallurgist") => ({
    id: idOf(role),
    email: emailOf(role),
    name: `The ${role}`,
    role,
    disabled: false,
    version: 1,
    createdAt: "2026-01-01T00:00:00.000Z",
  });
  expect(body).toEqual({ rows: [row("manager"), row("metallurgist")], total: 4, limit: 2, offset: 1 });
  expect(text).not.toMatch(/argon2|password/i);
});

const preferences: Preferences = {
  theme: "dark",
  plainMap: true,
  potentialUnit: "mV",
  potentialScale: "AGCL-3M",
  electrodeTemperatureC: 38.5,
  layers: { reach: false, crosscuts: true },
};

test("preferences come back as they were put, for their owner alone", async () => {
  const { as } = await testServer();
  const [technician, manager] = [await as("technician"), await as("manager")];
  expect((await technician.get("/api/me/preferences").expect(200)).body).toEqual({});
  expect((await technician.put("/api/me/preferences").send(preferences).expect(200)).body).toEqual(preferences);
  expect((await technician.get("/api/me/preferences")).body).toEqual(preferences);
  expect((await manager.get("/api/me/preferences")).body).toEqual({});
  await technician.put("/api/me/preferences").send({ theme: "light" }).expect(200);
  expect((await technician.get("/api/me/preferences")).body).toEqual({ theme: "light" });
});

test("a preference that is none is refused with its path and value, and changes nothing", async () => {
  const { as } = await testServer();
  const technician = await as("technician");
  await technician.put("/api/me/preferences").send(preferences);
  const wrong = { ...preferences, electrodeTemperatureC: 180 };
  const { body } = await technician.put("/api/me/preferences").send(wrong).expect(400);
  expect(body).toMatchObject({ error: { code: "INVALID_INPUT", path: "electrodeTemperatureC" } });
  expect(JSON.stringify(body)).toContain("180");
  expect((await technician.get("/api/me/preferences")).body).toEqual(preferences);
});

test("an administrator changes name, role and access; the record says who, when, what and why", async () => {
  const { as, now } = await testServer();
  const admin = await as("admin");
  const path = `/api/members/${idOf("technician")}`;
  const before = await admin.get(path).expect(200);
  expect(before.headers).toMatchObject({ etag: '"1"', "cache-control": "no-store" });
  now("2026-05-05T06:07:08.000Z");
  const change = { name: "T. Bench", role: "metallurgist", disabled: true, reason: "moves to the plant" };
  const { body, headers } = await admin.patch(path).set("If-Match", '"1"').send(change).expect(200);
  const after = { ...before.body, name: "T. Bench", role: "metallurgist", disabled: true, version: 2 };
  expect(body).toEqual(after);
  expect(headers.etag).toBe('"2"');
  expect((await admin.get(path)).body).toEqual(after);
  const { body: record } = await admin.get(`${path}/history`).expect(200);
  expect(record).toMatchObject({ total: 1, limit: 50, offset: 0 });
  expect((record as { rows: object[] }).rows[0]).toEqual({
    id: expect.any(Number),
    version: 2,
    action: "change",
    at: "2026-05-05T06:07:08.000Z",
    author: "The admin",
    reason: "moves to the plant",
    changes: [
      { path: "name", old: "The technician", new: "T. Bench" },
      { path: "role", old: "technician", new: "metallurgist" },
      { path: "disabled", old: false, new: true },
    ],
  });
  const then = await admin.get(`${path}/history/1`).expect(200);
  expect(then.body).toEqual({ name: "The technician", role: "technician", disabled: false, version: 1 });
  await admin.get(`${path}/history/7`).expect(404);
  await admin.get("/api/members/nobody").expect(404);
});

test("a closed account is signed out at once and cannot sign in; opened again it can", async () => {
  const { as, anyone } = await testServer();
  const [admin, technician] = [await as("admin"), await as("technician")];
  const path = `/api/members/${idOf("technician")}`;
  await technician.get("/api/plans").expect(200);
  await admin.patch(path).set("If-Match", "1").send({ disabled: true }).expect(200);
  await technician.get("/api/plans").expect(401);
  const credentials = { email: emailOf("technician"), password };
  const refused = await anyone.post("/api/session").send(credentials).expect(403);
  expect(refused.body).toMatchObject({ error: { code: "DISABLED" } });
  // Who does not know the password does not learn that the account is there.
  await anyone
    .post("/api/session")
    .send({ ...credentials, password: "guess" })
    .expect(401);
  await admin.patch(path).set("If-Match", "2").send({ disabled: false }).expect(200);
  await anyone.post("/api/session").send(credentials).expect(200);
});

test("a session begun while the account was being closed opens nothing", async () => {
  const { db, as } = await testServer();
  const technician = await as("technician");
  db.update(users)
    .set({ disabledAt: "2026-05-04T00:00:00.000Z" })
    .where(eq(users.id, idOf("technician")))
    .run();
  await technician.get("/api/plans").expect(401);
});

test("a new role counts from the next request on", async () => {
  const { as } = await testServer();
  const [admin, technician] = [await as("admin"), await as("technician")];
  await technician.post("/api/projects").send({ siteName: "North", name: "One" }).expect(403);
  await admin
    .patch(`/api/members/${idOf("technician")}`)
    .set("If-Match", "1")
    .send({ role: "metallurgist" })
    .expect(200);
  await technician.post("/api/projects").send({ siteName: "North", name: "One" }).expect(201);
});

test("the last administrator stays one, until there is another who may sign in", async () => {
  const { as } = await testServer();
  const admin = await as("admin");
  const change = (who: "admin" | "manager", version: number, values: object) =>
    admin
      .patch(`/api/members/${idOf(who)}`)
      .set("If-Match", String(version))
      .send(values);
  for (const [values, path] of [
    [{ disabled: true }, "disabled"],
    [{ role: "manager" }, "role"],
  ] as const) {
    const { body } = await change("admin", 1, values).expect(409);
    expect(body).toMatchObject({ error: { code: "CONFLICT", path } });
  }
  await change("manager", 1, { role: "admin", disabled: true }).expect(200);
  await change("admin", 1, { role: "manager" }).expect(409);
  await change("manager", 2, { disabled: false }).expect(200);
  await change("admin", 1, { role: "manager" }).expect(200);
  await admin.get("/api/members").expect(403);
});

test("a stale change of a member gets the row as it is and the difference", async () => {
  const { as } = await testServer();
  const admin = await as("admin");
  const path = `/api/members/${idOf("technician")}`;
  await admin.patch(path).send({ name: "X" }).expect(428);
  const first = await admin.patch(path).set("If-Match", "1").send({ name: "First", role: "manager" }).expect(200);
  const { body } = await admin.patch(path).set("If-Match", "1").send({ name: "Second", role: "manager" }).expect(412);
  expect(body).toMatchObject({ error: { code: "STALE" }, current: first.body as object });
  expect((body as { difference: unknown }).difference).toEqual([
    { path: "name", base: "The technician", yours: "Second", theirs: "First" },
  ]);
  expect((await admin.get(path)).body).toEqual(first.body);
});
