import type { CementationRun } from "./cementationBench";
import type { LeachRun } from "./leachBench";
import type { ores } from "./feeds";
import type { Random } from "./random";

/** What a trial is called by, beside what was done in it. */
export interface LaidOut {
  readonly feed: string;
  readonly stage: string;
  /** date the trial began */
  readonly day: string;
  /** number of the trial it repeats */
  readonly repeats?: number;
  readonly note?: string;
}
interface Numbered {
  readonly laid: LaidOut;
  readonly campaign: string;
  readonly n: number;
}
export type LeachDesign = Numbered &
  Omit<LeachRun, "ore" | "electrode" | "hand"> & { readonly ore: keyof typeof ores; readonly electrode: string };
export type CementationDesign = Numbered & Omit<CementationRun, "electrode" | "hand">;

const day = (first: string, n: number): string =>
  new Date(Date.parse(first) + n * 86_400_000).toISOString().slice(0, 10);

/** pH, Eh (V vs SHE), hours, and what is out of the ordinary */
type Line = readonly [
  pH: number,
  Eh: number,
  hours: number,
  more?: Partial<Omit<LeachRun, "electrode">> & { repeats?: number; note?: string; T?: number; electrode?: string },
];

const neutral: readonly Line[] = [
  [4.8, 0.68, 2, { note: "base case" }],
  [3.2, 0.66, 2],
  [3.5, 0.67, 2],
  [3.8, 0.68, 2],
  [4.1, 0.7, 2],
  [4.4, 0.69, 2],
  [5.1, 0.67, 2],
  [5.4, 0.66, 2],
  [5.7, 0.64, 2],
  [4.8, 0.68, 2, { repeats: 1 }],
  [6.0, 0.62, 2],
  [6.3, 0.61, 2],
  [4.8, 0.36, 2, { note: "no oxidant" }],
  [5.2, 0.34, 2, { note: "no oxidant" }],
  [4.5, 0.5, 2, { note: "air only" }],
  [4.8, 0.8, 2, { note: "MnO2 in excess" }],
  [4.8, 0.68, 0.5],
  [5.2, 0.66, 0.25, { note: "stopped early: stirrer failed" }],
  [4.8, 0.68, 4, { hotElectrode: true }],
  [5.0, 0.67, 2, { T: 68, hotElectrode: true, note: "bath ran hot" }],
  [4.6, 0.69, 2, { cooledSample: true }],
  [4.8, 0.68, 2, { repeats: 1, electrode: "AGCL-3.5M", note: "other probe" }],
];

const october: readonly Line[] = [
  [4.8, 0.68, 2, { note: "base case of NL-1" }],
  [4.2, 0.69, 2],
  [4.5, 0.68, 2],
  [5.1, 0.66, 2],
  [5.4, 0.65, 2],
  [5.8, 0.63, 2],
  [4.8, 0.68, 1],
  [4.8, 0.68, 4],
  [4.8, 0.68, 2, { repeats: 1 }],
  [5.0, 0.42, 2, { note: "air only" }],
  [4.8, 0.68, 2, { dryMass: 60, brought: 2, plannedTenor: 90, note: "thin pulp by mistake" }],
  [4.8, 0.68, 2, { repeats: 1 }],
];

const weakAcid: readonly Line[] = [
  [1.4, 0.66, 3],
  [1.8, 0.66, 3],
  [2.2, 0.66, 3],
  [2.6, 0.67, 3],
  [3.0, 0.67, 3],
  [3.4, 0.68, 3],
  [2.2, 0.66, 1],
  [2.2, 0.66, 6, { hotElectrode: true }],
];

const oxide: readonly Line[] = [
  [1.8, 0.64, 24, { note: "base case" }],
  [1.0, 0.66, 24],
  [1.3, 0.65, 24],
  [1.5, 0.65, 24],
  [2.1, 0.63, 24],
  [2.4, 0.62, 24],
  [2.8, 0.6, 24],
  [3.2, 0.58, 24],
  [3.6, 0.56, 24],
  [4.0, 0.54, 24],
  [4.4, 0.52, 24],
  [4.9, 0.5, 24],
  [1.8, 0.64, 24, { repeats: 1 }],
  [1.8, 0.64, 4],
  [1.8, 0.64, 8],
  [1.8, 0.64, 48],
  [1.3, 0.65, 2, { note: "taken off for the power cut" }],
  [2.4, 0.62, 48],
  [1.8, 0.64, 24, { repeats: 1, electrode: "AGCL-sat" }],
  [2.1, 0.63, 24, { electrode: "AGCL-sat", note: "ORP logged on the wrong range" }],
  [1.5, 0.65, 24, { note: "volume not weighed back" }],
  [1.8, 0.64, 36],
];

