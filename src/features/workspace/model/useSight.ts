import { useCallback, useMemo } from "react";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Frame } from "../../../../shared/schemas/problem";
import type { Point } from "../../../../shared/solution";
import type { ChangeView } from "../address/useView";
import type { PlanView } from "../address/view";

/** What somebody looks at on the map; none of it belongs to the plan. */
export interface Sight {
  /** element in focus: the others step back */
  focus: string | null;
  /** elements that are not drawn */
  hidden: readonly string[];
  /** two metals that are compared: only they are drawn */
  pair: readonly [string, string] | null;
  /** a point whose crosscuts are shown beside those of the set point */
  pinned: Point | null;
  /** what is in sight, V vs SHE; null: the whole frame */
  zoom: Frame | null;
}

export const wholeSight: Sight = { focus: null, hidden: [], pair: null, pinned: null, zoom: null };

const within = (a: Frame, b: Frame): boolean =>
  a.pH[0] >= b.pH[0] - 1e-9 && a.pH[1] <= b.pH[1] + 1e-9 && a.Eh[0] >= b.Eh[0] - 1e-9 && a.Eh[1] <= b.Eh[1] + 1e-9;

/** What is left of a wish when the plan has other metals or another frame. */
export function sightOf(wanted: Sight, { metals, frame }: Pick<PlanInputs, "metals" | "frame">): Sight {
  const known = new Set(metals.map((m) => m.element));
  const hidden = wanted.hidden.filter((element) => known.has(element));
  return {
    focus: wanted.focus !== null && known.has(wanted.focus) ? wanted.focus : null,
    hidden: hidden.length < known.size ? hidden : [],
    pair: wanted.pair?.every((element) => known.has(element)) ? wanted.pair : null,
    pinned: wanted.pinned,
    zoom: wanted.zoom && within(wanted.zoom, frame) ? wanted.zoom : null,
  };
}

export interface SightInHand {
  sight: Sight;
  change: (part: Partial<Sight>) => void;
}

/** What the view in the address says of it. */
export function useSight(
  { metals, frame }: Pick<PlanInputs, "metals" | "frame">,
  { focus, hidden, pair, pin, visible }: PlanView,
  changeView: ChangeView,
): SightInHand {
  const sight = useMemo(
    () => sightOf({ focus, hidden, pair, pinned: pin, zoom: visible }, { metals, frame }),
    [focus, hidden, pair, pin, visible, metals, frame],
  );
  const change = useCallback(
    ({ pinned, zoom, ...part }: Partial<Sight>) =>
      changeView({
        ...part,
        ...(pinned !== undefined && { pin: pinned }),
        ...(zoom !== undefined && { visible: zoom }),
      }),
    [changeView],
  );
  return { sight, change };
}
