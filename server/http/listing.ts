import { eq, isNotNull, isNull, like, or, sql, type AnyColumn, type SQL } from "drizzle-orm";

/** `?deleted=false|true|all` */
export function deletedIs(column: AnyColumn, deleted: "true" | "false" | "all"): SQL | undefined {
  if (deleted === "all") return undefined;
  return deleted === "true" ? isNotNull(column) : isNull(column);
}

/** Rows of which any of the columns holds the text; its own % and _ are text too. */
export function holds(text: string | undefined, columns: readonly AnyColumn[]): SQL | undefined {
  if (text === undefined || text === "") return undefined;
  const pattern = `%${text.replace(/[\\%_]/g, "\\$&")}%`;
  return or(...columns.map((column) => sql`${like(column, pattern)} escape '\\'`));
}

export const isOf = (column: AnyColumn, value: string | undefined): SQL | undefined =>
  value === undefined ? undefined : eq(column, value);

/** What is not known stands last, whichever way the rest is sorted. */
export const ordered = (column: AnyColumn | SQL, order: "asc" | "desc"): SQL =>
  order === "asc" ? sql`${column} asc nulls last` : sql`${column} desc nulls last`;