const calcineBench = {
  dryMass: 170,
  volume: 2,
  brought: 40,
  sulfate: 1.6,
  hotElectrode: false,
  cooledSample: false,
  moisture: 0,
};
const bottleRoll = {
  dryMass: 500,
  volume: 1,
  brought: 0,
  sulfate: 0.15,
  hotElectrode: false,
  cooledSample: false,
  moisture: 0.038,
};

function laidOut(
  campaign: string,
  from: number,
  first: string,
  feed: string,
  stage: string,
  ore: LeachDesign["ore"],
  T: number,
  bench: typeof calcineBench,
  lines: readonly Line[],
): LeachDesign[] {
  return lines.map(([pH, Eh, hours, more = {}], i) => {
    const { repeats, note, T: own, electrode = "AGCL-3M", ...run } = more;
    const n = from + i;
    return {
      campaign,
      n,
      laid: {
        feed,
        stage,
        day: day(first, i),
        ...(repeats === undefined ? {} : { repeats }),
        ...(note === undefined ? {} : { note }),
      },
      ...bench,
      ...run,
      ore,
      electrode,
      planned: { temperatureC: own ?? T, pH, Eh },
      hours,
      sampled: [0.125, 0.25, 0.5, 0.75].map((share) => share * hours),
    };
  });
}

/** The leaches of the demo in the order they were run. */
export const leachTrials = (): LeachDesign[] => [
  ...laidOut("NL-1", 1, "2026-09-22", "demo-feed-calcine-3", "NL", "calcine3", 60, calcineBench, neutral),
  ...laidOut("NL-2", 1, "2026-10-19", "demo-feed-calcine-4", "NL", "calcine4", 60, calcineBench, october),
  ...laidOut(
    "NL-2",
    october.length + 1,
    "2026-11-02",
    "demo-feed-calcine-4",
    "WA",
    "calcine4",
    60,
    calcineBench,
    weakAcid,
  ),
  ...laidOut("OX-1", 1, "2026-09-28", "demo-feed-heap-4", "OX", "heap4", 25, bottleRoll, oxide),
];

/** Stage, pH, dust g/L, minutes */
const dust: readonly (readonly [stage: "CU" | "CD", pH: number, dust: number, minutes: number, note?: string])[] = [
  ["CU", 4.5, 0.6, 20],
  ["CU", 4.5, 0.8, 20],
  ["CU", 4.5, 1.0, 10],
  ["CU", 4.5, 1.0, 20],
  ["CU", 4.5, 1.2, 20],
  ["CU", 3.6, 1.0, 20],
  ["CU", 5.1, 1.0, 20],
  ["CD", 4.5, 1.2, 30],
  ["CD", 4.5, 1.6, 30],
  ["CD", 4.5, 2.0, 30, "base case"],
  ["CD", 4.5, 2.5, 30],
  ["CD", 4.5, 3.2, 30],
  ["CD", 4.5, 4.0, 30],
  ["CD", 4.5, 2.0, 10],
  ["CD", 4.5, 2.0, 20],
  ["CD", 4.5, 2.0, 45],
  ["CD", 4.5, 2.0, 75, "left over lunch"],
  ["CD", 3.6, 2.0, 30],
  ["CD", 3.2, 2.0, 60, "gas seen"],
  ["CD", 5.1, 2.5, 30],
  ["CD", 4.5, 2.0, 30],
  ["CD", 4.5, 2.5, 45],
];

/** The zinc-dust trials: liquor drawn fresh each day, so its tenors drift. */
export const cementationTrials = (random: Random): CementationDesign[] =>
  dust.map(([stage, pH, zinc, minutes, note], i) => ({
    campaign: "ZD-1",
    n: i + 1,
    laid: { feed: "demo-feed-overflow", stage, day: day("2026-10-05", i), ...(note === undefined ? {} : { note }) },
    planned: { temperatureC: 55, pH, dust: zinc, minutes },
    start: {
      Cu: random.scattered(0.45, 0.04),
      Cd: random.scattered(0.38, 0.04),
      Co: random.scattered(0.018, 0.06),
      Ni: random.scattered(0.012, 0.06),
    },
    zinc: random.scattered(140, 0.01),
    volume: 1,
    active: 0.96,
    target: stage === "CU" ? "Cu" : "Cd",
  }));
