import { Value } from "./trialStore";

/** Which limit is pointed at, on the map or in the list beside it; both show it. */
export class LimitStore {
  readonly pointed = new Value<string | null>(null);
}
