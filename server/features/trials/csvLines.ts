import type { Entry } from "../../../shared/entry/readEntry";
import type { SolidAssay, SolutionAssay } from "../../../shared/schemas/entry";
import type { Cell } from "../../http/csv";
import { streams, type ExportedTrial, type Stream } from "./csvColumns";

const entry = ({ text, unit }: Entry): Cell[] => [text, text === "" ? null : unit];
const both = (header: string) => [`${header}, as typed`, `${header}, unit`];

const who = ["campaign", "trial", "stage", "feed", "status"];
const whoOf = (trial: ExportedTrial): Cell[] => [
  trial.campaignCode,
  trial.code,
  trial.stage,
  trial.feedName,
  trial.status,
];

export const readingHeader = [
  ...who,
  "reading",
  ...both("time since start"),
  ...both("pulp temperature"),
  "pH, as typed",
  ...both("pH, own temperature"),
  "pH of a cooled sample",
  ...both("ORP"),
  "ORP, reference electrode",
  ...both("ORP, electrode temperature"),
  "note",
];

/** One line a look at the vessel, all as it was typed. */
export const readingLines = (trial: ExportedTrial): Cell[][] =>
  trial.measured.readings.map(({ at, temperature, pH, orp, note }, i) => [
    ...whoOf(trial),
    i + 1,
    ...entry(at),
    ...entry(temperature),
    pH.value.text,
    ...entry(pH.temperature),
    pH.cooledSample,
    ...entry(orp.value),
    orp.electrode,
    ...entry(orp.electrodeTemperature),
    note,
  ]);

export const assayHeader = [
  ...who,
  "stream",
  "sample",
  ...both("time since start"),
  ...both("amount"),
  "analyte",
  ...both("assay"),
  "method",
];

type Assays = readonly (SolutionAssay | SolidAssay)[];

/** One line an assay, of the account's streams and of every sample, all as it was typed. */
export function assayLines(trial: ExportedTrial): Cell[][] {
  const { charge, products } = trial;
  const lines = (stream: string, sample: number | null, at: Entry | null, amount: Entry, assays: Assays) =>
    assays.map(({ analyte, value, method }): Cell[] => {
      const time: Cell[] = at ? entry(at) : [null, null];
      return [...whoOf(trial), stream, sample, ...time, ...entry(amount), analyte, ...entry(value), method];
    });
  const amounts: Record<Stream, Entry> = {
    "starting liquor": charge.liquorVolume,
    "final liquor": products.filtrateVolume,
    wash: products.washVolume,
    "residue or cement": products.residueDryMass,
  };
  const samples = trial.samples.flatMap(
    ({ at, volume, assays, makeUpVolume, makeUpAssays, drySolids, solidsAssays }, i) => [
      ...lines("sample", i + 1, at, volume, assays),
      ...lines("make-up", i + 1, at, makeUpVolume, makeUpAssays),
      ...lines("solids of a sample", i + 1, at, drySolids, solidsAssays),
    ],
  );
  const ofStream = (stream: Stream) => lines(stream, null, null, amounts[stream], streams[stream](trial));
  return [
    ...ofStream("starting liquor"),
    ...samples,
    ...ofStream("final liquor"),
    ...ofStream("wash"),
    ...ofStream("residue or cement"),
  ];
}
