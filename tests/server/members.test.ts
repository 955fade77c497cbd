import { expect, test } from "vitest";
import type { Preferences } from "../../shared/schemas/member";
import { emailOf, idOf, testServer } from "../support/testServer";

test("the administrator sees the members, page by page, and no hash", async () => {
  const { as } = await testServer();
  const admin = await as("admin");
  const { body, text } = await admin.get("/api/members?limit=2&offset=1").expect(200);
  const row = (role: "manager" | "metallurgist") => ({
    id: idOf(role),
    email: emailOf(role),
    name: `The ${role}`,
    role,
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
