import { useCallback, useMemo } from "react";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Point } from "../../../../shared/solution";
import type { TrialLooks } from "../../trials/planTrials/usePlanTrials";
import { useAddress, useView } from "../address/useView";
import type { FilmWish, PlanView } from "../address/view";
import { useMapSettings, useReagents, useSwitches } from "./useMapSettings";

/** How the plan is looked at, with a hand on each part of it; the address follows.
 *  @param start  what the address brought     @param settings  it still brings settings that nobody took or left */
export function useLook(start: PlanView, planId: string, inputs: PlanInputs, settings: boolean) {
  const { view, change, own } = useView(start, planId, inputs);
  const map = useMapSettings(view, change);
  const switched = useSwitches(view, change);
  const reagents = useReagents(planId, inputs, view, change);
  const { layers, plain, switches } = map;
  const seen = useMemo(
    () => ({ ...view, plain, layers: { ...definedIn(switches), ...layers } }),
    [view, plain, layers, switches],
  );
  useAddress(seen, own, settings);

  const { focus: wantedFocus, trialsOf, colouredBy, without, brush } = view;
  const trials = useMemo<TrialLooks>(
    () => ({ scope: trialsOf, colouring: colouredBy, hidden: without, brush }),
    [trialsOf, colouredBy, without, brush],
  );
  const lookAtTrials = useCallback(
    ({ scope, colouring, hidden, brush }: Partial<TrialLooks>) =>
      change({
        ...(scope && { trialsOf: scope }),
        ...(colouring && { colouredBy: colouring }),
        ...(hidden && { without: hidden }),
        ...(brush !== undefined && { brush }),
      }),
    [change],
  );
  return {
    /** everything seen, as an address states it */
    seen,
    view,
    change,
    map,
    switched,
    ...reagents,
    focus: inputs.metals.some((m) => m.element === wantedFocus) ? wantedFocus : null,
    setFocus: useCallback((focus: string | null) => change({ focus }), [change]),
    setWindow: useCallback((window: number) => change({ window }), [change]),
    setPinned: useCallback((pin: Point | null) => change({ pin }), [change]),
    setSide: useCallback((side: PlanView["side"]) => change({ side }), [change]),
    setFilm: useCallback((film: FilmWish | null) => change({ film }), [change]),
    trials,
    lookAtTrials,
  };
}

const definedIn = (switches: Readonly<Record<string, boolean | undefined>>): Record<string, boolean> =>
  Object.fromEntries(Object.entries(switches).filter((entry): entry is [string, boolean] => entry[1] !== undefined));
