import { useCallback } from "react";
import type { Problem } from "../../../../shared/schemas/problem";
import type { Solution } from "../../../../shared/solution";
import { messageOf } from "../../../lib/failure";
import type { PotentialScale } from "../../../lib/potential";
import type { ProposalStore } from "../../../map/proposalStore";
import type { ShownTrials } from "../../../map/TrialsLayer";
import type { ExportKind, Said } from "../header/WorkspaceHeader";
import type { MapModel } from "./useMapModel";
import type { Table } from "./useTable";

interface Shown {
  problem: Problem;
  solution: Solution | null;
  model: MapModel | null;
  trials: ShownTrials | null;
  proposals: ProposalStore;
  scale: PotentialScale;
}

/** Makes a file of what is on the table and shown of it, and says how it goes. */
export function useExport(table: Table, shown: Shown, say: (word: Said | null) => void) {
  const { plan, frozen, draft, inputs, data } = table;
  const { problem, solution, model, trials, proposals, scale } = shown;
  return useCallback(
    (kind: ExportKind) => {
      if (!solution || !model) return;
      say({ text: "Making the file …", bad: false });
      const state = frozen
        ? `revision ${frozen.number}`
        : draft.changed
          ? `draft on revision ${draft.basedOn}`
          : `revision ${draft.basedOn}`;
      import("./exportPlan")
        .then(({ exportPlan }) =>
          exportPlan(kind, {
            plan,
            state,
            // with a newer revision saved meanwhile, still the one that is seen
            revision: frozen?.number ?? draft.basedOn,
            scale,
            inputs,
            problem,
            solution,
            model: { ...model, asked: { ...model.asked, trials, proposals: proposals.marks.get() } },
            data,
            trialWords: trials?.words() ?? null,
          }),
        )
        .then(
          () =>
            say(
              kind === "sheet" && !frozen && draft.changed
                ? {
                    text: `The sheet is that of revision ${draft.basedOn}, without the unsaved changes.`,
                    bad: false,
                  }
                : null,
            ),
          (error: unknown) => say({ text: `Not exported: ${messageOf(error)}`, bad: true }),
        );
    },
    [solution, model, trials, proposals, frozen, draft.changed, draft.basedOn, plan, inputs, problem, scale, data, say],
  );
}
