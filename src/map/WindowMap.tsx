import {
  type ComponentType,
  lazy,
  Suspense,
  useCallback,
  useEffect,
  useLayoutEffect,
  useMemo,
  useRef,
  useState,
} from "react";
import type { Frame } from "../../shared/schemas/problem";
import type { Point } from "../../shared/solution";
import { mapPixels, sheetBoxes } from "./boxes";
import { type ContentWishes, mapContent } from "./content";
import { Cursor } from "./cursor";
import type { CursorStore } from "./cursorStore";
import { mapLayout, mapTraces } from "./figure";
import type { SetPointHandleProps } from "./handle";
import { LimitHover, type NamedLimit, nearestLimit } from "./LimitHover";
import type { LimitStore } from "./limitStore";
import { Over } from "./Over";
import type { PlotProps } from "./Plot";
import type { ProposalStore } from "./proposalStore";
import type { Figure, PlotLayout, PlotTrace } from "./plotTypes";
import { Touch } from "./Touch";
import { Under } from "./Under";
import { nearestMark, type ShownTrials, TrialsLayer } from "./TrialsLayer";
import { useSize } from "./useSize";
import { drawnMetals, type MapView } from "./view";
import { afterRelayout, MovingView } from "./zoom";

const NO_MARKS: ShownTrials["marks"] = [];

/** The chart is the largest file there is, and nothing that is seen needs it: where it does not come, keys, fingers and buttons still zoom. */
const Plot = lazy<ComponentType<PlotProps>>(() => import("./Plot").catch(() => ({ default: () => null })));
const ProposalsLayer = lazy(async () => ({ default: (await import("./ProposalsLayer")).ProposalsLayer }));

export interface WindowMapProps {
  asked: ContentWishes;
  /** how to draw it */
  view: MapView;
  /** what should be in sight from now on; null: the whole frame */
  onSight: (frame: Frame | null) => void;
  /** what a drag of the mouse does on the map */
  dragMode?: "zoom" | "pan";
  cursor: CursorStore;
  /** a click or tap on the map; null lets the point go */
  onPick: (at: Point | null) => void;
  /** what a screen reader says of it, and the element that says more */
  label: string;
  describedBy?: string;
  /** the set point, where it can be moved by hand */
  handle?: Omit<SetPointHandleProps, "sheet" | "visible"> | null;
  /** trials painted over the map */
  trials?: ShownTrials | null;
  /** next trials, numbered, movable */
  proposals?: ProposalStore | null;
  /** limits of the windows in words, for the pointer */
  limits?: readonly NamedLimit[];
  limitStore?: LimitStore;
  /** traces of the caller's own over the figure, potentials on the shown scale */
  overlay?: readonly PlotTrace[];
}

/** So long after the last move of a wheel or a drag the hand is taken to rest, ms. */
const REST = 160;

/** The window map: fields and windows as shapes, over them axes, names, strips and reach bars, and the cursor, which redraws none of them.
 *  Between them lies Plotly, unseen, for zoom, pan and the wheel; it comes when the map stands. */
