import { z } from "./z";
import type { CampaignPair, StagePair } from "../trials/pair";
import type { StageSummary } from "../trials/summary";

/** Whose figures they are, and what inside and outside are judged against. */
export interface SummaryHead {
  campaign: {
    id: string;
    code: string;
    title: string;
    question: string;
    projectId: string;
    projectName: string;
    invented: boolean;
  };
  plan: {
    id: string;
    name: string;
    revision: number;
    /** of the chemistry library the revision froze */
    dataVersion: string;
    temperatureC: number;
    windows: number;
    /** why the revision cannot be solved, where it cannot: nothing is judged then */
    failure: string | null;
  };
  /** feeds of its trials, rejected ones left out */
  feeds: { id: string; name: string; n: number }[];
}

export interface CampaignSummaryAnswer extends SummaryHead {
  stages: readonly StageSummary[];
}

export const campaignPairQuery = z.object({ a: z.string().min(1), b: z.string().min(1) });

/** `left` is a, `right` is b. No test of significance. */
export interface CampaignPairAnswer {
  left: SummaryHead;
  right: SummaryHead;
  stages: readonly StagePair[];
  cautions: CampaignPair["cautions"];
}
