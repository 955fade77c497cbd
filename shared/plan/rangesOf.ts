import type { Ranges } from "../advice/robust";
import type { HoldRanges } from "../schemas/plan";

/** Ranges of a plan as the core takes them: of metals that the plan still has.
 *  @param ranges  of the plan, C and activities; absent: none     @param elements  metals of the plan that ask for something
 *  @returns  ranges for `robustWindow`; null where nothing is left to hold over     @source  a choice */
export function rangesOf(ranges: HoldRanges | undefined, elements: readonly string[]): Ranges | null {
  const { temperatureC, activities = {} } = ranges ?? {};
  const known = Object.entries(activities).filter(([element]) => elements.includes(element));
  if (temperatureC === undefined && known.length === 0) return null;
  return {
    ...(temperatureC === undefined ? {} : { temperatureC }),
    ...(known.length === 0 ? {} : { activities: Object.fromEntries(known) }),
  };
}
