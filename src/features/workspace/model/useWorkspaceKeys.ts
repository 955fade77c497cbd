import type { DialogName } from "../header/Dialogs";
import type { DraftInHand } from "./useDraft";
import type { useLook } from "./useLook";
import { useKeys } from "./useKeys";
import type { SightInHand } from "./useSight";

/** What the keyboard does on the plan's screen; KeysDialog names it all.
 *  @param fixed  the settings are only looked at     @param windows  how many there are, which is in hand, and how to take another */
export function useWorkspaceKeys(
  draft: DraftInHand,
  look: ReturnType<typeof useLook>,
  see: SightInHand["change"],
  elements: readonly string[],
  fixed: boolean,
  mayWrite: boolean,
  windows: { count: number; chosen: number; choose: (index: number) => void },
  open: (dialog: DialogName) => void,
  copyLink: () => void,
  comments: () => void,
): void {
  const { count, chosen, choose } = windows;
  const { focus, setFocus, map } = look;
  useKeys([
    { key: "z", ctrl: true, shift: false, run: () => fixed || draft.undo() },
    { key: "z", ctrl: true, shift: true, run: () => fixed || draft.redo() },
    { key: "y", ctrl: true, run: () => fixed || draft.redo() },
    { key: "s", ctrl: true, run: () => mayWrite && !fixed && draft.changed && open("save") },
    { key: "f", run: () => map.setPlain(!map.plain) },
    { key: "r", run: () => open("revisions") },
    { key: "c", run: comments },
    { key: "w", run: () => count > 1 && choose((chosen + 1) % count) },
    { key: "l", run: copyLink },
    { key: "?", run: () => open("keys") },
    ...["0", "escape"].map((key) => ({
      key,
      run: () => see({ focus: null, pair: null, pinned: null, ...(key === "0" ? { hidden: [] } : {}) }),
    })),
    ...elements.slice(0, 9).map((element, i) => ({
      key: String(i + 1),
      run: () => setFocus(focus === element ? null : element),
    })),
  ]);
}
