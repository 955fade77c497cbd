import { significantPlain, trueMinus, withUnit } from "./numbers";

const scales = [
  { from: 0.1, unit: "g/L", perG: 1 },
  { from: 1e-4, unit: "mg/L", perG: 1e3 },
  { from: 0, unit: "µg/L", perG: 1e6 },
] as const;
/** As few µg/L are still written out; below, a power of ten reads better. */
const LEAST_PLAIN = 1e-4;

/** A tenor as the trade writes it: 12.5 g/L, 26.7 mg/L, 55.8 µg/L, so that no power of ten is needed.
 *  @param gPerL  g/L, zero or more     @param figures  significant figures     @returns  number and unit     @source  usage of the trade
 *  @example Number(tenorParts(0.0267).text) // => 26.7
 *  @example Number(tenorParts(5.58e-5).text) // => 55.8 */
export function tenorParts(gPerL: number, figures = 3): { readonly text: string; readonly unit: string } {
  if (!(gPerL > 0)) return { text: String(gPerL), unit: "g/L" };
  // rounded first, so that 0.09999 is 0.100 g/L and not 100 mg/L
  const rounded = Number(gPerL.toPrecision(figures));
  const { unit, perG } = scales.find((s) => rounded >= s.from) ?? scales[2];
  const x = rounded * perG;
  return { text: x < LEAST_PLAIN ? trueMinus(x.toExponential(figures - 1)) : significantPlain(x, figures), unit };
}

/** The same as one text, the unit behind a thin space.
 *  @param gPerL, figures  as `tenorParts`     @returns  text     @source  as `tenorParts`
 *  @example tenorText(0.0267).length // => 9 */
export function tenorText(gPerL: number, figures = 3): string {
  const { text, unit } = tenorParts(gPerL, figures);
  return withUnit(text, unit);
}

/** All the figures that were typed, up to six, and at least so many.
 *  @param x  a number     @param least  figures     @returns  a count     @source  arithmetic
 *  @example typedFigures(0.0125) // => 3 */
export const typedFigures = (x: number, least = 2): number =>
  Math.max(least, Number(x.toPrecision(6)).toExponential().replace(/e.*/, "").replace(/[-.]/g, "").length);

/** A tenor in a field whose unit stays g/L, in characters that can be typed again: 0.0267, not 2.67e-2.
 *  @param gPerL  g/L     @param least  significant figures at least     @returns  text     @source  usage of the trade
 *  @example Number(tenorInput(0.0267)) // => 0.0267 */
export function tenorInput(gPerL: number, least = 2): string {
  const figures = typedFigures(gPerL, least);
  if (gPerL === 0) return "0";
  return Math.abs(gPerL) >= 1e-4
    ? significantPlain(gPerL, figures)
    : gPerL.toExponential(figures - 1).replace("e+", "e");
}
