import { createHash } from "node:crypto";
import { existsSync, readFileSync } from "node:fs";
import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";
import { parse } from "csv-parse/sync";
import { valueOf } from "../../shared/outcome";
import { tableFiles, type ChemicalTables } from "../../shared/schemas/chemistry";
import { tablesFromRows } from "../../shared/species/library";

/** shared/data, found from this file upwards (source tree or bundle in dist/), else from the working directory. */
function dataDirectory(): string {
  const tried: string[] = [];
  let here = dirname(fileURLToPath(import.meta.url));
  for (let up = 0; up < 4; up += 1) {
    tried.push(join(here, "shared", "data"));
    here = dirname(here);
  }
  tried.push(join(process.cwd(), "shared", "data"));
  const found = tried.find((dir) => existsSync(join(dir, "elements.csv")));
  if (found === undefined)
    throw new Error(`the chemistry tables (shared/data) were found in none of ${tried.join(", ")}`);
  return found;
}

function rowsOf(file: string, text: string): Record<string, string>[] {
  try {
    return parse<Record<string, string>>(text, { columns: true, skip_empty_lines: true });
  } catch (error) {
    throw new Error(`${file}: ${error instanceof Error ? error.message : String(error)}`, { cause: error });
  }
}

/** Reads the chemistry tables.
 *  @param dir  folder of the CSV files     @returns  the tables and their version, a short hash of the files' content
 *  @throws Error when a file is missing or a cell is not what its column says
 *  @source  shared/data */
export function readTables(dir = dataDirectory()): { tables: ChemicalTables; version: string } {
  const hash = createHash("sha256");
  const rows: Record<string, Record<string, string>[]> = {};
  for (const file of Object.values(tableFiles).flat()) {
    const text = readFileSync(join(dir, file), "utf8");
    hash.update(`${file}\n${text}\n`);
    rows[file] = rowsOf(file, text);
  }
  const version = hash.digest("hex").slice(0, 12);
  return { tables: valueOf(tablesFromRows(rows, version)), version };
}
