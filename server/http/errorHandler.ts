import type { ErrorRequestHandler, RequestHandler } from "express";
import type { Logger } from "pino";
import { Refusal, statusOf } from "./refusal";

export const unknownRoute: RequestHandler = (req) => {
  throw new Refusal("NOT_FOUND", "", `There is no ${req.method} ${req.originalUrl.split("?")[0]}.`);
};

/** What express and its body parser throw, in our codes. */
function known(error: unknown): Refusal | null {
  if (error instanceof Refusal) return error;
  const { type, status } = (error ?? {}) as { type?: string; status?: number };
  if (type === "entity.parse.failed") {
    return new Refusal("INVALID_JSON", "", `The body is not JSON: ${(error as Error).message}`);
  }
  if (type === "entity.too.large") return new Refusal("TOO_LARGE", "", "The body is larger than 1 MB.");
  if (status === 400) return new Refusal("INVALID_INPUT", "", (error as Error).message);
  return null;
}

/** Last of all: one shape of refusal, and nothing of ours in the answer to an unexpected error. */
export function errorHandler(log: Logger): ErrorRequestHandler {
  return (error: unknown, req, res, next) => {
    if (res.headersSent) return next(error);
    const refusal = known(error);
    if (!refusal) log.error({ err: error, method: req.method, url: req.originalUrl }, "unexpected error");
    const { code, path, message, beside } =
      refusal ?? new Refusal("INTERNAL", "", "Something went wrong on the server; its log says what.");
    res.status(statusOf[code]).json({ error: { code, path, message }, ...beside });
  };
}
