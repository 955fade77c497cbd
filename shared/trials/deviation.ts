/** What a trial was laid out for; null where nothing was planned. */
export interface PlannedPoint {
  readonly pH: number | null;
  /** V vs SHE */
  readonly Eh: number | null;
}

export interface Deviation {
  /** measured less planned; null where nothing was planned */
  readonly pH: number | null;
  /** V */
  readonly Eh: number | null;
  /** the larger of both, in control bands; the potential's own uncertainty is not held against it; null where nothing was planned */
  readonly bands: number | null;
  /** more than one control band away: what a loop that works would have held */
  readonly off: boolean;
}

/** How far a reading is from the set point its trial was laid out for. It says nothing of windows: a trial planned outside one may be
 *  held exactly where it was wanted.
 *  @param point  pH, V vs SHE and its +- V     @param planned  the trial's own     @param band  control bands of the plan
 *  @returns  differences and their size in bands     @source  common practice, no source: off is what the control band does not cover */
export function deviation(
  point: { readonly pH: number; readonly Eh: number; readonly EhUncertainty?: number },
  planned: PlannedPoint,
  band: { readonly pH: number; readonly Eh: number },
): Deviation {
  const pH = planned.pH === null ? null : point.pH - planned.pH;
  const Eh = planned.Eh === null ? null : point.Eh - planned.Eh;
  const counted = [
    pH === null ? [] : [Math.abs(pH) / band.pH],
    Eh === null ? [] : [Math.max(0, Math.abs(Eh) - (point.EhUncertainty ?? 0)) / band.Eh],
  ].flat();
  const bands = counted.length === 0 ? null : Math.max(...counted);
  // Differences of typed decimals: 4.95 - 4.8 is not to count as more than 0.15.
  return { pH, Eh, bands, off: bands !== null && bands > 1 + 1e-9 };
}
