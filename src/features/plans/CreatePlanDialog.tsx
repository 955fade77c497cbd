import type { ProjectRow } from "../../../shared/schemas/api";
import { whenOpened } from "../../components/whenOpened";

export interface CreatePlanDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  projects: readonly ProjectRow[];
  projectId: string;
  /** the feed to start from */
  feedId?: string | undefined;
}

export const CreatePlanDialog = whenOpened<CreatePlanDialogProps>(() => import("./CreatePlan"));
