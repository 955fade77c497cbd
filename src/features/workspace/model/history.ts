import type { PlanInputs } from "../../../../shared/schemas/plan";

/** Every state gone through since the page was opened, and the one that stands. */
export interface History<State> {
  past: readonly State[];
  present: State;
  future: readonly State[];
  /** what the last change was about and when, so that one drag makes one step of undo; null closes it */
  open: { about: string; at: number } | null;
}

export type HistoryAction<State> =
  /** `about` names a control that changes many times in one gesture; changes without it are steps of their own */
  | { type: "change"; to: State; about?: string; at: number }
  /** what holds of every state, undone ones as well, changed in all */
  | { type: "every"; change: (state: State) => State }
  | { type: "settle" }
  | { type: "undo" }
  | { type: "redo" };

const DEPTH = 200;
/** a pause this long, ms, ends a gesture even when nobody said so */
const PAUSE = 1200;

export const startHistory = <State>(present: State, past: readonly State[] = []): History<State> => ({
  past,
  present,
  future: [],
  open: null,
});

export function history<State>(state: History<State>, action: HistoryAction<State>): History<State> {
  switch (action.type) {
    case "change": {
      if (action.to === state.present) return state;
      const open = action.about === undefined ? null : { about: action.about, at: action.at };
      const goesOn =
        state.open !== null &&
        state.open.about === action.about &&
        action.at - state.open.at < PAUSE &&
        state.past.length > 0;
      const past = goesOn ? state.past : [...state.past, state.present].slice(-DEPTH);
      return { past, present: action.to, future: [], open };
    }
    case "every":
      return {
        past: state.past.map(action.change),
        present: action.change(state.present),
        future: state.future.map(action.change),
        open: state.open,
      };
    case "settle":
      return state.open === null ? state : { ...state, open: null };
    case "undo": {
      const before = state.past[state.past.length - 1];
      if (before === undefined) return state;
      return { past: state.past.slice(0, -1), present: before, future: [state.present, ...state.future], open: null };
    }
    case "redo": {
      const [next, ...future] = state.future;
      if (next === undefined) return state;
      return { past: [...state.past, state.present], present: next, future, open: null };
    }
  }
}

/** Whether two inputs ask the same, whatever the order of their keys. */
export const sameInputs = (a: PlanInputs, b: PlanInputs): boolean => a === b || ordered(a) === ordered(b);

const ordered = (value: unknown): string =>
  JSON.stringify(value, (_key, v: unknown) =>
    v !== null && typeof v === "object" && !Array.isArray(v)
      ? Object.fromEntries(Object.entries(v).sort(([p], [q]) => (p < q ? -1 : 1)))
      : v,
  );
