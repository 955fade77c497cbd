import type { ChemicalData } from "../species/chemicalData";
import { fail, ok, type Outcome } from "../outcome";

/** Molality of a tenor, one kilogram of water taken for a litre of liquor: the error is that of the liquor's water content, a few percent in
 *  a sulfate liquor of 100 g/L.
 *  @param data  the library, for the molar mass     @param component  element or ligand group     @param gPerL  g/L, above zero
 *  @returns  mol/kg; UNKNOWN_COMPONENT or OUT_OF_RANGE     @source  molar masses of shared/data/elements.csv
 *  @example valueOf(molality(chemistry(), "Cu", 0.5)) // => 0.0078683 */
export function molality(data: ChemicalData, component: string, gPerL: number): Outcome<number> {
  const mass = data.molarMass.get(component);
  if (mass === undefined) return fail("UNKNOWN_COMPONENT", "component", `no component "${component}" in the library`);
  if (!(gPerL > 0)) return fail("OUT_OF_RANGE", "gPerL", `tenor of ${component}: ${gPerL} g/L; it must be above 0`);
  return ok(gPerL / mass);
}

/** Ionic strength I = 1/2 sum m z^2.
 *  @param ions  molality in mol/kg and charge of every ion     @returns  mol/kg
 *  @source  G. N. Lewis and M. Randall, J. Am. Chem. Soc. 43, 1112 (1921)
 *  @example ionicStrength([{ m: 0.1, z: 1 }, { m: 0.05, z: -2 }]) // => 0.15 */
export const ionicStrength = (ions: readonly { m: number; z: number }[]): number =>
  ions.reduce((sum, { m, z }) => sum + (m * z * z) / 2, 0);
