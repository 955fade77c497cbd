import { massRatio, type MolarMasses } from "./molarMass";

/** kg H2SO4 per kg, by the reaction named.
 *  @param masses  g/mol     @returns  kg/kg of the metal or mineral     @source  stoichiometry; practice-checks.json, F11
 *  @example acidFactors(chemistry().molarMass).perCopperOxide // => 1.543
 *  @example acidFactors(chemistry().molarMass).returnedByJarosite // => 1.756 */
export const acidFactors = (masses: MolarMasses) => ({
  /** CuO + H2SO4 = CuSO4 + H2O; solvent extraction gives the same back */
  perCopperOxide: massRatio("H2SO4", "Cu", [1, 1], masses),
  /** Fe^3+ + 2 H2O = FeOOH + 3 H^+; hematite the same */
  returnedByGoethite: massRatio("H2SO4", "Fe", [3, 2], masses),
  /** 3 Fe^3+ + 2 SO4^2- + 6 H2O + K^+ = KFe3(SO4)2(OH)6 + 6 H^+ */
  returnedByJarosite: massRatio("H2SO4", "Fe", [1, 1], masses),
  /** 2 Fe^2+ + 1/2 O2 + 2 H^+ = 2 Fe^3+ + H2O */
  perFerrousOxidised: massRatio("H2SO4", "Fe", [1, 2], masses),
  perCalcite: massRatio("H2SO4", "CaCO3", [1, 1], masses),
});

/** Acid a metal takes to leave its oxide: MO(z/2) + z H^+, two H^+ a mole of H2SO4.
 *  @param metal  element     @param charge  of its ion     @param masses  g/mol     @returns  kg H2SO4/kg metal
 *  @source  stoichiometry
 *  @example acidPerMetal("Zn", 2, chemistry().molarMass) // => 1.500 */
export const acidPerMetal = (metal: string, charge: number, masses: MolarMasses): number =>
  massRatio("H2SO4", metal, [charge / 2, 1], masses);

/** kg of base that neutralises 1 kg of H2SO4.
 *  @param base  formula     @param protons  H^+ one formula unit takes     @param masses  g/mol     @returns  kg/kg
 *  @source  stoichiometry
 *  @example neutralising("CaO", 2, chemistry().molarMass) // => 0.572 */
export const neutralising = (base: string, protons: number, masses: MolarMasses): number =>
  massRatio(base, "H2SO4", [2, protons], masses);

/** A reagent put in less what is left of it, in solution and in the samples.
 *  @param added  g of pure reagent, with what the lixiviant brought     @param left, inSamples  g     @returns  g used up
 *  @source  mass balance
 *  @example usedUp(33.41, 4.96, 0.312) // => 28.138 */
export const usedUp = (added: number, left: number, inSamples: number): number => added - left - inSamples;

export interface AcidBalance {
  /** kg/t of dry ore, all of them */
  readonly gross: number;
  readonly copper: number;
  readonly returned: number;
  readonly ironOxidation: number;
  readonly gangue: number;
  readonly netAfterExtraction: number;
}

/** Where the acid went: gross less the copper's demand, plus what jarosite gave back, less what oxidising ferrous iron took,
 *  is the gangue's. Net after solvent extraction is gross less what extraction gives back with the copper.
 *  @param used  g H2SO4 used up     @param dryOre  g     @param copper  g dissolved from oxides
 *  @param jarositeIron  g Fe precipitated as jarosite     @param ferrousOxidised  g Fe     @param masses  g/mol
 *  @returns  kg H2SO4 per t dry ore     @source  practice-checks.json, F10; always say which one is quoted
 *  @example acidBalance(28.138, 1000, 6.9, 1.2, 0, chemistry().molarMass).gangue // => 19.596 */
export function acidBalance(
  used: number,
  dryOre: number,
  copper: number,
  jarositeIron: number,
  ferrousOxidised: number,
  masses: MolarMasses,
): AcidBalance {
  const factors = acidFactors(masses);
  const perTonne = (grams: number) => (1000 * grams) / dryOre;
  const balance = {
    gross: perTonne(used),
    copper: perTonne(copper * factors.perCopperOxide),
    returned: perTonne(jarositeIron * factors.returnedByJarosite),
    ironOxidation: perTonne(ferrousOxidised * factors.perFerrousOxidised),
  };
  return {
    ...balance,
    gangue: balance.gross - balance.copper + balance.returned - balance.ironOxidation,
    netAfterExtraction: balance.gross - balance.copper,
  };
}
