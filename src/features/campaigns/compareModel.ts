import type { CampaignPairAnswer } from "../../../shared/schemas/campaignSummary";
import { spreadOf, type Spread } from "../../../shared/trials/spread";
import type { Count } from "../../../shared/trials/tally";
import { fixed, MINUS, percent } from "../../lib/format";
import type { PlacedTrial } from "../../lib/judgedTrials";
import { tableCsv } from "../../components/tableModel";
import { exportedStageColumns } from "./stageColumns";

export const measures = ["recoveryPct", "gangueDissolvedPct", "selectivityPct"] as const;
export type Measure = (typeof measures)[number];

/** One dot of a strip. */
export interface Dot {
  id: string;
  code: string;
  value: number;
  count: Count;
}
/** The trials of one campaign on one feed. */
export interface Strip {
  campaignId: string;
  campaignCode: string;
  dots: Dot[];
  spread: Spread | null;
  /** trials without the figure */
  without: number;
  temperatureC: Spread | null;
}
export interface FeedStrips {
  feedId: string;
  feedName: string;
  strips: Strip[];
}

/** Trials of one stage by feed, within a feed by campaign; rejected ones are left out. A feed that only one campaign used stays:
 *  that is worth seeing. */
export function feedStrips(
  trials: readonly PlacedTrial[],
  campaigns: readonly { id: string; code: string }[],
  stage: string,
  measure: Measure,
): FeedStrips[] {
  const kept = trials.filter((t) => t.stage === stage && t.count !== "rejected");
  const feeds = new Map(kept.map(({ feedId, feedName }) => [feedId, feedName]));
  return [...feeds]
    .sort((a, b) => a[1].localeCompare(b[1]))
    .map(([feedId, feedName]) => ({
      feedId,
      feedName,
      strips: campaigns.map(({ id, code }): Strip => {
        const of = kept.filter((t) => t.feedId === feedId && t.campaignId === id);
        const dots = of.flatMap(({ id: trialId, code: trialCode, figures, count }) => {
          const value = figures[measure];
          return value === null ? [] : [{ id: trialId, code: trialCode, value, count }];
        });
        return {
          campaignId: id,
          campaignCode: code,
          dots,
          spread: spreadOf(dots.map(({ value }) => value)),
          without: of.length - dots.length,
          temperatureC: spreadOf(of.map(({ figures }) => figures.temperatureC)),
        };
      }),
    }));
}

const points = (x: number, digits = 1) => `${fixed(Math.abs(x), digits)} points ${x < 0 ? "less" : "more"}`;

export interface Words {
  /** "Zn extraction" */
  what: string;
  left: string;
  right: string;
}

/** What the data say, the whole first, then feed by feed, since a feed run in one campaign alone says nothing of the other. */
export function differenceSentences(
  { what, left, right }: Words,
  feeds: readonly FeedStrips[],
): { verdict: string; byFeed: string[] } {
  const all = (code: string) =>
    spreadOf(
      feeds.flatMap(({ strips }) =>
        strips.filter((s) => s.campaignCode === code).flatMap((s) => s.dots.map((d) => d.value)),
      ),
    );
  const [a, b] = [all(left), all(right)];
  if (!a || !b) {
    const none = [!a && left, !b && right].filter(Boolean).join(" and ");
    return {
      verdict: `${none} ${!a && !b ? "have" : "has"} no ${what} yet, so there is nothing to compare.`,
      byFeed: [],
    };
  }
  const mean = ({ mean: m, n }: Spread) => `${percent(m, 1)} (n ${n})`;
  const shared = feeds.flatMap(({ feedName, strips }) => {
    const [l, r] = [
      strips.find((s) => s.campaignCode === left)?.spread,
      strips.find((s) => s.campaignCode === right)?.spread,
    ];
    return l && r ? [{ feedName, l, r }] : [];
  });
  const verdict =
    shared.length === 0
      ? `${right} gave ${what} of ${mean(b)}, ${left} of ${mean(a)}; no feed was run in both, so the difference may be the ore’s.`
      : shared.length === 1 && feeds.length === 1
        ? `${right} gave ${points(b.mean - a.mean)} ${what} than ${left}, on the same feed: ${mean(b)} against ${mean(a)}.`
        : `${right} gave ${points(b.mean - a.mean)} ${what} than ${left} over all feeds: ${mean(b)} against ${mean(a)}. Compare within a feed:`;
  const byFeed =
    shared.length === 0 || (shared.length === 1 && feeds.length === 1)
      ? []
      : shared.map(({ feedName, l, r }) => `${feedName}: ${points(r.mean - l.mean)}, ${mean(r)} against ${mean(l)}.`);
  return { verdict, byFeed };
}

