import { useNavigate } from "react-router-dom";
import type { TrialRow } from "../../../shared/schemas/trial";
import { Confirm } from "../../components/Dialog";
import { HistoryDialog } from "../../components/HistoryDialog";
import { ReasonDialog } from "../../components/ReasonDialog";
import { ErrorNote } from "../../components/status";
import { useDeleteTrial, useReopenTrial, useRestoreTrial } from "../../lib/trials";
import type { DraftInHand } from "../../lib/useRecordDraft";
import { stepped, type Step } from "./model/flow";
import type { TrialValues } from "./model/trialValues";
import { trialWords } from "./model/trialWords";

export type TrialDialog =
  { kind: "history" } | { kind: "delete" } | { kind: "restore" } | { kind: "reopen" } | { kind: "step"; step: Step };

interface TrialDialogsProps {
  trial: TrialRow;
  draft: DraftInHand<TrialValues, TrialRow>;
  open: TrialDialog | null;
  onOpen: (dialog: TrialDialog | null) => void;
}

/** What is asked before a trial is rejected, opened again, deleted, restored; and its history. */
export function TrialDialogs({ trial, draft, open, onOpen }: TrialDialogsProps) {
  const navigate = useNavigate();
  const remove = useDeleteTrial();
  const restore = useRestoreTrial();
  const reopen = useReopenTrial();
  const onOpenChange = (next: boolean) => !next && onOpen(null);
  const at = { id: trial.id, version: trial.version };
  const done = { onSuccess: () => onOpen(null) };
  return (
    <>
      <HistoryDialog
        open={open?.kind === "history"}
        onOpenChange={onOpenChange}
        title={`History of trial ${trial.code}`}
        path={`/trials/${encodeURIComponent(trial.id)}`}
        words={trialWords}
      />
      <ReasonDialog
        open={open?.kind === "delete"}
        onOpenChange={onOpenChange}
        title={`Delete trial ${trial.code}`}
        description="It leaves every list and figure. Its record stays and can be restored from the campaign’s deleted trials."
        action="Delete"
        danger
        busy={remove.isPending}
        error={remove.error}
        onConfirm={(reason) =>
          remove.mutate({ ...at, reason }, { onSuccess: () => void navigate(`/campaigns/${trial.campaignId}`) })
        }
      />
      <Confirm
        open={open?.kind === "restore"}
        onOpenChange={onOpenChange}
        title={`Restore trial ${trial.code}`}
        description="It counts again in every list and figure of its campaign."
        action="Restore"
        busy={restore.isPending}
        onConfirm={() => restore.mutate(at, done)}
      >
        {restore.error && <ErrorNote doing="Not restored" error={restore.error} />}
      </Confirm>
      <ReasonDialog
        open={open?.kind === "reopen"}
        onOpenChange={onOpenChange}
        title={`Open trial ${trial.code} again`}
        description="The approval is taken back and the record can be changed; both stay in its history."
        action="Open again"
        required
        busy={reopen.isPending}
        error={reopen.error}
        onConfirm={(reason) => reopen.mutate({ ...at, reason }, done)}
      />
      <ReasonDialog
        open={open?.kind === "step"}
        onOpenChange={onOpenChange}
        title={open?.kind === "step" ? `${open.step.label} trial ${trial.code}` : ""}
        description={
          open?.kind === "step" && open.step.to === "rejected"
            ? "A rejected trial keeps its record and counts in no figure. The reason stands beside it."
            : undefined
        }
        action={open?.kind === "step" ? open.step.label : ""}
        danger={open?.kind === "step" && open.step.to === "rejected"}
        required
        onConfirm={(reason) => {
          if (open?.kind !== "step") return;
          const { step } = open;
          draft.edit((t) => stepped(t, step, reason, new Date()));
          void draft.save(reason);
          onOpen(null);
        }}
      />
    </>
  );
}
