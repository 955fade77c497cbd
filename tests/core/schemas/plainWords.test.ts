import { expect, test } from "vitest";
import { z } from "../../../shared/schemas/z";

const said = (schema: z.ZodType, value: unknown) => schema.safeParse(value).error?.issues.map(({ message }) => message);
const kind = z.discriminatedUnion("k", [z.object({ k: z.literal("a") }), z.object({ k: z.literal("b") })]);

// What a form, the server or the command line says after the field's name: words of our own, no source but English.
test.each([
  ["a field left out", z.object({ a: z.number() }), {}, "is missing"],
  ["a choice left out", z.object({ a: z.enum(["x"]) }), {}, "is missing"],
  ["one of several forms left out", z.union([z.number(), z.string()]), undefined, "is missing"],
  ["text for a number", z.number(), "60", "must be a number"],
  ["no number at all", z.number(), NaN, "must be a number"],
  ["half of one", z.number().int(), 1.5, "must be a whole number"],
  ["a number for a list", z.array(z.number()), 3, "must be a list"],
  ["a list for an object", z.object({}), [], "must be an object"],
  ["a number at its open bound", z.number().gt(0), 0, "must be above 0"],
  ["a number under its closed bound", z.number().min(-2), -3, "must be at least -2"],
  ["a number at its upper open bound", z.number().lt(14), 14, "must be below 14"],
  ["a number over its closed bound", z.number().max(250), 251, "must be at most 250"],
  ["a text without characters", z.string().min(1), "", "must have at least 1 character"],
  ["a text too long", z.string().max(120), "x".repeat(121), "must have at most 120 characters"],
  ["a list without entries", z.array(z.number()).min(1), [], "must have at least 1 entry"],
  ["another choice", z.enum(["fresh", "aged"]), "old", 'must be one of "fresh", "aged"'],
  ["another constant", z.literal(3), 4, "must be 3"],
  ["another kind of entry", kind, { k: "c" }, 'must be one of "a", "b"'],
  ["none of several forms", z.union([z.number(), z.string()]), null, "is none of the forms that fit here"],
  ["a misspelt field", z.strictObject({}), { activty: 2 }, 'is not a field here ("activty")'],
  ["no address", z.email(), "bench", "must be a mail address (name@host.example)"],
  ["no day", z.iso.date(), "yesterday", "must be a day (2026-03-31)"],
  ["a text of another form", z.string().regex(/^a/), "b", "is not written as it must be"],
  ["a key of another form", z.record(z.string().min(2), z.number()), { b: 1 }, "is not as it must be"],
  ["an odd number", z.number().multipleOf(2), 3, "must be a multiple of 2"],
  ["what a schema has words for", z.number({ error: "the feed's moisture is missing" }), "x", "the feed's moisture is missing"], // prettier-ignore
])("%s", (_what, schema, value, words) => expect(said(schema, value)).toEqual([words]));
