import type { ReactNode } from "react";
import { whenOpened } from "./whenOpened";

export interface HistoryDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  /** of the row: "/trials/abc" */
  path: string;
  /** a field as people call it: "measured.readings.2.pH.value" → "reading 3, pH" */
  words: (path: string) => string;
  /** a value that is not plain text or number, in words; undefined leaves it to the dialog */
  show?: (path: string, value: unknown) => ReactNode | undefined;
}

/** Who changed what, when and why. */
export const HistoryDialog = whenOpened<HistoryDialogProps>(() => import("./HistorySheet"));
