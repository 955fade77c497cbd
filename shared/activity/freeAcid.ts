import { energiesAt } from "../gibbs/energies";
import { GAS_CONSTANT, LN10 } from "../constants";
import { fail, ok, type Outcome } from "../outcome";
import type { ChemicalData } from "../species/chemicalData";
import { kelvin } from "../units";
import { DAVIES_LIMIT, davies, daviesSlope } from "./davies";

const H2SO4_G_PER_MOL = 98.07;

export interface FreeAcid {
  /** g/L of H2SO4 that a titration to sulfate finds: H^+ and the proton of HSO4^- */
  readonly gPerL: number;
  /** mol/L */
  readonly hydrogen: number;
  readonly bisulfate: number;
  /** mol/kg; of acid and sulfate alone */
  readonly ionicStrength: number;
  /** false beyond the ionic strength that Davies holds to: no more than an order of things */
  readonly withinDavies: boolean;
}

/** Free acid of a sulfate liquor from its pH: bisulfate in equilibrium with hydrogen ion and sulfate at the total given, activity
 *  coefficients by Davies up to its limit and held at their value there. A litre counts as a kilogram of water, cations that balance the
 *  sulfate left over as divalent.
 *  @param data  library, for pK2 at T     @param pH  -log10 of the hydrogen ion's activity     @param sulfate  total, mol/L, above 0
 *  @param temperatureC  C, 0 to 250     @returns  g/L H2SO4 with what it rests on; OUT_OF_RANGE
 *  @source  mass action, Davies 1962; indicative: a real liquor's free acid is titrated
 *  @example Number(valueOf(freeAcid(chemistry(), 1.5, 0.5, 25)).withinDavies) // => 0 */
export function freeAcid(data: ChemicalData, pH: number, sulfate: number, temperatureC: number): Outcome<FreeAcid> {
  if (!(sulfate > 0)) return fail("OUT_OF_RANGE", "sulfate", `total sulfate ${sulfate} mol/L; it must be above 0`);
  const T = kelvin(temperatureC);
  const energies = energiesAt(data, T);
  const pK2 = (energies.of("SO4^2-(aq)").G - energies.of("HSO4^-(aq)").G) / (GAS_CONSTANT * T * LN10);
  const slope = daviesSlope(T);
  let ionicStrength = sulfate;
  let [hydrogen, bisulfate] = [0, 0];
  for (let i = 0; i < 200; i++) {
    const I = Math.min(DAVIES_LIMIT, ionicStrength);
    const [g1, g2] = [davies(1, I, 0.3, slope), davies(2, I, 0.3, slope)];
    hydrogen = 10 ** -pH / g1;
    // K2 = a(H) m(SO4) g2 / (m(HSO4) g1)
    const ratio = (10 ** (pK2 - pH) * g2) / g1;
    bisulfate = (sulfate * ratio) / (1 + ratio);
    const free = sulfate - bisulfate;
    // What the hydrogen ion does not balance, divalent cations do.
    const cations = Math.max(0, (2 * free + bisulfate - hydrogen) / 2);
    const next = (hydrogen + bisulfate + 4 * free + 4 * cations) / 2;
    if (Math.abs(next - ionicStrength) < 1e-12) break;
    ionicStrength = (ionicStrength + next) / 2;
  }
  return ok({
    gPerL: ((hydrogen + bisulfate) / 2) * H2SO4_G_PER_MOL,
    hydrogen,
    bisulfate,
    ionicStrength,
    withinDavies: ionicStrength <= DAVIES_LIMIT,
  });
}
