import type { QueryClient } from "@tanstack/react-query";
import type { PlanRow, RevisionRow } from "../../../../shared/schemas/plan";
import { api } from "../../../lib/api";
import { keys } from "../../../lib/queries";
import { decodeView } from "./codec";
import { baseOf, decodeSettings } from "./settings";
import type { Opened } from "./useOpened";

/** Reads an address, with the revision that its settings start from.
 *  @returns  view, what could not be taken, and the settings proposed */
export async function readAddress(
  query: URLSearchParams,
  plan: PlanRow,
  frozen: RevisionRow | null,
  client: QueryClient,
): Promise<Opened> {
  const text = query.get("settings");
  if (text === null) return { ...decodeView(query, (frozen ?? plan.latest).inputs), settings: null };
  const settings = await proposed(text);
  const inputs = "inputs" in settings ? settings.inputs : (frozen ?? plan.latest).inputs;
  const { view, ignored } = decodeView(query, inputs);
  return "inputs" in settings
    ? { view, ignored, settings: settings.inputs }
    : { view, ignored: [`settings (${settings.wrong})`, ...ignored], settings: null };

  async function proposed(given: string): Promise<ReturnType<typeof decodeSettings>> {
    if (frozen) return { wrong: "a saved revision stands as it is" };
    const number = baseOf(given);
    if (number === null) return { wrong: "it names no revision" };
    if (number === plan.latest.number) return decodeSettings(plan.latest.inputs, given);
    try {
      const base = await client.fetchQuery({
        queryKey: keys.revision(plan.id, number),
        queryFn: () => api.get<RevisionRow>(`/plans/${encodeURIComponent(plan.id)}/revisions/${number}`),
      });
      return decodeSettings(base.inputs, given);
    } catch {
      return { wrong: `revision ${number} could not be read` };
    }
  }
}
