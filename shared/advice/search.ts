/** Told while something long goes on: steps done of steps in all; what ends early jumps ahead. */
export type OnProgress = (done: number, total: number) => void;

/** a root is narrowed to this: decades of activity or pressure, kelvin, or pH */
const RESOLUTION = 1e-4;

/** A question along one number: where it stands, how far and in what steps to look. */
export interface Walk {
  readonly from: number;
  readonly low: number;
  readonly high: number;
  readonly step: number;
}

/** How many steps outward a walk can take at most.
 *  @param walk  the walk     @returns  a count     @example stepsOf({ from: 0, low: -1, high: 2, step: 0.5 }) // => 4 */
export const stepsOf = ({ from, low, high, step }: Walk): number =>
  Math.max(0, Math.ceil(Math.max(high - from, from - low) / step - 1e-9));

/** Smallest |x - from| at which `test` holds, looking outward in steps to both ends, then bisecting to 1e-4.
 *  @param test  asked at many x     @param walk  from where, how far     @param onStep  called after each step outward
 *  @returns  x just past the root; null where no step holds     @source  even steps, then bisection
 *  @example nearest((x) => x >= 1.5, { from: 1, low: 0, high: 4, step: 1 }) // => 1.500 */
export function nearest(test: (x: number) => boolean, walk: Walk, onStep?: () => void): number | null {
  const { from, low, high, step } = walk;
  for (let k = 1; k <= stepsOf(walk); k++) {
    let best: number | null = null;
    for (const side of [-1, 1]) {
      const outer = Math.min(high, Math.max(low, from + side * k * step));
      const inner = Math.min(high, Math.max(low, from + side * (k - 1) * step));
      if (outer === inner || !test(outer)) continue;
      let [no, yes] = [inner, outer];
      while (Math.abs(yes - no) > RESOLUTION) {
        const mid = (no + yes) / 2;
        if (test(mid)) yes = mid;
        else no = mid;
      }
      if (best === null || Math.abs(yes - from) < Math.abs(best - from)) best = yes;
    }
    onStep?.();
    if (best !== null) return best;
  }
  return null;
}
