import { z } from "zod";
import type { CampaignStage } from "./campaign";
import type { TrialKind } from "./trial";

/** How a figure is spread over n trials. */
export interface Spread {
  n: number;
  mean: number;
  min: number;
  max: number;
}

/** Trials on one side of the window's limits. */
export interface SideTally {
  n: number;
  recoveryPct: Spread | null;
  gangueDissolvedPct: Spread | null;
}

/** The trials of one stage and kind; rejected ones are counted and left out of every figure. */
export interface StageSummary {
  stage: CampaignStage;
  kind: TrialKind;
  n: number;
  rejected: number;
  recoveryPct: Spread | null;
  gangueDissolvedPct: Spread | null;
  selectivityPct: Spread | null;
  accountabilityPct: Spread | null;
  /** accounts outside 95 to 105 % */
  unbalanced: number;
  acidPerTonne: Spread | null;
  /** leach: kg acid per kg dissolved; cementation: kg cementing metal per kg won */
  reagentPerKg: Spread | null;
  inside: SideTally;
  outside: SideTally;
  /** too far from the plan in temperature, tenor or ligand for its window to judge them */
  farFromPlan: SideTally;
  /** without a measured pH and Eh */
  unplaced: number;
}

export interface CampaignSummary {
  campaign: {
    id: string;
    code: string;
    title: string;
    question: string;
    projectName: string;
    invented: boolean;
  };
  /** what inside and outside are judged against */
  plan: {
    id: string;
    name: string;
    revision: number;
    dataVersion: string;
    temperatureC: number;
    windows: number;
    /** why the plan cannot be solved, where it cannot */
    failure: string | null;
  };
  feeds: { id: string; name: string; n: number }[];
  stages: StageSummary[];
}

export const campaignPairQuery = z.object({ a: z.string().min(1), b: z.string().min(1) });

/** Two campaigns side by side, stage by stage; `null` where one of them has no such stage. No test of significance. */
export interface CampaignPair {
  a: CampaignSummary;
  b: CampaignSummary;
  stages: { code: string; kind: TrialKind; a: StageSummary | null; b: StageSummary | null }[];
  /** what makes the two hard to compare: other feeds, other plan, other target */
  cautions: string[];
}
