import type { ElectrodeSeries } from "../../../../shared/electrodes/series";
import { cementationAccount, type CementationAccount } from "../../../../shared/metallurgy/account/cementationAccount";
import type { MissingInput } from "../../../../shared/metallurgy/account/ledger";
import { metalAccount, type MetalAccount } from "../../../../shared/metallurgy/account/metalAccount";
import { reagentAccount, type ReagentAccount } from "../../../../shared/metallurgy/account/reagentAccount";
import type { CampaignStage } from "../../../../shared/schemas/campaign";
import type { FeedRow } from "../../../../shared/schemas/feed";
import type { TrialFigures } from "../../../../shared/schemas/trial";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { comparable, type Comparability } from "../../../../shared/trials/comparable";
import { trialFigures } from "../../../../shared/trials/figures";
import { judge, type Judgement } from "../../../../shared/trials/judge";
import { lastTemperature, measuredPoint, type MeasuredPoint } from "../../../../shared/trials/measuredPoint";
import type { SolvedRevision } from "../../../lib/solvedRevision";
import type { TrialValues } from "./trialValues";

/** Metals one can ask an account of: those assayed anywhere, the stage's own first. */
export function metalsOf(trial: TrialValues, feed: FeedRow, stage: CampaignStage, data: ChemicalData): string[] {
  const assayed = [
    ...trial.products.residueAssays,
    ...trial.products.finalAssays,
    ...trial.charge.liquorAssays,
    ...trial.samples.flatMap((s) => s.assays),
  ].map(({ analyte }) => analyte);
  const heads = trial.kind === "leach" ? feed.heads.map(({ element }) => element) : [];
  return [...new Set([stage.target, ...(stage.gangue === null ? [] : [stage.gangue]), ...heads, ...assayed])].filter(
    (metal) => data.molarMass.has(metal) && data.tables.elements.some(({ symbol }) => symbol === metal),
  );
}

export type Account =
  | { kind: "leach"; account: MetalAccount; reagents: ReagentAccount }
  | { kind: "cementation"; account: CementationAccount; reagents: ReagentAccount };

/** The account of one metal, with the reagents counted on it. */
export function accountOf(trial: TrialValues, feed: FeedRow, metal: string, data: ChemicalData): Account {
  const masses = data.molarMass;
  if (trial.kind === "leach") {
    const account = metalAccount(trial, feed, metal, masses);
    const reagents = reagentAccount(trial, feed, { name: metal, grams: account.dissolved }, masses);
    return { kind: "leach", account, reagents };
  }
  const account = cementationAccount(trial, metal, masses);
  const reagents = reagentAccount(trial, feed, { name: metal, grams: account.won }, masses);
  return { kind: "cementation", account, reagents };
}

export interface Standing {
  figures: TrialFigures;
  /** what the target's and the gangue's accounts still need, each once */
  missing: readonly MissingInput[];
  point: MeasuredPoint | null;
  pointMissing: readonly MissingInput[];
  /** null while there is no place on the map, or no map */
  judgement: Judgement | null;
  comparability: Comparability | null;
}

/** What the record says so far: figures, place on the map, what is still missing. */
export function standingOf(
  trial: TrialValues,
  feed: FeedRow,
  stage: CampaignStage,
  data: ChemicalData,
  electrodes: readonly ElectrodeSeries[],
  solved: SolvedRevision | undefined,
): Standing {
  const { point, missing: pointMissing } = measuredPoint(trial, electrodes);
  const asked = [stage.target, ...(trial.kind === "leach" && stage.gangue !== null ? [stage.gangue] : [])];
  const open = asked.flatMap((metal) => accountOf(trial, feed, metal, data).account.missing);
  const seen = new Set<string>();
  return {
    figures: trialFigures(trial, feed, stage, data.molarMass, electrodes),
    missing: open.filter(({ path }) => !seen.has(path) && seen.add(path)),
    point,
    pointMissing,
    judgement: point && solved?.solution ? judge(point, solved.solution, solved.inputs.controlBand) : null,
    comparability: solved
      ? comparable(trial, point?.temperatureC ?? lastTemperature(trial), stage, solved.inputs, solved.data)
      : null,
  };
}
