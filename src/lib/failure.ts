import type { StaleAnswer } from "../../shared/schemas/api";
import type { ApiError } from "../../shared/schemas/member";

/** A refusal of the server, or the network's silence, as an Error that keeps code and path. */
export class ApiFailure extends Error {
  override readonly name = "ApiFailure";
  constructor(
    /** HTTP status; 0 when the server did not answer */
    readonly status: number,
    readonly code: string,
    /** where in the request, "" when it concerns the whole */
    readonly path: string,
    message: string,
    /** the whole body of the refusal: a stale write comes with what stands there now */
    readonly body: unknown = null,
  ) {
    super(message);
  }
}

/** What a write that came too late is told; null for every other failure. */
export const staleAnswer = <Row>(error: unknown): StaleAnswer<Row> | null =>
  error instanceof ApiFailure && error.status === 412 && error.code === "STALE" && hasCurrent(error.body)
    ? (error.body as StaleAnswer<Row>)
    : null;

const hasCurrent = (body: unknown) => typeof body === "object" && body !== null && "current" in body;

export const offline = () =>
  new ApiFailure(
    0,
    "NO_ANSWER",
    "",
    "The server does not answer. What you entered is still here; try again in a moment.",
  );

export const fromBody = (status: number, body: unknown): ApiFailure =>
  isApiError(body)
    ? new ApiFailure(status, body.error.code, body.error.path, body.error.message, body)
    : new ApiFailure(status, "UNEXPECTED", "", `The server answered with status ${status} and no explanation.`);

const isApiError = (body: unknown): body is ApiError =>
  typeof body === "object" && body !== null && "error" in body && typeof (body as ApiError).error?.message === "string";

/** One sentence for people. */
export function messageOf(error: unknown): string {
  if (error instanceof ApiFailure && error.code === "NOT_SIGNED_IN")
    return "Your session had ended. Sign in, then try once more.";
  return error instanceof Error ? error.message : "Something unexpected went wrong.";
}
