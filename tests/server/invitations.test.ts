import { createHash } from "node:crypto";
import type { AddressInfo } from "node:net";
import { SMTPServer } from "smtp-server";
import type { Agent } from "supertest";
import { expect, onTestFinished, test } from "vitest";
import { invitations, mails, users } from "../../server/db/schema";
import type { Page } from "../../shared/schemas/api";
import type { InvitationRow, MailRow } from "../../shared/schemas/invitation";
import { emailOf, testServer } from "../support/testServer";

const at = "2026-05-04T03:02:01.000Z";
const person = { name: "New Bencher", password: "a long enough one" };
const offer = { email: "New.One@works.example", role: "technician", message: "Start on Monday." } as const;

const inviteOne = async (admin: Agent) =>
  (await admin.post("/api/invitations").send(offer).expect(201)).body as InvitationRow;
const letters = async (admin: Agent) => (await admin.get("/api/outbox").expect(200)).body as Page<MailRow>;

async function tokenIn(admin: Agent): Promise<string> {
  const [letter] = (await letters(admin)).rows;
  const token = /http:\/\/localhost:5180\/invitation\/([\w-]{43})$/m.exec(letter?.text ?? "")?.[1];
  return token ?? expect.fail(`no link in ${letter?.text}`);
}

test("an invitation comes back as it was made, and its letter waits in the mailbox", async () => {
  const { as } = await testServer();
  const admin = await as("admin");
  const made = await inviteOne(admin);
  expect(made).toEqual({
    id: made.id,
    email: "new.one@works.example",
    role: "technician",
    invitedBy: "The admin",
    createdAt: at,
    expiresAt: "2026-05-11T03:02:01.000Z",
    state: "open",
    mail: { id: made.mail?.id, state: "kept", error: null },
  });
  expect((await admin.get("/api/invitations?state=open").expect(200)).body).toEqual({
    rows: [made],
    total: 1,
    limit: 50,
    offset: 0,
  });
  expect((await admin.get("/api/invitations?state=expired")).body).toMatchObject({ rows: [], total: 0 });
  const { rows, total } = await letters(admin);
  expect(total).toBe(1);
  const { text = "", ...letter } = rows[0] ?? {};
  expect(letter).toEqual({
    id: made.mail?.id,
    to: "new.one@works.example",
    subject: "Invitation to Gangueway",
    createdAt: at,
    state: "kept",
    sentAt: null,
    error: null,
  });
  expect(text).toContain("The admin invites you to Gangueway as technician.");
  expect(text).toContain("Start on Monday.");
  expect(text).toContain("2026-05-11 03:02 UTC");
});

test("the link makes a member once, signs in, and is forgotten", async () => {
  const { as, anyone, db } = await testServer();
  const admin = await as("admin");
  await inviteOne(admin);
  const token = await tokenIn(admin);
  const shown = await anyone.get(`/api/invitations/${token}`).expect(200);
  expect(shown.body).toEqual({
    email: "new.one@works.example",
    role: "technician",
    invitedBy: "The admin",
    expiresAt: "2026-05-11T03:02:01.000Z",
  });
  const { body } = await anyone.post(`/api/invitations/${token}/accept`).send(person).expect(201);
  const user = { id: expect.any(String), email: "new.one@works.example", name: "New Bencher", role: "technician" };
  expect(body).toEqual({ user, needsFirstAdmin: false });
  expect((await anyone.get("/api/session")).body).toMatchObject({ user: (body as { user: object }).user });

  for (const again of [
    anyone.post(`/api/invitations/${token}/accept`).send(person),
    anyone.get(`/api/invitations/${token}`),
  ]) {
    expect((await again.expect(410)).body).toMatchObject({
      error: { code: "EXPIRED", path: "token", message: /was used already/ },
    });
  }
  expect(db.select().from(users).all()).toHaveLength(5);
  expect((await admin.get("/api/invitations")).body).toMatchObject({ rows: [{ state: "accepted" }] });
  expect((await letters(admin)).rows[0]?.text).not.toContain(token);
  await anyone.delete("/api/session").expect(204);
  await anyone.post("/api/session").send({ email: offer.email, password: person.password }).expect(200);
});

test("only a hash of the link is at rest once the letter has gone", async () => {
  const { as, raw, db } = await testServer();
  const admin = await as("admin");
  await inviteOne(admin);
  const token = await tokenIn(admin);
  const [stored] = db.select().from(invitations).all();
  expect(stored?.tokenHash).toBe(createHash("sha256").update(token).digest("hex"));
  expect(JSON.stringify(stored)).not.toContain(token);
  const { body } = await admin.get("/api/invitations");
  expect(JSON.stringify(body)).not.toContain(token);
  expect(raw.prepare("select count(*) n from mails where link like '%' || ?").get(token)).toEqual({ n: 1 });
});

test("a link that is too old, withdrawn or made up opens nothing, and says so", async () => {
  const { as, anyone, now, db } = await testServer({ env: { INVITATION_DAYS: "2" } });
  const admin = await as("admin");
  const { id } = await inviteOne(admin);
  const token = await tokenIn(admin);
  now("2026-05-06T03:02:00.000Z");
  await anyone.get(`/api/invitations/${token}`).expect(200);
  now("2026-05-06T03:02:01.000Z");
  const late = await anyone.post(`/api/invitations/${token}/accept`).send(person).expect(410);
  expect(late.body).toMatchObject({
    error: { message: "This invitation has expired; ask an administrator for a new one." },
  });
  expect((await letters(admin)).rows[0]?.text).not.toContain(token);
  expect((await admin.get("/api/invitations?state=expired")).body).toMatchObject({ total: 1 });
  await admin.delete(`/api/invitations/${id}`).expect(409);

  const again = (await admin.post(`/api/invitations/${id}/again`).expect(201)).body as InvitationRow;
  expect(again).toMatchObject({ email: "new.one@works.example", role: "technician", state: "open" });
  const second = await tokenIn(admin);
  expect(second).not.toBe(token);
  expect((await admin.delete(`/api/invitations/${again.id}`).expect(200)).body).toMatchObject({ state: "withdrawn" });
  const withdrawn = await anyone.post(`/api/invitations/${second}/accept`).send(person).expect(410);
  expect(withdrawn.body).toMatchObject({ error: { message: /was withdrawn/ } });
  expect((await anyone.get("/api/invitations/made-up").expect(404)).body).toMatchObject({
    error: { code: "NOT_FOUND" },
  });
  expect(db.select().from(users).all()).toHaveLength(4);
});

