import { exactly, spanOf, type Interval } from "../../entry/interval";
import { numberIn, type MeasureContext } from "../../entry/measure";
import { readEntry, type Entry } from "../../entry/readEntry";
import type { SolutionAssay } from "../../schemas/entry";
import type { Trial } from "../../schemas/trial";
import { dissolvedInFiltrate, dissolvedMetal, volumeLeft, type Vessel } from "../dissolvedMetal";
import { molarMass, type MolarMasses } from "../molarMass";
import type { Ledger } from "./ledger";

/** A vessel as recorded: volumes are numbers, assays may be intervals. */
export interface RecordedVessel {
  /** L at the start, water of the solids counted in */
  readonly volume: number;
  /** L of liquor charged, which carries the starting assay */
  readonly liquor: number;
  /** g/L in the liquor charged */
  readonly start: Interval;
  /** in the order they were taken, where every time is written; else as listed */
  readonly taken: readonly {
    /** since the start; null where not written */
    readonly hours: number | null;
    readonly volume: number;
    readonly makeUpVolume: number;
    readonly assay: Interval;
    readonly makeUp: Interval;
  }[];
}

const listed = (assays: readonly SolutionAssay[], analyte: string): Entry | undefined =>
  assays.find((a) => a.analyte === analyte)?.value;

const massOrNull = (formula: string, masses: MolarMasses): number | null => {
  const mass = molarMass(formula, masses);
  return mass.ok ? mass.value : null;
};

/** Density and molar mass that ppm and mol/L of a trial's liquors go by. */
export function liquorContext(
  trial: { charge: Pick<Trial["charge"], "liquorDensity">; products: Pick<Trial["products"], "liquorDensity"> },
  analyte: string,
  masses: MolarMasses,
  when: "start" | "end",
): MeasureContext {
  const [first, second] =
    when === "start"
      ? [trial.charge.liquorDensity, trial.products.liquorDensity]
      : [trial.products.liquorDensity, trial.charge.liquorDensity];
  return { molarMass: massOrNull(analyte, masses), density: numberIn(first, "density") ?? numberIn(second, "density") };
}

/** What the liquor brought along. Not listed at all it is taken as absent and said so, as in fresh acid; a blank is missing. */
function startingAssay(
  trial: Trial,
  analyte: string,
  masses: MolarMasses,
  ledger: Ledger,
  needed: boolean,
): Interval | null {
  const [path, label] = [`charge.liquorAssays.${analyte}`, `starting liquor, ${analyte}`];
  const entry = listed(trial.charge.liquorAssays, analyte);
  if (entry === undefined && !needed) return exactly(ledger.assume(path, label, 0, "g/L", "not listed, taken as none"));
  return ledger.take(path, label, entry, "solutionAssay", liquorContext(trial, analyte, masses, "start"));
}

/** The vessel of one analyte, sample by sample.
 *  @param trial  record     @param analyte  metal or reagent     @param water  g that came with the solids     @param masses  g/mol
 *  @param ledger  notes     @param startNeeded  the starting assay cannot be assumed absent (cementation)
 *  @returns  null while something is missing */
export function recordedVessel(
  trial: Trial,
  analyte: string,
  water: number,
  masses: MolarMasses,
  ledger: Ledger,
  startNeeded = false,
): RecordedVessel | null {
  const liquor = ledger.takeNumber(
    "charge.liquorVolume",
    "volume of the starting liquor",
    trial.charge.liquorVolume,
    "volume",
  );
  const start = startingAssay(trial, analyte, masses, ledger, startNeeded);
  const context = liquorContext(trial, analyte, masses, "end");
  const taken = trial.samples.map((s, i) => {
    const [path, label] = [`samples.${i}`, `sample ${i + 1}`];
    const volume = ledger.takeNumber(`${path}.volume`, `${label}, volume`, s.volume, "volume");
    const assay = ledger.take(
      `${path}.assays.${analyte}`,
      `${label}, ${analyte}`,
      listed(s.assays, analyte),
      "solutionAssay",
      context,
    );
    const makeUpVolume = ledger.takeNumber(
      `${path}.makeUpVolume`,
      `${label}, volume put back (0 for none)`,
      s.makeUpVolume,
      "volume",
    );
    const entry = listed(s.makeUpAssays, analyte);
    const makeUp =
      makeUpVolume === 0 || entry === undefined
        ? exactly(0)
        : ledger.take(
            `${path}.makeUpAssays.${analyte}`,
            `${label}, make-up, ${analyte}`,
            entry,
            "solutionAssay",
            context,
          );
    return volume === null || assay === null || makeUpVolume === null || makeUp === null
      ? null
      : { hours: numberIn(s.at, "time"), volume, assay, makeUpVolume, makeUp };
  });
  if (liquor === null || start === null || taken.includes(null)) return null;
  const known = taken.flatMap((t) => t ?? []);
  if (known.every(({ hours }) => hours !== null)) known.sort((a, b) => a.hours! - b.hours!);
  return { volume: liquor + water / 1000, liquor, start, taken: known };
}

