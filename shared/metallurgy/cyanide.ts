import { protonatedShare } from "../activity/protonation";
import { massRatio, type MolarMasses } from "./molarMass";

/** Free acid makes HCN of cyanide: below pH 10.5 the usual caution stands beside every number here, and site procedures,
 *  local codes and licensed practice decide. Share of free cyanide present as HCN: 1 / (1 + 10^(pH - pKa)).
 *  @param pH  of the liquor at 25 C     @param pKa  9.21 at 25 C     @returns  %
 *  @source  acid-base equilibrium; pKa 9.21 as quoted from Lu et al. 2002, others give 9.2 to 9.5
 *  @example hcnShare(10.5) // => 4.88 */
export const hcnShare = (pH: number, pKa = 9.21): number => 100 * protonatedShare(pH, pKa);

/** Henry constant of HCN, K_H = exp(8205.7 / T - 25.323).
 *  @param T  K, 273 to 308     @returns  mol/(L atm)     @source  Ma, Dasgupta, Blackledge & Boss 2010, Environ. Sci. Technol. 44, 3028
 *  @example hcnHenry(298.15) // => 9.016 */
export const hcnHenry = (T: number): number => Math.exp(8205.7 / T - 25.323);

/** HCN in the air above a liquor at equilibrium, total pressure 1 atm.
 *  @param hcnAsCN  mg/L of dissolved HCN counted as CN     @param T  K     @param masses  g/mol     @returns  ppm by volume
 *  @source  Henry's law with `hcnHenry`
 *  @example hcnOverSolution(1, 298.15, chemistry().molarMass) // => 4.26 */
export const hcnOverSolution = (hcnAsCN: number, T: number, masses: MolarMasses): number =>
  (1e6 * (hcnAsCN / 1000 / ((masses.get("C") ?? Number.NaN) + (masses.get("N") ?? Number.NaN)))) / hcnHenry(T);

/** NaCN and O2 that gold takes: 4 Au + 8 CN^- + O2 + 2 H2O = 4 Au(CN)2^- + 4 OH^-.
 *  @param masses  g/mol     @returns  kg/kg Au     @source  stoichiometry (Elsner's equation)
 *  @example goldDemand(chemistry().molarMass).NaCN // => 0.4976 */
export const goldDemand = (masses: MolarMasses): { NaCN: number; O2: number } => ({
  NaCN: massRatio("NaCN", "Au", [2, 1], masses),
  O2: massRatio("O2", "Au", [1, 4], masses),
});