test("a second invitation of the same address takes the place of the first", async () => {
  const { as, anyone } = await testServer();
  const admin = await as("admin");
  await inviteOne(admin);
  const first = await tokenIn(admin);
  await admin.post("/api/invitations").send({ email: offer.email, role: "manager" }).expect(201);
  await anyone.get(`/api/invitations/${first}`).expect(410);
  const { body } = await admin.get("/api/invitations?state=open");
  expect(body).toMatchObject({ total: 1, rows: [{ role: "manager" }] });
});

test("a member is not invited, a short password is refused, and failures are limited", async () => {
  const { as, anyone } = await testServer({ env: { SIGN_IN_ATTEMPTS: "2" } });
  const admin = await as("admin");
  const member = await admin
    .post("/api/invitations")
    .send({ ...offer, email: emailOf("manager").toUpperCase() })
    .expect(409);
  expect(member.body).toMatchObject({ error: { code: "CONFLICT", path: "email" } });
  await inviteOne(admin);
  const token = await tokenIn(admin);
  const short = await anyone
    .post(`/api/invitations/${token}/accept`)
    .send({ ...person, password: "hunter2" })
    .expect(400);
  expect(short.body).toMatchObject({ error: { code: "INVALID_INPUT", path: "password" } });
  expect(short.text).not.toContain("hunter2");
  await anyone.post("/api/invitations/guess/accept").send(person).expect(404);
  expect((await anyone.post(`/api/invitations/${token}/accept`).send(person).expect(429)).body).toMatchObject({
    error: { code: "TOO_MANY_ATTEMPTS" },
  });
});

test("two who accept one invitation at once: one becomes a member", async () => {
  const { as, anyone, db } = await testServer();
  const admin = await as("admin");
  await inviteOne(admin);
  const path = `/api/invitations/${await tokenIn(admin)}/accept`;
  const both = await Promise.all([
    anyone.post(path).send(person),
    anyone.post(path).send({ ...person, name: "Other" }),
  ]);
  expect(both.map(({ status }) => status).sort()).toEqual([201, 410]);
  expect(db.select().from(users).all()).toHaveLength(5);
});

/** A mail server of the test's own; `refuse` makes it turn every letter away. */
async function mailServer(refuse = false): Promise<{ url: string; received: { to: string; text: string }[] }> {
  const received: { to: string; text: string }[] = [];
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS"],
    onRcptTo: (_address, _session, done) => done(refuse ? new Error("no such mailbox here") : null),
    onData: (stream, { envelope }, done) => {
      let text = "";
      stream.on("data", (chunk: Buffer) => (text += chunk.toString()));
      stream.on("end", () => {
        received.push({ to: envelope.rcptTo[0]?.address ?? "", text });
        done();
      });
    },
  });
  const listening = server.listen(0, "127.0.0.1");
  await new Promise((resolve) => listening.once("listening", resolve));
  onTestFinished(() => void server.close());
  return { url: `smtp://127.0.0.1:${(listening.address() as AddressInfo).port}?ignoreTLS=true`, received };
}

/** Undoes the line breaks of quoted-printable. */
const unfolded = (text: string) => text.replaceAll("=\r\n", "").replaceAll("=3D", "=");

test("with a mail server the letter goes out, and the mailbox keeps it without its link", async () => {
  const { url, received } = await mailServer();
  const { as, anyone, db } = await testServer({ env: { SMTP_URL: url, MAIL_FROM: "Plant <plant@works.example>" } });
  const admin = await as("admin");
  expect(await inviteOne(admin)).toMatchObject({ mail: { state: "sent", error: null } });
  expect(received).toHaveLength(1);
  expect(received[0]?.to).toBe("new.one@works.example");
  const text = unfolded(received[0]?.text ?? "");
  expect(text).toContain("From: Plant <plant@works.example>");
  const token = /\/invitation\/([\w-]{43})/.exec(text)?.[1] ?? expect.fail(text);
  const [letter] = (await letters(admin)).rows;
  expect(letter).toMatchObject({ state: "sent", sentAt: at, error: null });
  expect(letter?.text).not.toContain(token);
  expect(JSON.stringify(db.select().from(mails).all())).not.toContain(token);
  await anyone.post(`/api/invitations/${token}/accept`).send(person).expect(201);
});

test("a letter that the mail server refuses stays in the mailbox with its words, and its link can be handed over", async () => {
  const { url, received } = await mailServer(true);
  const { as, anyone } = await testServer({ env: { SMTP_URL: url } });
  const admin = await as("admin");
  const made = await inviteOne(admin);
  expect(made.mail).toMatchObject({
    state: "failed",
    error: expect.stringContaining("no such mailbox here") as string,
  });
  expect(received).toEqual([]);
  await anyone.get(`/api/invitations/${await tokenIn(admin)}`).expect(200);
});
