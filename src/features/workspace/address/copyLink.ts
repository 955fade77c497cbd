import type { PlanInputs, PlanRow, RevisionRow } from "../../../../shared/schemas/plan";
import { encodeView, queryText } from "./codec";
import { encodeSettings } from "./settings";
import type { PlanView } from "./view";

/** The address at which anybody of the project sees what is seen here: the view, and the settings as their difference from the latest
 *  revision, so that a later one does not change what the link shows.
 *  @param seen  with layers, plain and scale as they are in force     @param frozen  the saved state looked at */
export function linkTo(plan: PlanRow, frozen: RevisionRow | null, inputs: PlanInputs, seen: PlanView): string {
  const what: [string, string] = frozen
    ? ["revision", String(frozen.number)]
    : ["settings", encodeSettings(plan.latest, inputs)];
  return `${window.location.origin}/plans/${plan.id}${queryText([what, ...encodeView(seen)])}`;
}

/** @returns  false where the browser lets no page write to the clipboard, as over plain http */
export async function copied(link: string): Promise<boolean> {
  try {
    await navigator.clipboard.writeText(link);
    return true;
  } catch {
    return false;
  }
}
