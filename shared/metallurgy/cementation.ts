import { FARADAY, GAS_CONSTANT, LN10 } from "../constants";
import { massRatio, type MolarMasses } from "./molarMass";

/** Electrons an atom takes or gives in cementation, in the usual valence: gold and silver as they stand in cyanide. */
export const cementationElectrons: Readonly<Record<string, number>> = {
  Cu: 2, Cd: 2, Co: 2, Ni: 2, Pb: 2, Zn: 2, Fe: 2, Mg: 2, Sn: 2, Pd: 2, Hg: 2, Ag: 1, Au: 1, Al: 3, As: 3, Sb: 3, Bi: 3,
}; // prettier-ignore

/** Metal won from a liquor: 100 (1 - V_f c_f / (V_0 c_0)).
 *  @param before, after  L and g/L     @returns  %     @source  definition; worked in practice-checks.json, F15
 *  @example cementationRecovery([2, 1.85], [1.985, 0.042]) // => 97.747 */
export const cementationRecovery = (
  before: readonly [volume: number, assay: number],
  after: readonly [volume: number, assay: number],
): number => 100 * (1 - (after[0] * after[1]) / (before[0] * before[1]));

/** kg of cementing metal that one kg of a metal takes by stoichiometry.
 *  @param cementing, won  elements     @param masses  g/mol     @returns  kg/kg; NaN for a metal without a known valence
 *  @source  electrons given = electrons taken
 *  @example stoichiometricRatio("Zn", "Cu", chemistry().molarMass) // => 1.0289
 *  @example stoichiometricRatio("Al", "Cu", chemistry().molarMass) // => 0.2831 */
export const stoichiometricRatio = (cementing: string, won: string, masses: MolarMasses): number =>
  massRatio(
    cementing,
    won,
    [cementationElectrons[won] ?? Number.NaN, cementationElectrons[cementing] ?? Number.NaN],
    masses,
  );

/** kg of cementing metal that ferric iron takes on its way to ferrous: one electron an atom.
 *  @returns  kg/kg Fe^3+     @source  Fe + 2 Fe^3+ = 3 Fe^2+ and its like
 *  @example ferricDemand("Fe", chemistry().molarMass) // => 0.5 */
export const ferricDemand = (cementing: string, masses: MolarMasses): number =>
  massRatio(cementing, "Fe", [1, cementationElectrons[cementing] ?? Number.NaN], masses);

/** kg of cementing metal that free acid dissolves, with hydrogen: ventilate, no flame; with arsenic or antimony about, arsine
 *  and stibine.
 *  @returns  kg/kg H2SO4     @source  M + z H^+ = M^z+ + z/2 H2
 *  @example acidDemand("Fe", chemistry().molarMass) // => 0.5694 */
export const acidDemand = (cementing: string, masses: MolarMasses): number =>
  massRatio(cementing, "H2SO4", [2, cementationElectrons[cementing] ?? Number.NaN], masses);

/** Cementing metal that everything removed takes by stoichiometry.
 *  @param removed  g or g/L by element     @param cementing  element     @param masses  g/mol     @returns  same unit as removed
 *  @source  sum of the stoichiometric ratios (practice-checks.json, F16)
 *  @example theoreticalMetal({ Cu: 0.45, Cd: 0.38, Co: 0.018, Ni: 0.012 }, "Zn", chemistry().molarMass) // => 0.7173 */
export const theoreticalMetal = (
  removed: Readonly<Record<string, number>>,
  cementing: string,
  masses: MolarMasses,
): number =>
  Object.entries(removed).reduce((sum, [metal, n]) => sum + n * stoichiometricRatio(cementing, metal, masses), 0);

/** First-order decay of a tenor: c = c0 exp(-k t).
 *  @param c0  any unit     @param k  1/time     @param t  same time     @returns  unit of c0     @source  first-order kinetics
 *  @example firstOrder(450, 0.18, 20) // => 12.296 */
export const firstOrder = (c0: number, k: number, t: number): number => c0 * Math.exp(-k * t);

/** Time of a first-order decay down to a tenor.
 *  @param c0, c  same unit     @param k  1/time     @returns  that time     @source  first-order kinetics
 *  @example timeToReach(450, 1, 0.18) // => 33.940 */
export const timeToReach = (c0: number, c: number, k: number): number => Math.log(c0 / c) / k;

/** Equilibrium constant of M_noble^n+ + M_base = M_noble + M_base^n+, as log10. It says how far, never how fast: cobalt on
 *  zinc has 16 decades and is slow.
 *  @param noble, base  V, standard potentials     @param electrons  exchanged     @param T  K     @returns  log10 K
 *  @source  Nernst equation
 *  @example logKOfCementation(0.342, -0.447, 2, 298.15) // => 26.674 */
export const logKOfCementation = (noble: number, base: number, electrons: number, T: number): number =>
  (electrons * FARADAY * (noble - base)) / (GAS_CONSTANT * T * LN10);
