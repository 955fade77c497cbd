import type { Frame } from "../schemas/problem";
import type { PublishedRange } from "./ranges";

/** What a window may miss a published range by: pH, V, C. */
export const RANGE_MARGIN = { pH: 0.2, Eh: 0.03, temperatureC: 5 } as const;

/** A range as a box in the frame: an axis the source does not speak of spans the frame. A single published value gets the margin to
 *  either side.
 *  @param range  with a pH or an Eh     @param frame  of the map     @returns  pH and Eh (V vs SHE), cut by the frame; null where it lies outside
 *  @source  RANGE_MARGIN for single values */
export function boxOf(range: PublishedRange, frame: Frame): Frame | null {
  const side = (
    span: readonly [number, number] | null,
    [low, high]: readonly [number, number],
    margin: number,
  ): [number, number] => {
    const [lo, hi] = span ?? [low, high];
    const [a, b] = lo === hi ? [lo - margin, hi + margin] : [lo, hi];
    return [Math.max(a, low), Math.min(b, high)];
  };
  const pH = side(range.pH, frame.pH, RANGE_MARGIN.pH);
  const Eh = side(range.Eh, frame.Eh, RANGE_MARGIN.Eh);
  return pH[0] < pH[1] && Eh[0] < Eh[1] ? { pH, Eh } : null;
}
