import type { z } from "zod";
import type { ErrorCode, Failure } from "../../shared/outcome";

/** Every code the API refuses with, and its status: the one table. */
export const statusOf = {
  // what the solver and the library say about an input
  INVALID_INPUT: 400,
  OUT_OF_RANGE: 400,
  UNKNOWN_METAL: 400,
  UNKNOWN_COMPONENT: 400,
  UNKNOWN_SPECIES: 400,
  LIGAND_MISSING: 400,
  AMBIGUOUS_SPECIES: 400,
  UNBALANCED: 400,
  BAD_FORMULA: 400,
  BAD_DATA: 400,
  // what the server says about a request
  INVALID_JSON: 400,
  NOT_SIGNED_IN: 401,
  WRONG_CREDENTIALS: 401,
  FORBIDDEN: 403,
  DISABLED: 403,
  WRONG_ORIGIN: 403,
  NOT_FOUND: 404,
  CONFLICT: 409,
  LOCKED: 409,
  EXPIRED: 410,
  STALE: 412,
  TOO_LARGE: 413,
  VERSION_REQUIRED: 428,
  TOO_MANY_ATTEMPTS: 429,
  INTERNAL: 500,
} as const satisfies Record<ErrorCode, number> & Record<string, number>;
export type RefusalCode = keyof typeof statusOf;

/** Thrown anywhere below a route; the error handler turns it into status and body. */
export class Refusal extends Error {
  constructor(
    readonly code: RefusalCode,
    readonly path: string,
    message: string,
    /** stands in the body beside `error`, as the current row beside STALE */
    readonly beside: Record<string, unknown> = {},
  ) {
    super(message);
  }

  static from({ code, path, message }: Failure): Refusal {
    return new Refusal(code, path, message);
  }
}

/** A secret is never sent back, nor reaches a log. */
const secret = (path: string) => /password/i.test(path);

function withValue(path: string, { message, input }: z.core.$ZodIssue): string {
  if (Number.isNaN(input)) return "must be a number";
  const plain = typeof input === "string" || typeof input === "number" || typeof input === "boolean";
  return plain && !secret(path) ? `${message} (got ${JSON.stringify(input).slice(0, 80)})` : message;
}

/** The first thing wrong with a body, a query or a path, with the value that was given. */
export function refusalOf(error: z.core.$ZodError): Refusal {
  const [first] = error.issues;
  if (!first) return new Refusal("INVALID_INPUT", "", "not as expected");
  const path = first.path.join(".");
  return new Refusal("INVALID_INPUT", path, withValue(path, first));
}
