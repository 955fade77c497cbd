import { type Dispatch, lazy, type SetStateAction, Suspense, useCallback, useState } from "react";
import type { PlanInputs, PlanRow, RevisionRow } from "../../../../shared/schemas/plan";
import { useScaleChoice } from "../../../lib/scaleChoice";
import { messageOf } from "../../../lib/failure";
import type { Said } from "../header/WorkspaceHeader";
import type { PlanView } from "./view";

const LinkDialog = lazy(() => import("../header/LinkDialog"));

/** Copies the link to what is seen; where the browser does not let a page, shows it.
 *  @param say  a word beside the commands on how it went; taken back after a while */
export function useLink(
  plan: PlanRow,
  frozen: RevisionRow | null,
  inputs: PlanInputs,
  seen: PlanView,
  say: Dispatch<SetStateAction<Said | null>>,
) {
  const [scale] = useScaleChoice();
  const [shown, setShown] = useState<string | null>(null);
  const copy = useCallback(() => {
    import("./copyLink")
      .then(async ({ linkTo, copied }) => {
        const link = linkTo(plan, frozen, inputs, { ...seen, scale });
        if (!(await copied(link))) return setShown(link);
        const word = { text: "Link copied", bad: false };
        say(word);
        // What was said since stays.
        setTimeout(() => say((now) => (now === word ? null : now)), 4000);
      })
      .catch((error: unknown) => say({ text: `No link: ${messageOf(error)}`, bad: true }));
  }, [plan, frozen, inputs, seen, scale, say]);
  const dialog =
    shown === null ? null : (
      <Suspense fallback={null}>
        <LinkDialog link={shown} onClose={() => setShown(null)} />
      </Suspense>
    );
  return { copy, dialog };
}
