import { useEffect, useRef, useState } from "react";
import type { Sheet } from "../boxes";
import type { MapContent } from "../content";
import type { PlacedText } from "../texts";
import type { TrialMark } from "../trialMarks";
import type { MapView } from "../view";
import { placedNames } from "./placedNames";

/** ms: so often, and no oftener, names follow while the hand moves: those that still fit stay where they are */
const FOLLOW = 160;
/** ms without a change: the hand rests, and every name takes the best place there is */
const REST = 150;

export interface Named {
  content: MapContent;
  sheet: Sheet;
  view: MapView;
  /** trials painted over the names */
  marks: readonly TrialMark[];
}

const placed = ({ content, sheet, view, marks }: Named, before: readonly PlacedText[] = []) =>
  placedNames(content, sheet, view, { marks, before });

/** The names of a map in their places, a moment after what they name: a full search takes longer than the rest of a frame. */
export function useNames(asked: Named): { names: readonly PlacedText[]; of: Named } {
  const [shown, setShown] = useState(() => ({ names: placed(asked), of: asked }));
  const latest = useRef(asked);
  const first = useRef(asked);
  const following = useRef(0);
  const resting = useRef(0);
  useEffect(() => {
    latest.current = asked;
    if (asked === first.current) return;
    if (following.current === 0)
      following.current = window.setTimeout(() => {
        following.current = 0;
        const of = latest.current;
        setShown(({ names }) => ({ names: placed(of, names), of }));
      }, FOLLOW);
    clearTimeout(resting.current);
    resting.current = window.setTimeout(() => {
      setShown({ names: placed(latest.current), of: latest.current });
    }, REST);
  }, [asked]);
  useEffect(
    () => () => {
      clearTimeout(following.current);
      clearTimeout(resting.current);
      following.current = 0;
    },
    [],
  );
  return shown;
}
