import type { Page } from "../../shared/schemas/api";

/** One page of rows beside how many there are. */
export function page<Row>(rows: Row[], total: number, { limit, offset }: { limit: number; offset: number }): Page<Row> {
  return { rows, total, limit, offset };
}
