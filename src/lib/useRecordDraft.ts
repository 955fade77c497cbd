import { useEffect, useState, useSyncExternalStore } from "react";
import { RecordDraft, type DraftOptions, type DraftState } from "./recordDraft";

export type DraftInHand<Values extends object, Row> = DraftState<Values> &
  Pick<RecordDraft<Values, Row>, "edit" | "undo" | "redo" | "discard" | "resolve" | "save">;

const RETRY = 15_000; // ms

/** A record in hand; give the component a key of the record's id. What waits for a connection is sent when there is one. */
export function useRecordDraft<Values extends object, Row>(
  options: DraftOptions<Values, Row>,
): DraftInHand<Values, Row> {
  const [draft] = useState(() => new RecordDraft(options));
  const state = useSyncExternalStore(draft.subscribe, draft.get);
  const { row } = options;
  useEffect(() => draft.seen(row), [draft, row]);
  const waiting = state.status === "waiting";
  useEffect(() => {
    if (!waiting) return;
    const again = () => void draft.save();
    const timer = setInterval(again, RETRY);
    window.addEventListener("online", again);
    return () => {
      clearInterval(timer);
      window.removeEventListener("online", again);
    };
  }, [draft, waiting]);
  const { edit, undo, redo, discard, resolve, save } = draft;
  return { ...state, edit, undo, redo, discard, resolve, save };
}
