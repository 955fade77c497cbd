import type { Frame } from "../../shared/schemas/problem";
import type { ShownScale } from "./view";

type Range = [number, number];

/** The two ways in which Plotly tells a new range of an axis. */
function rangeOf(change: Readonly<Record<string, unknown>>, axis: "xaxis" | "yaxis"): Range | null {
  const whole = change[`${axis}.range`];
  const [lo, hi] = Array.isArray(whole)
    ? (whole as unknown[])
    : [change[`${axis}.range[0]`], change[`${axis}.range[1]`]];
  return typeof lo === "number" && typeof hi === "number" ? [lo, hi] : null;
}

const near = (a: Range, b: Range): boolean =>
  Math.max(Math.abs(a[0] - b[0]), Math.abs(a[1] - b[1])) < 1e-6 * (b[1] - b[0]);

/** What is in sight after Plotly moved its axes; null when that is the whole frame again.
 *  @param change  of a relayout event, potentials on the shown scale     @param from  in sight before, V vs SHE */
export function afterRelayout(
  change: Readonly<Record<string, unknown>>,
  from: Frame,
  frame: Frame,
  scale: ShownScale,
): Frame | null {
  if (change["xaxis.autorange"] === true || change["yaxis.autorange"] === true) return null;
  const x = rangeOf(change, "xaxis");
  const y = rangeOf(change, "yaxis");
  const next: Frame = { pH: x ?? from.pH, Eh: y ? [scale.fromShown(y[0]), scale.fromShown(y[1])] : from.Eh };
  return near(next.pH, frame.pH) && near(next.Eh, frame.Eh) ? null : next;
}

/** What is in sight while the axes move under the hand, outside React's state; null once they rest. */
export class MovingView {
  private frame: Frame | null = null;
  private readonly listeners = new Set<() => void>();
  readonly get = (): Frame | null => this.frame;
  readonly set = (frame: Frame | null): void => {
    if (frame === this.frame) return;
    this.frame = frame;
    this.listeners.forEach((tell) => tell());
  };
  readonly subscribe = (tell: () => void): (() => void) => {
    this.listeners.add(tell);
    return () => void this.listeners.delete(tell);
  };
}
