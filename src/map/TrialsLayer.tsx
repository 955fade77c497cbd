import { useEffect, useLayoutEffect, useMemo, useRef, useState, type RefObject } from "react";
import type { Frame } from "../../shared/schemas/problem";
import type { ThemeColours } from "../lib/theme";
import { mapPixels, type Sheet } from "./boxes";
import { TrialPainter } from "./paintTrials";
import type { ColourScale, TrialMark } from "./trialMarks";
import { inBrush, type TrialStore, useTold } from "./trialStore";

export interface ShownTrials {
  marks: readonly TrialMark[];
  scale: ColourScale;
  store: TrialStore;
  onOpen: (id: string) => void;
  /** what the marks mean, for a picture */
  words: () => string;
}

/** What is in sight while Plotly still moves its axes; null between gestures. */
export interface LiveView {
  get: () => Frame | null;
  subscribe: (tell: () => void) => () => void;
}

interface TrialsLayerProps extends ShownTrials {
  sheet: Sheet;
  visible: Frame;
  live: LiveView;
  colours: ThemeColours;
  holder: RefObject<HTMLDivElement | null>;
}

/** px around a mark that still mean it */
const REACH = 9;

/** The mark nearest to a place, within a finger's reach of it. */
export function nearestMark(
  marks: readonly TrialMark[],
  toPixel: (pH: number, Eh: number) => [number, number],
  x: number,
  y: number,
  reach = REACH,
): TrialMark | null {
  let best: TrialMark | null = null;
  let least = reach;
  for (const mark of marks) {
    const [px, py] = toPixel(mark.pH, mark.Eh);
    const distance = Math.hypot(px - x, py - y);
    if (distance <= least) [best, least] = [mark, distance];
  }
  return best;
}

/** Trials painted over the map on a canvas of their own: a drag of the plan redraws them in a few milliseconds, and they cost the
 *  figure below nothing. Shift and drag brushes; a ring marks the trial under the pointer, here or in the table. */
