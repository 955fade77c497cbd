import { type ComponentType, memo, useDeferredValue } from "react";
import { useRested } from "../lib/useRested";

/** ms of rest after which such a part is drawn again, and ms it may stay behind a hand that moves on */
const REST = 120;
const MOST = 700;

/** A part of the page that may follow a moment after the hand: it is drawn again in time that is left, and not at all while what it is
 *  given stays the same. */
export function later<Props extends object>(Part: ComponentType<Props>): ComponentType<Props> {
  const Kept = memo(Part) as unknown as ComponentType<Props>;
  return function Later(props: Props) {
    return <Kept {...useDeferredValue(useRested(props, REST, MOST))} />;
  };
}
