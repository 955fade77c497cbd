import { useCallback, useMemo, useState } from "react";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Frame } from "../../../../shared/schemas/problem";
import type { Point } from "../../../../shared/solution";

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

/** The part that the address keeps (useLook). */
export interface KeptLook {
  focus: string | null;
  view: { pin: Point | null; visible: Frame | null };
  setFocus: (focus: string | null) => void;
  setPinned: (at: Point | null) => void;
  setZoom: (to: Frame | null) => void;
}

/** What the address keeps of it, and which metals are drawn. */
export function useSight(inputs: Pick<PlanInputs, "metals" | "frame">, look: KeptLook): SightInHand {
  const [drawn, setDrawn] = useState<Pick<Sight, "hidden" | "pair">>({ hidden: [], pair: null });
  const { metals, frame } = inputs;
  const { focus, setFocus, setPinned, setZoom } = look;
  const { pin, visible } = look.view;
  const sight = useMemo(
    () => sightOf({ ...drawn, focus, pinned: pin, zoom: visible }, { metals, frame }),
    [drawn, focus, pin, visible, metals, frame],
  );
  const change = useCallback(
    (part: Partial<Sight>) => {
      const { hidden, pair } = part;
      if (part.focus !== undefined) setFocus(part.focus);
      if (part.pinned !== undefined) setPinned(part.pinned);
      if (part.zoom !== undefined) setZoom(part.zoom);
      if (hidden !== undefined || pair !== undefined)
        setDrawn((old) => ({ hidden: hidden ?? old.hidden, pair: pair === undefined ? old.pair : pair }));
    },
    [setFocus, setPinned, setZoom],
  );
  return { sight, change };
}
