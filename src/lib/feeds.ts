import { useMutation, useQuery, useQueryClient, type QueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import type { feedCreate, FeedRow, feedUpdate } from "../../shared/schemas/feed";
import { api } from "./api";
import { allRows, queryString } from "./pages";
import { keys } from "./queries";

const at = (id: string) => `/feeds/${encodeURIComponent(id)}`;

export type DeletedFilter = "false" | "true";

export const useFeeds = (projectId: string | undefined, deleted: DeletedFilter = "false") =>
  useQuery({
    queryKey: keys.feedList(projectId ?? "", deleted),
    queryFn: ({ signal }) => allRows<FeedRow>(`/feeds${queryString({ projectId, deleted })}`, signal),
    enabled: projectId !== undefined,
  });

/** A feed; while figures of its trials are worked out anew it is asked again, and everything that shows them once they are. */
export function useFeed(id: string | undefined) {
  const client = useQueryClient();
  return useQuery({
    queryKey: keys.feed(id ?? ""),
    queryFn: async ({ signal }) => {
      const before = client.getQueryData<FeedRow>(keys.feed(id ?? ""));
      const feed = await api.get<FeedRow>(at(id ?? ""), { signal });
      if (before && before.figuresDue > 0 && feed.figuresDue === 0) invalidateFigures(client);
      return feed;
    },
    enabled: id !== undefined,
    refetchInterval: ({ state }) => (state.data && state.data.figuresDue > 0 ? 700 : false),
  });
}

/** Heads and moisture enter every account of the feed's trials. */
function invalidateFigures(client: QueryClient): void {
  void client.invalidateQueries({ queryKey: keys.trials });
  void client.invalidateQueries({ queryKey: keys.campaigns });
}

function useFeedMutation<Variables>(mutationFn: (variables: Variables) => Promise<FeedRow>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn,
    onSuccess: (feed) => {
      client.setQueryData(keys.feed(feed.id), feed);
      void client.invalidateQueries({ queryKey: keys.feeds });
      invalidateFigures(client);
    },
  });
}

export const useCreateFeed = () =>
  useFeedMutation((body: z.input<typeof feedCreate>) => api.post<FeedRow>("/feeds", body));

export const useUpdateFeed = () =>
  useFeedMutation(
    ({ id, version, ...body }: z.input<typeof feedUpdate> & { id: string; version: number; reason?: string }) =>
      api.patch<FeedRow>(at(id), body, { ifMatch: version }),
  );

export const useDeleteFeed = () =>
  useFeedMutation(({ id, version, reason }: { id: string; version: number; reason: string }) =>
    api.delete<FeedRow>(`${at(id)}${queryString({ reason })}`, { ifMatch: version }),
  );

export const useRestoreFeed = () =>
  useFeedMutation(({ id, version }: { id: string; version: number }) =>
    api.post<FeedRow>(`${at(id)}/restore`, {}, { ifMatch: version }),
  );
