import type { Point } from "../../shared/solution";
import { Value } from "./trialStore";

/** A limit whose name stays on the map, and where it was asked for. */
export interface NamedHere {
  key: string;
  at: Point;
}

/** Which limit is pointed at, on the map or in the list beside it; both show it. */
export class LimitStore {
  readonly pointed = new Value<string | null>(null);
  /** asked for by a tap or from the list: it stays when finger or focus go */
  readonly named = new Value<NamedHere | null>(null);
}
