import { pKwater } from "./water";

/** -log10 K of HSO4^- = H^+ + SO4^2-.
 *  @param T  K, 273.15 to 523.15     @returns  molal, I = 0
 *  @source  A. G. Dickson and others, J. Phys. Chem. 94, 7978 (1990), as printed by Clegg, Rard and Pitzer (1994), equation 21
 *  @example pKBisulfate(kelvin(25)) // => 1.979
 *  @example pKBisulfate(kelvin(100)) // => 3.076 */
export const pKBisulfate = (T: number): number =>
  -(562.694864456 - 102.5154 * Math.log(T) - 1.117033e-4 * T * T + 0.2477538 * T - 13273.75 / T);

/** -log10 K of NH4^+ = H^+ + NH3.
 *  @param T  K, measured 273.15 to 323.15     @returns  molal, I = 0
 *  @source  R. G. Bates and G. D. Pinching, J. Res. NBS 42, 419 (1949)
 *  @example pKAmmonium(kelvin(25)) // => 9.244
 *  @example pKAmmonium(kelvin(50)) // => 8.539 */
export const pKAmmonium = (T: number): number => 2835.76 / T - 0.6322 + 0.001225 * T;

/** -log10 K of CO2(aq) + H2O = H^+ + HCO3^-.
 *  @param T  K, fitted 273.15 to 363.15, used to 423.15     @returns  molal, I = 0
 *  @source  L. N. Plummer and E. Busenberg, Geochim. Cosmochim. Acta 46, 1011 (1982), table 1
 *  @example pKCarbonicAcid(kelvin(25)) // => 6.352
 *  @example pKCarbonicAcid(kelvin(100)) // => 6.427 */
export const pKCarbonicAcid = (T: number): number =>
  -(-356.3094 - 0.06091964 * T + 21834.37 / T + 126.8339 * Math.log10(T) - 1684915 / (T * T));

/** -log10 K of HCO3^- = H^+ + CO3^2-.
 *  @param T  K, fitted 273.15 to 363.15, used to 423.15     @returns  molal, I = 0
 *  @source  L. N. Plummer and E. Busenberg, Geochim. Cosmochim. Acta 46, 1011 (1982), table 1
 *  @example pKBicarbonate(kelvin(25)) // => 10.329
 *  @example pKBicarbonate(kelvin(150)) // => 10.387 */
export const pKBicarbonate = (T: number): number =>
  -(-107.8871 - 0.03252849 * T + 5151.79 / T + 38.92561 * Math.log10(T) - 563713.9 / (T * T));

/** -log10 K of HCN = H^+ + CN^-.
 *  @param T  K, measured 283.15 to 318.15     @returns  molal, I = 0
 *  @source  S. J. Broderius (1977); agrees with Izatt and others, Inorg. Chem. 1, 828 (1962), both from memory
 *  @example pKHydrocyanicAcid(kelvin(10)) // => 9.63 */
export const pKHydrocyanicAcid = (T: number): number => 1.344 + 2347.2 / T;

/** A species whose Gibbs energy follows a published K(T): G(id) = sum of n G(partner) + sign RT ln10 pK. H^+ is zero and left out. */
export interface Anchor {
  readonly partners: readonly (readonly [id: string, n: number])[];
  readonly sign: 1 | -1;
  readonly pK: (T: number) => number;
  readonly model: string;
  /** C */
  readonly trusted: readonly [number, number];
}

/** The anchored species by id. The published curve is moved as a whole so that the table's own value at 25 C is kept.
 *  @returns  anchors     @source  each function above */
export const anchors: ReadonlyMap<string, Anchor> = new Map<string, Anchor>([
  ["OH^-(aq)", { partners: [["H2O(l)", 1]], sign: 1, pK: pKwater, model: "pKw of IAPWS R11-07", trusted: [0, 250] }],
  [
    "HSO4^-(aq)",
    {
      partners: [["SO4^2-(aq)", 1]],
      sign: -1,
      pK: pKBisulfate,
      model: "pK of Dickson and others (1990)",
      trusted: [0, 200],
    },
  ],
  [
    "NH4^+(aq)",
    {
      partners: [["NH3(aq)", 1]],
      sign: -1,
      pK: pKAmmonium,
      model: "pK of Bates and Pinching (1949)",
      trusted: [0, 100],
    },
  ],
  [
    "HCO3^-(aq)",
    {
      partners: [["CO3^2-(aq)", 1]],
      sign: -1,
      pK: pKBicarbonate,
      model: "pK of Plummer and Busenberg (1982)",
      trusted: [0, 150],
    },
  ],
  [
    "CO2(aq)",
    {
      partners: [["HCO3^-(aq)", 1], ["H2O(l)", -1]], // prettier-ignore
      sign: -1,
      pK: pKCarbonicAcid,
      model: "pK of Plummer and Busenberg (1982)",
      trusted: [0, 150],
    },
  ],
  [
    "HCN(aq)",
    { partners: [["CN^-(aq)", 1]], sign: -1, pK: pKHydrocyanicAcid, model: "pK of Broderius (1977)", trusted: [0, 60] },
  ],
]);
