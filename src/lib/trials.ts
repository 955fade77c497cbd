import { keepPreviousData, useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import type { Page } from "../../shared/schemas/api";
import type { trialCreate, TrialRow, trialsQuery, trialUpdate } from "../../shared/schemas/trial";
import type { MapTrials, TrialListRow } from "../../shared/schemas/trialRows";
import { api } from "./api";
import { allRows, queryString } from "./pages";
import { keys } from "./queries";

const at = (id: string) => `/trials/${encodeURIComponent(id)}`;

export type TrialsQuery = z.input<typeof trialsQuery>;

/** Address of the file of the same trials: `lines` says what a line is. */
export const trialsFile = (query: TrialsQuery, lines: "trials" | "readings" | "assays"): string =>
  `/api/trials.csv${queryString({ ...(query as Record<string, string>), limit: undefined, offset: undefined, lines })}`;

/** One page of trials, sorted and filtered by the server; the page before stands until the next one is there. */
export const useTrials = (query: TrialsQuery, enabled = true) => {
  const search = queryString(query as Record<string, string>);
  return useQuery({
    queryKey: keys.trialList(search),
    queryFn: ({ signal }) => api.get<Page<TrialListRow>>(`/trials${search}`, { signal }),
    placeholderData: keepPreviousData,
    enabled,
  });
};

/** All trials of a query, page after page: for lists that are known to be short. */
export const useAllTrials = (query: Omit<TrialsQuery, "limit" | "offset">, enabled = true) => {
  const search = queryString(query);
  return useQuery({
    queryKey: keys.trialList(`all${search}`),
    queryFn: ({ signal }) => allRows<TrialListRow>(`/trials${search}`, signal),
    enabled,
  });
};

export const useTrial = (id: string | undefined) =>
  useQuery({
    queryKey: keys.trial(id ?? ""),
    queryFn: ({ signal }) => api.get<TrialRow>(at(id ?? ""), { signal }),
    enabled: id !== undefined,
  });

/** Every trial that a plan's map can show, as points. */
export const useMapTrials = (planId: string, scope: "plan" | "project", enabled = true) =>
  useQuery({
    queryKey: keys.mapTrials(planId, scope),
    queryFn: ({ signal }) =>
      api.get<MapTrials>(`/plans/${encodeURIComponent(planId)}/trials${queryString({ scope })}`, { signal }),
    enabled,
  });

/** The points of some campaigns of a plan's project. */
export const useCampaignTrials = (planId: string | undefined, campaignIds: readonly string[]) =>
  useQuery({
    queryKey: keys.mapTrials(planId ?? "", campaignIds.join(",")),
    queryFn: ({ signal }) =>
      api.get<MapTrials>(
        `/plans/${encodeURIComponent(planId ?? "")}/trials${queryString({ campaignIds: campaignIds.join(",") })}`,
        { signal },
      ),
    enabled: planId !== undefined && campaignIds.length > 0,
  });

function useTrialMutation<Variables>(mutationFn: (variables: Variables) => Promise<TrialRow>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn,
    onSuccess: (trial) => {
      client.setQueryData(keys.trial(trial.id), trial);
      void client.invalidateQueries({ queryKey: [...keys.trials, "list"] });
      void client.invalidateQueries({ queryKey: [...keys.trials, "map"] });
      void client.invalidateQueries({ queryKey: keys.campaigns });
      void client.invalidateQueries({ queryKey: keys.feeds });
      void client.invalidateQueries({ queryKey: ["history", at(trial.id)] });
    },
  });
}

export const useCreateTrial = () =>
  useTrialMutation((body: z.input<typeof trialCreate>) => api.post<TrialRow>("/trials", body));

export const useUpdateTrial = () =>
  useTrialMutation(
    ({ id, version, ...body }: z.input<typeof trialUpdate> & { id: string; version: number; reason?: string }) =>
      api.patch<TrialRow>(at(id), body, { ifMatch: version }),
  );

interface Judged {
  id: string;
  version: number;
  reason: string;
}

export const useDeleteTrial = () =>
  useTrialMutation(({ id, version, reason }: Judged) =>
    api.delete<TrialRow>(`${at(id)}${queryString({ reason })}`, { ifMatch: version }),
  );

export const useRestoreTrial = () =>
  useTrialMutation(({ id, version }: Omit<Judged, "reason">) =>
    api.post<TrialRow>(`${at(id)}/restore`, {}, { ifMatch: version }),
  );

/** Unlocks an approved trial. */
export const useReopenTrial = () =>
  useTrialMutation(({ id, version, reason }: Judged) =>
    api.post<TrialRow>(`${at(id)}/reopen`, { reason }, { ifMatch: version }),
  );
