import type { ElectrodeSeries } from "../../../../shared/electrodes/series";
import type { TrialReading } from "../../../../shared/schemas/trialRecord";
import { measuredPoint, type MeasuredPoint } from "../../../../shared/trials/measuredPoint";
import { isBlank } from "./trialValues";

export type ReadOrp =
  | { kind: "none" }
  | { kind: "read"; point: MeasuredPoint }
  /** why it has no place on the SHE scale */
  | { kind: "open"; why: string };

/** The ORP of one reading on the SHE scale, whether its pH was read or not. */
export function orpOf(reading: TrialReading, electrodes: readonly ElectrodeSeries[]): ReadOrp {
  if (isBlank(reading.orp.value)) return { kind: "none" };
  // A place on the map needs both; here only the potential is asked, so a missing pH must not stand in its way.
  const pH = isBlank(reading.pH.value) ? { ...reading.pH, value: { text: "7", unit: "pH" } } : reading.pH;
  const { point, missing } = measuredPoint(
    {
      measured: {
        readings: [{ ...reading, pH }],
        ligands: [],
        doses: [],
        cementingMetal: null,
        solids: blank,
        p80: blank,
        duration: blank,
      },
    },
    electrodes,
  );
  return point ? { kind: "read", point } : { kind: "open", why: missing[0]?.why ?? "cannot be read" };
}

const blank = { text: "", unit: "" };
