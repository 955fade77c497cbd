/** How many, their mean and their ends. */
export interface Spread {
  readonly n: number;
  readonly mean: number;
  readonly min: number;
  readonly max: number;
}

/** Count, mean and range of what is there; blanks are left out, never counted as zero.
 *  @param values  one unit; null where there is none     @returns  null without any value     @source  definition
 *  @example spreadOf([80, null, 90]).mean // => 85
 *  @example spreadOf([80, null, 90]).n // => 2 */
export function spreadOf(values: readonly (number | null)[]): Spread | null {
  const known = values.filter((v) => v !== null);
  if (known.length === 0) return null;
  return {
    n: known.length,
    mean: known.reduce((a, b) => a + b, 0) / known.length,
    min: Math.min(...known),
    max: Math.max(...known),
  };
}
