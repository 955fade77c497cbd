import type { TrialRow } from "../../../../shared/schemas/trial";
import { useUpdateTrial } from "../../../lib/trials";
import { useRecordDraft } from "../../../lib/useRecordDraft";
import { trialProblems, trialValues, type TrialValues } from "./trialValues";

/** A trial in hand, at the desk or at the bench: both keep the same draft. */
export function useTrialDraft(trial: TrialRow) {
  const update = useUpdateTrial();
  return useRecordDraft<TrialValues, TrialRow>({
    shelf: `trial.${trial.id}`,
    row: trial,
    valuesOf: trialValues,
    versionOf: ({ version }) => version,
    check: trialProblems,
    send: (changed, version, reason) => update.mutateAsync({ id: trial.id, version, reason, ...changed }),
  });
}
