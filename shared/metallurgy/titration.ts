import { massOf, type MolarMasses } from "./molarMass";

/** Tenor from a titre: c = titrant x titre x ratio / aliquot x molar mass.
 *  @param aliquot, titre  same unit of volume     @param titrant  mol/L     @param ratio  mol of what is sought per mol of titrant
 *  @returns  g/L     @source  volumetric analysis */
const fromTitre = (aliquot: number, titrant: number, titre: number, ratio: number, molar: number): number =>
  ((titrant * titre * ratio) / aliquot) * molar;

/** Free acid by NaOH: two OH^- a mole of H2SO4. With Fe^3+, Al^3+ or Cu^2+ about it needs a complexant (oxalate, fluoride,
 *  Mg-EDTA) or a back extrapolation, else hydrolysis is counted as acid.
 *  @param aliquot, titre  mL     @param naoh  mol/L     @param masses  g/mol     @returns  g/L H2SO4     @source  volumetric analysis; practice-checks.json, F19
 *  @example freeAcid(10, 0.2, 12.35, chemistry().molarMass) // => 12.112 */
export const freeAcid = (aliquot: number, naoh: number, titre: number, masses: MolarMasses): number =>
  fromTitre(aliquot, naoh, titre, 1 / 2, massOf("H2SO4", masses));

/** Free cyanide by silver nitrate: Ag^+ + 2 CN^- = Ag(CN)2^-. Keep the liquor above pH 10.5 and away from acid.
 *  @param aliquot, titre  mL     @param silver  mol/L AgNO3     @param masses  g/mol     @returns  g/L NaCN     @source  Liebig titration; practice-checks.json, F20
 *  @example freeCyanide(25, 0.02, 2.55, chemistry().molarMass) // => 0.19995 */
export const freeCyanide = (aliquot: number, silver: number, titre: number, masses: MolarMasses): number =>
  fromTitre(aliquot, silver, titre, 2, massOf("NaCN", masses));