export function TrialsLayer({ marks, scale, store, onOpen, sheet, visible, live, colours, holder }: TrialsLayerProps) {
  const [painter] = useState(() => new TrialPainter());
  const canvas = useRef<HTMLCanvasElement>(null);
  const ring = useRef<HTMLDivElement>(null);
  const box = useRef<HTMLDivElement>(null);
  const brush = useTold(store.brush);
  const brushing = useTold(store.brushing);
  const brushed = useMemo(
    () => (brush === null ? null : new Set(marks.filter((m) => inBrush(m, brush)).map(({ id }) => id))),
    [marks, brush],
  );
  const byId = useMemo(() => new Map(marks.map((m) => [m.id, m])), [marks]);
  const now = useRef({ marks, scale, sheet, visible, colours, brushed, brush, byId, onOpen });
  // Before paint: what is painted below must be of this frame.
  useLayoutEffect(() => {
    now.current = { marks, scale, sheet, visible, colours, brushed, brush, byId, onOpen };
  });

  const drawn = useRef<readonly unknown[]>([]);
  const draw = useRef({ all: () => {}, ring: () => {} });
  useLayoutEffect(() => {
    const pixelsNow = () => mapPixels(now.current.sheet, live.get() ?? now.current.visible);
    const drawRing = () => {
      const at = now.current.byId.get(store.hovered.get() ?? "");
      const { toPixel, box: b } = pixelsNow();
      const [x, y] = at ? toPixel(at.pH, at.Eh) : [-1, -1];
      const inside = at && x >= b.x0 && x <= b.x1 && y >= b.y0 && y <= b.y1;
      Object.assign(ring.current?.style ?? {}, {
        visibility: inside ? "visible" : "hidden",
        transform: `translate(${x}px, ${y}px)`,
      });
    };
    const drawBox = () => {
      const b = now.current.brush;
      const { toPixel } = pixelsNow();
      const [x0, y1] = b ? toPixel(b.pH[0], b.Eh[0]) : [0, 0];
      const [x1, y0] = b ? toPixel(b.pH[1], b.Eh[1]) : [0, 0];
      Object.assign(box.current?.style ?? {}, {
        visibility: b ? "visible" : "hidden",
        transform: `translate(${x0}px, ${y0}px)`,
        width: `${x1 - x0}px`,
        height: `${y1 - y0}px`,
      });
    };
    const drawMarks = () => {
      const element = canvas.current;
      const context = element?.getContext("2d");
      if (!element || !context) return;
      const { sheet: s, ...rest } = now.current;
      const ratio = window.devicePixelRatio || 1;
      const { pH, Eh } = live.get() ?? rest.visible;
      // Axes that come to rest tell the same frame twice.
      const of = [rest.marks, rest.scale, rest.colours, rest.brushed, s, ratio, ...pH, ...Eh];
      if (of.every((part, i) => part === drawn.current[i])) return;
      drawn.current = of;
      const [w, h] = [Math.round(s.width * ratio), Math.round(s.height * ratio)];
      if (element.width !== w || element.height !== h) Object.assign(element, { width: w, height: h });
      painter.paint(context, s, ratio, { ...rest, ...pixelsNow() });
    };
    const drawAll = () => {
      drawMarks();
      drawBox();
      drawRing();
    };
    draw.current = { all: drawAll, ring: drawRing };
    drawAll();
  }, [marks, scale, sheet, visible, colours, brushed, brush, byId, live, store, painter]);
  useEffect(() => {
    const stop = [live.subscribe(() => draw.current.all()), store.hovered.subscribe(() => draw.current.ring())];
    return () => stop.forEach((end) => end());
  }, [live, store]);

  useEffect(() => {
    const element = holder.current;
    if (!element) return;
    let from: [number, number] | null = null;
    let frame = 0;
    const at = (event: PointerEvent): [number, number] => {
      const outline = element.getBoundingClientRect();
      return [event.clientX - outline.left, event.clientY - outline.top];
    };
    const pixels = () => mapPixels(now.current.sheet, live.get() ?? now.current.visible);
    const inMap = ([x, y]: [number, number]) => {
      const { box: b } = pixels();
      return x >= b.x0 && x <= b.x1 && y >= b.y0 && y <= b.y1;
    };
    const rectangle = (to: [number, number]) => {
      const { toPoint } = pixels();
      const [a, b] = [toPoint(...from!), toPoint(...to)];
      return {
        pH: [Math.min(a[0], b[0]), Math.max(a[0], b[0])] as const,
        Eh: [Math.min(a[1], b[1]), Math.max(a[1], b[1])] as const,
      };
    };
    const wantsBrush = (event: MouseEvent) => (event.shiftKey || store.brushing.get()) && event.button === 0;
    const onDown = (event: PointerEvent) => {
      if (!wantsBrush(event) || !inMap(at(event))) return;
      from = at(event);
      // Plotly would pan, and the cursor would pick a point.
      event.stopImmediatePropagation();
    };
    const onMouseDown = (event: MouseEvent) => {
      if (from === null) return;
      event.stopImmediatePropagation();
      event.preventDefault();
    };
    const onMove = (event: PointerEvent) => {
      const place = at(event);
      cancelAnimationFrame(frame);
      frame = requestAnimationFrame(() => {
        if (from) store.brush.set(rectangle(place));
        else
          store.hovered.set(
            inMap(place) ? (nearestMark(now.current.marks, pixels().toPixel, ...place)?.id ?? null) : null,
          );
      });
    };
    const onUp = (event: PointerEvent) => {
      if (!from) return;
      const to = at(event);
      const still = Math.hypot(to[0] - from[0], to[1] - from[1]) < 4;
      cancelAnimationFrame(frame);
      store.brush.set(still ? null : rectangle(to));
      store.brushing.set(false);
      from = null;
    };
    const onLeave = () => {
      if (from) return;
      cancelAnimationFrame(frame);
      store.hovered.set(null);
    };
    element.addEventListener("pointerdown", onDown, true);
    element.addEventListener("mousedown", onMouseDown, true);
    element.addEventListener("pointermove", onMove, true);
    element.addEventListener("pointerleave", onLeave);
    window.addEventListener("pointerup", onUp, true);
    return () => {
      cancelAnimationFrame(frame);
      element.removeEventListener("pointerdown", onDown, true);
      element.removeEventListener("mousedown", onMouseDown, true);
      element.removeEventListener("pointermove", onMove, true);
      element.removeEventListener("pointerleave", onLeave);
      window.removeEventListener("pointerup", onUp, true);
    };
  }, [holder, live, store]);

  return (
    <>
      <canvas
        ref={canvas}
        aria-hidden
        data-testid="trial-marks"
        className="pointer-events-none absolute top-0 left-0"
        style={{ width: sheet.width, height: sheet.height }}
      />
      <div
        ref={box}
        aria-hidden
        className="no-print pointer-events-none absolute top-0 left-0 border border-dashed border-ink bg-ink/5"
        style={{ visibility: "hidden" }}
      />
      <div
        ref={ring}
        aria-hidden
        data-testid="trial-ring"
        className="no-print pointer-events-none absolute -top-2.5 -left-2.5 h-5 w-5 rounded-full border-2 border-ink"
        style={{ visibility: "hidden" }}
      />
      {brushing && (
        <span className="no-print absolute top-1 left-16 bg-sheet px-1 text-sm">Drag a box round trials</span>
      )}
    </>
  );
}
