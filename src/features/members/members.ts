import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import type { InvitationRow, invitationCreate, MemberRow, memberUpdate } from "../../../shared/schemas/invitation";
import { api } from "../../lib/api";
import { allRows } from "../../lib/pages";
import { keys } from "../../lib/queries";

/** Others open accounts from their letters meanwhile: read anew whenever the page is opened. */
const fresh = { staleTime: 0 };

export const useMembers = () =>
  useQuery({ queryKey: keys.members, queryFn: ({ signal }) => allRows<MemberRow>("/members", signal), ...fresh });

export const useInvitations = () =>
  useQuery({
    queryKey: keys.invitations,
    queryFn: ({ signal }) => allRows<InvitationRow>("/invitations", signal),
    ...fresh,
  });

function useMembersMutation<Variables, Answer>(mutationFn: (variables: Variables) => Promise<Answer>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn,
    // After a refusal too: somebody else may have changed what stands here.
    onSettled: () =>
      Promise.all(
        [keys.members, keys.invitations, keys.letters, keys.session].map((queryKey) =>
          client.invalidateQueries({ queryKey, exact: true }),
        ),
      ),
  });
}

export const useUpdateMember = () =>
  useMembersMutation(({ id, version, ...body }: z.input<typeof memberUpdate> & { id: string; version: number }) =>
    api.patch<MemberRow>(`/members/${encodeURIComponent(id)}`, body, { ifMatch: version }),
  );

export const useInvite = () =>
  useMembersMutation((body: z.input<typeof invitationCreate>) => api.post<InvitationRow>("/invitations", body));

export const useInviteAgain = () =>
  useMembersMutation((id: string) => api.post<InvitationRow>(`/invitations/${encodeURIComponent(id)}/again`));

export const useWithdrawInvitation = () =>
  useMembersMutation((id: string) => api.delete<InvitationRow>(`/invitations/${encodeURIComponent(id)}`));