const vesselWith = (
  v: RecordedVessel,
  start: number,
  assays: readonly number[],
  makeUps: readonly number[],
): Vessel => ({
  volume: v.liquor,
  assay: start,
  withdrawals: v.taken.map(({ volume, makeUpVolume }, i) => ({
    volume,
    makeUpVolume,
    assay: assays[i]!,
    makeUpAssay: makeUps[i]!,
  })),
});

/** Liquor in the vessel at the end: as measured, else start less samples plus make-up, evaporation not counted.
 *  @returns  L; a worked-out volume is noted as assumed */
export function finalVolume(trial: Trial, v: RecordedVessel, ledger: Ledger): number | null {
  const entry = trial.products.vesselVolume;
  const [path, label] = ["products.vesselVolume", "liquor in the vessel at the end"];
  if (readEntry(entry.text).kind !== "blank") return ledger.takeNumber(path, label, entry, "volume");
  const left = volumeLeft({
    ...vesselWith(
      v,
      0,
      v.taken.map(() => 0),
      v.taken.map(() => 0),
    ),
    volume: v.volume,
  });
  if (left <= 0) return ledger.miss(path, label, "the samples take more than the vessel held");
  return ledger.assume(path, label, left, "L", "not measured, start less samples plus make-up");
}

export function finalAssay(trial: Trial, analyte: string, masses: MolarMasses, ledger: Ledger): Interval | null {
  return ledger.take(
    `products.finalAssays.${analyte}`,
    `final solution, ${analyte}`,
    listed(trial.products.finalAssays, analyte),
    "solutionAssay",
    liquorContext(trial, analyte, masses, "end"),
  );
}

/** What went into solution (negative: out of it), with the censored assays as an interval.
 *  @param v  vessel     @param volume  L at the end     @param final  g/L     @returns  g     @source  metallurgy/dissolvedMetal.ts */
export const dissolvedRange = (v: RecordedVessel, volume: number, final: Interval): Interval =>
  spanOf(
    [final, ...v.taken.map((t) => t.assay)],
    [v.start, ...v.taken.map((t) => t.makeUp)],
    ([c = 0, ...assays], [start = 0, ...makeUps]) => dissolvedMetal(vesselWith(v, start, assays, makeUps), volume, c),
  );

/** As `dissolvedRange`, from filtrate and wash. */
export const dissolvedInFiltrateRange = (
  v: RecordedVessel,
  filtrate: number,
  final: Interval,
  wash: number,
  washed: Interval,
): Interval =>
  spanOf(
    [final, washed, ...v.taken.map((t) => t.assay)],
    [v.start, ...v.taken.map((t) => t.makeUp)],
    ([c = 0, w = 0, ...assays], [start = 0, ...makeUps]) =>
      dissolvedInFiltrate(vesselWith(v, start, assays, makeUps), [filtrate, c], [wash, w]),
  );

/** Filtrate and wash as recorded; a trial without a wash says 0. */
export function filtrateAndWash(
  trial: Trial,
  analyte: string,
  masses: MolarMasses,
  ledger: Ledger,
): { filtrate: number; wash: number; washed: Interval } | null {
  const { products } = trial;
  const filtrate = ledger.takeNumber("products.filtrateVolume", "filtrate volume", products.filtrateVolume, "volume");
  const wash = ledger.takeNumber("products.washVolume", "wash volume (0 for none)", products.washVolume, "volume");
  if (filtrate === null || wash === null) return null;
  if (wash === 0) return { filtrate, wash, washed: exactly(0) };
  const context = liquorContext(trial, analyte, masses, "end");
  const entry = listed(products.washAssays, analyte);
  const washed = ledger.take(`products.washAssays.${analyte}`, `wash, ${analyte}`, entry, "solutionAssay", context);
  return washed === null ? null : { filtrate, wash, washed };
}
