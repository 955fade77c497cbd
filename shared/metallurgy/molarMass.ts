import { ok, valueOf, type Outcome } from "../outcome";
import { parseFormula } from "../species/formula";

/** g/mol by element symbol: `molarMass` of the library. */
export type MolarMasses = ReadonlyMap<string, number>;

/** Molar mass of a formula from those of its elements.
 *  @param formula  as `H2SO4`, `Fe^3+`, `CuSO4.5H2O`; an oxidation state as in `Fe(III)` is left away     @param masses  g/mol
 *  @returns  g/mol; BAD_FORMULA where it cannot be read     @source  IUPAC standard atomic weights, abridged (elements.csv)
 *  @example valueOf(molarMass("H2SO4", chemistry().molarMass)) // => 98.072
 *  @example valueOf(molarMass("Fe(III)", chemistry().molarMass)) // => 55.845 */
export function molarMass(formula: string, masses: MolarMasses): Outcome<number> {
  const parsed = parseFormula(formula.replace(/\((?:0|I{1,3}|IV|V|VI{0,3})\)$/, ""));
  if (!parsed.ok) return parsed;
  return ok(
    Object.entries(parsed.value.atoms).reduce((sum, [symbol, n]) => sum + n * (masses.get(symbol) ?? Number.NaN), 0),
  );
}

/** As `molarMass`, for a formula that stands in the program.
 *  @returns  g/mol     @throws Error when it cannot be read
 *  @example massOf("NaCN", chemistry().molarMass) // => 49.008 */
export const massOf = (formula: string, masses: MolarMasses): number => valueOf(molarMass(formula, masses));

/** kg of one substance per kg of another, by the moles of each in a reaction.
 *  @param of, per  formulas     @param moles  [of, per]     @returns  kg/kg     @source  definition of the mole
 *  @example massRatio("H2SO4", "Cu", [1, 1], chemistry().molarMass) // => 1.543
 *  @example massRatio("NaClO3", "U", [1, 3], chemistry().molarMass) // => 0.149 */
export const massRatio = (of: string, per: string, [n, m]: readonly [number, number], masses: MolarMasses): number =>
  (n * massOf(of, masses)) / (m * massOf(per, masses));

/** mol/L of a tenor.
 *  @param gPerL  g/L     @param formula  what was weighed     @returns  mol/L     @source  definition of the mole
 *  @example molPerL(5, "Cu", chemistry().molarMass) // => 0.07868 */
export const molPerL = (gPerL: number, formula: string, masses: MolarMasses): number => gPerL / massOf(formula, masses);
