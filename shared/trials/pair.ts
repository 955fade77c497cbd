import type { CampaignRow } from "../schemas/campaign";
import { campaignSummary, type StageSummary, type SummarisedTrial } from "./summary";

export interface Side {
  readonly campaign: Pick<CampaignRow, "id" | "code" | "title" | "planId" | "planRevision" | "stages">;
  /** their electrodes as a sentence should name them */
  readonly trials: readonly SummarisedTrial[];
}

/** One stage of two campaigns, or of the one that has it. */
export interface StagePair {
  readonly code: string;
  readonly left: StageSummary | null;
  readonly right: StageSummary | null;
  /** mean of the right less mean of the left, in points; null where either has none */
  readonly recovery: number | null;
  readonly gangueDissolved: number | null;
  readonly reagentPerKg: number | null;
}

export interface CampaignPair {
  readonly stages: readonly StagePair[];
  /** what makes the difference hard to read, each in a sentence */
  readonly cautions: readonly string[];
}

const difference = (
  of: (s: StageSummary) => { mean: number } | null,
  left: StageSummary | null,
  right: StageSummary | null,
) => {
  const [a, b] = [left && of(left), right && of(right)];
  return a && b ? b.mean - a.mean : null;
};

const names = (side: Side, of: (t: SummarisedTrial) => string | null): Set<string> =>
  new Set(side.trials.filter((t) => t.status !== "rejected").flatMap((t) => of(t) ?? []));
const sameSet = (a: Set<string>, b: Set<string>) => a.size === b.size && [...a].every((x) => b.has(x));

function cautionsOf(left: Side, right: Side, stages: readonly StagePair[]): string[] {
  const list = (s: Set<string>) => [...s].sort().join(", ") || "none";
  const [feedsL, feedsR] = [names(left, (t) => t.feedName), names(right, (t) => t.feedName)];
  const [probesL, probesR] = [names(left, (t) => t.electrode), names(right, (t) => t.electrode)];
  const sentences = [
    !sameSet(feedsL, feedsR) &&
      `Different feeds (${list(feedsL)}; ${list(feedsR)}): a difference may be the ore's. Compare within one feed.`,
    (left.campaign.planId !== right.campaign.planId || left.campaign.planRevision !== right.campaign.planRevision) &&
      "Laid out on different plan revisions: inside and outside are judged against different windows unless one revision is shown for both.",
    !sameSet(probesL, probesR) &&
      probesL.size > 0 &&
      probesR.size > 0 &&
      `Read against different electrodes (${left.campaign.code}: ${list(probesL)}; ${right.campaign.code}: ${list(probesR)}); all are converted to SHE.`,
    ...stages.flatMap(({ code, left: l, right: r }) => {
      const [a, b] = [l?.recovery?.n ?? 0, r?.recovery?.n ?? 0];
      if (!l || !r) return [`Stage ${code} stands in one campaign only.`];
      return Math.min(a, b) < 3
        ? [`Stage ${code}: ${a} and ${b} recoveries; with fewer than three a mean says little.`]
        : [];
    }),
    ...stages.flatMap(({ code, left: l, right: r }) =>
      l && r && l.stage.target !== r.stage.target
        ? [`Stage ${code} is judged by ${l.stage.target} in one and by ${r.stage.target} in the other.`]
        : [],
    ),
    "No test of significance is made here: scatter within a campaign shows in its range.",
  ];
  return sentences.filter((s) => s !== false);
}

/** Two campaigns side by side, stage by stage.
 *  @param left, right  each with its trials     @returns  differences of means, right less left, and what stands in the way of reading them
 *  @source  common practice, no source: compare within a feed, on one electrode scale, against one revision */
export function campaignPair(left: Side, right: Side): CampaignPair {
  const [a, b] = [campaignSummary(left.campaign, left.trials), campaignSummary(right.campaign, right.trials)];
  const codes = [...new Set([...a, ...b].map((s) => s.stage.code))];
  const stages = codes.map((code): StagePair => {
    const [l, r] = [a.find((s) => s.stage.code === code) ?? null, b.find((s) => s.stage.code === code) ?? null];
    const comparableStage = l?.stage.target === r?.stage.target;
    return {
      code,
      left: l,
      right: r,
      recovery: comparableStage ? difference((s) => s.recovery, l, r) : null,
      gangueDissolved: comparableStage ? difference((s) => s.gangueDissolved, l, r) : null,
      reagentPerKg: comparableStage ? difference((s) => s.reagentPerKg, l, r) : null,
    };
  });
  return { stages, cautions: cautionsOf(left, right, stages) };
}
