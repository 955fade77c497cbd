import type { Reading } from "../entry/readEntry";
import type { Interval } from "../entry/interval";

export interface CensoredMean extends Interval {
  /** each limit taken as half: shown beside the interval, never instead of it */
  readonly halfLimit: number;
  readonly n: number;
  readonly censored: number;
}

/** Mean of results of which some are "<": the interval it must lie in, each "<" taken from zero to its limit.
 *  @param readings  as read; blanks and unreadable ones are left out     @returns  ends in the readings' unit; null without any;
 *    the upper end is infinite with a ">" among them, and half the limit is not given then (NaN)
 *  @source  bounds by definition; half-limit substitution biases comparisons (Helsel 2005, Nondetects and Data Analysis) */
export function censoredMean(readings: readonly Reading[]): CensoredMean | null {
  let [lo, hi, half, n, censored] = [0, 0, 0, 0, 0];
  for (const r of readings) {
    if (r.kind === "blank" || r.kind === "bad") continue;
    n += 1;
    if (r.kind === "value") {
      lo += r.value;
      hi += r.value;
      half += r.value;
      continue;
    }
    censored += 1;
    lo += r.kind === "less" ? 0 : r.limit;
    hi += r.kind === "less" ? r.limit : Infinity;
    half += r.kind === "less" ? r.limit / 2 : Number.NaN;
  }
  return n === 0 ? null : { lo: lo / n, hi: hi / n, halfLimit: half / n, n, censored };
}
