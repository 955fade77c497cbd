import type { Spread } from "../../shared/trials/spread";
import type { Count, Tally } from "../../shared/trials/tally";
import { counted, fixed, percent } from "./format";

/** "75.0–90.4", for under a mean; "" where there is one value or none. */
export const rangeOf = (spread: Spread | null, digits: number): string =>
  spread === null || spread.n < 2 ? "" : `${fixed(spread.min, digits)}\u2013${fixed(spread.max, digits)}`;

export const countWords: Readonly<Record<Count, string>> = {
  inside: "inside",
  outside: "outside",
  apart: "other conditions",
  "off the map": "beyond the frame",
  "not placed": "without pH and Eh",
  rejected: "rejected",
};

/** "Inside, n 15: Zn 88 %, Fe 0.1 %." with an n of its own where not every trial has the figure. */
export function tallySentence(
  tally: Tally,
  count: "inside" | "outside" | "apart",
  { target, gangue }: { target: string; gangue: string | null },
): string {
  const { n, unsure, recovery, gangueDissolved } = tally[count];
  const one = (metal: string, spread: Spread | null, digits: number) =>
    spread === null ? null : `${metal} ${percent(spread.mean, digits)}${spread.n < n ? ` (n ${spread.n})` : ""}`;
  const figures = [
    one(target, recovery, 0),
    gangue === null ? null : one(`${gangue} dissolved`, gangueDissolved, 1),
  ].filter((part) => part !== null);
  const head = `${count === "apart" ? "Other conditions" : count === "inside" ? "Inside" : "Outside"}, n ${n}`;
  const near = unsure > 0 ? `; ${counted(unsure, "trial")} within the electrode’s error of a limit` : "";
  return `${head}${figures.length > 0 ? `: ${figures.join(", ")}` : ""}${near}.`;
}
