import { FARADAY, GAS_CONSTANT } from "../constants";

/** Ratio of oxidised to reduced form from a potential: exp(n F (Eh - E0) / (R T)). With the standard potential it is a ratio of
 *  activities, with a formal one of concentrations in that medium: say which.
 *  @param Eh, E0  V versus SHE     @param electrons  of the couple     @param T  K     @returns  ratio     @source  Nernst equation
 *  @example ratioFromEh(0.62, 0.68, 1, 298.15) // => 0.0968
 *  @example ratioFromEh(0.01, 0, 1, 298.15) // => 1.476 */
export const ratioFromEh = (Eh: number, E0: number, electrons: number, T: number): number =>
  Math.exp((electrons * FARADAY * (Eh - E0)) / (GAS_CONSTANT * T));
