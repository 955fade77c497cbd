import { FARADAY, GAS_CONSTANT, LN10 } from "../constants";
import { fail, ok, type Outcome } from "../outcome";
import type { Kelvin } from "../units";
import type { ElectrodePoint, ElectrodeSeries } from "./series";

/** What an electrode stands at, and how far that is to be trusted. */
export interface ReferencePotential {
  /** V versus SHE */
  readonly E: number;
  /** how it came about: read between two rows, borrowed from the standard Ag/AgCl electrode, or carried on beyond the rows */
  readonly basis: "table" | "borrowed" | "extrapolated";
  /** V; what the basis adds to the error of the electrode itself, 0 inside its table */
  readonly uncertainty: number;
}

/** Slope of the Nernst equation per decade.
 *  @param T  K     @returns  V; times (H^+ / e^-) it is the fall of a boundary per pH     @source  ln(10) R T / F, CODATA 2018
 *  @example nernstSlope(kelvin(25)) // => 0.059159
 *  @example nernstSlope(kelvin(100)) // => 0.074041 */
export const nernstSlope = (T: Kelvin): number => (LN10 * GAS_CONSTANT * T) / FARADAY;

/** Near enough to the one temperature of a table. */
const sameTemperature = 0.5; // K
const supported = { lo: 0, hi: 100 }; // C

/** Straight lines between the points, the end pieces carried on. */
function between(points: readonly ElectrodePoint[], tC: number): number {
  let k = 0;
  while (k < points.length - 2 && tC > (points[k + 1]?.tC ?? Infinity)) k += 1;
  const [p, q] = [points[k], points[k + 1]];
  if (p === undefined) return Number.NaN;
  return q === undefined ? p.mV : p.mV + ((q.mV - p.mV) * (tC - p.tC)) / (q.tC - p.tC);
}

/** Potential of a reference electrode (or check solution) at its own temperature. Inside its table straight lines join the rows; beyond it
 *  the last piece goes on, and 5 mV of uncertainty are stated up to 20 K beyond, 10 mV further. A table of one temperature moves like the
 *  standard Ag/AgCl electrode where its note says so (5 mV stated), else it holds at that temperature only.
 *  @param series  of `electrodeSeries`     @param tC  C, 0 to 100: of the electrode, not of the liquor
 *  @returns  V versus SHE; OUT_OF_RANGE with bound and value outside 0 to 100 C, or away from the one temperature of a table
 *  @source  shared/data/electrodes.csv; extrapolation with a stated error is common practice, no source */
export function referencePotential(series: ElectrodeSeries, tC: number): Outcome<ReferencePotential> {
  const { points, changesLike, label } = series;
  if (!(tC >= supported.lo && tC <= supported.hi))
    return fail("OUT_OF_RANGE", "temperatureC", `electrode at ${tC} C: from ${supported.lo} to ${supported.hi} C`);
  const [first] = points;
  const last = points.at(-1);
  if (first === undefined || last === undefined)
    return fail("BAD_DATA", series.id, `${label} has no potential in the tables`);
  if (points.length === 1 && Math.abs(tC - first.tC) > sameTemperature) {
    if (changesLike === null || changesLike.length === 0)
      return fail("OUT_OF_RANGE", "temperatureC", `${label} at ${tC} C: its potential is known at ${first.tC} C only`);
    const mV = first.mV + between(changesLike, tC) - between(changesLike, first.tC);
    return ok({ E: mV / 1000, basis: "borrowed", uncertainty: 0.005 });
  }
  const beyond = points.length === 1 ? 0 : Math.max(first.tC - tC, tC - last.tC, 0);
  const E = between(points, tC) / 1000;
  if (beyond === 0) return ok({ E, basis: "table", uncertainty: 0 });
  return ok({ E, basis: "extrapolated", uncertainty: beyond <= 20 ? 0.005 : 0.01 });
}

const shifted = (E: number, series: ElectrodeSeries, tC: number, sign: 1 | -1): Outcome<number> => {
  const reference = referencePotential(series, tC);
  return reference.ok ? ok(E + sign * reference.value.E) : reference;
};

/** A reading on the SHE scale: Eh = reading + E_ref(T_ref).
 *  @param reading  V versus the electrode     @param series  the electrode     @param tC  C, its temperature
 *  @returns  V versus SHE; failures as of `referencePotential`     @source  definition of the scale
 *  @example valueOf(toSHE(0.45, electrodeSeries(chemistry().tables).find((s) => s.id === "AGCL-3M"), 25)) // => 0.657 */
export const toSHE = (reading: number, series: ElectrodeSeries, tC: number): Outcome<number> =>
  shifted(reading, series, tC, 1);

/** What the electrode reads: E - E_ref(T_ref).
 *  @param E  V versus SHE     @param series  the electrode     @param tC  C, its temperature
 *  @returns  V versus the electrode; failures as of `referencePotential`     @source  definition of the scale
 *  @example valueOf(fromSHE(0.624, electrodeSeries(chemistry().tables).find((s) => s.id === "SCE"), 25)) // => 0.383 */
export const fromSHE = (E: number, series: ElectrodeSeries, tC: number): Outcome<number> => shifted(E, series, tC, -1);
