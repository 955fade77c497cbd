import { fail, ok, type Outcome } from "../outcome";
import { chemicalTables, tableFiles, type ChemicalTables, type TableName } from "../schemas/chemistry";

type TextRow = Readonly<Record<string, string>>;

/** The first column names the row in every table. */
const nameOf = (row: TextRow): string => Object.values(row)[0] ?? "";

/** The tables from the rows of their files, every cell checked against its column.
 *  @param rows  rows by file name, `species-ligands.csv`, cells as text     @param version  content hash of the files
 *  @returns  the tables; BAD_DATA names file, line, row id, column and value     @source  shared/schemas/chemistry.ts */
export function tablesFromRows(
  rows: Readonly<Record<string, readonly TextRow[]>>,
  version: string,
): Outcome<ChemicalTables> {
  const tables: Partial<Record<TableName, unknown[]>> = {};
  for (const [table, files] of Object.entries(tableFiles) as [TableName, readonly string[]][]) {
    const schema = chemicalTables.shape[table].element;
    const parsed: unknown[] = [];
    for (const file of files) {
      const fileRows = rows[file];
      if (fileRows === undefined) return fail("BAD_DATA", file, `${file} is missing`);
      for (const [i, row] of fileRows.entries()) {
        const result = schema.safeParse(row);
        if (result.success) {
          parsed.push(result.data);
          continue;
        }
        const issue = result.error.issues[0];
        const column = issue?.path.join(".") ?? "";
        const value = row[column] === undefined ? "no such column" : `"${row[column]}"`;
        const message = `${file}, line ${i + 2}, row ${nameOf(row)}, column ${column}: ${value}; ${issue?.message ?? ""}`;
        return fail("BAD_DATA", `${file}/${nameOf(row)}/${column}`, message);
      }
    }
    tables[table] = parsed;
  }
  // Each table holds what its own schema returned, one line above.
  return ok({ version, ...tables } as unknown as ChemicalTables);
}
