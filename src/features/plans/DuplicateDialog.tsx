import type { PlanRow } from "../../../shared/schemas/plan";
import { whenOpened } from "../../components/whenOpened";
import type { PlanDialogProps } from "./RenameDialog";

export interface DuplicateDialogProps extends PlanDialogProps {
  onCopied: (copy: PlanRow) => void;
}

export const DuplicateDialog = whenOpened<DuplicateDialogProps>(() => import("./Duplicate"));
