import { toSHE, referencePotential } from "../electrodes/convert";
import type { ElectrodeSeries } from "../electrodes/series";
import { numberIn } from "../entry/measure";
import { readEntry } from "../entry/readEntry";
import type { MissingInput } from "../metallurgy/account/ledger";
import { say } from "../metallurgy/account/words";
import type { Trial } from "../schemas/trial";
import type { TrialReading } from "../schemas/trialRecord";

/** Above this the potential of a common reference electrode is carried on beyond its tables: common practice, no source. */
const HOT = 40; // C
const HOT_ERROR = 0.01; // V

export type PointMark =
  | "COOLED_SAMPLE" // pH of a sample that had cooled, plotted at its own temperature, never corrected
  | "HOT_REFERENCE" // +-10 mV
  | "REFERENCE_BORROWED" // one-temperature table, moved like the standard electrode
  | "REFERENCE_EXTRAPOLATED"
  | "REFERENCE_AT_PULP"; // its own temperature was not written, the pulp's stands in

/** Where a trial stands on the map. */
export interface MeasuredPoint {
  readonly pH: number;
  /** V vs SHE */
  readonly Eh: number;
  /** +- V that the reference electrode adds; 0 where its table covers the temperature, at or below 40 C */
  readonly EhUncertainty: number;
  /** of the pulp, C */
  readonly temperatureC: number | null;
  /** the pH's own, C */
  readonly pHTemperatureC: number | null;
  readonly cooledSample: boolean;
  /** electrode series, or SHE */
  readonly electrode: string;
  /** "450 mV + 207 mV (Ag/AgCl, 3 mol/L KCl at 25 C) = 657 mV vs SHE" */
  readonly conversion: string;
  /** h since the start, of the reading that stands for the trial: the last with both pH and ORP */
  readonly hours: number | null;
  /** over all readings with both */
  readonly range: { readonly pH: readonly [number, number]; readonly Eh: readonly [number, number] };
  readonly readings: number;
  readonly marks: readonly { readonly mark: PointMark; readonly text: string }[];
}

interface Placed {
  readonly point: Omit<MeasuredPoint, "range" | "readings">;
}

const C = (t: number) => `${say(t)} °C`;
/** To a tenth: no electrode is known better. */
const mV = (volts: number) => `${say(Math.round(volts * 10_000) / 10)} mV`;

function eh(
  reading: TrialReading,
  path: string,
  electrodes: readonly ElectrodeSeries[],
): Pick<MeasuredPoint, "Eh" | "EhUncertainty" | "conversion" | "marks" | "electrode"> | MissingInput {
  const { orp } = reading;
  const E = numberIn(orp.value, "potential")!;
  const label = "ORP";
  if (orp.electrode === null) return { path: `${path}.orp.electrode`, label, why: "no reference electrode is named" };
  const pulp = numberIn(reading.temperature, "temperature");
  const own = numberIn(orp.electrodeTemperature, "temperature");
  const shown = `${say(E * 1000)} mV`;
  if (orp.electrode === "SHE")
    return { Eh: E, EhUncertainty: 0, electrode: "SHE", conversion: `${shown} vs SHE as read`, marks: [] };
  const series = electrodes.find((s) => s.id === orp.electrode);
  if (!series) return { path: `${path}.orp.electrode`, label, why: `no electrode ${orp.electrode} in the tables` };
  const at = own ?? pulp;
  if (at === null)
    return {
      path: `${path}.orp.electrodeTemperature`,
      label,
      why: "neither the electrode's temperature nor the pulp's is written",
    };
  const reference = referencePotential(series, at);
  const converted = toSHE(E, series, at);
  if (!reference.ok || !converted.ok)
    return { path: `${path}.orp.electrodeTemperature`, label, why: reference.ok ? "" : reference.error.message };
  const { basis, uncertainty, E: offset } = reference.value;
  const hot = at > HOT;
  const marks: MeasuredPoint["marks"] = [
    ...(hot ? [{ mark: "HOT_REFERENCE" as const, text: `reference at ${C(at)}, above ${HOT} °C: ±10 mV` }] : []),
    ...(basis === "borrowed"
      ? [
          {
            mark: "REFERENCE_BORROWED" as const,
            text: `${series.label} is tabled at one temperature: moved like the standard Ag/AgCl electrode`,
          },
        ]
      : []),
    ...(basis === "extrapolated"
      ? [{ mark: "REFERENCE_EXTRAPOLATED" as const, text: `${series.label} carried on beyond its table` }]
      : []),
    ...(own === null ? [{ mark: "REFERENCE_AT_PULP" as const, text: `electrode taken at the pulp's ${C(at)}` }] : []),
  ];
  return {
    Eh: converted.value,
    EhUncertainty: Math.max(uncertainty, hot ? HOT_ERROR : 0),
    electrode: series.id,
    conversion: `${shown} ${offset < 0 ? "\u2212" : "+"} ${mV(Math.abs(offset))} (${series.label} at ${C(at)}) = ${mV(converted.value)} vs SHE`,
    marks,
  };
}

