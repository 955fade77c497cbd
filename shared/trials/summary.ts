import type { CampaignRow, CampaignStage } from "../schemas/campaign";
import type { Trial, TrialFigures } from "../schemas/trial";
import { spreadOf, type Spread } from "./spread";
import { tally, type JudgedTrial, type Tally } from "./tally";

/** A trial of a campaign with its figures; judged where a map is at hand. */
export interface SummarisedTrial extends Omit<JudgedTrial, "figures"> {
  readonly kind: Trial["kind"];
  readonly stage: string;
  readonly feedId: string;
  readonly feedName: string;
  /** electrode series of its ORP, null without */
  readonly electrode: string | null;
  readonly figures: TrialFigures;
}

export interface StageSummary {
  readonly stage: CampaignStage;
  /** all trials of the stage but rejected ones */
  readonly n: number;
  readonly rejected: number;
  /** trials whose recovery is an interval: they enter by its middle */
  readonly censored: number;
  readonly recovery: Spread | null;
  readonly gangueDissolved: Spread | null;
  readonly accountability: Spread | null;
  /** accounts outside 95 to 105 % */
  readonly open: number;
  readonly acidPerTonne: Spread | null;
  /** kg acid, or kg cementing metal, per kg of target; consumed */
  readonly reagentPerKg: Spread | null;
  readonly places: Tally;
}

/** One line a stage of a campaign; trials of a stage the campaign does not name are left out.
 *  @param campaign  with its stages     @param trials  of that campaign     @returns  stages in the campaign's order
 *  @source  counts, means and ranges; no test of significance */
export function campaignSummary(
  { stages }: Pick<CampaignRow, "stages">,
  trials: readonly SummarisedTrial[],
): StageSummary[] {
  return stages.map((stage) => {
    const all = trials.filter((t) => t.stage === stage.code);
    const kept = all.filter((t) => t.status !== "rejected");
    const of = (key: "recoveryPct" | "gangueDissolvedPct" | "accountabilityPct" | "acidPerTonne" | "reagentPerKg") =>
      spreadOf(kept.map((t) => t.figures[key]));
    const closure = (t: SummarisedTrial) => t.figures.accountabilityPct;
    return {
      stage,
      n: kept.length,
      rejected: all.length - kept.length,
      censored: kept.filter((t) => t.figures.recoveryRangePct !== null).length,
      recovery: of("recoveryPct"),
      gangueDissolved: of("gangueDissolvedPct"),
      accountability: of("accountabilityPct"),
      open: kept.filter((t) => closure(t) !== null && (closure(t)! < 95 || closure(t)! > 105)).length,
      acidPerTonne: of("acidPerTonne"),
      reagentPerKg: of("reagentPerKg"),
      places: tally(all),
    };
  });
}
