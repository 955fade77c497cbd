import { useMemo, useSyncExternalStore } from "react";
import type { Sheet } from "./boxes";
import type { MapContent } from "./content";
import { SetPointHandle, type SetPointHandleProps } from "./handle";
import { useNames } from "./names/useNames";
import { Names, Overlay } from "./svg/Overlay";
import type { PlacedText } from "./texts";
import type { TrialMark } from "./trialMarks";
import type { MapView } from "./view";
import type { MovingView } from "./zoom";

const NONE: readonly PlacedText[] = [];

export interface OverProps {
  content: MapContent;
  sheet: Sheet;
  view: MapView;
  /** trials painted over the names */
  marks: readonly TrialMark[];
  live: MovingView;
  handle: Omit<SetPointHandleProps, "sheet" | "visible"> | null;
}

/** What lies over the figure and moves with it while its axes move under the hand. */
export function Over({ content, sheet, view, marks, live, handle }: OverProps) {
  const moving = useSyncExternalStore(live.subscribe, live.get);
  const asked = useMemo(() => ({ content, sheet, view, marks }), [content, sheet, view, marks]);
  const { names, of: named } = useNames(asked);
  const { visible } = view;
  const shown = useMemo(() => (moving ? { ...view, visible: moving } : view), [view, moving]);
  const namesIn = useMemo(
    () => ({ visible: moving ?? visible, colours: named.view.colours }),
    [moving, visible, named],
  );
  return (
    <>
      <Overlay content={content} sheet={sheet} view={shown} names={NONE} />
      {/* On a layer of their own: while they rest they are not painted again. */}
      <svg
        className="pointer-events-none absolute overflow-hidden will-change-transform"
        style={{ left: sheet.map.x0, top: sheet.height - sheet.map.y1 }}
        width={sheet.map.x1 - sheet.map.x0}
        height={sheet.map.y1 - sheet.map.y0}
        viewBox={`${sheet.map.x0} ${sheet.height - sheet.map.y1} ${sheet.map.x1 - sheet.map.x0} ${sheet.map.y1 - sheet.map.y0}`}
        aria-hidden
        data-testid="map-names"
      >
        <Names names={names} sheet={named.sheet} view={namesIn} />
      </svg>
      {handle && view.layers.setPoint && <SetPointHandle sheet={sheet} visible={shown.visible} {...handle} />}
    </>
  );
}
