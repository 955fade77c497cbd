import { mkdirSync } from "node:fs";
import { dirname } from "node:path";
import Sqlite from "better-sqlite3";
import { drizzle, type BetterSQLite3Database } from "drizzle-orm/better-sqlite3";
import * as schema from "./schema";

export type Db = BetterSQLite3Database<typeof schema>;
export interface OpenDatabase {
  db: Db;
  raw: Sqlite.Database;
}

/** Opens (and if need be creates) the SQLite file; its folder too. Foreign keys are on. */
export function openDatabase(path: string): OpenDatabase {
  mkdirSync(dirname(path), { recursive: true });
  const raw = new Sqlite(path);
  raw.pragma("journal_mode = WAL");
  raw.pragma("busy_timeout = 5000");
  raw.pragma("foreign_keys = ON");
  return { db: drizzle(raw, { schema }), raw };
}
