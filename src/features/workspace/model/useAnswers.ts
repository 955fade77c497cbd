import { useMemo } from "react";
import type { FreeAcidCurve } from "../../../../shared/activity/freeAcid";
import { freeAcidOf } from "../../../../shared/plan/freeAcidOf";
import type { HazardGas } from "../../../../shared/hazards/pressures";
import type { Advice } from "../../../../shared/advice/openings";
import type { Robust } from "../../../../shared/advice/robust";
import type { HeldSetPoint } from "../../../../shared/setpoint/held";
import type { Window } from "../../../../shared/solution";
import { holdSetPoint } from "./adviceEdit";
import { type Awaited, useAdvice, useRobust } from "./useAsked";
import type { useLook } from "./useLook";
import { type Gases, useGases, useHeld } from "./usePoint";
import { type Solved, useSolved } from "./useSolved";
import type { Table } from "./useTable";

/** What the settings on the table come to; the solution stands with the held set point in it. */
export interface Answers extends Solved {
  /** null where the deepest point counts */
  held: HeldSetPoint | null;
  /** index of the window in hand */
  chosen: number;
  choose: (index: number) => void;
  /** the window in hand; null where none is open */
  window: Window | null;
  /** what would open a window, while none is open */
  advice: Awaited<Advice>;
  /** what holds over the plan's ranges */
  robust: Awaited<Robust>;
  gases: Gases | null;
  chooseGas: (gas: HazardGas, on: boolean) => void;
  /** free acid against pH of a sulfate liquor */
  freeAcid: FreeAcidCurve | null;
}

/** Answers to what lies on the table, for the window that is looked at. */
export function useAnswers({ inputs, data, draft, fixed }: Table, look: ReturnType<typeof useLook>): Answers {
  const solved = useSolved(inputs, data);
  const { problem, analysis, failure } = solved;
  const { solution, held } = useHeld(inputs, solved.solution, analysis);
  const advice = useAdvice(problem, inputs, data, failure === null && solution?.windows.length === 0);
  const robust = useRobust(problem, inputs, data);
  const count = solution?.windows.length ?? 0;
  const chosen = held?.index ?? Math.min(look.view.window, Math.max(0, count - 1));
  const window = solution?.windows[chosen] ?? null;
  const { gases, choose: chooseGas } = useGases(analysis, window, look.switched);
  const { ligands, temperatureC } = inputs;
  const freeAcid = useMemo(() => freeAcidOf(data, { ligands, temperatureC }), [data, ligands, temperatureC]);

  function choose(index: number) {
    look.setWindow(index);
    // A point held elsewhere would bring its own window back.
    if (held && held.index !== index && !fixed) draft.edit(holdSetPoint(null));
  }
  return { ...solved, solution, held, chosen, choose, window, advice, robust, gases, chooseGas, freeAcid };
}
