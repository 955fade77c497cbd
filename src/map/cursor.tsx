import { useEffect, useRef, type RefObject } from "react";
import type { Frame } from "../../shared/schemas/problem";
import type { Point } from "../../shared/solution";
import { mapPixels, type Sheet } from "./boxes";
import type { CursorStore } from "./cursorStore";
import { broughtInSight, zoomedRound } from "./zoom";

interface CursorProps {
  sheet: Sheet;
  visible: Frame;
  /** on a strip the other coordinate is the one its line runs at */
  through: Point | null;
  store: CursorStore;
  holder: RefObject<HTMLDivElement | null>;
  onPick: (at: Point | null, byFinger?: boolean) => void;
  frame: Frame;
  /** keys zoom, a cursor that leaves the part in sight takes it along, a double click goes back to the whole frame */
  onSight: (next: Frame | null) => void;
}

/** A second click within this time, ms, makes a double click, and then the first one meant nothing. */
const DOUBLE = 280;

/** Two hairlines under the pointer across map and strips. Pointer and arrow keys move them, plus and minus zoom round them;
 *  a click or Enter picks the point, Escape lets it go. */
export function Cursor({ sheet, visible, frame, through, store, holder, onPick, onSight }: CursorProps) {
  const upright = useRef<HTMLDivElement>(null);
  const level = useRef<HTMLDivElement>(null);
  const now = useRef({ sheet, visible, frame, through, onPick, onSight });
  useEffect(() => {
    now.current = { sheet, visible, frame, through, onPick, onSight };
  });

  useEffect(() => {
    const element = holder.current;
    if (!element) return;
    let frame = 0;
    let click = 0;
    let pressed: { x: number; y: number } | null = null;
    const place = (at: Point | null) => {
      const { sheet: s, visible: v } = now.current;
      const { toPixel, box } = mapPixels(s, v);
      const [x, y] = at ? toPixel(at[0], at[1]) : [0, 0];
      const foot = s.height - (s.alongPH?.y0 ?? s.map.y0);
      const right = s.alongEh?.x1 ?? s.map.x1;
      for (const line of [upright.current, level.current]) if (line) line.style.visibility = at ? "visible" : "hidden";
      if (!at) return;
      if (upright.current)
        Object.assign(upright.current.style, {
          transform: `translateX(${x}px)`,
          top: `${box.y0}px`,
          height: `${foot - box.y0}px`,
        });
      if (level.current)
        Object.assign(level.current.style, {
          transform: `translateY(${y}px)`,
          left: `${box.x0}px`,
          width: `${right - box.x0}px`,
        });
    };
    const pointAt = (event: { clientX: number; clientY: number }): Point | null => {
      const { sheet: s, visible: v, through: t } = now.current;
      const outline = element.getBoundingClientRect();
      const [x, y] = [event.clientX - outline.left, event.clientY - outline.top];
      const { box, toPoint } = mapPixels(s, v);
      const inMap = { x: x >= box.x0 && x <= box.x1, y: y >= box.y0 && y <= box.y1 };
      const [pH, Eh] = toPoint(x, y);
      if (inMap.x && inMap.y) return [pH, Eh];
      if (t && inMap.x && s.alongPH && y >= s.height - s.alongPH.y1 && y <= s.height - s.alongPH.y0) return [pH, t[1]];
      if (t && inMap.y && s.alongEh && x >= s.alongEh.x0 && x <= s.alongEh.x1) return [t[0], Eh];
      return null;
    };
    // Ahead of what is shown by less than a frame: keys that repeat faster than the screen draws must each count.
    let wanted = store.get();
    const show = (at: Point | null) => {
      wanted = at;
      cancelAnimationFrame(frame);
      frame = requestAnimationFrame(() => {
        place(at);
        store.set(at);
      });
    };
    const onMove = (event: PointerEvent) => show(pointAt(event));
    const onLeave = () => show(null);
    // The handle of the set point lies on the map and answers for itself.
    const onHandle = (event: Event) =>
      event.target instanceof Element && event.target.closest("[data-handle]") !== null;
    const onDown = (event: PointerEvent) => {
      if (onHandle(event)) return;
      pressed = event.button === 0 ? { x: event.clientX, y: event.clientY } : null;
    };
    const onUp = (event: PointerEvent) => {
      const still = pressed && Math.hypot(event.clientX - pressed.x, event.clientY - pressed.y) < 4;
      pressed = null;
      const at = still ? pointAt(event) : null;
      if (!at) return;
      // Counted here: Plotly lays a sheet over the page while a button is down, and the browser's own double click goes there.
      if (click !== 0) {
        clearTimeout(click);
        click = 0;
        now.current.onSight(null);
        return;
      }
      const byFinger = event.pointerType === "touch";
      click = window.setTimeout(() => {
        click = 0;
        now.current.onPick(at, byFinger);
      }, DOUBLE);
    };
    const onKey = (event: KeyboardEvent) => {
      if (onHandle(event)) return;
      const step = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, 1], ArrowDown: [0, -1] }[event.key];
      const { visible: v, frame: f, through: t } = now.current;
      const zoom = { "+": 0.7, "=": 0.7, "-": 1 / 0.7, "−": 1 / 0.7 }[event.key];
      if (event.ctrlKey || event.metaKey || event.altKey) return;
      if (zoom !== undefined || event.key === "Home") {
        event.preventDefault();
        const about = wanted ?? t ?? [(v.pH[0] + v.pH[1]) / 2, (v.Eh[0] + v.Eh[1]) / 2];
        now.current.onSight(zoom === undefined ? null : zoomedRound(about, zoom, v, f));
        show(wanted);
      } else if (step) {
        event.preventDefault();
        const from = wanted ?? t ?? [(v.pH[0] + v.pH[1]) / 2, (v.Eh[0] + v.Eh[1]) / 2];
        const fine = event.shiftKey ? 5 : 1;
        const clamp = (x: number, [lo, hi]: readonly [number, number]) => Math.min(hi, Math.max(lo, x));
        const to: Point = [
          clamp(from[0] + (step[0] ?? 0) * 0.02 * fine, f.pH),
          clamp(from[1] + (step[1] ?? 0) * 0.005 * fine, f.Eh),
        ];
        const outside = to[0] < v.pH[0] || to[0] > v.pH[1] || to[1] < v.Eh[0] || to[1] > v.Eh[1];
        if (outside) now.current.onSight(broughtInSight(to, v, f));
        show(to);
      } else if (event.key === "Enter") {
        if (wanted) now.current.onPick(wanted);
      } else if (event.key === "Escape") {
        show(null);
        now.current.onPick(null);
      }
    };
    // Capture: Plotly stops some pointer events on its drag layer.
    element.addEventListener("pointermove", onMove, true);
    element.addEventListener("pointerleave", onLeave);
    element.addEventListener("pointerdown", onDown, true);
    window.addEventListener("pointerup", onUp, true);
    element.addEventListener("keydown", onKey);
    // Two maps with one store move together.
    const stop = store.subscribe(() => {
      wanted = store.get();
      place(wanted);
    });
    return () => {
      stop();
      cancelAnimationFrame(frame);
      clearTimeout(click);
      element.removeEventListener("pointermove", onMove, true);
      element.removeEventListener("pointerleave", onLeave);
      element.removeEventListener("pointerdown", onDown, true);
      window.removeEventListener("pointerup", onUp, true);
      element.removeEventListener("keydown", onKey);
    };
  }, [holder, store]);

  const hair = "pointer-events-none absolute bg-ink opacity-50 no-print";
  return (
    <>
      <div ref={upright} aria-hidden className={`${hair} left-0 w-px`} style={{ visibility: "hidden" }} />
      <div ref={level} aria-hidden className={`${hair} top-0 h-px`} style={{ visibility: "hidden" }} />
    </>
  );
}
