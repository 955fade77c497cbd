import { describe, expect, test } from "vitest";
import { speciesRow, tableFiles } from "../../shared/schemas/chemistry";
import { csvRows } from "../support/csv";
import pins from "./pins.json";

/** Count and sums of every numeric column, text columns by their length: data cannot change unseen. Changed on purpose? A new pin, and a
 *  line in docs/changelog.md that says which number moved and why. */
function fingerprint(file: string): Record<string, number> {
  const rows = csvRows(`shared/data/${file}`);
  const sums: Record<string, number> = { rows: rows.length };
  for (const row of rows)
    for (const [column, cell] of Object.entries(row)) {
      const value = cell === "" || Number.isNaN(Number(cell)) ? null : Math.abs(Number(cell));
      if (value !== null) sums[column] = (sums[column] ?? 0) + value;
      else sums[`${column}, letters`] = (sums[`${column}, letters`] ?? 0) + cell.length;
    }
  return Object.fromEntries(Object.entries(sums).map(([k, v]) => [k, Number(v.toFixed(6))]));
}

const pinned = pins as Record<string, Record<string, number>>;

describe.each(Object.values(tableFiles).flat())("%s", (file) => {
  test("is as pinned, column by column", () => expect(fingerprint(file)).toEqual(pinned[file]));
});

test("every column of the species tables that holds numbers is pinned", () => {
  const columns = Object.keys(speciesRow.shape).filter((c) => /kJ|_J$|Cp_|charge/.test(c));
  expect(columns.length).toBe(9);
  for (const column of columns) expect(pinned["species-base-metals.csv"]).toHaveProperty([column]);
});
