import { massOf, type MolarMasses } from "./molarMass";

/** Electrons one formula unit takes up (negative: gives) when it does its work, with the acid taken on the way. */
export const oxidants = {
  O2: { electrons: 4, protons: 4 },
  H2O2: { electrons: 2, protons: 2 },
  NaClO3: { electrons: 6, protons: 6 },
  MnO2: { electrons: 2, protons: 4 },
  Cl2: { electrons: 2, protons: 0 },
  KMnO4: { electrons: 5, protons: 8 },
  O3: { electrons: 2, protons: 2 },
  "Fe^3+": { electrons: 1, protons: 0 },
} as const;
export type Oxidant = keyof typeof oxidants;

/** Electrons given by a metal on its way up.
 *  @param grams  of the metal     @param metal  element     @param electrons  per atom, as 2 for U(IV) to U(VI)     @param masses  g/mol
 *  @returns  mmol of electrons     @source  stoichiometry
 *  @example electronsGiven(2.4, "Fe", 1, chemistry().molarMass) // => 42.976 */
export const electronsGiven = (grams: number, metal: string, electrons: number, masses: MolarMasses): number =>
  (1000 * grams * electrons) / massOf(metal, masses);

/** Oxidant that takes so many electrons.
 *  @param mmol  of electrons     @param oxidant  by formula     @param masses  g/mol     @returns  g
 *  @source  half-reactions in acid: ClO3^- + 6 H^+ + 6 e^-, MnO2 + 4 H^+ + 2 e^-, O2 + 4 H^+ + 4 e^-, O3 to O2, MnO4^- to Mn^2+
 *  @example oxidantFor(50.118, "NaClO3", chemistry().molarMass) // => 0.8891 */
export const oxidantFor = (mmol: number, oxidant: Oxidant, masses: MolarMasses): number =>
  (mmol / 1000 / oxidants[oxidant].electrons) * massOf(oxidant, masses);

/** kg of oxidant per kg of metal that gives so many electrons an atom.
 *  @param oxidant  by formula     @param metal  element     @param electrons  per atom of the metal     @param masses  g/mol
 *  @returns  kg/kg     @source  stoichiometry
 *  @example oxidantPerMetal("O2", "Fe", 1, chemistry().molarMass) // => 0.1432 */
export const oxidantPerMetal = (oxidant: Oxidant, metal: string, electrons: number, masses: MolarMasses): number =>
  oxidantFor(electronsGiven(1, metal, electrons, masses), oxidant, masses);

/** Acid the oxidant itself takes, per kg of metal.
 *  @returns  kg H2SO4/kg metal, the metal's own demand not counted     @source  protons of the half-reactions above
 *  @example acidForOxidant("MnO2", "U", 2, chemistry().molarMass) // => 0.824 */
export const acidForOxidant = (oxidant: Oxidant, metal: string, electrons: number, masses: MolarMasses): number =>
  ((oxidants[oxidant].protons / 2) * (electrons / oxidants[oxidant].electrons) * massOf("H2SO4", masses)) /
  massOf(metal, masses);

/** Share of an oxidant that did the work asked of it.
 *  @param theoretical, used  g     @returns  %     @source  definition
 *  @example utilisation(0.88907, 2.1) // => 42.34 */
export const utilisation = (theoretical: number, used: number): number => (100 * theoretical) / used;
