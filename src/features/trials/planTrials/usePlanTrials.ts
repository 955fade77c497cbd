import { useCallback, useDeferredValue, useEffect, useMemo, useRef, useState } from "react";
import { useNavigate } from "react-router-dom";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { MapTrials } from "../../../../shared/schemas/trialRows";
import type { Solution } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { placedTrials, type PlacedTrial } from "../../../lib/judgedTrials";
import { useMapTrials } from "../../../lib/trials";
import { useRested } from "../../../lib/useRested";
import { colourScale, type ColourScale, type MarkSymbol, type TrialMark } from "../../../map/trialMarks";
import { type Brushed, TrialStore } from "../../../map/trialStore";
import type { ShownTrials } from "../../../map/TrialsLayer";
import { marksInWords, marksOf, stageMarkers, type Colouring } from "./planTrialsModel";

export interface PlanTrials {
  /** undefined while they are read, or while the layer is off */
  answer: MapTrials | undefined;
  error: unknown;
  retry: () => void;
  scope: "plan" | "project";
  setScope: (scope: "plan" | "project") => void;
  hidden: ReadonlySet<string>;
  toggle: (campaignId: string) => void;
  colouring: Colouring;
  setColouring: (colouring: Colouring) => void;
  /** judged against what the map shows, hidden campaigns left out */
  trials: readonly PlacedTrial[];
  marks: readonly TrialMark[];
  markers: ReadonlyMap<string, MarkSymbol>;
  scale: ColourScale;
  store: TrialStore;
  /** for the map */
  shown: ShownTrials | null;
  open: (id: string) => void;
  /** what they are judged against */
  ground: { inputs: PlanInputs; data: ChemicalData };
}

const NONE: readonly PlacedTrial[] = [];

/** Which trials are looked at and what colours them. */
export interface TrialLooks {
  scope: "plan" | "project";
  colouring: Colouring;
  /** ids of campaigns */
  hidden: readonly string[];
  /** the box whose trials are listed; null: all of them */
  brush: Brushed | null;
}

/** The trials of a plan's map: read once, judged against the solution in hand, coloured and filtered.
 *  @param enabled  the layer is on     @param solution  of what the map shows, draft or revision */
export function usePlanTrials(
  planId: string,
  inputs: PlanInputs,
  solution: Solution | null,
  data: ChemicalData,
  enabled: boolean,
  looks: TrialLooks,
  onLook: (part: Partial<TrialLooks>) => void,
): PlanTrials {
  const navigate = useNavigate();
  const { scope, colouring } = looks;
  const hidden = useMemo(() => new Set(looks.hidden), [looks.hidden]);
  const [store] = useState(() => new TrialStore(looks.brush));
  useKeptBrush(store, looks.brush, onLook);
  const query = useMapTrials(planId, scope, enabled);
  const answer = enabled ? query.data : undefined;

  // A drag of the plan moves at once; two thousand verdicts follow when the hand rests and there is time.
  const asked = useMemo(() => ({ inputs, solution, data }), [inputs, solution, data]);
  const ground = useDeferredValue(useRested(asked, 120, 500));
  const judged = useMemo(() => (answer ? placedTrials(answer, () => ground) : NONE), [answer, ground]);
  const trials = useMemo(
    () => (hidden.size === 0 ? judged : judged.filter(({ campaignId }) => !hidden.has(campaignId))),
    [judged, hidden],
  );
  const markers = useMemo(() => stageMarkers(answer?.campaigns ?? []), [answer]);
  const marks = useMemo(() => marksOf(trials, markers, colouring), [trials, markers, colouring]);
  const scale = useMemo(() => colourScale(marks.map(({ value }) => value)), [marks]);
  const open = useCallback((id: string) => void navigate(`/trials/${id}`), [navigate]);
  const shown = useMemo(
    () =>
      marks.length === 0
        ? null
        : { marks, scale, store, onOpen: open, words: () => marksInWords(marks, scale, markers, colouring) },
    [marks, scale, store, open, markers, colouring],
  );
  const setScope = useCallback((next: TrialLooks["scope"]) => onLook({ scope: next }), [onLook]);
  const setColouring = useCallback((next: Colouring) => onLook({ colouring: next }), [onLook]);
  const toggle = useCallback(
    (id: string) => onLook({ hidden: hidden.has(id) ? [...hidden].filter((h) => h !== id) : [...hidden, id] }),
    [hidden, onLook],
  );
  return {
    answer,
    error: query.error,
    retry: () => void query.refetch(),
    scope,
    setScope,
    hidden,
    toggle,
    colouring,
    setColouring,
    trials,
    marks,
    markers,
    scale,
    store,
    shown,
    open,
    ground,
  };
}

/** The box follows the hand by itself; what is kept of it follows when the hand rests, ms. */
const BRUSH_RESTS = 200;

/** Keeps the box of a brush with the other looks, and takes it from there when they change from outside. */
function useKeptBrush(store: TrialStore, kept: Brushed | null, onLook: (part: Partial<TrialLooks>) => void): void {
  const known = useRef(kept);
  useEffect(() => {
    if (kept === known.current) return;
    known.current = kept;
    store.brush.set(kept);
  }, [store, kept]);
  useEffect(() => {
    let timer: number | undefined;
    const stop = store.brush.subscribe(() => {
      clearTimeout(timer);
      timer = window.setTimeout(() => {
        const brush = store.brush.get();
        if (brush === known.current) return;
        known.current = brush;
        onLook({ brush });
      }, BRUSH_RESTS);
    });
    return () => {
      stop();
      clearTimeout(timer);
    };
  }, [store, onLook]);
}
