import { isExact, type Interval } from "../../entry/interval";

/** Numbers as they stand in a worked formula: enough figures to repeat the sum by hand, true minus, no exponent in the usual range. */
export function say(x: number, figures = 5): string {
  if (!Number.isFinite(x)) return x > 0 ? "unbounded" : "not known";
  const size = Math.abs(x);
  const rounded = Number(x.toPrecision(figures));
  const text = size !== 0 && (size < 1e-4 || size >= 1e7) ? rounded.toExponential() : String(rounded);
  return text.replace(/-/g, "\u2212").replace("e+", "e");
}

export const sayRange = (i: Interval, figures = 5): string =>
  isExact(i)
    ? say(i.lo, figures)
    : i.hi === Infinity
      ? `${say(i.lo, figures)} or more`
      : `${say(i.lo, figures)} to ${say(i.hi, figures)}`;

/** In brackets where it would else be misread in a product. */
export const inProduct = (i: Interval): string => (isExact(i) && i.lo >= 0 ? say(i.lo) : `(${sayRange(i)})`);
