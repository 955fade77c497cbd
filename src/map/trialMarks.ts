import type { ThemeColours } from "../lib/theme";

/** A marker a stage; told apart without colour. In the order in which stages come. */
export const markSymbols = ["circle", "square", "diamond", "triangle-up", "triangle-down", "hexagon"] as const;
export type MarkSymbol = (typeof markSymbols)[number];

/** A trial as a point of the map, before the view comes in. */
export interface TrialMark {
  id: string;
  code: string;
  pH: number;
  /** V vs SHE */
  Eh: number;
  symbol: MarkSymbol;
  /** the figure it is coloured by; null: not known yet */
  value: number | null;
  /** conditions too far from the plan: drawn open */
  open: boolean;
  /** pH of a cooled sample, not corrected: a dot in the middle */
  cooled: boolean;
}

/** Ends of the colour scale, both in the unit of the figure. */
export interface ColourScale {
  lo: number;
  hi: number;
}

/** Round ends that hold the values: steps of 1, 2, 5 or 10 per tenth of the span; 0 to 100 of nothing. */
export function colourScale(values: readonly (number | null)[]): ColourScale {
  const known = values.filter((v) => v !== null);
  if (known.length === 0) return { lo: 0, hi: 100 };
  const [min, max] = [Math.min(...known), Math.max(...known)];
  const span = Math.max(max - min, 1);
  const raw = span / 5;
  const power = 10 ** Math.floor(Math.log10(raw));
  const step = ([1, 2, 5, 10].find((s) => s * power >= raw) ?? 10) * power;
  const lo = Math.floor(min / step) * step;
  const hi = Math.ceil(max / step) * step;
  return { lo, hi: hi > lo ? hi : lo + step };
}

const channels = (hex: string): [number, number, number] =>
  [1, 3, 5].map((i) => parseInt(hex.slice(i, i + 2), 16)) as [number, number, number];
const hex2 = (x: number) => Math.round(x).toString(16).padStart(2, "0");

/** Colour of a value on the result scale, low to high, straight between its five stops.
 *  @returns  "#rrggbb"; the rule colour where the value is not known */
export function resultColour(
  value: number | null,
  { lo, hi }: ColourScale,
  { result, rule }: Pick<ThemeColours, "result" | "rule">,
): string {
  if (value === null) return rule;
  const at = Math.min(1, Math.max(0, (value - lo) / (hi - lo))) * (result.length - 1);
  const i = Math.min(result.length - 2, Math.floor(at));
  const [from, to] = [channels(result[i] ?? rule), channels(result[i + 1] ?? rule)];
  return `#${from.map((c, k) => hex2(c + ((to[k] ?? c) - c) * (at - i))).join("")}`;
}

/** Diameter in px: smaller where there are many. */
export const markSize = (count: number): number => (count > 600 ? 7 : count > 150 ? 8 : 9.5);
