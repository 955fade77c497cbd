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

/** What is in sight after Plotly moved its axes, kept inside the frame; null when that is the whole frame again.
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
  return withinFrame(next, frame);
}

/** Nearer than this share of the frame nothing is to be seen that the solver would not call the same. */
const CLOSEST = 1 / 400;

const clamp = (x: number, lo: number, hi: number) => Math.min(hi, Math.max(lo, x));

/** A range moved into bounds, and cut to them where it is wider. */
function into([lo, hi]: readonly [number, number], [min, max]: readonly [number, number]): Range {
  if (lo >= min && hi <= max && hi - lo >= CLOSEST * (max - min)) return [lo, hi];
  const span = clamp(hi - lo, CLOSEST * (max - min), max - min);
  const middle = clamp((lo + hi) / 2, min + span / 2, max - span / 2);
  return [middle - span / 2, middle + span / 2];
}

/** What is wanted in sight, kept inside the frame; null where that is the whole of it. */
export function withinFrame(wanted: Frame, frame: Frame): Frame | null {
  const next = { pH: into(wanted.pH, frame.pH), Eh: into(wanted.Eh, frame.Eh) };
  return near(next.pH, [...frame.pH]) && near(next.Eh, [...frame.Eh]) ? null : next;
}

/** Nearer (factor below 1) or further, round a point that stays where it is on the screen. */
export function zoomedRound(at: readonly [number, number], factor: number, visible: Frame, frame: Frame): Frame | null {
  const about = ([lo, hi]: readonly [number, number], x: number): Range => [
    x - factor * (x - lo),
    x + factor * (hi - x),
  ];
  return withinFrame({ pH: about(visible.pH, at[0]), Eh: about(visible.Eh, at[1]) }, frame);
}

/** The smallest move that brings a point in sight. */
export function broughtInSight(at: readonly [number, number], visible: Frame, frame: Frame): Frame | null {
  const moved = ([lo, hi]: readonly [number, number], x: number): Range => {
    const by = x < lo ? x - lo : x > hi ? x - hi : 0;
    return [lo + by, hi + by];
  };
  return withinFrame({ pH: moved(visible.pH, at[0]), Eh: moved(visible.Eh, at[1]) }, frame);
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
