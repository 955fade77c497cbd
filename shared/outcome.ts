/** What can go wrong in the core, as a value: a code for programs, a path into the input, a sentence with value and bound for people. */
export type ErrorCode =
  | "INVALID_INPUT" // shape or type of the input
  | "OUT_OF_RANGE" // a number outside its bound
  | "UNKNOWN_METAL"
  | "UNKNOWN_COMPONENT"
  | "UNKNOWN_SPECIES"
  | "LIGAND_MISSING" // a named mineral needs a component that has no total
  | "AMBIGUOUS_SPECIES" // a formula that several species of the library share
  | "UNBALANCED" // a reaction that loses atoms or charge
  | "BAD_FORMULA"
  | "BAD_DATA"; // a table row contradicts itself

export interface Failure {
  readonly code: ErrorCode;
  readonly path: string;
  readonly message: string;
}

export type Outcome<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly error: Failure };

export const ok = <T>(value: T): Outcome<T> => ({ ok: true, value });
export const fail = (code: ErrorCode, path: string, message: string): Outcome<never> => ({
  ok: false,
  error: { code, path, message },
});

/** The value, or a thrown Error with the failure's sentence: for callers that have already validated.
 *  @throws Error when the outcome is a failure */
export function valueOf<T>(outcome: Outcome<T>): T {
  if (outcome.ok) return outcome.value;
  throw new Error(`${outcome.error.code} at ${outcome.error.path}: ${outcome.error.message}`);
}
