import { trialUpdate, type TrialCreate, type TrialRow } from "../../../../shared/schemas/trial";
import type { Dose, Sample, TrialReading } from "../../../../shared/schemas/trialRecord";
import { readEntry, type Entry } from "../../../../shared/entry/readEntry";
import type { Problem } from "../../../lib/recordDraft";

/** What is written of a trial; the campaign it belongs to stays. */
export type TrialValues = Omit<TrialCreate, "campaignId">;

export const trialValues = (row: TrialRow): TrialValues => {
  const { feedId, code, kind, stage, status, statusReason, operator, startedAt, endedAt, replicateOf } = row;
  const { planned, measured, charge, samples, products, notes } = row;
  return { feedId, code, kind, stage, status, statusReason, operator, startedAt, endedAt, replicateOf, planned, measured, charge, samples, products, notes }; // prettier-ignore
};

export const isBlank = ({ text }: Entry): boolean => readEntry(text).kind === "blank";
const empty = (unit: string): Entry => ({ text: "", unit });

/** Why the changed parts cannot be saved; the same check that the server makes. */
export function trialProblems(changed: Partial<TrialValues>): Problem[] {
  const parsed = trialUpdate.safeParse(changed);
  if (parsed.success) return [];
  return parsed.error.issues.map(({ path, message }) => ({ path: path.join("."), message: inWords(path, message) }));
}

function inWords(path: readonly PropertyKey[], message: string): string {
  if (path.at(-1) === "code") return "the trial needs a code of 1 to 24 characters";
  if (path.at(-1) === "analyte") return path.length > 3 ? message : "what was assayed is missing";
  if (path.at(-1) === "reagent") return "the reagent is missing";
  return message;
}

/** The reading after these: the electrode goes on, since a probe stays in the vessel; nothing that was read does. */
export function nextReading(readings: readonly TrialReading[]): TrialReading {
  const last = readings.at(-1);
  return {
    at: empty(last?.at.unit ?? "h"),
    temperature: empty("C"),
    pH: { value: empty("pH"), temperature: empty("C"), cooledSample: false },
    orp: {
      value: empty(last?.orp.value.unit ?? "mV"),
      electrode: last?.orp.electrode ?? null,
      electrodeTemperature: last?.orp.electrodeTemperature ?? empty("C"),
    },
    note: "",
  };
}

export function nextSample(samples: readonly Sample[]): Sample {
  const last = samples.at(-1);
  return {
    at: empty(last?.at.unit ?? "h"),
    volume: empty(last?.volume.unit ?? "mL"),
    assays: [],
    makeUpVolume: empty(last?.makeUpVolume.unit ?? "mL"),
    makeUpAssays: [],
    drySolids: empty("g"),
    solidsAssays: [],
  };
}

export function nextDose(doses: readonly Dose[]): Dose {
  const last = doses.at(-1);
  return {
    role: last?.role ?? "acid",
    reagent: last?.reagent ?? "",
    amount: empty(last?.amount.unit ?? "g"),
    strength: last?.strength ?? empty("% w/w"),
    density: last?.density ?? empty("kg/L"),
    at: empty(last?.at.unit ?? "h"),
    reason: "",
  };
}
