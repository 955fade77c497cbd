import type { Kelvin } from "../units";
import { debyeHuckelA } from "./debyeHuckel";

/** Debye-Hueckel slope that goes with the Davies equation at 25 C (checks.csv, act-davies; the computed one is 0.5098). */
export const DEBYE_HUECKEL_A_25 = 0.509;

/** Beyond this ionic strength (mol/kg) the equation turns upward and means nothing; some authors say 0.1. */
export const DAVIES_LIMIT = 0.5;

/** The slope for Davies at T: 0.509 at 25 C, moved in proportion to the computed Debye-Hueckel slope.
 *  @param T  K, 273.15 to 523.15     @returns  kg^0.5 mol^-0.5     @source  Davies 1962; activity/debyeHuckel.ts for the change with T
 *  @example daviesSlope(kelvin(25)) // => 0.509
 *  @example daviesSlope(kelvin(100)) // => 0.598 */
export const daviesSlope = (T: Kelvin | number): number =>
  (DEBYE_HUECKEL_A_25 * debyeHuckelA(T)) / debyeHuckelA(298.15);

/** Activity coefficient of an ion by Davies: log10 gamma = -A z^2 (sqrt(I) / (1 + sqrt(I)) - b I).
 *  @param z  charge number     @param ionicStrength  mol/kg, >= 0; holds to DAVIES_LIMIT     @param b  0.3 (1962), 0.2 in the paper of 1938
 *  @param A  slope, kg^0.5 mol^-0.5; `daviesSlope(T)` away from 25 C     @returns  gamma, dimensionless
 *  @source  C. W. Davies, Ion Association, Butterworths 1962
 *  @example davies(2, 0.1) // => 0.3732
 *  @example davies(2, 0.5, 0.2) // => 0.2292 */
export function davies(z: number, ionicStrength: number, b = 0.3, A = DEBYE_HUECKEL_A_25): number {
  const root = Math.sqrt(ionicStrength);
  return 10 ** (-A * z * z * (root / (1 + root) - b * ionicStrength));
}
