import { useNavigate } from "react-router-dom";
import type { PlanRow, RevisionRow } from "../../../../shared/schemas/plan";
import { Confirm } from "../../../components/Dialog";
import { ErrorNote } from "../../../components/status";
import { useUpdatePlan } from "../../../lib/plans";
import { DuplicateDialog } from "../../plans/DuplicateDialog";
import { RenameDialog } from "../../plans/RenameDialog";
import { RevisionsDialog } from "../../plans/RevisionsDialog";
import type { DraftInHand } from "../model/useDraft";
import { KeysDialog } from "./KeysDialog";
import { SaveDialog } from "./SaveDialog";

export type DialogName = "save" | "revisions" | "rename" | "duplicate" | "archive" | "keys";

/** Every dialog of the workspace; one is open at a time. */
export function Dialogs({
  open,
  onOpen,
  plan,
  draft,
  unconfirmed,
  frozen,
  onRestore,
}: {
  open: DialogName | null;
  onOpen: (dialog: DialogName | null) => void;
  plan: PlanRow;
  draft: DraftInHand;
  unconfirmed: readonly string[];
  frozen: boolean;
  onRestore: (revision: RevisionRow) => void;
}) {
  const navigate = useNavigate();
  const update = useUpdatePlan();
  const show = (name: DialogName) => ({
    open: open === name,
    onOpenChange: (next: boolean) => onOpen(next ? name : null),
  });
  return (
    <>
      <SaveDialog {...show("save")} plan={plan} draft={draft} unconfirmed={unconfirmed} />
      <RevisionsDialog
        {...show("revisions")}
        plan={plan}
        onTake={(revision) => (frozen ? onRestore(revision) : draft.take(revision))}
        onLook={(revision) => {
          onOpen(null);
          void navigate(`/plans/${plan.id}?revision=${revision.number}`);
        }}
      />
      <RenameDialog {...show("rename")} plan={plan} />
      <DuplicateDialog {...show("duplicate")} plan={plan} onCopied={(copy) => void navigate(`/plans/${copy.id}`)} />
      <KeysDialog {...show("keys")} />
      <Confirm
        {...show("archive")}
        title={plan.archived ? `Take ${plan.name} back from the archive` : `Archive ${plan.name}`}
        description={
          plan.archived
            ? "It stands among the plans of its project again."
            : "It leaves the list of plans; nothing is deleted, and it can be taken back."
        }
        action={plan.archived ? "Take back" : "Archive"}
        busy={update.isPending}
        onConfirm={() =>
          update.mutate(
            { id: plan.id, version: plan.version, archived: !plan.archived },
            { onSuccess: () => onOpen(null) },
          )
        }
      >
        {update.error && <ErrorNote doing="Not changed" error={update.error} />}
      </Confirm>
    </>
  );
}
