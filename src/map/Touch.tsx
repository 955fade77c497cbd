import { useEffect, useRef, type RefObject } from "react";
import type { Frame } from "../../shared/schemas/problem";
import { mapPixels, type Sheet } from "./boxes";
import { withinFrame } from "./zoom";

interface TouchProps {
  sheet: Sheet;
  visible: Frame;
  frame: Frame;
  holder: RefObject<HTMLDivElement | null>;
  onSight: (next: Frame | null) => void;
}

type Place = readonly [x: number, y: number];

/** What is in sight after fingers that held some points of the map went elsewhere: one finger moves the map, two also stretch it, alike
 *  along both axes. */
export function underFingers(
  before: readonly Place[],
  after: readonly Place[],
  toPoint: (x: number, y: number) => [number, number],
  visible: Frame,
): Frame {
  const middle = (places: readonly Place[]): Place => [
    places.reduce((sum, p) => sum + p[0], 0) / places.length,
    places.reduce((sum, p) => sum + p[1], 0) / places.length,
  ];
  const spread = (places: readonly Place[]) => {
    const [a, b] = places;
    return a && b ? Math.max(20, Math.hypot(a[0] - b[0], a[1] - b[1])) : 1;
  };
  const factor = spread(before) / spread(after);
  const [held, now] = [toPoint(...middle(before)), toPoint(...middle(after))];
  const axis = ([lo, hi]: readonly [number, number], h: number, n: number): [number, number] => [
    h - factor * (n - lo),
    h + factor * (hi - n),
  ];
  return { pH: axis(visible.pH, held[0], now[0]), Eh: axis(visible.Eh, held[1], now[1]) };
}

/** Fingers on the map: two zoom and move it, one moves it once it is zoomed. The chart knows the mouse alone. */
export function Touch({ sheet, visible, frame, holder, onSight }: TouchProps) {
  const now = useRef({ sheet, visible, frame, onSight });
  useEffect(() => {
    now.current = { sheet, visible, frame, onSight };
  });
  useEffect(() => {
    const element = holder.current;
    if (!element) return;
    let grip: { places: Place[]; visible: Frame } | null = null;
    let request = 0;
    const places = (event: TouchEvent): Place[] => {
      const outline = element.getBoundingClientRect();
      return Array.from(event.touches)
        .slice(0, 2)
        .map((t): Place => [t.clientX - outline.left, t.clientY - outline.top]);
    };
    const onHandle = (event: Event) =>
      event.target instanceof Element && event.target.closest("[data-handle]") !== null;
    const hold = (event: TouchEvent) => {
      grip = event.touches.length > 0 ? { places: places(event), visible: now.current.visible } : null;
    };
    const onStart = (event: TouchEvent) => {
      if (onHandle(event)) return;
      // The chart would draw a box to zoom into.
      event.stopPropagation();
      hold(event);
    };
    const onMove = (event: TouchEvent) => {
      if (!grip) return;
      event.stopPropagation();
      const { visible: v, frame: f } = now.current;
      const zoomed = withinFrame(v, f) !== null;
      if (event.touches.length < 2 && !zoomed) return;
      event.preventDefault();
      const held = grip;
      const at = places(event);
      cancelAnimationFrame(request);
      request = requestAnimationFrame(() => {
        if (at.length !== held.places.length) return;
        const { toPoint } = mapPixels(now.current.sheet, held.visible);
        const { frame: whole } = now.current;
        now.current.onSight(withinFrame(underFingers(held.places, at, toPoint, held.visible), whole));
      });
    };
    const onEnd = (event: TouchEvent) => {
      if (!grip) return;
      event.stopPropagation();
      hold(event);
    };
    element.addEventListener("touchstart", onStart, { capture: true, passive: true });
    element.addEventListener("touchmove", onMove, { capture: true, passive: false });
    element.addEventListener("touchend", onEnd, true);
    element.addEventListener("touchcancel", onEnd, true);
    return () => {
      cancelAnimationFrame(request);
      element.removeEventListener("touchstart", onStart, true);
      element.removeEventListener("touchmove", onMove, true);
      element.removeEventListener("touchend", onEnd, true);
      element.removeEventListener("touchcancel", onEnd, true);
    };
  }, [holder]);
  return null;
}
