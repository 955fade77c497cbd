import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import type { commentCreate, CommentRow } from "../../shared/schemas/comment";
import { api } from "./api";
import { allRows } from "./pages";
import { keys } from "./queries";

const listOf = (planId: string) => `/plans/${encodeURIComponent(planId)}/comments`;
const rowOf = ({ id }: Pick<CommentRow, "id">) => `/comments/${encodeURIComponent(id)}`;

/** What was said of a plan, oldest first. */
export const useComments = (planId: string) =>
  useQuery({
    queryKey: keys.comments(planId),
    queryFn: ({ signal }) => allRows<CommentRow>(listOf(planId), signal),
  });

/** After a write the list is read anew, and the plan, which counts it. */
function useCommentMutation<Variables>(planId: string, mutationFn: (variables: Variables) => Promise<CommentRow>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn,
    onSuccess: async () => {
      void client.invalidateQueries({ queryKey: keys.plan(planId), exact: true });
      await client.invalidateQueries({ queryKey: keys.comments(planId) });
    },
  });
}

export const useAddComment = (planId: string) =>
  useCommentMutation(planId, (body: z.input<typeof commentCreate>) => api.post<CommentRow>(listOf(planId), body));

/** The version is the one that was read; 412 STALE when it was reworded elsewhere meanwhile. */
export const useRewordComment = (planId: string) =>
  useCommentMutation(planId, ({ text, ...row }: Pick<CommentRow, "id" | "version" | "text">) =>
    api.patch<CommentRow>(rowOf(row), { text }, { ifMatch: row.version }),
  );

export const useRemoveComment = (planId: string) =>
  useCommentMutation(planId, (row: Pick<CommentRow, "id" | "version">) =>
    api.delete<CommentRow>(rowOf(row), { ifMatch: row.version }),
  );

export const useBringBackComment = (planId: string) =>
  useCommentMutation(planId, (row: Pick<CommentRow, "id" | "version">) =>
    api.post<CommentRow>(`${rowOf(row)}/restore`, { reason: "" }, { ifMatch: row.version }),
  );
