import { copyFileSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { Express } from "express";
import pino from "pino";
import request, { type Agent } from "supertest";
import { onTestFinished } from "vitest";
import { createApp } from "../../server/app";
import { readTables } from "../../server/chemistry/readTables";
import { readConfig } from "../../server/config";
import { migrateDatabase } from "../../server/db/migrate";
import { openDatabase, type OpenDatabase } from "../../server/db/open";
import { users } from "../../server/db/schema";
import type { Deps } from "../../server/deps";
import { hashPassword } from "../../server/features/auth/passwords";
import { createSessions } from "../../server/features/auth/sessions";
import { createChemistry } from "../../server/features/chemistry/library";
import { keepVersion } from "../../server/features/chemistry/service";
import { createMailer } from "../../server/features/mailbox/mailer";
import { valueOf } from "../../shared/outcome";
import { memberRoles, type MemberRole } from "../../shared/schemas/member";
import { solve } from "../../shared/solve";
import { libraryFrom } from "../../shared/species/library";

export const password = "correct horse battery";
export const emailOf = (role: MemberRole) => `${role}@works.example`;
export const idOf = (role: MemberRole) => `user-${role}`;

export const { tables } = readTables();
export const library = valueOf(libraryFrom(tables));

/** A folder that is gone when the test is over. */
export function temporaryFolder(): string {
  const folder = mkdtempSync(join(tmpdir(), "gangueway-test-"));
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }));
  return folder;
}

/** One migrated file with the chemistry library a worker; every test copies it. */
let template: string | undefined;
function migratedTemplate(): string {
  if (template !== undefined) return template;
  const path = join(mkdtempSync(join(tmpdir(), "gangueway-template-")), "template.db");
  const open = openDatabase(path);
  migrateDatabase(open);
  keepVersion(open.db, tables, new Date("2026-01-01T00:00:00Z"));
  open.raw.close();
  process.once("exit", () => rmSync(join(path, ".."), { recursive: true, force: true }));
  return (template = path);
}

/** A migrated SQLite file of the test's own, without members. */
export function testDatabase(): OpenDatabase {
  const path = join(temporaryFolder(), "test.db");
  copyFileSync(migratedTemplate(), path);
  const open = openDatabase(path);
  open.raw.pragma("synchronous = OFF"); // no test pulls the plug
  onTestFinished(() => void open.raw.close());
  return open;
}

const passwordHash = hashPassword(password);

async function addMembers({ db }: OpenDatabase): Promise<void> {
  const stored = { passwordHash: await passwordHash, preferences: {}, createdAt: "2026-01-01T00:00:00.000Z" };
  const members = memberRoles.map((role) => ({ id: idOf(role), email: emailOf(role), name: `The ${role}`, role }));
  db.insert(users)
    .values(members.map((member) => ({ ...member, ...stored })))
    .run();
}

interface Options {
  /** settings as the environment gives them */
  env?: Record<string, string>;
  members?: boolean;
  clientFolder?: string;
}

export interface TestServer extends OpenDatabase {
  app: Express;
  deps: Deps;
  /** moves the server's clock */
  now: (iso: string) => void;
  /** a client signed in as that role */
  as: (role: MemberRole) => Promise<Agent>;
  /** a client that is not signed in */
  anyone: Agent;
}

/** The whole application on a SQLite file of its own, with one member a role. */
export async function testServer({
  env = {},
  members = true,
  clientFolder = temporaryFolder(),
}: Options = {}): Promise<TestServer> {
  const open = testDatabase();
  if (members) await addMembers(open);
  let clock = new Date("2026-05-04T03:02:01.000Z");
  const config = readConfig({ SIGN_IN_ATTEMPTS: "1000", ...env });
  const sessions = createSessions(open.db, { https: config.appUrl.startsWith("https:"), days: config.sessionDays });
  const now = () => clock;
  const deps: Deps = {
    db: open.db,
    config,
    clock: now,
    log: pino({ level: "silent" }),
    sessions,
    mailer: createMailer(open.db, { smtpUrl: config.smtpUrl, from: config.mailFrom, clock: now }),
    chemistry: createChemistry(open.db, tables, clock),
    solve,
  };
  const app = createApp(deps, clientFolder);
  return {
    ...open,
    app,
    deps,
    now: (iso) => (clock = new Date(iso)),
    as: async (role) => {
      const agent = request.agent(app);
      const cookie = (await sessions.start(idOf(role))).split(";")[0] ?? "";
      return agent.set("Cookie", cookie);
    },
    anyone: request.agent(app),
  };
}
