import type { PlanRow } from "../../../shared/schemas/plan";
import { whenOpened } from "../../components/whenOpened";

export interface PlanDialogProps {
  plan: PlanRow;
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

export const RenameDialog = whenOpened<PlanDialogProps>(() => import("./Rename"));
