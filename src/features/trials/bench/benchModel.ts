import { fromSHE } from "../../../../shared/electrodes/convert";
import type { ElectrodeSeries } from "../../../../shared/electrodes/series";
import { numberIn } from "../../../../shared/entry/measure";
import { readEntry } from "../../../../shared/entry/readEntry";
import { refusalOf } from "../../../../shared/schemas/entry";
import type { TrialReading } from "../../../../shared/schemas/trialRecord";
import { judge } from "../../../../shared/trials/judge";
import { fixed, signed, withUnit } from "../../../lib/format";
import type { SolvedRevision } from "../../../lib/solvedRevision";
import { deviationWords, plannedOutside, plannedPoint } from "../model/deviationWords";
import { electrodeName } from "../model/electrodes";
import { orpOf } from "../model/orp";
import { placeWords } from "../model/placeWords";
import { isBlank, type TrialValues } from "../model/trialValues";
import type { BenchForm, FilledForm } from "./benchShelf";
import { timeEntry } from "./elapsed";

export type BenchField = "pH" | "pHTemperature" | "orp" | "electrodeTemperature" | "temperature" | "at";

/** The reading that stands in the fields.
 *  @param minutes  since the start, where no time was typed     @param unit  of time, as the record has it so far */
export function readingIn(form: FilledForm, minutes: number | null, unit?: string): TrialReading {
  return {
    at: timeEntry(form.at, minutes, unit),
    temperature: { text: form.temperature, unit: "C" },
    pH: {
      value: { text: form.pH, unit: "pH" },
      temperature: { text: form.cooled ? form.pHTemperature : "", unit: "C" },
      cooledSample: form.cooled,
    },
    orp: {
      value: { text: form.orp, unit: "mV" },
      electrode: form.electrode,
      electrodeTemperature: { text: form.electrodeTemperature, unit: "C" },
    },
    note: "",
  };
}

/** What cannot be kept as it stands, by field; empty when it can. */
export function benchProblems(reading: TrialReading): Partial<Record<BenchField | "electrode" | "none", string>> {
  const { at, temperature, pH, orp } = reading;
  const said = {
    at: refusalOf(at, "time"),
    temperature: refusalOf(temperature, "temperature"),
    pH: refusalOf(pH.value, "pH"),
    pHTemperature: refusalOf(pH.temperature, "temperature"),
    orp: refusalOf(orp.value, "potential"),
    electrodeTemperature: refusalOf(orp.electrodeTemperature, "temperature"),
    electrode:
      orp.electrode === null && !isBlank(orp.value) ? "Name the electrode: an ORP without it says nothing" : null,
    none: [temperature, pH.value, orp.value].every(isBlank) ? "Nothing is typed yet" : null,
  };
  return Object.fromEntries(Object.entries(said).filter(([, why]) => why !== null));
}

/** The last reading that has a value of this kind. */
export const lastWith = (
  readings: readonly TrialReading[],
  has: (r: TrialReading) => boolean,
): TrialReading | undefined => readings.findLast(has);

/** What a reading that has a place says of itself: held where it was laid out or not, and inside or outside of the window. */
export function placeSaid(
  reading: TrialReading,
  { planned }: Pick<TrialValues, "planned">,
  electrodes: readonly ElectrodeSeries[],
  solved: SolvedRevision | undefined,
): { held: Said | null; place: Said; inside: boolean; laidOutside: boolean } | null {
  const orp = orpOf(reading, electrodes);
  if (orp.kind !== "read" || isBlank(reading.pH.value) || !solved?.solution) return null;
  const wanted = plannedPoint(planned, electrodes);
  const judgement = judge(orp.point, solved.solution, solved.inputs.controlBand);
  const laidOutside = plannedOutside(wanted, orp.point, solved);
  return {
    held: deviationWords(orp.point, wanted, solved.inputs.controlBand),
    place: placeWords(judgement, solved.inputs, laidOutside),
    inside: judgement.verdict !== "outside",
    laidOutside,
  };
}

export interface Said {
  text: string;
  tone: "good" | "bad" | "quiet";
}

/** What is off at once: far from what was planned, or a jump from the reading before. */
export function temperatureSaid(form: BenchForm, trial: TrialValues): Said | null {
  const value = numberIn({ text: form.temperature, unit: "C" }, "temperature");
  const planned = numberIn(trial.planned.temperature, "temperature");
  if (value === null)
    return planned === null ? null : { text: `planned ${withUnit(fixed(planned, 0), "°C")}`, tone: "quiet" };
  if (planned === null) return null;
  const off = value - planned;
  if (Math.abs(off) <= 2) return { text: `as planned, ${withUnit(fixed(planned, 0), "°C")}`, tone: "good" };
  const far = Math.abs(off) > 5;
  return {
    text: `${withUnit(signed(off, 1), "K")} from the plan${far ? ": over 5 K the trial is counted apart" : ""}`,
    tone: far ? "bad" : "quiet",
  };
}

/** "15 mV higher than the last reading", once both are on one scale. */
export function stepFromLast(
  now: TrialReading,
  readings: readonly TrialReading[],
  electrodes: readonly ElectrodeSeries[],
): string | null {
  const last = lastWith(readings, (r) => !isBlank(r.orp.value));
  const [a, b] = [orpOf(now, electrodes), last && orpOf(last, electrodes)];
  if (a.kind !== "read" || b?.kind !== "read") return null;
  const mV = Math.round((a.point.Eh - b.point.Eh) * 1000);
  return mV === 0 ? "as the last reading" : `${Math.abs(mV)} mV ${mV > 0 ? "higher" : "lower"} than the last reading`;
}

export function pHSaid(form: BenchForm, readings: readonly TrialReading[]): Said | null {
  const value = numberIn({ text: form.pH, unit: "pH" }, "pH");
  const last = lastWith(readings, (r) => !isBlank(r.pH.value));
  const before = last && numberIn(last.pH.value, "pH");
  if (value === null || before === null || before === undefined) return null;
  const step = value - before;
  if (Math.abs(step) < 0.005) return { text: "as the last reading", tone: "quiet" };
  return { text: `${signed(step, 2)} from the last reading`, tone: Math.abs(step) >= 1 ? "bad" : "quiet" };
}

/** What the planned potential would read on the electrode in hand: "373 mV on Ag/AgCl 3 M". */
export function plannedOnElectrode(
  trial: TrialValues,
  electrodes: readonly ElectrodeSeries[],
  electrode: string | null,
  electrodeC: number,
): string | null {
  const { Eh } = plannedPoint(trial.planned, electrodes);
  if (Eh === null) return null;
  const series = electrodes.find(({ id }) => id === electrode);
  if (!series) return `${withUnit(fixed(Eh * 1000, 0), "mV")} vs SHE`;
  const read = fromSHE(Eh, series, electrodeC);
  return read.ok ? `${withUnit(fixed(read.value * 1000, 0), "mV")} on ${electrodeName(electrodes, electrode)}` : null;
}

/** One key of the keypad on a text: digits and one sign, one point. */
export function typed(text: string, key: string): string {
  if (key === "delete") return text.slice(0, -1);
  if (key === "-") return text.startsWith("-") ? text.slice(1) : `-${text}`;
  if (key === ".") return /[.,]/.test(text) ? text : `${text === "" || text === "-" ? `${text}0` : text}.`;
  return text.length >= 12 ? text : text + key;
}

export const hasText = (text: string): boolean => readEntry(text).kind !== "blank";
