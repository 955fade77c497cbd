import { existsSync, rmSync } from "node:fs";
import { join } from "node:path";
import { readMigrationFiles } from "drizzle-orm/migrator";
import { migrate } from "drizzle-orm/better-sqlite3/migrator";
import { projectRoot } from "../root";
import type { OpenDatabase } from "./open";

const shippedMigrations = join(projectRoot, "drizzle");

/** Hash of every migration this file has seen; null for a file without tables of ours. */
function applied({ raw }: OpenDatabase): Set<string> | null {
  const known = raw.prepare("select 1 from sqlite_master where name = '__drizzle_migrations'").get();
  if (!known) return null;
  const rows = raw.prepare("select hash from __drizzle_migrations").all() as { hash: string }[];
  return new Set(rows.map(({ hash }) => hash));
}

/** Copies the file beside itself.
 *  @returns where to */
function backUp({ raw }: OpenDatabase, migrationsSeen: number): string {
  const copy = `${raw.name}.before-migration-${migrationsSeen + 1}`;
  if (existsSync(copy)) rmSync(copy);
  raw.prepare("vacuum into ?").run(copy);
  return copy;
}

/** @throws Error when a row points at nothing */
function checkReferences({ raw }: OpenDatabase, backup: string | null): void {
  const [broken] = raw.pragma("foreign_key_check") as { table: string; rowid: number; parent: string }[];
  if (!broken) return;
  const where = `Row ${broken.rowid} of ${broken.table} points at a missing row of ${broken.parent}`;
  throw new Error(backup ? `${where}; copy from before: ${backup}` : where);
}

/** Brings the file to the newest schema. A file that already holds data is copied beside itself first.
 *  Foreign keys are off meanwhile: the migrator works in one transaction, where the generated
 *  `PRAGMA foreign_keys` does nothing and rebuilding a table would empty the tables that refer to it.
 *  @returns how many migrations ran, and where the copy is
 *  @throws Error when a reference is broken afterwards, naming row and tables */
export function migrateDatabase(
  open: OpenDatabase,
  migrationsFolder = shippedMigrations,
): { ran: number; backup: string | null } {
  const before = applied(open);
  const pending = readMigrationFiles({ migrationsFolder }).filter(({ hash }) => !before?.has(hash));
  const backup = before && pending.length > 0 ? backUp(open, before.size) : null;
  if (pending.length > 0) {
    open.raw.pragma("foreign_keys = OFF");
    try {
      migrate(open.db, { migrationsFolder });
    } finally {
      open.raw.pragma("foreign_keys = ON");
    }
  }
  checkReferences(open, backup);
  return { ran: pending.length, backup };
}
