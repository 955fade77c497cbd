import { GAS_CONSTANT } from "../constants";
import { energiesAt } from "../gibbs/energies";
import { fail, ok, type Outcome } from "../outcome";
import type { ChemicalData } from "../species/chemicalData";
import { kelvin } from "../units";
import { DAVIES_LIMIT, davies, daviesSlope } from "./davies";

const H2SO4_G_PER_MOL = 98.072;

/** Below this pH a glass electrode is an index only, and a sulfate loop is run on free acid (common practice, no source). */
export const FREE_ACID_BELOW = 1.5;

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
  /** false where it is more acid than the sulfate of the liquor balances: the total is then too low for this pH */
  readonly withinSulfate: boolean;
}

/** Free acid against pH for one liquor, either way. */
export interface FreeAcidCurve {
  /** free acid at a pH */
  readonly at: (pH: number) => FreeAcid;
  /** pH of a free acid in g/L; null at or below nothing, and beyond what the sulfate balances */
  readonly pHOf: (gPerL: number) => number | null;
  /** g/L: the sulfate of the liquor balances no more */
  readonly most: number;
}

/** The curve of free acid against pH of a sulfate liquor: bisulfate in equilibrium with hydrogen ion and sulfate at the total given,
 *  activity coefficients by Davies up to its limit and held at their value there. A litre counts as a kilogram of water, cations that
 *  balance the sulfate left over as divalent.
 *  @param data  library, for pK2 at T     @param sulfate  total, mol/L, above 0     @param temperatureC  C, 0 to 250
 *  @returns  functions both ways, each iterated to 1e-12 mol/kg of ionic strength; OUT_OF_RANGE
 *  @source  mass action, Davies 1962; indicative: a real liquor's free acid is titrated
 *  @example Number(valueOf(freeAcidCurve(chemistry(), 0.5, 25)).pHOf(10).toFixed(2)) // => 1.83 */
export function freeAcidCurve(data: ChemicalData, sulfate: number, temperatureC: number): Outcome<FreeAcidCurve> {
  if (!(sulfate > 0)) return fail("OUT_OF_RANGE", "sulfate", `total sulfate ${sulfate} mol/L; it must be above 0`);
  const T = kelvin(temperatureC);
  const energies = energiesAt(data, T);
  const K2 = Math.exp((energies.of("HSO4^-(aq)").G - energies.of("SO4^2-(aq)").G) / (GAS_CONSTANT * T));
  const slope = daviesSlope(T);

  /** Ionic strength, activity coefficients and amounts agree; `split` gives the amounts from the coefficients. */
  function settled(split: (g1: number, g2: number) => [hydrogen: number, bisulfate: number]) {
    let ionicStrength = sulfate;
    let [hydrogen, bisulfate, g1] = [0, 0, 1];
    for (let i = 0; i < 200; i++) {
      const I = Math.min(DAVIES_LIMIT, ionicStrength);
      g1 = davies(1, I, 0.3, slope);
      [hydrogen, bisulfate] = split(g1, davies(2, I, 0.3, slope));
      const free = sulfate - bisulfate;
      // What the hydrogen ion does not balance, divalent cations do.
      const cations = Math.max(0, (2 * free + bisulfate - hydrogen) / 2);
      const next = (hydrogen + bisulfate + 4 * free + 4 * cations) / 2;
      if (Math.abs(next - ionicStrength) < 1e-12) break;
      ionicStrength = (ionicStrength + next) / 2;
    }
    return { hydrogen, bisulfate, ionicStrength, g1 };
  }

  function at(pH: number): FreeAcid {
    const { hydrogen, bisulfate, ionicStrength } = settled((g1, g2) => {
      // K2 = a(H) m(SO4) g2 / (m(HSO4) g1)
      const ratio = (10 ** -pH * g2) / (K2 * g1);
      return [10 ** -pH / g1, (sulfate * ratio) / (1 + ratio)];
    });
    const gPerL = ((hydrogen + bisulfate) / 2) * H2SO4_G_PER_MOL;
    return {
      ...{ gPerL, hydrogen, bisulfate, ionicStrength },
      withinDavies: ionicStrength <= DAVIES_LIMIT,
      withinSulfate: gPerL <= sulfate * H2SO4_G_PER_MOL,
    };
  }

  function pHOf(gPerL: number): number | null {
    if (!(gPerL > 0) || gPerL > sulfate * H2SO4_G_PER_MOL) return null;
    const protons = (2 * gPerL) / H2SO4_G_PER_MOL;
    const { hydrogen, g1 } = settled((_, g2) => {
      // K' = m(H) m(SO4) / m(HSO4) with m(H) + m(HSO4) = protons: the positive root of h^2 + (sulfate - protons + K') h - protons K' = 0.
      const K = K2 / g2;
      const b = sulfate - protons + K;
      const root = Math.sqrt(b * b + 4 * protons * K);
      const h = b > 0 ? (2 * protons * K) / (b + root) : (root - b) / 2;
      return [h, protons - h];
    });
    return -Math.log10(hydrogen * g1);
  }
  return ok({ at, pHOf, most: sulfate * H2SO4_G_PER_MOL });
}

