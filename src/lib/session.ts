import { queryOptions, useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import type { firstAdmin, Member, MemberRole, SessionAnswer, signIn } from "../../shared/schemas/member";
import { api } from "./api";
import { keys } from "./queries";

export const sessionQuery = queryOptions({
  queryKey: keys.session,
  queryFn: ({ signal }) => api.get<SessionAnswer>("/session", { signal }),
  staleTime: Infinity,
});
export const useSessionQuery = () => useQuery(sessionQuery);

/** The signed-in member. Only below the gate, where there is one.
 *  @throws Error when nobody is signed in */
export function useSession(): { user: Member } {
  const { data } = useSessionQuery();
  if (!data?.user) throw new Error("useSession is for screens behind the sign-in");
  return { user: data.user };
}

const may = {
  /** create, change, archive plans and projects */
  writePlans: ["admin", "metallurgist"],
  /** add a species to the library, override one */
  editChemistry: ["admin", "metallurgist"],
  /** feeds and campaigns; approve and reject trials */
  review: ["admin", "metallurgist"],
  /** plan and record trials */
  writeBench: ["admin", "metallurgist", "technician"],
  /** invite members, change their role, close their account */
  manageMembers: ["admin"],
} as const satisfies Record<string, readonly MemberRole[]>;

export type Permission = keyof typeof may;

/** Mirrors the server's roles: a control nobody may use is not shown. The server decides. */
export const mayDo = (role: MemberRole, action: Permission): boolean =>
  (may[action] as readonly MemberRole[]).includes(role);

export const useMay = (action: Permission): boolean => mayDo(useSession().user.role, action);

function useEnter<Body>(path: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Body) => api.post<SessionAnswer>(path, body),
    onSuccess: (session) => {
      client.setQueryData(keys.sessionEnded, false);
      client.setQueryData(keys.session, session);
      void client.invalidateQueries({ predicate: ({ queryKey }) => queryKey[0] !== "session" });
    },
  });
}
export const useSignIn = () => useEnter<z.infer<typeof signIn>>("/session");
export const useFirstAdmin = () => useEnter<z.infer<typeof firstAdmin>>("/first-admin");

export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => api.delete<null>("/session"),
    onSuccess: async () => {
      client.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== "session" });
      await client.refetchQueries({ queryKey: keys.session, exact: true });
    },
  });
}

/** True when the server stopped knowing the session while the page was open; the page stays and asks to sign in again. */
export function useSessionEnded(): boolean {
  const { data } = useQuery({
    queryKey: keys.sessionEnded,
    queryFn: () => false,
    staleTime: Infinity,
    initialData: false,
  });
  return data;
}
