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

/** Brings the file to the newest schema. A file that already holds data is copied beside itself first.
 *  Foreign keys are off meanwhile: the migrator works in one transaction, where the generated
 *  `PRAGMA foreign_keys` does nothing and rebuilding a table would empty the tables that refer to it.
 *  @returns how many migrations ran, and where the copy is
 *  @throws Error when a reference is broken afterwards, naming table and row */
export function migrateDatabase(
  open: OpenDatabase,
  migrationsFolder = shippedMigrations,
): { ran: number; backup: string | null } {
  const { db, raw } = open;
  const before = applied(open);
  const pending = readMigrationFiles({ migrationsFolder }).filter(({ hash }) => !before?.has(hash));
  if (pending.length === 0) return { ran: 0, backup: null };

  const backup = before && before.size > 0 ? `${raw.name}.before-migration-${before.size + 1}` : null;
  if (backup) {
    if (existsSync(backup)) rmSync(backup);
    raw.prepare("vacuum into ?").run(backup);
  }
  raw.pragma("foreign_keys = OFF");
  try {
    migrate(db, { migrationsFolder });
    const [broken] = raw.pragma("foreign_key_check") as { table: string; rowid: number; parent: string }[];
    if (broken) {
      const row = `row ${broken.rowid} of ${broken.table}`;
      throw new Error(`After the migration ${row} points at a missing row of ${broken.parent}; backup: ${backup}`);
    }
  } finally {
    raw.pragma("foreign_keys = ON");
  }
  return { ran: pending.length, backup };
}
