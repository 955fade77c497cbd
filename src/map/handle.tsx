import { useEffect, useRef } from "react";
import type { Frame } from "../../shared/schemas/problem";
import type { Point } from "../../shared/solution";
import { mapPixels, type Sheet } from "./boxes";

export interface SetPointHandleProps {
  sheet: Sheet;
  visible: Frame;
  at: Point;
  /** what a screen reader says of it: "Set point, pH 5.10, 0.58 V, margin 6.9 control bands" */
  label: string;
  onMove: (at: Point) => void;
  /** the hand let go, or the keys rest */
  onSettle: () => void;
  /** pressed and let go without a move: px on the sheet */
  onPress?: (x: number, y: number) => void;
}

export const STEP = { pH: 0.02, Eh: 0.005 };
export const moves: Readonly<Record<string, readonly [number, number]>> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, 1],
  ArrowDown: [0, -1],
};

/** Lies over the set point and is taken by mouse, finger or arrow keys. Wider than the mark, so that a finger finds it. */
export function SetPointHandle({ sheet, visible, at, label, onMove, onSettle, onPress }: SetPointHandleProps) {
  const grip = useRef<{ dx: number; dy: number; moved: boolean } | null>(null);
  const frame = useRef(0);
  useEffect(() => () => cancelAnimationFrame(frame.current), []);
  const { toPixel, toPoint, box } = mapPixels(sheet, visible);
  const [x, y] = toPixel(at[0], at[1]);
  if (x < box.x0 || x > box.x1 || y < box.y0 || y > box.y1) return null;
  const clamped = (px: number, py: number): Point =>
    toPoint(Math.min(box.x1, Math.max(box.x0, px)), Math.min(box.y1, Math.max(box.y0, py)));
  return (
    <button
      type="button"
      data-handle=""
      data-testid="set-point-handle"
      aria-label={label}
      aria-roledescription="movable set point"
      title="Drag, or move with the arrow keys"
      className="no-print absolute h-9 w-9 cursor-move touch-none rounded-full bg-transparent p-0 [@media(pointer:coarse)]:h-14 [@media(pointer:coarse)]:w-14"
      style={{ left: x, top: y, transform: "translate(-50%, -50%)" }}
      onPointerDown={(event) => {
        if (event.button !== 0) return;
        event.currentTarget.setPointerCapture(event.pointerId);
        grip.current = { dx: event.clientX - x, dy: event.clientY - y, moved: false };
      }}
      onPointerMove={(event) => {
        const held = grip.current;
        if (!held) return;
        const [px, py] = [event.clientX - held.dx, event.clientY - held.dy];
        if (Math.hypot(px - x, py - y) < 1) return;
        held.moved = true;
        cancelAnimationFrame(frame.current);
        frame.current = requestAnimationFrame(() => onMove(clamped(px, py)));
      }}
      onPointerUp={(event) => {
        const held = grip.current;
        if (!held) return;
        grip.current = null;
        onSettle();
        const outline = event.currentTarget.offsetParent?.getBoundingClientRect();
        if (!held.moved && outline) onPress?.(event.clientX - outline.left, event.clientY - outline.top);
      }}
      onPointerCancel={() => {
        grip.current = null;
        onSettle();
      }}
      onKeyDown={(event) => {
        const move = moves[event.key];
        if (!move) return;
        event.preventDefault();
        const times = event.shiftKey ? 5 : 1;
        onMove([at[0] + move[0] * STEP.pH * times, at[1] + move[1] * STEP.Eh * times]);
      }}
      onBlur={onSettle}
    />
  );
}
