import { fixed, withUnit } from "../words/numbers";
import type { Turn } from "./turns";

/** What jumps and by how much: "the margin jumps from 6.7 to 10.0 bands, open ground from 0.86 to 1.68 pH·V".
 *  @param jump  of a turn     @returns  a clause     @source  as `steps` counts a jump */
export function jumpWords({ margin: [m, n], area: [a, b] }: NonNullable<Turn["jump"]>): string {
  const digits = Math.abs(n - m) < 0.1 && m !== n ? 2 : 1;
  const margin = `from ${fixed(m, digits)} to ${withUnit(fixed(n, digits), "bands")}`;
  const ground = `from ${fixed(a, 2)} to ${withUnit(fixed(b, 2), "pH·V")}`;
  if (fixed(m, digits) === fixed(n, digits)) return `open ground jumps ${ground}`;
  if (fixed(a, 2) === fixed(b, 2)) return `the margin jumps ${margin}`;
  return `the margin jumps ${margin}, open ground ${ground}`;
}

/** Why: which solid counts from here on, which salt comes out, whether a couple sets Eh.
 *  @param jump  of a turn     @param metalName  element -> name     @returns  clauses with ids of species; empty where only the picture jumps */
export function jumpReasons(
  { comes, goes, takes, loses, couple }: NonNullable<Turn["jump"]>,
  metalName: (element: string) => string,
): string[] {
  return [
    ...comes.map((c) => `${c.species} counts for ${metalName(c.metal)} from here on (below, ${c.reason})`),
    ...goes.map((c) => `${c.species} no longer counts for ${metalName(c.metal)} from here on (${c.reason})`),
    ...(comes.length + goes.length > 0 ? [] : strokes(takes, loses)),
    ...(couple === "begins" ? ["from here on a couple sets Eh, and the margin counts pH and Eh"] : []),
    ...(couple === "ceases" ? ["from here on no couple sets Eh, and the margin counts pH alone"] : []),
  ];
}

/** Where the candidates are the same on both sides: what gains or loses ground whose border no pH and no Eh moves. */
const strokes = (takes: readonly string[], loses: readonly string[]): string[] => [
  ...takes.map(
    (id) => `${id} takes its ground at one stroke: the liquor is saturated with it over a range of pH and Eh`,
  ),
  ...loses.map((id) => `${id} loses its ground at one stroke`),
];
