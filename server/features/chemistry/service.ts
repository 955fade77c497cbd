import { and, asc, eq } from "drizzle-orm";
import { chemicalTables, tableFiles, type ChemicalTables, type TableName } from "../../../shared/schemas/chemistry";
import type { ChemistryAnswer, EditedSpecies } from "../../../shared/schemas/speciesEdit";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import { chemistryVersions, libraryRows, speciesRows } from "./schema";

type SmallTable = Exclude<TableName, "species">;
const smallTables = (Object.keys(tableFiles) as TableName[]).filter((name): name is SmallTable => name !== "species");

/** SQLite takes 32,766 values in one statement; a species row has 20. */
function inChunks<Row>(rows: readonly Row[], insert: (chunk: Row[]) => void): void {
  for (let start = 0; start < rows.length; start += 500) insert(rows.slice(start, start + 500));
}

/** What a version rests on, beside its rows. */
export interface About {
  curatedVersion: string;
  edited: EditedSpecies[];
}

/** Puts a version of the library into the database unless it is there; older versions stay, revisions of plans use them.
 *  @returns whether it was new */
export function keepVersion(db: Db, tables: ChemicalTables, now: Date, about: Partial<About> = {}): boolean {
  const { version } = tables;
  return db.transaction((tx) => {
    const id = tx.select().from(chemistryVersions).where(eq(chemistryVersions.id, version)).get();
    if (id) return false;
    tx.insert(chemistryVersions)
      .values({ id: version, createdAt: now.toISOString(), ...about })
      .run();
    inChunks(
      tables.species.map((row, position) => ({ version, position, ...row })),
      (chunk) => tx.insert(speciesRows).values(chunk).run(),
    );
    for (const table of smallTables) {
      inChunks(
        tables[table].map((row, position) => ({ version, table, position, row })),
        (chunk) => tx.insert(libraryRows).values(chunk).run(),
      );
    }
    return true;
  });
}

/** A version as it was kept, checked against its schema; null when there is none of that name. */
export function tablesOf(db: Db, version: string): ChemicalTables | null {
  if (!db.select().from(chemistryVersions).where(eq(chemistryVersions.id, version)).get()) return null;
  const species = db
    .select()
    .from(speciesRows)
    .where(eq(speciesRows.version, version))
    .orderBy(asc(speciesRows.position))
    .all()
    .map(({ version: _version, position: _position, ...row }) => row);
  const small = smallTables.map((table) => {
    const ofTable = and(eq(libraryRows.version, version), eq(libraryRows.table, table));
    const rows = db.select().from(libraryRows).where(ofTable).orderBy(asc(libraryRows.position)).all();
    return [table, rows.map(({ row }) => row)] as const;
  });
  return chemicalTables.parse({ version, species, ...Object.fromEntries(small) });
}

/** As `tablesOf`.
 *  @throws Refusal NOT_FOUND */
export function keptVersion(db: Db, version: string): ChemicalTables {
  const tables = tablesOf(db, version);
  if (!tables) throw new Refusal("NOT_FOUND", "id", `There is no version ${version} of the chemistry library here.`);
  return tables;
}

/** As `keptVersion`, with what it rested on. */
export function keptAnswer(db: Db, version: string): ChemistryAnswer {
  const tables = keptVersion(db, version);
  const about = db.select().from(chemistryVersions).where(eq(chemistryVersions.id, version)).get();
  return { ...tables, curatedVersion: about?.curatedVersion ?? version, edited: about?.edited ?? [] };
}
