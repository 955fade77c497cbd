import { GAS_CONSTANT, LN10, T_REFERENCE } from "../constants";
import type { ChemicalData, EnergiesAtT, SpeciesEnergy } from "../species/chemicalData";
import { toCelsius, type Kelvin } from "../units";
import { correspondenceIntegral, type Correspondence, type IonClass } from "./correspondence";
import { gibbsShift } from "./heatCapacity";
import { modelsOf, type Model } from "./models";

/** What the core supports, K. */
export const supported = { lo: 273.15, hi: 523.15 } as const;

const celsius = (T: number): string => `${Number((T - 273.15).toFixed(2))}`;

function warningAt(model: Model, t: number, inWords: string): string | null {
  const [lo, hi] = model.trusted;
  // Half a hundredth of a degree is no extrapolation: 25 C in kelvin and back.
  if (t >= lo - 0.005 && t <= hi + 0.005) return null;
  const { formula } = model;
  if (model.kind !== "held" || model.hold !== "none")
    return `${formula} at ${inWords} C: Gibbs energy by "${model.label}", trusted from ${lo} to ${hi} C.`;
  const start = `${formula} has no temperature data: its energy of formation is held at its 25 C value and trusted near 25 C only`;
  return t > 60 ? `${start}. Do not rely on it at ${inWords} C.` : `${start}, not at ${inWords} C.`;
}

/** Standard Gibbs energies at one temperature: apparent, G(T) = G298 of formation less the integral of S dT, on the convention that
 *  H^+(aq) is zero at every T (entropies are conventional too). An electron at Eh = 0 is half of H2(g) less H^+, so that potentials are
 *  versus SHE at T; `of("e^-")` gives it. Each species is worked out when first asked for.
 *  @param data  the library     @param T  K, 273.15 to 523.15; pressure is saturation above 100 C, else 1 bar, and left out
 *  @returns  energies; `of` throws an Error where the id is unknown
 *  @throws RangeError where T is outside
 *  @source  docs/method.md, section 1
 *  @example energiesAt(chemistry(), kelvin(25)).of("H2O(l)").G // => -237129
 *  @example energiesAt(chemistry(), kelvin(60)).of("H^+(aq)").G // => 0 */
export function energiesAt(data: ChemicalData, T: Kelvin): EnergiesAtT {
  if (!(T >= supported.lo && T <= supported.hi))
    throw new RangeError(`T = ${T} K is outside ${supported.lo} to ${supported.hi} K`);
  const memo: (SpeciesEnergy | undefined)[] = [];
  const modelOf = modelsOf(data);
  const t = toCelsius(T);
  const inWords = celsius(T);
  const factors = new Map<IonClass, Correspondence>();
  const slope = LN10 * GAS_CONSTANT * T;

  function factorsOf(ionClass: IonClass): Correspondence {
    let found = factors.get(ionClass);
    if (found === undefined)
      factors.set(ionClass, (found = correspondenceIntegral(data.tables.correspondence, ionClass, T)));
    return found;
  }
  function sum(partners: readonly (readonly [string, number])[]): number {
    let total = 0;
    for (const [id, n] of partners) total += n * of(id).G;
    return total;
  }
  function gibbs(model: Model): number {
    if (T === T_REFERENCE) return model.G298;
    switch (model.kind) {
      case "zero":
        return 0;
      case "heatCapacity":
        return model.G298 + gibbsShift(T, model.S, model.cp);
      case "correspondence": {
        const { a, b, h } = factorsOf(model.ionClass);
        return model.G298 - (a + b * model.S - model.z * h);
      }
      case "anchor":
        return sum(model.partners) + model.sign * slope * (model.pK(T) + model.shift);
      case "held":
        return sum(model.partners) + model.dG298 * (model.hold === "logK" ? T / T_REFERENCE : 1);
    }
  }
  function of(id: string): SpeciesEnergy {
    if (id === "e^-") return electron();
    const { place, model } = modelOf(id);
    const before = memo[place];
    if (before !== undefined) return before;
    const energy = speciesEnergy(model);
    memo[place] = energy;
    return energy;
  }
  function speciesEnergy(model: Model): SpeciesEnergy {
    return { G: gibbs(model), model: model.label, trusted: model.trusted, warning: warningAt(model, t, inWords) };
  }
  const electron = (): SpeciesEnergy => ({ ...of("H2(g)"), G: of("H2(g)").G / 2, model: "half of H2(g) less H^+" });
  return { T, of };
}
