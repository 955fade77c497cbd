import type { PlanRow, RevisionRow } from "../../../shared/schemas/plan";
import { whenOpened } from "../../components/whenOpened";

export interface RevisionsDialogProps {
  plan: Pick<PlanRow, "id" | "name">;
  open: boolean;
  onOpenChange: (open: boolean) => void;
  /** brings the inputs of an earlier revision into the plan that is open */
  onTake?: (revision: RevisionRow) => void;
  /** opens a revision as it was, with the data it froze */
  onLook?: (revision: RevisionRow) => void;
  /** puts a revision beside the plan as it stands */
  onCompare?: (revision: RevisionRow) => void;
}

export const RevisionsDialog = whenOpened<RevisionsDialogProps>(() => import("./Revisions"));
