import { MutationCache, QueryCache, QueryClient } from "@tanstack/react-query";
import { ApiFailure } from "./failure";

/** Every key of the query cache, so that no two places spell one differently. */
export const keys = {
  session: ["session"] as const,
  sessionEnded: ["session", "ended"] as const,
  preferences: ["me", "preferences"] as const,
  chemistry: ["chemistry"] as const,
  chemistryVersion: (version: string) => ["chemistry", version] as const,
  speciesEdits: (species: string) => ["chemistry", "edits", species] as const,
  projects: ["projects"] as const,
  plans: ["plans"] as const,
  planList: (projectId: string, archived: string) => ["plans", "list", projectId, archived] as const,
  plan: (id: string) => ["plans", id] as const,
  revisions: (id: string) => ["plans", id, "revisions"] as const,
  revision: (id: string, number: number) => ["plans", id, "revisions", number] as const,
  comments: (planId: string) => ["comments", planId] as const,
  feeds: ["feeds"] as const,
  feedList: (projectId: string, deleted: string) => ["feeds", "list", projectId, deleted] as const,
  feed: (id: string) => ["feeds", id] as const,
  campaigns: ["campaigns"] as const,
  campaignList: (projectId: string, deleted: string) => ["campaigns", "list", projectId, deleted] as const,
  campaign: (id: string) => ["campaigns", id] as const,
  campaignSummary: (id: string) => ["campaigns", id, "summary"] as const,
  campaignPair: (a: string, b: string) => ["campaigns", "pair", a, b] as const,
  trials: ["trials"] as const,
  mapTrials: (planId: string, scope: string) => ["trials", "map", planId, scope] as const,
  trialList: (query: string) => ["trials", "list", query] as const,
  trial: (id: string) => ["trials", id] as const,
  members: ["members"] as const,
  invitations: ["invitations"] as const,
  invitation: (token: string) => ["invitation", token] as const,
  letters: ["letters"] as const,
};

/** Asking again helps only when the server did not answer or stumbled. */
const worthAnotherTry = (count: number, error: unknown) =>
  count < 2 && (!(error instanceof ApiFailure) || error.status === 0 || error.status >= 500);

export function createQueryClient(): QueryClient {
  const onError = (error: unknown) => {
    if (error instanceof ApiFailure && error.code === "NOT_SIGNED_IN") client.setQueryData(keys.sessionEnded, true);
  };
  const client = new QueryClient({
    queryCache: new QueryCache({ onError }),
    mutationCache: new MutationCache({ onError }),
    defaultOptions: {
      queries: { staleTime: 15_000, retry: worthAnotherTry, refetchOnWindowFocus: false },
      mutations: { retry: false },
    },
  });
  return client;
}
