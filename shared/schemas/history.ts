import { z } from "./z";

/** Why a row is changed: kept beside what changed, in the words of whoever did it. */
export const reason = z.string().trim().max(500).default("");
export const withReason = z.object({ reason });
export const reasonRequired = z.object({ reason: z.string().trim().min(3, "say why").max(500) });

export const historyActions = ["create", "change", "delete", "restore", "reopen", "recalculate"] as const;
export type HistoryAction = (typeof historyActions)[number];

/** One field of a row before and after. A typed number (text and unit) counts as one field; `measured.readings.2.pH.value`. */
export interface FieldChange {
  path: string;
  old: unknown;
  new: unknown;
}

/** One write to a row. */
export interface HistoryRow {
  id: number;
  /** of the row after this write */
  version: number;
  action: HistoryAction;
  at: string; // ISO 8601
  author: string;
  reason: string;
  /** what was not there before is undefined, and so left away */
  changes: FieldChange[];
}

/** A field two writers do not agree on, told to the one who came late. */
export interface FieldDifference {
  path: string;
  /** as the late writer first saw it */
  base: unknown;
  yours: unknown;
  theirs: unknown;
}
