import { over, times, type Interval } from "../../entry/interval";
import { dissolvedRange, type RecordedVessel } from "./liquor";

export interface CurvePoint {
  /** h since the start; null where the sample's time was not written */
  readonly hours: number | null;
  /** % of the metal fed by the measured head */
  readonly extraction: Interval;
}

/** Extraction at every sample, the liquor of the sample itself still in the vessel.
 *  @param vessel  as recorded     @param feed  g of metal     @returns  one point a sample     @source  practice-checks.json, F04 */
export const extractionCurve = (vessel: RecordedVessel, feed: Interval): CurvePoint[] =>
  vessel.taken.map(({ hours, assay }, i) => {
    const before = { ...vessel, taken: vessel.taken.slice(0, i) };
    const volume = before.taken.reduce((left, t) => left - t.volume + t.makeUpVolume, vessel.volume);
    return { hours, extraction: times(over(dissolvedRange(before, volume, assay), feed), 100) };
  });
