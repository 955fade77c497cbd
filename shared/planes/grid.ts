import { FARADAY, GAS_CONSTANT, LN10 } from "../constants";
import type { Plane } from "../geometry/envelope";
import type { Line } from "../geometry/line";
import type { EnergiesAtT } from "../species/chemicalData";

/** Steps per J/mol. Coefficients are whole numbers of steps, so every difference of two planes is exact and the
 *  predicates see the true sign; a step moves no line by more than 1e-6 pH. */
export const STEPS_PER_JOULE = 1024;

/** What every plane at one temperature shares, in steps of the grid. */
export interface Basis {
  readonly T: number; // K
  /** RT ln 10: price of one H^+ per pH */
  readonly proton: number;
  /** F: price of one e^- per V */
  readonly electron: number;
  /** J/mol */
  readonly water: number;
  readonly electronAtZero: number;
  readonly thermal: number; // RT
  readonly energies: EnergiesAtT;
}

export const snap = (joule: number): number => Math.round(joule * STEPS_PER_JOULE);

/** Prices of H^+, e^- and water at T. The electron is half a hydrogen molecule less a proton at E = 0 (SHE at T).
 *  @param energies  Gibbs energies at T     @returns  the basis     @source  docs/method.md, section 2 */
export function basisAt(energies: EnergiesAtT): Basis {
  const thermal = GAS_CONSTANT * energies.T;
  return {
    T: energies.T,
    proton: snap(thermal * LN10),
    electron: snap(FARADAY),
    water: energies.of("H2O(l)").G,
    electronAtZero: energies.of("H2(g)").G / 2,
    thermal,
    energies,
  };
}

/** Where water is stable against 1 bar of oxygen, and against 1 bar of hydrogen: lines positive inside the band.
 *  @param basis  prices at T     @param overpotential  V, widens the band     @returns  a line on the grid
 *  @source  2 H2O = O2 + 4 H^+ + 4 e^-; 2 H^+ + 2 e^- = H2 */
export function oxygenLine(basis: Basis, overpotential = 0): Line {
  const k = basis.energies.of("O2(g)").G - 2 * basis.water + 4 * basis.electronAtZero;
  return [snap(k) + 4 * snap(FARADAY * overpotential), -4 * basis.proton, -4 * basis.electron];
}

/** See oxygenLine. */
export function hydrogenLine(basis: Basis, overpotential = 0): Line {
  return [2 * snap(FARADAY * overpotential), 2 * basis.proton, 2 * basis.electron];
}

export const asLine = (p: Plane): Line => [p.k, p.x, p.y];
