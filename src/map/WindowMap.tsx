import { lazy, Suspense, useCallback, useMemo, useRef, useState } from "react";
import { Loading } from "../components/status";
import type { Frame } from "../../shared/schemas/problem";
import type { Point } from "../../shared/solution";
import { sheetBoxes } from "./boxes";
import type { MapContent } from "./content";
import { Cursor, type CursorStore } from "./cursor";
import { mapFigure } from "./figure";
import { haloStyle } from "./texts";
import { useSize } from "./useSize";
import type { MapView } from "./view";

const Plot = lazy(() => import("./Plot"));

export interface WindowMapProps {
  content: MapContent;
  /** how to draw it; what is in sight is the map's own affair */
  view: Omit<MapView, "visible">;
  cursor: CursorStore;
  /** a click or tap on the map; null lets the point go */
  onPick: (at: Point | null) => void;
  /** what a screen reader says of it */
  label: string;
}

/** The window map: one Plotly figure of map, strips and reach bars, and over it the cursor, which never redraws the figure. */
export function WindowMap({ content, view, cursor, onPick, label }: WindowMapProps) {
  const holder = useRef<HTMLDivElement>(null);
  const size = useSize(holder);
  const { frame, scale } = view;
  const [zoom, setZoom] = useState<{ of: string; frame: Frame } | null>(null);
  // A zoom belongs to one frame on one scale; the axes go back when either changes, and so must this.
  const zoomOf = [frame.pH, frame.Eh, scale.unit, scale.short].flat().join(" ");
  const visible = zoom?.of === zoomOf ? zoom.frame : frame;
  const { alongPH, reachShown } = {
    alongPH: view.layers.crosscuts && content.through !== null,
    reachShown: view.layers.reach,
  };

  const sheet = useMemo(
    () =>
      size &&
      sheetBoxes(size.width, size.height, {
        metals: view.metals.length,
        reagents: content.reaches.length,
        crosscuts: alongPH,
        reach: reachShown,
      }),
    [size, view.metals.length, content.reaches.length, alongPH, reachShown],
  );
  const figure = useMemo(
    () => sheet && mapFigure(content, sheet, { ...view, visible }),
    [content, sheet, view, visible],
  );

  const onRelayout = useCallback(
    (change: Record<string, unknown>) => {
      const reset = change["xaxis.autorange"] === true || change["yaxis.autorange"] === true;
      setZoom((old) => {
        const from = old?.of === zoomOf ? old.frame : frame;
        const read = (axis: "xaxis" | "yaxis", unchanged: readonly [number, number], back: (v: number) => number) => {
          const [lo, hi] = [change[`${axis}.range[0]`], change[`${axis}.range[1]`]];
          return typeof lo === "number" && typeof hi === "number"
            ? ([back(lo), back(hi)] as [number, number])
            : unchanged;
        };
        const next: Frame = reset
          ? frame
          : {
              pH: [...read("xaxis", from.pH, (v) => v)],
              Eh: [...read("yaxis", from.Eh, (v) => scale.fromShown(v))],
            };
        return { of: zoomOf, frame: next };
      });
    },
    [zoomOf, frame, scale],
  );
  const onDrawn = useCallback(() => {
    if (holder.current) holder.current.dataset.drawn = String(Number(holder.current.dataset.drawn ?? 0) + 1);
  }, []);

  return (
    <div
      ref={holder}
      role="application"
      aria-roledescription="window map"
      aria-label={label}
      tabIndex={0}
      className="relative h-full w-full overflow-hidden"
      data-testid="window-map"
    >
      <style>{haloStyle("var(--color-sheet)", "var(--color-tint)")}</style>
      {figure && sheet ? (
        <>
          <Suspense fallback={<Loading label="Opening the map" />}>
            <Plot figure={figure} onRelayout={onRelayout} onDrawn={onDrawn} />
          </Suspense>
          <Cursor
            sheet={sheet}
            visible={visible}
            through={content.through}
            store={cursor}
            holder={holder}
            onPick={onPick}
          />
        </>
      ) : null}
    </div>
  );
}
