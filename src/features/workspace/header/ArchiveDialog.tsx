import { Confirm } from "../../../components/Dialog";
import { ErrorNote } from "../../../components/status";
import { useUpdatePlan } from "../../../lib/plans";
import type { PlanDialogProps } from "../../plans/RenameDialog";

/** Asks before a plan leaves the list, and before it comes back. */
export default function ArchiveDialog({ plan, open, onOpenChange }: PlanDialogProps) {
  const update = useUpdatePlan();
  return (
    <Confirm
      open={open}
      onOpenChange={onOpenChange}
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
          { onSuccess: () => onOpenChange(false) },
        )
      }
    >
      {update.error && <ErrorNote doing="Not changed" error={update.error} />}
    </Confirm>
  );
}