/** Free acid of a sulfate liquor at one pH.
 *  @param data  library, for pK2 at T     @param pH  -log10 of the hydrogen ion's activity     @param sulfate  total, mol/L, above 0
 *  @param temperatureC  C, 0 to 250     @returns  g/L H2SO4 with what it rests on; OUT_OF_RANGE
 *  @source  `freeAcidCurve`
 *  @example Number(valueOf(freeAcid(chemistry(), 1.5, 0.5, 25)).withinDavies) // => 0 */
export function freeAcid(data: ChemicalData, pH: number, sulfate: number, temperatureC: number): Outcome<FreeAcid> {
  const curve = freeAcidCurve(data, sulfate, temperatureC);
  return curve.ok ? ok(curve.value.at(pH)) : curve;
}

export interface AcidBand {
  /** free acid at the set point's pH, g/L */
  readonly gPerL: number;
  /** pH units from the set point to where the acid is higher, and lower, by the band */
  readonly low: number;
  readonly high: number;
  /** half-width in pH that the metric counts: the wider of the two */
  readonly counted: number;
}

/** A control band of free acid as one of pH. The two sides differ; the metric of the set point wants one number, and takes the wider side, so
 *  that a margin counted in bands is never made out larger than the loop has it.
 *  @param data  library     @param band  half-width, g/L H2SO4, above 0     @param pH  of the set point, below 1.5
 *  @param sulfate  total, mol/L     @param temperatureC  C
 *  @returns  both sides and what counts. OUT_OF_RANGE where the band takes all the acid there is, reaches beyond what the sulfate
 *    balances, or the pH is not below 1.5     @source  `freeAcidCurve`; docs/decisions for the choice of side
 *  @example Number(valueOf(acidBand(chemistry(), 2, 0.8, 0.5, 25)).counted.toFixed(2)) // => 0.07 */
export function acidBand(
  data: ChemicalData,
  band: number,
  pH: number,
  sulfate: number,
  temperatureC: number,
): Outcome<AcidBand> {
  const refuse = (why: string) => fail("OUT_OF_RANGE", "freeAcidBand", why);
  if (!(band > 0)) return refuse(`a band of ${band} g/L free acid; it must be above 0`);
  if (!(pH < FREE_ACID_BELOW))
    return refuse(`at pH ${pH.toFixed(2)} a band in g/L says nothing: free acid counts below pH ${FREE_ACID_BELOW}`);
  const curve = freeAcidCurve(data, sulfate, temperatureC);
  if (!curve.ok) return curve;
  const { gPerL } = curve.value.at(pH);
  const here = `the free acid at pH ${pH.toFixed(2)} is about ${gPerL.toPrecision(2)} g/L`;
  if (band >= gPerL) return refuse(`a band of ${band} g/L leaves no acid: ${here}`);
  const [more, less] = [curve.value.pHOf(gPerL + band), curve.value.pHOf(gPerL - band)];
  if (more === null || less === null)
    return refuse(`a band of ${band} g/L is more than ${sulfate} mol/L of sulfate balances: ${here}`);
  const [low, high] = [pH - more, less - pH];
  return ok({ gPerL, low, high, counted: Math.max(low, high) });
}