/** Does the window predict? Inside against outside, both campaigns together, each figure with its n. */
export function windowSentences(
  trials: readonly PlacedTrial[],
  stage: { code: string; target: string; gangue: string | null },
): string[] {
  const of = (count: Count, measure: Measure) =>
    spreadOf(trials.filter((t) => t.stage === stage.code && t.count === count).map((t) => t.figures[measure]));
  const sentence = (metal: string, measure: Measure, digits: number, verb: string): string | null => {
    const [inside, outside] = [of("inside", measure), of("outside", measure)];
    const say = (s: Spread) =>
      `${percent(s.mean, digits)} ${verb} (n ${s.n}, ${fixed(s.min, digits)} to ${fixed(s.max, digits)})`;
    if (!inside || !outside) return null;
    return `${metal}: inside ${say(inside)}, outside ${say(outside)}.`;
  };
  const found = [
    stage.gangue === null ? null : sentence(stage.gangue, "gangueDissolvedPct", 1, "dissolved"),
    sentence(stage.target, "recoveryPct", 0, "recovered"),
  ].filter((s) => s !== null);
  if (found.length === 0) return ["Nothing to say: the trials lie on one side only, or are not placed."];
  const poorInside = trials.filter(
    (t) =>
      t.stage === stage.code && t.count === "inside" && t.figures.recoveryPct !== null && t.figures.recoveryPct < 70,
  );
  if (poorInside.length > 0)
    found.push(
      `${poorInside.length === 1 ? "One trial" : `${poorInside.length} trials`} inside stayed below 70 % ${stage.target} (${poorInside
        .slice(0, 4)
        .map(({ code }) => code)
        .join(", ")}${poorInside.length > 4 ? " and others" : ""}). The window says where, not how fast.`,
    );
  return found;
}

/** Round ends and steps for an axis in %: as wide as the dots need, never wider than 0 to 100 unless a dot is. */
export function percentAxis(values: readonly number[]): { lo: number; hi: number; ticks: number[] } {
  const [min, max] = [Math.min(...values, 100), Math.max(...values, 0)];
  const span = Math.max(5, max - min);
  const step = span > 60 ? 20 : span > 30 ? 10 : span > 12 ? 5 : 2;
  const lo = Math.floor((min - 0.02 * span) / step) * step;
  const hi = Math.ceil((max + 0.02 * span) / step) * step;
  const low = min >= 0 ? Math.max(0, lo) : lo;
  const high = max <= 100 ? Math.min(100, Math.max(hi, low + step)) : hi;
  const ticks: number[] = [];
  for (let t = low; t <= high + 1e-9; t += step) ticks.push(t);
  return { lo: low, hi: high, ticks };
}

/** "+1.2", "−3.4" */
export const difference = (x: number | null, digits = 1): string =>
  x === null ? "" : x < 0 ? `${MINUS}${fixed(-x, digits)}` : `+${fixed(x, digits)}`;

/** Both campaigns, a line a stage: every mean with its n and its ends, and the revision it is judged against. */
export const pairCsv = ({ left, right, stages }: CampaignPairAnswer): string =>
  tableCsv(
    stages.flatMap((stage) =>
      (["left", "right"] as const).flatMap((side) => {
        const { campaign, plan } = { left, right }[side];
        const summary = stage[side];
        const of = { ...campaign, planName: plan.name, planRevision: plan.revision };
        return summary ? [{ campaign: of, stage: summary.stage, summary }] : [];
      }),
    ),
    exportedStageColumns,
  );
