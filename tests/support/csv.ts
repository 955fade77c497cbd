import { readFileSync } from "node:fs";
import { parse } from "csv-parse/sync";

/** Rows of a CSV file, cells as text. */
export const csvRows = (path: string): Record<string, string>[] =>
  parse<Record<string, string>>(readFileSync(path, "utf8"), { columns: true });

export interface CheckRow {
  id: string;
  topic: string;
  statement: string;
  value: number;
  unit: string;
  tolerance: number;
  conditions: string;
  source: string;
}

/** The published values of tests/golden/checks.csv. */
export const checkRows = (): CheckRow[] =>
  csvRows("tests/golden/checks.csv").map((r) => ({
    id: r.id ?? "",
    topic: r.topic ?? "",
    statement: r.statement ?? "",
    value: Number(r.value),
    unit: r.unit ?? "",
    tolerance: Number(r.tolerance),
    conditions: r.conditions ?? "",
    source: r.source ?? "",
  }));
