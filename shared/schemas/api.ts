import { z } from "./z";
import type { FieldDifference } from "./history";

/** `?limit=50&offset=0` of every list route. */
export const pageQuery = z.object({
  limit: z.coerce.number().int().min(1).max(200).default(50),
  offset: z.coerce.number().int().min(0).default(0),
});

/** What every list route answers. */
export interface Page<Row> {
  rows: Row[];
  /** rows that match, on all pages */
  total: number;
  limit: number;
  offset: number;
}

export const projectCreate = z.object({
  siteName: z.string().trim().min(1).max(120),
  name: z.string().trim().min(1).max(120),
});
export interface ProjectRow {
  id: string;
  siteName: string;
  name: string;
  /** demo data is invented and says so */
  invented: boolean;
  planCount: number;
}

export const plansQuery = pageQuery.extend({
  projectId: z.string().min(1).optional(),
  archived: z.enum(["true", "false", "all"]).default("false"),
});

/** Without a name the copy is called after its original. */
export const planDuplicate = z.object({
  name: z.string().trim().min(1).max(120).optional(),
  projectId: z.string().min(1).optional(),
  /** the latest inputs alone, or every revision with its author, note and moment */
  revisions: z.enum(["latest", "all"]).default("latest"),
});

/** The body of a refused write whose version is no longer the row's: what stands there now comes along. */
export interface StaleAnswer<Row> {
  error: { code: "STALE"; path: string; message: string };
  current: Row;
  /** fields that this write would have set and that stand otherwise by now */
  difference: FieldDifference[];
}
