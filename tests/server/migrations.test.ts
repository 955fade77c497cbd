import { cpSync, existsSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { getTableName, is } from "drizzle-orm";
import { SQLiteTable } from "drizzle-orm/sqlite-core";
import { expect, test } from "vitest";
import { migrateDatabase } from "../../server/db/migrate";
import { openDatabase, type OpenDatabase } from "../../server/db/open";
import * as schema from "../../server/db/schema";
import { createChemistry } from "../../server/features/chemistry/library";
import { seedDemo } from "../../server/demo/seed";
import { projectRoot } from "../../server/root";
import { tables, temporaryFolder, testDatabase } from "../support/testServer";

async function filledDatabase(): Promise<OpenDatabase> {
  const open = testDatabase();
  await seedDemo(open.db, createChemistry(open.db, tables, new Date("2026-01-01T00:00:00Z")));
  open.db.insert(schema.sessions).values({ id: "s1", userId: "demo-admin", expiresAt: 4_000_000_000 }).run();
  return open;
}

/** The shipped migrations and one more. */
function migrationsWith(sql: string): string {
  const folder = join(temporaryFolder(), "drizzle");
  cpSync(join(projectRoot, "drizzle"), folder, { recursive: true });
  const journalPath = join(folder, "meta/_journal.json");
  const journal = JSON.parse(readFileSync(journalPath, "utf8")) as {
    entries: { idx: number; when: number; tag: string }[];
  };
  const last = journal.entries.at(-1);
  if (!last) throw new Error("no migrations are shipped");
  const next = { ...last, idx: last.idx + 1, when: last.when + 1000, tag: "9999_trial" };
  writeFileSync(journalPath, JSON.stringify({ ...journal, entries: [...journal.entries, next] }));
  writeFileSync(join(folder, "9999_trial.sql"), sql);
  return folder;
}

/** What drizzle-kit writes when a column changes: a new table, the rows copied, the old one dropped. */
const rebuildUsers = [
  "PRAGMA foreign_keys=OFF;",
  "CREATE TABLE `__new_users` (`id` text PRIMARY KEY NOT NULL, `email` text NOT NULL, `name` text NOT NULL, `role` text NOT NULL, `password_hash` text NOT NULL, `preferences` text NOT NULL, `created_at` text NOT NULL, `version` integer DEFAULT 1 NOT NULL, `disabled_at` text, `phone` text);",
  'INSERT INTO `__new_users`("id", "email", "name", "role", "password_hash", "preferences", "created_at", "version", "disabled_at") SELECT "id", "email", "name", "role", "password_hash", "preferences", "created_at", "version", "disabled_at" FROM `users`;',
  "DROP TABLE `users`;",
  "ALTER TABLE `__new_users` RENAME TO `users`;",
  "PRAGMA foreign_keys=ON;",
].join("\n--> statement-breakpoint\n");

test("rebuilding a table keeps the rows that refer to it, and a copy from before stands beside the file", async () => {
  const open = await filledDatabase();
  const [members, revisions] = [
    open.db.select().from(schema.users).all(),
    open.db.select().from(schema.planRevisions).all(),
  ];
  const { ran, backup } = migrateDatabase(open, migrationsWith(rebuildUsers));
  expect(ran).toBe(1);
  expect(open.db.select().from(schema.users).all()).toEqual(members);
  expect(open.db.select().from(schema.sessions).all()).toHaveLength(1);
  expect(open.db.select().from(schema.planRevisions).all()).toEqual(revisions);
  expect(open.raw.pragma("foreign_keys", { simple: true })).toBe(1);
  expect(open.raw.prepare("select phone from users").all()).toHaveLength(members.length);

  expect(backup && existsSync(backup)).toBeTruthy();
  const copy = openDatabase(backup ?? "");
  expect(copy.db.select().from(schema.users).all()).toEqual(members);
  expect(() => copy.raw.prepare("select phone from users")).toThrow("no such column");
  copy.raw.close();
});

test("a migration that leaves a row pointing at nothing is an error that names both tables", async () => {
  const open = await filledDatabase();
  const migrate = () => migrateDatabase(open, migrationsWith("DELETE FROM `users` WHERE `id` = 'demo-admin';"));
  expect(migrate).toThrow(/of sessions points at a missing row of users; copy from before: .*before-migration/);
  expect(open.raw.pragma("foreign_keys", { simple: true })).toBe(1);
  // The migration itself is done: later starts must still refuse to work on such a file.
  expect(() => migrateDatabase(open)).toThrow(/of sessions points at a missing row of users/);
});

test("a migration that fails half way leaves the file as it was", async () => {
  const open = await filledDatabase();
  const half = "DELETE FROM `sessions`;\n--> statement-breakpoint\nDELETE FROM `no_such_table`;";
  expect(() => migrateDatabase(open, migrationsWith(half))).toThrow("no_such_table");
  expect(open.db.select().from(schema.sessions).all()).toHaveLength(1);
});

/** The shipped migrations up to and with the one of that number. */
function migrationsUpTo(last: number): string {
  const folder = join(temporaryFolder(), "drizzle");
  cpSync(join(projectRoot, "drizzle"), folder, { recursive: true });
  const journalPath = join(folder, "meta/_journal.json");
  const journal = JSON.parse(readFileSync(journalPath, "utf8")) as { entries: { idx: number }[] };
  const entries = journal.entries.filter(({ idx }) => idx <= last);
  writeFileSync(journalPath, JSON.stringify({ ...journal, entries }));
  return folder;
}

test("a database of the first release comes to the newest schema with its members, plans and library", () => {
  const open = openDatabase(join(temporaryFolder(), "first.db"));
  expect(migrateDatabase(open, migrationsUpTo(0)).ran).toBe(1);
  const run = (statement: string, ...values: unknown[]) => open.raw.prepare(statement).run(...values);
  run("insert into chemistry_versions (id, created_at) values ('v1', '2026-09-01')");
  run(
    "insert into users (id, email, name, role, password_hash, preferences, created_at) values ('u', 'a@b.example', 'A', 'admin', 'x', '{}', '2026-09-01')",
  );
  run(
    "insert into projects (id, site_name, name, invented, created_at) values ('p', 'North', 'Calcine', 0, '2026-09-01')",
  );
  run(
    "insert into plans (id, project_id, name, description, created_at, updated_at) values ('n', 'p', 'tank', '', '2026-09-01', '2026-09-01')",
  );
  run(
    "insert into plan_revisions (plan_id, number, note, author_id, created_at, data_version, inputs) values ('n', 1, '', 'u', '2026-09-01', 'v1', '{}')",
  );
  const { ran, backup } = migrateDatabase(open);
  expect(ran).toBeGreaterThanOrEqual(3);
  expect(backup && existsSync(backup)).toBeTruthy();
  const { db } = open;
  expect(db.select().from(schema.users).all()).toMatchObject([{ id: "u", name: "A", version: 1, disabledAt: null }]);
  expect(db.select().from(schema.chemistryVersions).all()).toMatchObject([
    { id: "v1", curatedVersion: null, edited: [] },
  ]);
  expect(db.select().from(schema.planRevisions).all()).toMatchObject([{ planId: "n", number: 1, dataVersion: "v1" }]);
  expect(db.select().from(schema.trials).all()).toEqual([]);
  open.raw.close();
});

test("a second start migrates nothing and copies nothing", async () => {
  const open = await filledDatabase();
  expect(migrateDatabase(open)).toEqual({ ran: 0, backup: null });
});

test("the tables in the code are the tables that the migrations make", () => {
  const { raw } = testDatabase();
  const made = raw.prepare("select name from sqlite_master where type = 'table'").all() as { name: string }[];
  const ours = made.map(({ name }) => name).filter((name) => !/^(sqlite_|__drizzle)/.test(name));
  const declared = Object.values<unknown>(schema).flatMap((table) =>
    is(table, SQLiteTable) ? [getTableName(table)] : [],
  );
  expect(declared.length).toBeGreaterThan(10);
  expect(ours.sort()).toEqual(declared.sort());
  expect(raw.pragma("foreign_key_check")).toEqual([]);
});
