import { FREE_ACID_BELOW, type FreeAcidCurve } from "../../../shared/activity/freeAcid";

export interface AcidTick {
  gPerL: number;
  pH: number;
}

/** px from one number to the next */
const GAP = 19;

/** Round numbers, the roundest first: 10, 50, 20, 30 ... 15. */
const mantissas = [1, 5, 2, 3, 4, 6, 8, 7, 9, 1.5, 2.5, 3.5, 4.5, 5.5, 6.5, 7.5, 8.5, 9.5];
const decades = [1, 2, 0, -1, -2].map((k) => 10 ** k);

/** Free acids that stand under a pH axis, as round and as many as there is room for; none where pH 1.5 and below is out of sight.
 *  @param curve  of the liquor     @param pH  in sight     @param pxPerPH  of the axis     @returns  by rising pH */
export function acidTicks(curve: FreeAcidCurve, pH: readonly [number, number], pxPerPH: number): AcidTick[] {
  const [lo, hi] = [pH[0], Math.min(pH[1], FREE_ACID_BELOW)];
  const ticks: AcidTick[] = [];
  for (const m of mantissas)
    for (const decade of decades) {
      const gPerL = Number((m * decade).toPrecision(2));
      const at = curve.pHOf(gPerL);
      if (at === null || at < lo || at > hi) continue;
      if (ticks.every((t) => Math.abs(t.pH - at) * pxPerPH >= GAP)) ticks.push({ gPerL, pH: at });
    }
  return ticks.sort((a, b) => a.pH - b.pH);
}
