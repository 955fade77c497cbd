import type { ElectrodeSeries } from "../electrodes/series";
import type { Trial } from "../schemas/trial";
import { measuredPoint } from "./measuredPoint";

const blank = { text: "", unit: "" };

/** Where a trial is to stand: its planned pH, and its planned ORP on the SHE scale by the electrode it was planned against.
 *  @param trial  record     @param electrodes  of `electrodeSeries`
 *  @returns  pH, V vs SHE, C; null where either is not planned or has no place on the scale     @source  measuredPoint.ts */
export function plannedPoint(
  { planned }: Pick<Trial, "planned">,
  electrodes: readonly ElectrodeSeries[],
): { pH: number; Eh: number; temperatureC: number | null } | null {
  const reading = {
    at: blank,
    temperature: planned.temperature,
    pH: { value: planned.pH, temperature: blank, cooledSample: false },
    orp: planned.orp,
    note: "",
  };
  const rest = { ligands: [], doses: [], cementingMetal: null, solids: blank, p80: blank, duration: blank };
  const { point } = measuredPoint({ measured: { readings: [reading], ...rest } }, electrodes);
  return point && { pH: point.pH, Eh: point.Eh, temperatureC: point.temperatureC };
}
