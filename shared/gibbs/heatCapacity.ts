import { T_REFERENCE } from "../constants";

/** Cp = a + b T + c T^-2, J/(mol K), held at its value at Tmax beyond it. A constant Cp has b = c = 0. */
export interface HeatCapacity {
  readonly a: number;
  readonly b: number;
  readonly c: number;
  /** K; Infinity where the polynomial has no upper end */
  readonly Tmax: number;
}

/** Heat capacity at T.
 *  @param T  K     @param cp  coefficients     @returns  J/(mol K)     @source  README of the tables: Cp = a + b T + c T^-2
 *  @example heatCapacityAt(298.15, { a: 15.616, b: 0.11921, c: 2150600, Tmax: 523 }) // => 75.35 */
export function heatCapacityAt(T: number, { a, b, c, Tmax }: HeatCapacity): number {
  const t = Math.min(T, Tmax);
  return a + b * t + c / (t * t);
}

/** Entropy at T.
 *  @param T  K     @param S  J/(mol K), at 298.15 K     @param cp  heat capacity
 *  @returns  J/(mol K)     @source  S(T) = S + integral of Cp / T dT
 *  @example entropyAt(373.15, 69.91, { a: 75.35, b: 0, c: 0, Tmax: Infinity }) // => 86.82 */
export function entropyAt(T: number, S: number, { a, b, c, Tmax }: HeatCapacity): number {
  const t = Math.min(T, Tmax);
  const { sum, beyond } = integrals(t, T, a, b, c);
  return S + sum + beyond * Math.log(T / t);
}

function integrals(t: number, T: number, a: number, b: number, c: number) {
  const r = T_REFERENCE;
  return {
    /** integral of Cp / T from 298.15 K to t */
    sum: a * Math.log(t / r) + b * (t - r) - (c / 2) * (1 / (t * t) - 1 / (r * r)),
    /** integral of Cp from 298.15 K to t */
    heat: a * (t - r) + (b / 2) * (t * t - r * r) - c * (1 / t - 1 / r),
    /** Cp that is held from t to T */
    beyond: T > t ? a + b * t + c / (t * t) : 0,
  };
}

/** Gibbs energy at T less that at 298.15 K: minus the integral of S dT, in closed form.
 *  @param T  K, 273.15 to 523.15     @param S  J/(mol K), at 298.15 K     @param cp  heat capacity
 *  @returns  J/mol     @source  d(T S) = S dT + Cp dT, so that the integral of S dT is T S(T) - 298.15 S less that of Cp dT
 *  @example gibbsShift(333.15, 69.91, { a: 75.35, b: 0, c: 0, Tmax: Infinity }) // => -2595.9 */
export function gibbsShift(T: number, S: number, { a, b, c, Tmax }: HeatCapacity): number {
  const t = Math.min(T, Tmax);
  const { sum, heat, beyond } = integrals(t, T, a, b, c);
  const entropy = S + sum + (T > t ? beyond * Math.log(T / t) : 0);
  return -(T * entropy - T_REFERENCE * S - heat - beyond * (T - t));
}

/** J/(mol K) per atom; every other element 25.9 */
const perAtom: Readonly<Record<string, number>> = { C: 7.5, H: 9.6, Si: 15.9, O: 16.7, F: 20.9, P: 22.6, S: 22.6 };

/** Heat capacity of a solid from its formula, for rows that have none: the sum over its atoms. Good to about 10 % for salts and oxides.
 *  @param atoms  by element symbol     @returns  J/(mol K)
 *  @source  Kopp's rule with the atomic values of Perry's Chemical Engineers' Handbook, from memory
 *  @example koppHeatCapacity({ Cu: 1, O: 2, H: 2 }) // => 78.5 */
export function koppHeatCapacity(atoms: Readonly<Record<string, number>>): number {
  return Object.entries(atoms).reduce((sum, [symbol, n]) => sum + n * (perAtom[symbol] ?? 25.9), 0);
}
