import { queryOptions, useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import type { planDuplicate, projectCreate, ProjectRow } from "../../shared/schemas/api";
import type { planCreate, planUpdate, PlanRow, revisionCreate, RevisionRow } from "../../shared/schemas/plan";
import { api } from "./api";
import { allRows } from "./pages";
import { keys } from "./queries";

export type ArchivedFilter = "false" | "true" | "all";

export const useProjects = () =>
  useQuery({ queryKey: keys.projects, queryFn: ({ signal }) => allRows<ProjectRow>("/projects", signal) });

export const usePlans = (projectId: string | undefined, archived: ArchivedFilter = "false") =>
  useQuery({
    queryKey: keys.planList(projectId ?? "", archived),
    queryFn: ({ signal }) =>
      allRows<PlanRow>(`/plans?projectId=${encodeURIComponent(projectId ?? "")}&archived=${archived}`, signal),
    enabled: projectId !== undefined,
  });

export const planQuery = (id: string) =>
  queryOptions({
    queryKey: keys.plan(id),
    queryFn: ({ signal }) => api.get<PlanRow>(`/plans/${encodeURIComponent(id)}`, { signal }),
  });

/** How often a plan that somebody works on is asked for again, ms: a colleague's revision is told of without a reload. */
const WATCH_EVERY = 20_000;

/** @param watched  asked for again while the page is in sight, and when somebody comes back to it */
export const usePlan = (id: string | undefined, watched = false) =>
  useQuery({
    ...planQuery(id ?? ""),
    enabled: id !== undefined,
    refetchInterval: watched && WATCH_EVERY,
    refetchOnWindowFocus: watched && "always",
  });

/** A saved revision never changes. */
export const revisionQuery = (planId: string, number: number) =>
  queryOptions({
    queryKey: keys.revision(planId, number),
    queryFn: ({ signal }) =>
      api.get<RevisionRow>(`/plans/${encodeURIComponent(planId)}/revisions/${number}`, { signal }),
    staleTime: Infinity,
  });

export const useRevisions = (planId: string, enabled = true) =>
  useQuery({
    queryKey: keys.revisions(planId),
    queryFn: ({ signal }) => allRows<RevisionRow>(`/plans/${encodeURIComponent(planId)}/revisions`, signal),
    enabled,
  });

/** After a write every list of plans and projects may have changed. */
function usePlanMutation<Variables, Answer>(
  mutationFn: (variables: Variables) => Promise<Answer>,
  seen?: (answer: Answer, variables: Variables) => PlanRow | undefined,
) {
  const client = useQueryClient();
  return useMutation({
    mutationFn,
    onSuccess: (answer, variables) => {
      const plan = seen?.(answer, variables);
      if (plan) client.setQueryData(keys.plan(plan.id), plan);
      void client.invalidateQueries({ queryKey: keys.plans });
      void client.invalidateQueries({ queryKey: keys.projects });
    },
  });
}

export const useCreateProject = () =>
  usePlanMutation((body: z.input<typeof projectCreate>) => api.post<ProjectRow>("/projects", body));

export const useCreatePlan = () =>
  usePlanMutation(
    (body: z.input<typeof planCreate>) => api.post<PlanRow>("/plans", body),
    (plan) => plan,
  );

export const useDuplicatePlan = () =>
  usePlanMutation(
    ({ id, ...body }: z.input<typeof planDuplicate> & { id: string }) =>
      api.post<PlanRow>(`/plans/${encodeURIComponent(id)}/duplicate`, body),
    (plan) => plan,
  );

/** Name, description, archived. The version is the one the change was made against; 412 STALE when somebody was faster. */
export const useUpdatePlan = () =>
  usePlanMutation(
    ({ id, version, ...body }: z.input<typeof planUpdate> & { id: string; version: number }) =>
      api.patch<PlanRow>(`/plans/${encodeURIComponent(id)}`, body, { ifMatch: version }),
    (plan) => plan,
  );

/** Saves the inputs as the next revision of the plan; 412 STALE when somebody was faster. */
export const useSaveRevision = () =>
  usePlanMutation(
    ({ planId, version, ...body }: z.input<typeof revisionCreate> & { planId: string; version: number }) =>
      api.post<RevisionRow>(`/plans/${encodeURIComponent(planId)}/revisions`, body, { ifMatch: version }),
  );
