import { whenOpened } from "./whenOpened";

export interface PotentialScaleDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  /** of the plan on the screen, where there is one */
  liquorC?: number;
}

/** Unit, electrode and its temperature, remembered for the member. */
export const PotentialScaleDialog = whenOpened<PotentialScaleDialogProps>(() => import("./PotentialScaleSheet"));
