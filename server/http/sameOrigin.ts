import type { RequestHandler } from "express";
import { Refusal } from "./refusal";

const reads = new Set(["GET", "HEAD", "OPTIONS"]);

function hostOf(origin: string): string | null {
  return URL.canParse(origin) ? new URL(origin).host : null;
}

/** A browser names the page a write comes from; it must be one of ours. No Origin header: not a browser's page. */
export function sameOrigin(appUrl: string): RequestHandler {
  return (req, _res, next) => {
    const origin = req.get("origin");
    if (reads.has(req.method) || origin === undefined) return next();
    if (origin === appUrl || hostOf(origin) === req.get("host")) return next();
    throw new Refusal("WRONG_ORIGIN", "", `Writes are taken from ${appUrl} only, not from ${origin}.`);
  };
}
