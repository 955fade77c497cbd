import type { DialogName } from "../header/Dialogs";
import type { Answers } from "./useAnswers";
import { useKeys } from "./useKeys";
import type { useLook } from "./useLook";
import type { SightInHand } from "./useSight";
import type { Table } from "./useTable";

/** What the keyboard does on the plan's screen; KeysDialog names it all. */
export function useWorkspaceKeys(
  { draft, inputs, fixed }: Table,
  { focus, setFocus, map }: ReturnType<typeof useLook>,
  { solution, chosen, choose }: Answers,
  see: SightInHand["change"],
  {
    mayWrite,
    open,
    copyLink,
    comments,
  }: { mayWrite: boolean; open: (dialog: DialogName) => void; copyLink: () => void; comments: () => void },
): void {
  const count = solution?.windows.length ?? 0;
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
    ...inputs.metals.slice(0, 9).map(({ element }, i) => ({
      key: String(i + 1),
      run: () => setFocus(focus === element ? null : element),
    })),
  ]);
}
