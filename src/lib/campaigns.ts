import { queryOptions, useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import type { campaignCreate, CampaignRow, campaignUpdate } from "../../shared/schemas/campaign";
import type { CampaignPairAnswer, CampaignSummaryAnswer } from "../../shared/schemas/campaignSummary";
import { api } from "./api";
import { allRows, queryString } from "./pages";
import { keys } from "./queries";

const at = (id: string) => `/campaigns/${encodeURIComponent(id)}`;

export const useCampaigns = (projectId: string | undefined, deleted: "false" | "true" = "false") =>
  useQuery({
    queryKey: keys.campaignList(projectId ?? "", deleted),
    queryFn: ({ signal }) => allRows<CampaignRow>(`/campaigns${queryString({ projectId, deleted })}`, signal),
    enabled: projectId !== undefined,
  });

/** A campaign; while figures of its trials are worked out anew it is asked again, and everything that shows them once they are. */
export function useCampaign(id: string | undefined) {
  const client = useQueryClient();
  return useQuery({
    queryKey: keys.campaign(id ?? ""),
    queryFn: async ({ signal }) => {
      const before = client.getQueryData<CampaignRow>(keys.campaign(id ?? ""));
      const campaign = await api.get<CampaignRow>(at(id ?? ""), { signal });
      if (before && before.figuresDue > 0 && campaign.figuresDue === 0) {
        void client.invalidateQueries({ queryKey: keys.trials });
        void client.invalidateQueries({ queryKey: keys.campaignSummary(campaign.id) });
      }
      return campaign;
    },
    enabled: id !== undefined,
    refetchInterval: ({ state }) => (state.data && state.data.figuresDue > 0 ? 700 : false),
  });
}

export const campaignSummaryQuery = (id: string) =>
  queryOptions({
    queryKey: keys.campaignSummary(id),
    queryFn: ({ signal }) => api.get<CampaignSummaryAnswer>(`${at(id)}/summary`, { signal }),
  });
export const useCampaignSummary = (id: string) => useQuery(campaignSummaryQuery(id));

export const useCampaignPair = (a: string, b: string) =>
  useQuery({
    queryKey: keys.campaignPair(a, b),
    queryFn: ({ signal }) => api.get<CampaignPairAnswer>(`/campaigns/pair${queryString({ a, b })}`, { signal }),
    enabled: a !== "" && b !== "",
  });

function useCampaignMutation<Variables>(mutationFn: (variables: Variables) => Promise<CampaignRow>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn,
    onSuccess: (campaign) => {
      client.setQueryData(keys.campaign(campaign.id), campaign);
      void client.invalidateQueries({ queryKey: keys.campaigns });
      // target and gangue of its stages enter the figures of its trials
      void client.invalidateQueries({ queryKey: keys.trials });
    },
  });
}

export const useCreateCampaign = () =>
  useCampaignMutation((body: z.input<typeof campaignCreate>) => api.post<CampaignRow>("/campaigns", body));

export const useUpdateCampaign = () =>
  useCampaignMutation(
    ({ id, version, ...body }: z.input<typeof campaignUpdate> & { id: string; version: number; reason?: string }) =>
      api.patch<CampaignRow>(at(id), body, { ifMatch: version }),
  );

export const useDeleteCampaign = () =>
  useCampaignMutation(({ id, version, reason }: { id: string; version: number; reason: string }) =>
    api.delete<CampaignRow>(`${at(id)}${queryString({ reason })}`, { ifMatch: version }),
  );

export const useRestoreCampaign = () =>
  useCampaignMutation(({ id, version }: { id: string; version: number }) =>
    api.post<CampaignRow>(`${at(id)}/restore`, {}, { ifMatch: version }),
  );
