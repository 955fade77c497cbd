import { isDeepStrictEqual } from "node:util";
import type { FieldChange, FieldDifference } from "../../../shared/schemas/history";

type Fields = Record<string, unknown>;

const isObject = (value: unknown): value is Fields =>
  typeof value === "object" && value !== null && !Array.isArray(value);

/** A typed number is one field to whoever reads a history, not a text and a unit. */
const isEntry = (value: unknown): boolean =>
  isObject(value) && Object.keys(value).length === 2 && "text" in value && "unit" in value;

const parted = (value: unknown): value is Fields | unknown[] =>
  Array.isArray(value) || (isObject(value) && !isEntry(value));

const childOf = (value: Fields | unknown[], key: string): unknown => (value as Fields)[key];

/** The smallest fields in which two values differ, in the order of their keys; lists are compared place by place.
 *  @param before, after  plain JSON values     @param path  in front of every path of the answer */
export function changesBetween(before: unknown, after: unknown, path = ""): FieldChange[] {
  if (isDeepStrictEqual(before, after)) return [];
  const alike = parted(before) && parted(after) && Array.isArray(before) === Array.isArray(after);
  if (!alike) return [{ path, old: before, new: after }];
  const keys = [...new Set([...Object.keys(before), ...Object.keys(after)])];
  return keys.flatMap((key) =>
    changesBetween(childOf(before, key), childOf(after, key), path ? `${path}.${key}` : key),
  );
}

function valueAt(row: unknown, path: string): unknown {
  return path.split(".").reduce<unknown>((value, key) => (parted(value) ? childOf(value, key) : undefined), row);
}

/** Where what a late writer sent differs from what stands there by now.
 *  @param base  the row the writer had seen, null when it is not known     @param yours  the fields sent     @param theirs  the row now */
export function differenceBetween(base: unknown, yours: Fields, theirs: Fields): FieldDifference[] {
  const now = Object.fromEntries(Object.keys(yours).map((key) => [key, theirs[key]]));
  return changesBetween(now, yours).map(({ path, old, new: sent }) => ({
    path,
    base: valueAt(base, path),
    yours: sent,
    theirs: old,
  }));
}
