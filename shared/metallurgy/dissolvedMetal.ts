/** Liquor taken out of the vessel and what was put back for it. */
export interface Withdrawal {
  /** L */
  readonly volume: number;
  /** g/L of the liquor taken */
  readonly assay: number;
  /** L put back, 0 for none */
  readonly makeUpVolume: number;
  /** g/L of what was put back */
  readonly makeUpAssay: number;
}

/** A vessel from its start to the liquor that is judged. */
export interface Vessel {
  /** L at the start */
  readonly volume: number;
  /** g/L the lixiviant brought along */
  readonly assay: number;
  readonly withdrawals: readonly Withdrawal[];
}

/** Liquor left in the vessel after the withdrawals, evaporation not counted.
 *  @param vessel  volumes in L     @returns  L     @source  volumes added up
 *  @example volumeLeft({ volume: 0.8, assay: 0, withdrawals: [{ volume: 0.04, assay: 1, makeUpVolume: 0, makeUpAssay: 0 }] }) // => 0.76 */
export const volumeLeft = ({ volume, withdrawals }: Vessel): number =>
  withdrawals.reduce((left, w) => left - w.volume + w.makeUpVolume, volume);

/** Metal the withdrawn samples carried, less what their make-up brought in.
 *  @param withdrawals  L and g/L     @returns  g     @source  volumes times assays */
export const withdrawnMetal = (withdrawals: readonly Withdrawal[]): number =>
  withdrawals.reduce((sum, w) => sum + w.volume * w.assay - w.makeUpVolume * w.makeUpAssay, 0);

/** Metal that went into solution: M = V_n c_n + sum(v_i c_i) - V_0 c_0 - sum(u_i c_m), over the samples taken before the
 *  liquor that is judged. With equal make-up V_n = V_0; without, V_n = V_0 - sum v_i. Negative where metal left the solution.
 *  @param vessel  start and withdrawals     @param finalVolume  L in the vessel at the end     @param finalAssay  g/L
 *  @returns  g; rises with every assay of the vessel, falls with those of the lixiviant and the make-up
 *  @source  mass balance over the vessel (practice-checks.json, F01 to F03)
 *  @example dissolvedMetal({ volume: 0.8, assay: 0, withdrawals: [] }, 0.8, 3.95) // => 3.16 */
export const dissolvedMetal = (vessel: Vessel, finalVolume: number, finalAssay: number): number =>
  finalVolume * finalAssay + withdrawnMetal(vessel.withdrawals) - vessel.volume * vessel.assay;

/** Metal dissolved up to each sample, the liquor of the sample itself still in the vessel.
 *  @param vessel  start and withdrawals in the order they were taken     @returns  g at each withdrawal
 *  @source  the same balance, stopped at each sample */
export const dissolvedAtEachSample = ({ volume, assay, withdrawals }: Vessel): number[] =>
  withdrawals.map((w, i) => {
    const before: Vessel = { volume, assay, withdrawals: withdrawals.slice(0, i) };
    return dissolvedMetal(before, volumeLeft(before), w.assay);
  });

/** Metal in solution from what was filtered off: M = V_f c_f + V_w c_w + samples - V_0 c_0.
 *  @param vessel  start and withdrawals     @param filtrate, wash  L and g/L     @returns  g
 *  @source  mass balance (practice-checks.json, F07); differs from `dissolvedMetal` by hold-up and volume error
 *  @example dissolvedInFiltrate({ volume: 0, assay: 0, withdrawals: [] }, [0.712, 3.95], [0.6, 0.558]) // => 3.1472 */
export const dissolvedInFiltrate = (
  vessel: Vessel,
  filtrate: readonly [volume: number, assay: number],
  wash: readonly [volume: number, assay: number],
): number => dissolvedMetal(vessel, filtrate[0], filtrate[1]) + wash[0] * wash[1];
