import { useCallback, useEffect, useMemo, useReducer, useRef, useState } from "react";
import type { PlanInputs, RevisionRow } from "../../../../shared/schemas/plan";
import { type Draft, dropDraft, keepDraft, readDraft } from "./draftShelf";
import type { Edit } from "./edit";
import { history, sameInputs, startHistory } from "./history";

export interface DraftInHand {
  inputs: PlanInputs;
  /** changes the inputs; `about` joins the changes of one gesture to one step of undo */
  edit: (change: Edit, about?: string) => void;
  /** a gesture ended */
  settle: () => void;
  undo: () => void;
  redo: () => void;
  canUndo: boolean;
  canRedo: boolean;
  /** differs from the revision it started from */
  changed: boolean;
  /** the revision it started from; older than the latest when somebody saved meanwhile */
  basedOn: number;
  /** false where this browser keeps nothing between visits */
  kept: boolean;
  procedures: Readonly<Record<string, string>>;
  nameProcedure: (code: string, procedure: string) => void;
  /** starts over from a revision, keeping the way back open */
  take: (revision: Pick<RevisionRow, "number" | "inputs">) => void;
  /** the inputs in hand became a revision */
  saved: (revision: RevisionRow) => void;
}

/** The inputs of a plan while somebody works on them: undo, redo, and a copy in the browser until they are saved. */
export function useDraft(planId: string, latest: RevisionRow): DraftInHand {
  const [start] = useState(() => ({ draft: readDraft(planId), latest }));
  const [state, act] = useReducer(history, start, ({ draft }) =>
    draft && !sameInputs(draft.inputs, latest.inputs)
      ? startHistory(draft.inputs, [latest.inputs])
      : startHistory(latest.inputs),
  );
  const [base, setBase] = useState<Pick<RevisionRow, "number" | "inputs">>(() =>
    start.draft && !sameInputs(start.draft.inputs, latest.inputs)
      ? { number: start.draft.basedOn, inputs: latest.inputs }
      : latest,
  );
  const [procedures, setProcedures] = useState<Record<string, string>>(start.draft?.procedures ?? {});
  const [kept, setKept] = useState(true);
  const inputs = state.present;
  const changed = useMemo(() => !sameInputs(inputs, base.inputs), [inputs, base]);

  // Written behind the hand, not under it: a drag would else write at every step.
  const pending = useRef<Draft | null>(null);
  useEffect(() => {
    pending.current = { basedOn: base.number, inputs, procedures };
    const nothing = !changed && Object.values(procedures).every((p) => p === "");
    const write = () => {
      if (pending.current === null) return;
      if (nothing) dropDraft(planId);
      else setKept(keepDraft(planId, pending.current));
      pending.current = null;
    };
    const timer = setTimeout(write, 300);
    window.addEventListener("pagehide", write);
    return () => {
      clearTimeout(timer);
      window.removeEventListener("pagehide", write);
    };
  }, [planId, base, inputs, procedures, changed]);
  useEffect(
    () => () => {
      if (pending.current) keepDraft(planId, pending.current);
    },
    [planId],
  );

  const present = useRef(inputs);
  useEffect(() => {
    present.current = inputs;
  }, [inputs]);
  const edit = useCallback((change: Edit, about?: string) => {
    const next = change(present.current);
    // Two edits in one event build on each other, before React has drawn the first.
    present.current = next;
    act({ type: "change", inputs: next, at: performance.now(), ...(about === undefined ? {} : { about }) });
  }, []);
  const settle = useCallback(() => act({ type: "settle" }), []);
  const undo = useCallback(() => act({ type: "undo" }), []);
  const redo = useCallback(() => act({ type: "redo" }), []);
  const nameProcedure = useCallback(
    (code: string, procedure: string) => setProcedures((old) => ({ ...old, [code]: procedure })),
    [],
  );
  const take = useCallback((revision: Pick<RevisionRow, "number" | "inputs">) => edit(() => revision.inputs), [edit]);
  const saved = useCallback((revision: RevisionRow) => setBase(revision), []);

  return {
    inputs,
    edit,
    settle,
    undo,
    redo,
    canUndo: state.past.length > 0,
    canRedo: state.future.length > 0,
    changed,
    basedOn: base.number,
    kept,
    procedures,
    nameProcedure,
    take,
    saved,
  };
}