export default function WindowMap(props: WindowMapProps) {
  const { asked, view, onSight, dragMode, cursor, onPick, label, describedBy, handle, trials, proposals, overlay } =
    props;
  const content = useMemo(() => mapContent(asked), [asked]);
  const holder = useRef<HTMLDivElement>(null);
  const size = useSize(holder);
  const { frame, scale, visible } = view;
  const crosscuts = view.layers.crosscuts && content.through !== null;
  const pinned = content.pinned !== null;
  const freeAcid = content.freeAcid !== null;
  const { reach } = view.layers;
  const metals = drawnMetals(view).length;

  const sheet = useMemo(
    () =>
      size &&
      sheetBoxes(size.width, size.height, {
        metals,
        reagents: content.reaches.length,
        crosscuts,
        reach,
        freeAcid,
        pinned,
      }),
    [size, metals, content.reaches.length, crosscuts, reach, freeAcid, pinned],
  );
  const traces = useMemo(() => [...mapTraces(content, view), ...(overlay ?? [])], [content, view, overlay]);
  // The chart has nothing but the ranges: while they stay it is left alone.
  const axes = useMemo(
    () => sheet && JSON.stringify(mapLayout(sheet, { visible, scale }, dragMode)),
    [sheet, visible, scale, dragMode],
  );
  const [rests, setRests] = useState(0);
  const figure = useMemo(
    (): Figure | null =>
      axes === null ? null : { data: [], layout: { ...(JSON.parse(axes) as PlotLayout), datarevision: rests } },
    [axes, rests],
  );

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
  // Names are placed anew, and the axes drawn anew, when the hand rests: a wheel would else wait for it at every notch.
  const onRelayout = useCallback(
    (change: Record<string, unknown>) => {
      const next = moved(change);
      live.set(next ?? frame);
      clearTimeout(rest.current);
      rest.current = window.setTimeout(() => {
        onSight(next);
        // Drawn anew even where nothing changed: the chart may stand beyond the frame, where it is not let.
        setRests((n) => n + 1);
        requestAnimationFrame(() => live.set(null));
      }, REST);
    },
    [live, moved, frame, onSight],
  );
  const look = useCallback(
    (next: Frame | null) => {
      clearTimeout(rest.current);
      live.set(null);
      onSight(next);
    },
    [live, onSight],
  );
  const { limits, limitStore } = props;
  const pick = useCallback(
    (at: Point | null, byFinger = false) => {
      const pixels = sheet && at && mapPixels(sheet, visible);
      const mark = pixels && trials && nearestMark(trials.marks, pixels.toPixel, ...pixels.toPixel(at[0], at[1]));
      if (mark) return trials.onOpen(mark.id);
      // A finger points at nothing before it presses: its tap names the limit that lies under it, and the next one lets it go.
      if (byFinger && at && pixels && limits && limitStore) {
        const limit = nearestLimit(limits, pixels.toPixel, at, true);
        // one whose limit has gone since is not seen
        const before = limits.find((l) => l.key === limitStore.named.get()?.key);
        limitStore.named.set(limit && limit.key !== before?.key ? { key: limit.key, at } : null);
        if (limit || before) return;
      }
      onPick(at);
    },
    [sheet, visible, trials, limits, limitStore, onPick],
  );
  // A trial run at the set point lies under its handle: a press that moves nothing means the trial.
  const openAt = useCallback(
    (x: number, y: number) => {
      const pixels = sheet && mapPixels(sheet, visible);
      const mark = pixels && trials && nearestMark(trials.marks, pixels.toPixel, x, y);
      if (mark) trials.onOpen(mark.id);
    },
    [sheet, visible, trials],
  );
  useLayoutEffect(() => {
    if (holder.current && sheet) holder.current.dataset.drawn = String(Number(holder.current.dataset.drawn ?? 0) + 1);
  }, [traces, sheet]);

  return (
    <div
      ref={holder}
      role="application"
      aria-roledescription="window map"
      aria-label={label}
      aria-describedby={describedBy}
      tabIndex={0}
      className="relative h-full w-full touch-none overflow-hidden"
      data-testid="window-map"
    >
      {figure && sheet ? (
        <>
          <Under traces={traces} sheet={sheet} view={view} live={live} />
          <Suspense fallback={null}>
            <Plot figure={figure} onRelayout={onRelayout} onRelayouting={onRelayouting} />
          </Suspense>
          <Over
            content={content}
            sheet={sheet}
            view={view}
            marks={trials?.marks ?? NO_MARKS}
            live={live}
            handle={handle ? { ...handle, onPress: openAt } : null}
          />
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
          {limits && limitStore && (
            <LimitHover
              limits={limits}
              store={limitStore}
              cursor={cursor}
              sheet={sheet}
              visible={visible}
              colours={view.colours}
            />
          )}
          <Cursor
            sheet={sheet}
            visible={visible}
            frame={frame}
            through={content.through}
            store={cursor}
            holder={holder}
            onPick={pick}
            onSight={look}
          />
          {proposals && (
            <Suspense fallback={null}>
              <ProposalsLayer store={proposals} sheet={sheet} visible={visible} live={live} />
            </Suspense>
          )}
          <Touch sheet={sheet} visible={visible} frame={frame} holder={holder} onSight={look} />
        </>
      ) : null}
    </div>
  );
}
