import { lazy, Suspense, useCallback, useEffect, useMemo, useRef, useState } from "react";
import { Button } from "../components/Button";
import type { Frame } from "../../shared/schemas/problem";
import type { Point } from "../../shared/solution";
import { mapPixels, sheetBoxes } from "./boxes";
import { type ContentWishes, mapContent } from "./content";
import { Cursor } from "./cursor";
import type { CursorStore } from "./cursorStore";
import { mapFigure } from "./figure";
import { SetPointHandle, type SetPointHandleProps } from "./handle";
import Plot from "./Plot";
import type { PlotTrace } from "./plotTypes";
import { haloStyle } from "./texts";
import type { ProposalStore } from "./proposalStore";
import { nearestMark, type ShownTrials, TrialsLayer } from "./TrialsLayer";
import { useSize } from "./useSize";
import type { MapView } from "./view";
import { afterRelayout, MovingView } from "./zoom";

const ProposalsLayer = lazy(async () => ({ default: (await import("./ProposalsLayer")).ProposalsLayer }));

export interface WindowMapProps {
  asked: ContentWishes;
  /** how to draw it; what is in sight is the map's own affair */
  view: Omit<MapView, "visible">;
  cursor: CursorStore;
  /** a click or tap on the map; null lets the point go */
  onPick: (at: Point | null) => void;
  /** what a screen reader says of it */
  label: string;
  /** the set point, where it can be moved by hand */
  handle?: Omit<SetPointHandleProps, "sheet" | "visible"> | null;
  /** trials painted over the map */
  trials?: ShownTrials | null;
  /** next trials, numbered, movable */
  proposals?: ProposalStore | null;
  /** what is in sight, V vs SHE; null: the whole frame */
  zoom: Frame | null;
  onZoom: (to: Frame | null) => void;
  /** traces of the caller's own over the figure, potentials on the shown scale */
  overlay?: readonly PlotTrace[];
}

/** So long after the last move of a wheel or a drag the hand is taken to rest, ms. */
const REST = 160;

/** The window map: one Plotly figure of map, strips and reach bars, and over it the cursor, which never redraws the figure.
 *  It brings Plotly along: import it late. */
export default function WindowMap({
  asked,
  view,
  cursor,
  onPick,
  label,
  handle,
  trials,
  proposals,
  zoom,
  onZoom,
  overlay,
}: WindowMapProps) {
  const content = useMemo(() => mapContent(asked), [asked]);
  const holder = useRef<HTMLDivElement>(null);
  const size = useSize(holder);
  const { frame, scale } = view;
  const [resets, setResets] = useState(0);
  const visible = zoom ?? frame;
  // A zoom belongs to one frame: another frame is seen whole.
  const frameText = [frame.pH, frame.Eh].flat().join(" ");
  const zoomedIn = useRef(frameText);
  useEffect(() => {
    if (zoomedIn.current === frameText) return;
    zoomedIn.current = frameText;
    onZoom(null);
  }, [frameText, onZoom]);
  const crosscuts = view.layers.crosscuts && content.through !== null;
  const { reach } = view.layers;

  const sheet = useMemo(
    () =>
      size &&
      sheetBoxes(size.width, size.height, {
        metals: view.metals.length,
        reagents: content.reaches.length,
        crosscuts,
        reach,
        freeAcid: content.freeAcid !== null,
      }),
    [size, view.metals.length, content.reaches.length, crosscuts, reach, content.freeAcid],
  );
  const figure = useMemo(() => {
    if (!sheet) return null;
    const made = mapFigure(content, sheet, { ...view, visible });
    // Plotly keeps a zoom while this text stands; one more reset is another text.
    return {
      ...made,
      data: overlay ? [...made.data, ...overlay] : made.data,
      layout: { ...made.layout, uirevision: `${made.layout.uirevision} ${resets}` },
    };
  }, [content, sheet, view, visible, resets, overlay]);

  const [live] = useState(() => new MovingView());
  const rest = useRef(0);
  useEffect(() => () => clearTimeout(rest.current), []);
  const moved = useCallback(
    (change: Record<string, unknown>) => afterRelayout(change, live.get() ?? visible, frame, scale),
    [live, visible, frame, scale],
  );
  const onRelayouting = useCallback(
    (change: Record<string, unknown>) => live.set(moved(change) ?? frame),
    [live, moved, frame],
  );
  // Names are placed anew, and the figure drawn anew, when the hand rests: a wheel would else wait for it at every notch.
  const onRelayout = useCallback(
    (change: Record<string, unknown>) => {
      const next = moved(change);
      live.set(next ?? frame);
      clearTimeout(rest.current);
      rest.current = window.setTimeout(() => {
        onZoom(next);
        requestAnimationFrame(() => live.set(null));
      }, REST);
    },
    [live, moved, frame, onZoom],
  );
  const pick = useCallback(
    (at: Point | null) => {
      const pixels = sheet && at && mapPixels(sheet, visible);
      const mark = pixels && trials && nearestMark(trials.marks, pixels.toPixel, ...pixels.toPixel(at[0], at[1]));
      if (mark) trials.onOpen(mark.id);
      else onPick(at);
    },
    [sheet, visible, trials, onPick],
  );
  // A trial run at the set point lies under its handle: a press that moves nothing means the trial.
  const openAt = (x: number, y: number) => {
    const pixels = sheet && mapPixels(sheet, visible);
    const mark = pixels && trials && nearestMark(trials.marks, pixels.toPixel, x, y);
    if (mark) trials.onOpen(mark.id);
  };
  const reset = useCallback(() => {
    clearTimeout(rest.current);
    live.set(null);
    onZoom(null);
    setResets((n) => n + 1);
  }, [live, onZoom]);
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
          <Plot figure={figure} onRelayout={onRelayout} onRelayouting={onRelayouting} onDrawn={onDrawn} />
          {trials && view.layers.trials && (
            <TrialsLayer
              {...trials}
              sheet={sheet}
              visible={visible}
              live={live}
              colours={view.colours}
              holder={holder}
            />
          )}
          {visible !== frame && (
            <Button
              kind="quiet"
              className="no-print absolute! h-auto! text-xs!"
              style={{ left: 8, bottom: sheet.map.y0 - (content.freeAcid ? 60 : 40) }}
              onClick={reset}
            >
              whole frame
            </Button>
          )}
          <Cursor
            sheet={sheet}
            visible={visible}
            through={content.through}
            store={cursor}
            holder={holder}
            onPick={pick}
            onReset={reset}
          />
          {handle && view.layers.setPoint && (
            <SetPointHandle sheet={sheet} visible={visible} {...handle} onPress={openAt} />
          )}
          {proposals && (
            <Suspense fallback={null}>
              <ProposalsLayer store={proposals} sheet={sheet} visible={visible} live={live} />
            </Suspense>
          )}
        </>
      ) : null}
    </div>
  );
}
