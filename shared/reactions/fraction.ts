/** An exact fraction of small whole numbers; the denominator is positive and nothing can be cancelled. */
export type Fraction = readonly [numerator: number, denominator: number];

export const zero: Fraction = [0, 1];

/** Greatest common divisor.
 *  @param a, b  whole numbers     @returns  at least 1, unless both are 0     @source  Euclid
 *  @example gcd(12, 18) // => 6 */
export function gcd(a: number, b: number): number {
  while (b !== 0) [a, b] = [b, a % b];
  return Math.abs(a);
}

function make(n: number, d: number): Fraction {
  const g = gcd(n, d) * Math.sign(d);
  return n === 0 ? zero : [n / g, d / g];
}

/** A decimal number of a formula (4.5) as a fraction.
 *  @param value  with at most a thousandth as its finest part     @returns  the fraction     @throws RangeError where there is none
 *  @source  arithmetic
 *  @example fraction(4.5)[0] // => 9 */
export function fraction(value: number): Fraction {
  for (const d of [1, 2, 5, 10, 100, 1000]) {
    const n = Math.round(value * d);
    if (Math.abs(n - value * d) < 1e-9 * d) return make(n, d);
  }
  throw new RangeError(`${value} is finer than a thousandth`);
}

/** Difference, product and quotient, exact while numerators stay below 2^53; the divisor must not be zero.
 *  @returns  a fraction in lowest terms     @source  arithmetic
 *  @example minus([1, 2], [1, 3])[1] // => 6 */
export const minus = ([a, b]: Fraction, [c, d]: Fraction): Fraction => make(a * d - c * b, b * d);
/** See `minus`.
 *  @returns  product     @source  arithmetic
 *  @example times([2, 3], [3, 4])[1] // => 2 */
export const times = ([a, b]: Fraction, [c, d]: Fraction): Fraction => make(a * c, b * d);
/** See `minus`.
 *  @returns  quotient     @source  arithmetic
 *  @example over([1, 2], [3, 4])[1] // => 3 */
export const over = ([a, b]: Fraction, [c, d]: Fraction): Fraction => make(a * d, b * c);
