import { useCallback, useEffect, useMemo, useReducer, useRef, useState } from "react";
import type { PlanInputs, RevisionRow } from "../../../../shared/schemas/plan";
import { type Draft, dropDraft, keepDraft, readDraft } from "./draftShelf";
import type { Edit } from "./edit";
import { history, sameInputs, startHistory } from "./history";

/** A state of the inputs, and the revision it stands on. Undoing a merge so brings back what it stood on before. */
interface Step {
  inputs: PlanInputs;
  base: Base;
}
/** `inputs` null: of an older revision that a kept draft names; the server has them */
interface Base {
  number: number;
  inputs: PlanInputs | null;
}

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
  /** what that revision said; null where only its number is known */
  baseInputs: PlanInputs | null;
  /** false where this browser keeps nothing between visits */
  kept: boolean;
  procedures: Readonly<Record<string, string>>;
  nameProcedure: (code: string, procedure: string) => void;
  /** starts over from a revision, keeping the way back open */
  take: (revision: Pick<RevisionRow, "number" | "inputs">) => void;
  /** goes on with these inputs on another revision: one step of undo, base and all */
  moveTo: (revision: Pick<RevisionRow, "number" | "inputs">, inputs: PlanInputs) => void;
  /** the inputs in hand became a revision */
  saved: (revision: RevisionRow) => void;
}

/** The inputs of a plan while somebody works on them: undo, redo, and a copy in the browser until they are saved.
 *  @param keeps  false beside a saved state that is only looked at: what the browser keeps is then left alone */
export function useDraft(planId: string, latest: RevisionRow, keeps = true): DraftInHand {
  const [start] = useState(() => ({ draft: readDraft(planId), latest }));
  const [state, act] = useReducer(history<Step>, start, ({ draft }) => {
    const first = { inputs: latest.inputs, base: latest };
    if (!draft || sameInputs(draft.inputs, latest.inputs)) return startHistory(first);
    const base = draft.basedOn === latest.number ? latest : { number: draft.basedOn, inputs: null };
    return startHistory<Step>({ inputs: draft.inputs, base }, [first]);
  });
  const [procedures, setProcedures] = useState<Record<string, string>>(start.draft?.procedures ?? {});
  const [kept, setKept] = useState(true);
  const { inputs, base } = state.present;
  const changed = useMemo(() => base.inputs === null || !sameInputs(inputs, base.inputs), [inputs, base]);

  // Written behind the hand, not under it: a drag would else write at every step.
  const pending = useRef<Draft | null>(null);
  useEffect(() => {
    if (!keeps) return;
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
  }, [planId, base, inputs, procedures, changed, keeps]);
  useEffect(
    () => () => {
      if (pending.current) keepDraft(planId, pending.current);
    },
    [planId],
  );

  const present = useRef(state.present);
  useEffect(() => {
    present.current = state.present;
  }, [state.present]);
  const step = useCallback((to: Step, about?: string) => {
    // Two edits in one event build on each other, before React has drawn the first.
    present.current = to;
    act({ type: "change", to, at: performance.now(), ...(about === undefined ? {} : { about }) });
  }, []);
  const edit = useCallback(
    (change: Edit, about?: string) => {
      const { inputs, base } = present.current;
      const next = change(inputs);
      if (next !== inputs) step({ inputs: next, base }, about);
    },
    [step],
  );
  const settle = useCallback(() => act({ type: "settle" }), []);
  const undo = useCallback(() => act({ type: "undo" }), []);
  const redo = useCallback(() => act({ type: "redo" }), []);
  const nameProcedure = useCallback(
    (code: string, procedure: string) => setProcedures((old) => ({ ...old, [code]: procedure })),
    [],
  );
  const moveTo = useCallback((base: Base, inputs: PlanInputs) => step({ inputs, base }), [step]);
  const take = useCallback(
    (revision: Pick<RevisionRow, "number" | "inputs">) =>
      // An older one is a change of the draft; nobody's later work is passed over by it.
      step({ inputs: revision.inputs, base: revision.number === latest.number ? revision : present.current.base }),
    [step, latest.number],
  );
  const saved = useCallback(
    (revision: RevisionRow) => act({ type: "every", change: ({ inputs }) => ({ inputs, base: revision }) }),
    [],
  );

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
    baseInputs: base.inputs,
    kept,
    procedures,
    nameProcedure,
    take,
    moveTo,
    saved,
  };
}
