/** Debye-Hueckel slope in log10, molal, at 25 C (checks.csv act-dh-A-25). */
export const DEBYE_HUECKEL_A_25 = 0.509;

/** Beyond this ionic strength the Davies equation turns upward and means nothing (practice brief, formula 3.11). */
export const DAVIES_LIMIT = 0.5;

/** Activity coefficient of an ion by Davies: log10 gamma = -A z^2 (sqrt(I) / (1 + sqrt(I)) - b I).
 *  @param z  charge number     @param ionicStrength  mol/kg, >= 0; valid to 0.5     @param b  0.3 (1962), 0.2 in the paper of 1938
 *  @param A  Debye-Hueckel slope, kg^0.5 mol^-0.5     @returns  gamma, dimensionless
 *  @source  Davies 1962 (checks.csv, DAVIES62)
 *  @example davies(2, 0.1) // => 0.3732 */
export function davies(z: number, ionicStrength: number, b = 0.3, A = DEBYE_HUECKEL_A_25): number {
  const root = Math.sqrt(ionicStrength);
  return 10 ** (-A * z * z * (root / (1 + root) - b * ionicStrength));
}
