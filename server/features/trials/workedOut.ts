import { electrodeSeries, type ElectrodeSeries } from "../../../shared/electrodes/series";
import { formulaVersion } from "../../../shared/metallurgy/formulaVersion";
import type { MolarMasses } from "../../../shared/metallurgy/molarMass";
import type { CampaignStage } from "../../../shared/schemas/campaign";
import type { SolutionAssay } from "../../../shared/schemas/entry";
import type { Feed } from "../../../shared/schemas/feed";
import type { Trial, TrialFigures } from "../../../shared/schemas/trial";
import type { ComparedTrial } from "../../../shared/schemas/trialRows";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { couldCarry } from "../../../shared/trials/couldCarry";
import { trialFigures } from "../../../shared/trials/figures";
import { titratedAcid } from "../../../shared/trials/trialAcid";
import { measuredPoint } from "../../../shared/trials/measuredPoint";
import { plannedPoint } from "../../../shared/trials/plannedPoint";
import type { Chemistry } from "../chemistry/library";
import type { trials } from "./schema";

/** What figures need beside the records. */
export interface Workings {
  masses: MolarMasses;
  electrodes: readonly ElectrodeSeries[];
  data: ChemicalData;
}
export const workingsOf = ({ data, current }: Chemistry): Workings => ({
  masses: data.molarMass,
  electrodes: electrodeSeries(current),
  data,
});

const ofTarget = (assays: readonly SolutionAssay[], { target }: CampaignStage) =>
  assays.filter(({ analyte }) => analyte === target);

const comparedOf = (
  trial: Trial,
  feed: Feed,
  stage: CampaignStage,
  { masses, electrodes }: Workings,
): ComparedTrial => {
  const { kind, planned, measured, charge, products } = trial;
  return {
    kind,
    planned: { tenor: planned.tenor, ligands: planned.ligands },
    measured: { ligands: measured.ligands },
    charge: { liquorAssays: ofTarget(charge.liquorAssays, stage), liquorDensity: charge.liquorDensity },
    products: { finalAssays: ofTarget(products.finalAssays, stage), liquorDensity: products.liquorDensity },
    couldCarry: couldCarry(trial, feed, stage.target, masses),
    freeAcid: titratedAcid(trial, masses),
    plannedAt: plannedPoint(trial, electrodes),
  };
};

type Stored = typeof trials.$inferSelect;
type FigureColumns = Omit<TrialFigures, "recoveryRangePct"> & Pick<Stored, "recoveryLow" | "recoveryHigh">;
export type WorkedOut = FigureColumns & Pick<Stored, "electrode" | "compared" | "formulaVersion">;

/** Everything that is stored of a trial beside its record. An interval open to one side is not stored: it says too little. */
export function workedOut(trial: Trial, feed: Feed, stage: CampaignStage, workings: Workings): WorkedOut {
  const { masses, electrodes } = workings;
  const { recoveryRangePct, ...figures } = trialFigures(trial, feed, stage, masses, electrodes);
  const [low, high] = recoveryRangePct ?? [null, null];
  const closed = Number.isFinite(low) && Number.isFinite(high);
  return {
    ...figures,
    recoveryLow: closed ? low : null,
    recoveryHigh: closed ? high : null,
    electrode: measuredPoint(trial, electrodes).point?.electrode ?? null,
    compared: comparedOf(trial, feed, stage, workings),
    formulaVersion,
  };
}

type NumberColumns = Omit<FigureColumns, "flags" | "pHCooled"> & { pHCooled: boolean | 0 | 1 };

/** The figures as the API has them, but for the flags. */
export function numbersOf(stored: NumberColumns): Omit<TrialFigures, "flags"> {
  const { recoveryLow, recoveryHigh } = stored;
  return {
    recoveryPct: stored.recoveryPct,
    recoveryRangePct: recoveryLow === null || recoveryHigh === null ? null : [recoveryLow, recoveryHigh],
    recoveryBasis: stored.recoveryBasis,
    gangueDissolvedPct: stored.gangueDissolvedPct,
    selectivityPct: stored.selectivityPct,
    accountabilityPct: stored.accountabilityPct,
    acidPerTonne: stored.acidPerTonne,
    reagentPerKg: stored.reagentPerKg,
    pH: stored.pH,
    pHCooled: Boolean(stored.pHCooled),
    Eh: stored.Eh,
    EhUncertainty: stored.EhUncertainty,
    temperatureC: stored.temperatureC,
  };
}

export const figuresOf = (stored: FigureColumns): TrialFigures => ({ ...numbersOf(stored), flags: stored.flags });
