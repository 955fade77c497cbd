import type { QueryClient } from "@tanstack/react-query";
import { chemistryQuery } from "../lib/chemistry";
import { planQuery } from "../lib/plans";
import { sessionQuery } from "../lib/session";

/** Asks for what the first screen will want while its scripts still come: who is signed in, and for a plan's address the plot, the plan
 *  and the chemistry. The screens ask as they always do and find the answer under way; a question that fails here is asked again there. */
export function headStart(client: QueryClient, { pathname, search }: Location) {
  const plan = /^\/plans\/([\w-]+)\/?$/.exec(pathname)?.[1];
  if (plan !== undefined) void import("../map/WindowMap");
  void client.prefetchQuery(sessionQuery).then(() => {
    if (plan === undefined || !client.getQueryData(sessionQuery.queryKey)?.user) return;
    void client.prefetchQuery(planQuery(plan));
    // A saved state brings the chemistry it froze.
    if (!new URLSearchParams(search).has("revision")) void client.prefetchQuery(chemistryQuery());
  });
}
