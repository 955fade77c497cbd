import type { TrialFigures, TrialStatus } from "../schemas/trial";
import type { Comparability } from "./comparable";
import type { Judgement } from "./judge";
import { spreadOf, type Spread } from "./spread";

/** A trial judged against the revision shown. */
export interface JudgedTrial {
  readonly id: string;
  readonly status: TrialStatus;
  readonly figures: Pick<TrialFigures, "recoveryPct" | "gangueDissolvedPct" | "selectivityPct">;
  /** null where pH or Eh could not be had */
  readonly judgement: Judgement | null;
  readonly comparability: Comparability;
}

/** Where a trial is counted. */
export type Count = "inside" | "outside" | "apart" | "off the map" | "not placed" | "rejected";

/** A rejected trial tells nothing; one too far from the plan is counted apart; then the window decides.
 *  @param trial  judged     @returns  the one count it belongs to */
export function countOf({ status, judgement, comparability }: JudgedTrial): Count {
  if (status === "rejected") return "rejected";
  if (judgement === null) return "not placed";
  if (!comparability.comparable) return "apart";
  return judgement.verdict;
}

export interface TallyLine {
  /** trials counted here, with or without a recovery */
  readonly n: number;
  /** placed within the uncertainty of a limit: either side is possible */
  readonly unsure: number;
  readonly recovery: Spread | null;
  readonly gangueDissolved: Spread | null;
  readonly selectivity: Spread | null;
}
export type Tally = Readonly<Record<Count, TallyLine>>;

const counts: readonly Count[] = ["inside", "outside", "apart", "off the map", "not placed", "rejected"];

/** Recovery and gangue dissolved inside and outside the windows of a revision, each with its own n.
 *  @param trials  judged     @returns  one line a count; every trial is in exactly one
 *  @source  definition; no significance is claimed: windows were not drawn at random and trials were not blocked */
export function tally(trials: readonly JudgedTrial[]): Tally {
  const line = (count: Count): TallyLine => {
    const here = trials.filter((t) => countOf(t) === count);
    const of = (key: keyof JudgedTrial["figures"]) => spreadOf(here.map((t) => t.figures[key]));
    return {
      n: here.length,
      unsure: here.filter((t) => t.judgement?.unsure).length,
      recovery: of("recoveryPct"),
      gangueDissolved: of("gangueDissolvedPct"),
      selectivity: of("selectivityPct"),
    };
  };
  return Object.fromEntries(counts.map((c) => [c, line(c)])) as Record<Count, TallyLine>;
}
