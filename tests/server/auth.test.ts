import { expect, test } from "vitest";
import { sessions, users } from "../../server/db/schema";
import { passwordMatches } from "../../server/features/auth/passwords";
import { emailOf, idOf, password, testServer } from "../support/testServer";

const signedIn = {
  user: { id: idOf("technician"), email: emailOf("technician"), name: "The technician", role: "technician" },
  needsFirstAdmin: false,
};

test("signing in gives a session that GET and later requests see, signing out ends it", async () => {
  const { anyone, db } = await testServer();
  const before = await anyone.get("/api/session").expect(200);
  expect(before.body).toEqual({ user: null, needsFirstAdmin: false });
  // Mixed case: addresses are one whatever the case.
  const made = await anyone.post("/api/session").send({ email: "Technician@Works.example", password }).expect(200);
  expect(made.body).toEqual(signedIn);
  expect((await anyone.get("/api/session").expect(200)).body).toEqual(signedIn);
  expect(JSON.stringify(made.body)).not.toContain("argon2");

  await anyone.delete("/api/session").expect(204);
  expect((await anyone.get("/api/session").expect(200)).body).toEqual(before.body);
  expect(db.select().from(sessions).all()).toEqual([]);
});

test("a session that was ended elsewhere is refused and its cookie cleared", async () => {
  const { as, db } = await testServer();
  const manager = await as("manager");
  await manager.get("/api/projects").expect(200);
  db.delete(sessions).run();
  const refused = await manager.get("/api/projects").expect(401);
  expect(refused.headers["set-cookie"]?.[0]).toMatch(/^gangueway_session=;.*Max-Age=0/);
});

test("an expired session is refused", async () => {
  const { as, db } = await testServer();
  const manager = await as("manager");
  db.update(sessions)
    .set({ expiresAt: Math.floor(Date.now() / 1000) - 5 })
    .run();
  await manager.get("/api/projects").expect(401);
});

test("signing in again replaces the session that was there", async () => {
  const { anyone, db } = await testServer();
  for (const role of ["technician", "manager"] as const) {
    await anyone
      .post("/api/session")
      .send({ email: emailOf(role), password })
      .expect(200);
  }
  expect(
    db
      .select()
      .from(sessions)
      .all()
      .map(({ userId }) => userId),
  ).toEqual([idOf("manager")]);
});

test.each([
  ["http://localhost:5180", false],
  ["https://leach.example", true],
])("with APP_URL %s the cookie is httpOnly, SameSite=Lax, Secure: %s", async (address, secure) => {
  const { anyone } = await testServer({ env: { APP_URL: address, SESSION_DAYS: "3" } });
  const made = await anyone
    .post("/api/session")
    .send({ email: emailOf("admin"), password })
    .expect(200);
  const cookie = made.headers["set-cookie"]?.[0] ?? "";
  expect(cookie).toMatch(/^gangueway_session=\w+;/);
  expect(cookie).toContain("HttpOnly");
  expect(cookie).toContain("SameSite=Lax");
  expect(cookie).toContain("Path=/");
  expect(cookie.includes("Secure")).toBe(secure);
  const age = Number(/Max-Age=(\d+)/.exec(cookie)?.[1]);
  expect(Math.abs(age - 3 * 86_400)).toBeLessThan(5);
});

test("a wrong password and an unknown address are refused in the same words", async () => {
  const { anyone } = await testServer();
  const wrong = await anyone
    .post("/api/session")
    .send({ email: emailOf("admin"), password: "guess" })
    .expect(401);
  const unknown = await anyone.post("/api/session").send({ email: "who@works.example", password }).expect(401);
  expect(wrong.body).toEqual(unknown.body);
  expect(wrong.body).toMatchObject({ error: { code: "WRONG_CREDENTIALS" } });
  expect(wrong.headers["set-cookie"]).toBeUndefined();
});

test("a member who does not exist matches no password, not even the one that stands in for his", async () => {
  expect(await passwordMatches(null, "nobody has this password")).toBe(false);
});

test("a refused body never repeats the password", async () => {
  const { anyone } = await testServer({ members: false });
  const short = { email: "first@works.example", name: "First", password: "hunter2" };
  const refused = await anyone.post("/api/first-admin").send(short).expect(400);
  expect(refused.body).toMatchObject({ error: { code: "INVALID_INPUT", path: "password" } });
  expect(refused.text).toContain("at least 12 characters");
  expect(refused.text).not.toContain("hunter2");
});

test("failures are limited, successes are not counted, and each application counts for itself", async () => {
  const { anyone } = await testServer({ env: { SIGN_IN_ATTEMPTS: "3" } });
  const good = { email: emailOf("manager"), password };
  const bad = { ...good, password: "guess" };
  for (let n = 0; n < 5; n += 1) await anyone.post("/api/session").send(good).expect(200);
  for (let n = 0; n < 3; n += 1) await anyone.post("/api/session").send(bad).expect(401);
  const refused = await anyone.post("/api/session").send(good).expect(429);
  expect(refused.body).toMatchObject({ error: { code: "TOO_MANY_ATTEMPTS" } });
  expect(Number(refused.headers["retry-after"])).toBeGreaterThan(0);
  await anyone.get("/api/session").expect(200);

  const other = await testServer({ env: { SIGN_IN_ATTEMPTS: "3" } });
  await other.anyone.post("/api/session").send(good).expect(200);
});

test("the first visitor of an empty server becomes its administrator, the second does not", async () => {
  const { anyone, db } = await testServer({ members: false });
  expect((await anyone.get("/api/session")).body).toEqual({ user: null, needsFirstAdmin: true });
  const first = { email: "First.Chemist@works.example", name: "First Chemist", password: "a long enough one" };
  const made = await anyone.post("/api/first-admin").send(first).expect(201);
  const user = { email: "first.chemist@works.example", name: "First Chemist", role: "admin" };
  expect(made.body).toMatchObject({ user, needsFirstAdmin: false });
  expect((await anyone.get("/api/session")).body).toMatchObject({ user });

  const late = { ...first, email: "late@works.example" };
  const refused = await anyone.post("/api/first-admin").send(late).expect(409);
  expect(refused.body).toMatchObject({ error: { code: "CONFLICT" } });
  expect(db.select().from(users).all()).toHaveLength(1);
  await anyone.post("/api/session").send({ email: first.email, password: first.password }).expect(200);
});
