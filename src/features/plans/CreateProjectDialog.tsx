import { whenOpened } from "../../components/whenOpened";

export interface CreateProjectDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

export const CreateProjectDialog = whenOpened<CreateProjectDialogProps>(() => import("./CreateProject"));
