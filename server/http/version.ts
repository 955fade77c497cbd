import { Refusal } from "./refusal";

/** The row version as an entity tag. */
export const tagOf = (version: number | string): string => `"${version}"`;

/** Headers of a row that others may change. The tag names the row's own version, not what is joined to it or worked out: a
 *  browser that kept the answer would be told "not modified" too often. */
export const versionHeaders = (version: number) => ({ ETag: tagOf(version), "Cache-Control": "no-store" });

/** The version an `If-Match` header names, with or without quotes; null without a header.
 *  @throws Refusal INVALID_INPUT when it is no version */
export function ifMatch(header: string | undefined): number | null {
  if (header === undefined) return null;
  const digits = /^(?:W\/)?"?(\d{1,9})"?$/.exec(header.trim())?.[1];
  if (digits === undefined) {
    throw new Refusal("INVALID_INPUT", "If-Match", `If-Match must be a version such as "3", not ${header}`);
  }
  return Number(digits);
}

/** As `ifMatch`, where a write must say which version it changes.
 *  @throws Refusal VERSION_REQUIRED */
export function requiredVersion(header: string | undefined): number {
  const version = ifMatch(header);
  if (version !== null) return version;
  throw new Refusal("VERSION_REQUIRED", "If-Match", "Say which version you change: If-Match with the row's version.");
}
