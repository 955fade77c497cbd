/** A value that is known to lie between two ends; both are the same where nothing was censored. */
export interface Interval {
  readonly lo: number;
  readonly hi: number;
}

export const exactly = (value: number): Interval => ({ lo: value, hi: value });
export const isExact = ({ lo, hi }: Interval): boolean => lo === hi;

/** The value of an interval that is none, else its middle: for sorting and drawing only, never for a result.
 *  @param interval  ends in one unit     @returns  same unit; null where an end is not finite
 *  @example middleOf({ lo: 1, hi: 3 }) // => 2 */
export const middleOf = ({ lo, hi }: Interval): number | null =>
  lo === hi ? lo : Number.isFinite(lo) && Number.isFinite(hi) ? (lo + hi) / 2 : null;

/** Both ends of f, for an f that never falls with a value of `raising` and never rises with one of `lowering`.
 *  @param raising, lowering  what is known of its arguments     @param f  monotone as said     @returns  the exact range of f
 *  @source  a monotone function takes its extremes at the corners of the box
 *  @example spanOf([{ lo: 1, hi: 2 }], [{ lo: 4, hi: 5 }], ([x], [y]) => x / y).hi // => 0.5 */
export function spanOf(
  raising: readonly Interval[],
  lowering: readonly Interval[],
  f: (raising: number[], lowering: number[]) => number,
): Interval {
  const ends = (list: readonly Interval[], end: "lo" | "hi") => list.map((i) => i[end]);
  return {
    lo: f(ends(raising, "lo"), ends(lowering, "hi")),
    hi: f(ends(raising, "hi"), ends(lowering, "lo")),
  };
}

export const plus = (...terms: readonly Interval[]): Interval =>
  terms.reduce((sum, t) => ({ lo: sum.lo + t.lo, hi: sum.hi + t.hi }), exactly(0));

export const minus = (a: Interval, b: Interval): Interval => ({ lo: a.lo - b.hi, hi: a.hi - b.lo });

/** @param factor  any sign */
export const times = (a: Interval, factor: number): Interval =>
  factor >= 0 ? { lo: a.lo * factor, hi: a.hi * factor } : { lo: a.hi * factor, hi: a.lo * factor };

/** Range of a / b for b above zero; the two may not hang together.
 *  @param a  any sign     @param b  ends >= 0     @returns  ends of a / b; an end is infinite where b reaches zero
 *  @example over({ lo: 1, hi: 2 }, { lo: 4, hi: 5 }).hi // => 0.5 */
export const over = (a: Interval, b: Interval): Interval => ({
  lo: a.lo / (a.lo >= 0 ? b.hi : b.lo),
  hi: a.hi / (a.hi >= 0 ? b.lo : b.hi),
});
