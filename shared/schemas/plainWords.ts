import type { z } from "zod";

/** What a value should have been, with its article. */
const kinds: Readonly<Record<string, string>> = {
  number: "a number",
  int: "a whole number",
  string: "a text",
  boolean: "true or false",
  array: "a list",
  tuple: "a list",
  object: "an object",
  record: "an object",
  null: "null",
};

/** What a bound counts, one and many. */
const counted: Readonly<Record<string, readonly [string, string]>> = {
  string: ["character", "characters"],
  array: ["entry", "entries"],
  object: ["entry", "entries"],
};

/** What a text should have looked like. */
const formats: Readonly<Record<string, string>> = {
  email: "must be a mail address (name@host.example)",
  date: "must be a day (2026-03-31)",
  datetime: "must be a time (2026-03-31T08:00:00Z)",
  url: "must be a web address",
};

const quoted = (value: unknown) => (typeof value === "string" ? `"${value}"` : String(value));
const oneOf = (values: readonly unknown[]) =>
  values.length === 1 ? `must be ${quoted(values[0])}` : `must be one of ${values.map(quoted).join(", ")}`;

function bound(origin: string, [open, closed]: readonly [string, string], inclusive: boolean, limit: number | bigint) {
  const words = counted[origin];
  return words === undefined
    ? `must be ${inclusive ? closed : open} ${String(limit)}`
    : `must have ${closed} ${String(limit)} ${words[Number(limit) === 1 ? 0 : 1]}`;
}

/** What zod found, as the end of a sentence that begins with the field's name: "is missing", "must be at most 250", "is not a field
 *  here". Where a schema has words of its own, those are said instead. */
export function plainWords(issue: z.core.$ZodRawIssue): string {
  switch (issue.code) {
    case "invalid_type":
      return issue.input === undefined ? "is missing" : `must be ${kinds[issue.expected] ?? issue.expected}`;
    case "invalid_value":
      return issue.input === undefined ? "is missing" : oneOf(issue.values);
    case "too_small":
      return bound(issue.origin, ["above", "at least"], issue.inclusive !== false, issue.minimum);
    case "too_big":
      return bound(issue.origin, ["below", "at most"], issue.inclusive !== false, issue.maximum);
    case "not_multiple_of":
      return `must be a multiple of ${String(issue.divisor)}`;
    case "unrecognized_keys":
      return `is not a field here (${issue.keys.map(quoted).join(", ")})`;
    case "invalid_format":
      return formats[issue.format] ?? "is not written as it must be";
    case "invalid_union":
      if (issue.input === undefined) return "is missing";
      return Array.isArray(issue.options) ? oneOf(issue.options) : "is none of the forms that fit here";
    default:
      return "is not as it must be";
  }
}
