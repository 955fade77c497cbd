import type { Page } from "../../shared/schemas/api";
import { api } from "./api";

/** All rows of a list route, page after page. */
export async function allRows<Row>(path: string, signal: AbortSignal): Promise<Row[]> {
  const rows: Row[] = [];
  for (;;) {
    const join = path.includes("?") ? "&" : "?";
    const page = await api.get<Page<Row>>(`${path}${join}limit=200&offset=${rows.length}`, { signal });
    rows.push(...page.rows);
    if (rows.length >= page.total || page.rows.length === 0) return rows;
  }
}

type Parameter = string | number | boolean | null | undefined;

/** "?a=1&b=2" of what is given; "" of nothing. */
export function queryString(parameters: Readonly<Record<string, Parameter>>): string {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(parameters)) {
    if (value !== undefined && value !== null && value !== "") search.set(name, String(value));
  }
  const text = search.toString();
  return text === "" ? "" : `?${text}`;
}
