import { rateLimit } from "express-rate-limit";
import { Refusal } from "./refusal";

const minutes = 15;

/** Counts failures alone: members who mistype and then get in are not held up. */
export const failureLimit = (attempts: number) =>
  rateLimit({
    windowMs: minutes * 60_000,
    limit: attempts,
    standardHeaders: "draft-8",
    legacyHeaders: false,
    skipSuccessfulRequests: true,
    // Whether X-Forwarded-For is believed is TRUST_PROXY's business.
    validate: { xForwardedForHeader: false },
    handler: () => {
      const message = `Too many failed attempts from this address; try again in ${minutes} minutes.`;
      throw new Refusal("TOO_MANY_ATTEMPTS", "", message);
    },
  });
