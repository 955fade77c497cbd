import { massOf } from "../metallurgy/molarMass";
import { SULFIDE_SULFUR } from "../selection/components";
import type { ChemicalData } from "../species/chemicalData";

/** What a component comes into a liquor with until somebody says how much there is, mol/L: common practice, no source. */
export const FIRST_TOTAL = 0.01;

/** What the trade weighs where a component is no element or group that stands by itself in a liquor. */
const weighed: Readonly<Record<string, string>> = {
  S: "SO4^2-",
  [SULFIDE_SULFUR]: "S",
  C: "CO3^2-",
  N: "NO3^-",
  P: "PO4^3-",
  Cl: "Cl^-",
  F: "F^-",
  CN: "CN^-",
  S2O3: "S2O3^2-",
  SCN: "SCN^-",
  GLY: "C2H5NO2",
  OX: "C2O4^2-",
};

/** The formula whose grams a total in g/L counts: sulfate for sulfate sulfur, glycine for glycinate, the element for K or Na.
 *  @param component  ligand or other component     @param sulfateReduction  all sulfur is one pool, counted as S
 *  @returns  a formula of one unit of the component     @source  common practice, no source
 *  @example weighedAs("S", false).length // => 6 */
export const weighedAs = (component: string, sulfateReduction: boolean): string =>
  component === "S" && sulfateReduction ? "S" : (weighed[component] ?? component);

/** g/L of one mol/L of a component: a total is molality with activity coefficient 1, a litre taken for a kilogram of water.
 *  @param data  library, for molar masses     @param component  as in components.csv     @param sulfateReduction  as above
 *  @returns  g/mol     @source  molar masses of elements.csv
 *  @example gramsPerMole(chemistry(), "S", false) // => 96.06
 *  @example gramsPerMole(chemistry(), "CN", false) // => 26.018 */
export const gramsPerMole = (data: ChemicalData, component: string, sulfateReduction: boolean): number =>
  massOf(weighedAs(component, sulfateReduction), data.molarMass);
