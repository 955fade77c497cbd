import { ticks, tickStep } from "d3-array";
import { fixed } from "../../lib/format";

/** about so many numbers stand along an axis */
const COUNT = 8;

export interface AxisTick {
  value: number;
  text: string;
}

/** Round numbers along an axis, with as many decimals as tell them apart.
 *  @param range  in sight, on the shown scale */
export function axisTicks([lo, hi]: readonly [number, number]): AxisTick[] {
  const decimals = Math.max(0, -Math.floor(Math.log10(tickStep(lo, hi, COUNT)) + 1e-9));
  return ticks(lo, hi, COUNT).map((value) => ({ value, text: fixed(value, decimals) }));
}
