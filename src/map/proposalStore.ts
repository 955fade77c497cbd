import type { Point } from "../../shared/solution";
import { Value } from "./trialStore";

/** A condition that is proposed for a trial, as the map shows it. */
export interface ProposedMark {
  n: number;
  pH: number;
  /** V vs SHE */
  Eh: number;
  /** what a screen reader says of it: "Proposed trial 2, pH 5.10, 0.58 V" */
  label: string;
}

/** What is asked of the next trials. */
export interface NextAsked {
  count: number;
  /** points that stay where they are, once one was moved by hand; null: all are proposed anew with the plan */
  kept: readonly { at: Point; moved: boolean }[] | null;
  /** points that were set aside and are not proposed again */
  aside: readonly Point[];
  /** only where the chosen reagents reach, where any of them is on record */
  withinReach: boolean;
}

/** What the map and the list of next trials tell each other; only those who listen are drawn again. */
export class ProposalStore {
  /** null: nobody asked */
  readonly asked = new Value<NextAsked | null>(null);
  readonly marks = new Value<readonly ProposedMark[]>([]);
  /** under the pointer or the focus, here or there */
  readonly lit = new Value<number | null>(null);
  /** moves a point by hand; set by the list while it is open */
  readonly mover = new Value<((n: number, at: Point) => void) | null>(null);
}