function placed(reading: TrialReading, path: string, electrodes: readonly ElectrodeSeries[]): Placed | MissingInput {
  const found = eh(reading, path, electrodes);
  if ("why" in found) return found;
  const { pH } = reading;
  const own = numberIn(pH.temperature, "temperature");
  const temperatureC = numberIn(reading.temperature, "temperature");
  const cooled = pH.cooledSample
    ? [
        {
          mark: "COOLED_SAMPLE" as const,
          text: `pH of a cooled sample${own === null ? "" : `, read at ${C(own)}`}: not corrected to the pulp`,
        },
      ]
    : [];
  return {
    point: {
      ...found,
      pH: numberIn(pH.value, "pH")!,
      temperatureC,
      pHTemperatureC: own ?? (pH.cooledSample ? null : temperatureC),
      cooledSample: pH.cooledSample,
      hours: numberIn(reading.at, "time"),
      marks: [...cooled, ...found.marks],
    },
  };
}

const hasBoth = ({ pH, orp }: TrialReading): boolean =>
  readEntry(pH.value.text).kind === "value" && readEntry(orp.value.text).kind === "value";

/** The pH and the potential a trial was held at: the last reading that has both, its ORP on the SHE scale by the electrode and its
 *  temperature, its pH as read; with the spread over all such readings.
 *  @param trial  record     @param electrodes  of `electrodeSeries`     @returns  the point, or null with what is missing
 *  @source  shared/electrodes; +-10 mV above 40 C is common practice, no source */
export function measuredPoint(
  trial: Pick<Trial, "measured">,
  electrodes: readonly ElectrodeSeries[],
): { readonly point: MeasuredPoint | null; readonly missing: readonly MissingInput[] } {
  const readings = trial.measured.readings.map((r, i) => ({ r, i })).filter(({ r }) => hasBoth(r));
  if (readings.length === 0)
    return { point: null, missing: [{ path: "measured.readings", label: "pH and ORP", why: "no reading has both" }] };
  const all = readings.map(({ r, i }) => placed(r, `measured.readings.${i}`, electrodes));
  const points = all.flatMap((p) => ("point" in p ? [p.point] : []));
  const missing = all.flatMap((p) => ("point" in p ? [] : [p]));
  if (points.every(({ hours }) => hours !== null)) points.sort((a, b) => a.hours! - b.hours!);
  const last = points.at(-1);
  if (last === undefined) return { point: null, missing };
  const over = (of: (p: Placed["point"]) => number): readonly [number, number] => [
    Math.min(...points.map(of)),
    Math.max(...points.map(of)),
  ];
  return {
    point: { ...last, range: { pH: over((p) => p.pH), Eh: over((p) => p.Eh) }, readings: points.length },
    missing,
  };
}

/** Temperature of the pulp by the last reading that has one, whether it has pH and ORP or not.
 *  @param trial  record     @returns  C; null where none is written */
export function lastTemperature({ measured }: Pick<Trial, "measured">): number | null {
  const known = measured.readings.flatMap((r) => {
    const t = numberIn(r.temperature, "temperature");
    return t === null ? [] : [{ t, hours: numberIn(r.at, "time") }];
  });
  if (known.every(({ hours }) => hours !== null)) known.sort((a, b) => a.hours! - b.hours!);
  return known.at(-1)?.t ?? null;
}
