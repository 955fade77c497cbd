import type { HistoryAction } from "../../../shared/schemas/history";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import type { HistoryEntity } from "./schema";
import { recordWrite, requireSeen, type Author, type Kept } from "./service";

export interface VersionedRow {
  id: string;
  version: number;
  deletedAt: string | null;
}

/** A table whose rows have a version, can be deleted and brought back, and leave a record of every write. */
export interface RecordedTable<Row extends VersionedRow> {
  entity: HistoryEntity;
  /** @throws Refusal NOT_FOUND */
  rowOf: (db: Db, id: string) => Row;
  /** for sentences: "Trial NL-07" */
  nameOf: (row: Row) => string;
  /** the row's own fields and its version */
  keptOf: (row: Row) => Kept;
  set: (db: Db, id: string, values: Record<string, unknown> & Stamp) => void;
}
interface Stamp {
  version: number;
  updatedAt: string;
}

interface Write<Row> {
  seen: number;
  action: HistoryAction;
  reason: string;
  /** the fields sent */
  yours: Record<string, unknown>;
  /** refuses what the row as it stands does not allow; after the version was checked */
  check?: (db: Db, current: Row) => void;
  /** what hangs on the row, in the same transaction */
  then?: (db: Db, before: Row, after: Row) => void;
}

/** Changes a row if it still is the one its writer saw, raises its version, and puts the write on record.
 *  @throws Refusal NOT_FOUND, STALE, and what `check` throws */
export function writeRow<Row extends VersionedRow>(
  db: Db,
  { entity, rowOf, nameOf, keptOf, set }: RecordedTable<Row>,
  id: string,
  { seen, action, reason, yours, check, then }: Write<Row>,
  author: Author,
): Row {
  return db.transaction((tx) => {
    const current = rowOf(tx, id);
    const before = keptOf(current);
    requireSeen(tx, { entity, what: nameOf(current), current, fields: before, seen, yours });
    check?.(tx, current);
    set(tx, id, { ...yours, version: seen + 1, updatedAt: author.now.toISOString() });
    const written = rowOf(tx, id);
    recordWrite(tx, { entity, id, action, before, after: keptOf(written), reason }, author);
    if (!then) return written;
    then(tx, current, written);
    return rowOf(tx, id);
  });
}

/** @throws Refusal CONFLICT for a deleted row */
export function requireThere(name: string, { deletedAt }: VersionedRow): void {
  if (deletedAt !== null) throw new Refusal("CONFLICT", "deletedAt", `${name} was deleted; restore it first.`);
}

interface Deletion<Row> {
  seen: number;
  reason: string;
  check?: (db: Db, current: Row) => void;
}

/** Takes a row out of every list; it stays, and can be brought back.
 *  @throws Refusal NOT_FOUND, STALE, CONFLICT */
export const deleteRow = <Row extends VersionedRow>(
  db: Db,
  table: RecordedTable<Row>,
  id: string,
  { check, ...deletion }: Deletion<Row>,
  author: Author,
): Row =>
  writeRow(
    db,
    table,
    id,
    {
      ...deletion,
      action: "delete",
      yours: { deletedAt: author.now.toISOString() },
      check: (tx, current) => {
        requireThere(table.nameOf(current), current);
        check?.(tx, current);
      },
    },
    author,
  );

/** @throws Refusal NOT_FOUND, STALE, CONFLICT */
export const restoreRow = <Row extends VersionedRow>(
  db: Db,
  table: RecordedTable<Row>,
  id: string,
  { check, ...restoring }: Deletion<Row>,
  author: Author,
): Row =>
  writeRow(
    db,
    table,
    id,
    {
      ...restoring,
      action: "restore",
      yours: { deletedAt: null },
      check: (tx, current) => {
        if (current.deletedAt === null)
          throw new Refusal("CONFLICT", "deletedAt", `${table.nameOf(current)} is not deleted.`);
        check?.(tx, current);
      },
    },
    author,
  );
