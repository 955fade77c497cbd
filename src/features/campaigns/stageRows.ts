import type { CampaignRow, CampaignStage } from "../../../shared/schemas/campaign";
import type { CampaignSummaryAnswer } from "../../../shared/schemas/campaignSummary";
import type { StageSummary } from "../../../shared/trials/summary";

/** One line of the list: a stage of a campaign, its figures once they are there. */
export interface StageRow {
  key: string;
  campaign: CampaignRow;
  stage: CampaignStage;
  summary: StageSummary | null;
}

export const stageRows = (
  campaigns: readonly CampaignRow[],
  summaries: ReadonlyMap<string, CampaignSummaryAnswer>,
): StageRow[] =>
  campaigns.flatMap((campaign) =>
    campaign.stages.map((stage) => ({
      key: `${campaign.id} ${stage.code}`,
      campaign,
      stage,
      summary: summaries.get(campaign.id)?.stages.find((s) => s.stage.code === stage.code) ?? null,
    })),
  );
