import { useRef } from "react";
import type { Frame } from "../../shared/schemas/problem";
import { classes } from "../lib/classes";
import { mapPixels, type Sheet } from "./boxes";
import { moves, STEP } from "./handle";
import type { ProposalStore, ProposedMark } from "./proposalStore";
import type { LiveView } from "./TrialsLayer";
import { useTold } from "./trialStore";

interface LayerProps {
  store: ProposalStore;
  sheet: Sheet;
  visible: Frame;
  live: LiveView;
}

/** Proposed conditions over the map: a numbered plate on a peg whose foot is the point, so that no trial's mark looks like it. Taken by
 *  mouse, finger or arrow keys. */
export function ProposalsLayer({ store, sheet, visible, live }: LayerProps) {
  const marks = useTold(store.marks);
  const lit = useTold(store.lit);
  const pixels = mapPixels(sheet, useTold(live) ?? visible);
  return marks.map((mark) => <Peg key={mark.n} mark={mark} store={store} pixels={pixels} lit={lit === mark.n} />);
}

interface PegProps {
  mark: ProposedMark;
  store: ProposalStore;
  pixels: ReturnType<typeof mapPixels>;
  lit: boolean;
}

function Peg({ mark: { n, pH, Eh, label }, store, pixels: { toPixel, toPoint, box }, lit }: PegProps) {
  const grip = useRef<{ dx: number; dy: number } | null>(null);
  const [x, y] = toPixel(pH, Eh);
  if (x < box.x0 || x > box.x1 || y < box.y0 || y > box.y1) return null;
  const light = (on: boolean) => store.lit.set(on ? n : null);
  const letGo = () => {
    grip.current = null;
  };
  return (
    <button
      type="button"
      data-handle=""
      data-testid={`proposed-${n}`}
      aria-label={label}
      aria-roledescription="movable proposal"
      title={`${label}. Drag, or move with the arrow keys`}
      className="absolute h-8 w-7 cursor-move touch-none bg-transparent p-0 [@media(pointer:coarse)]:w-10"
      style={{ left: x, top: y + 3, transform: "translate(-50%, -100%)" }}
      onPointerEnter={() => light(true)}
      onPointerLeave={() => light(false)}
      onFocus={() => light(true)}
      onBlur={() => light(false)}
      onPointerDown={(event) => {
        if (event.button !== 0) return;
        event.currentTarget.setPointerCapture(event.pointerId);
        grip.current = { dx: event.clientX - x, dy: event.clientY - y };
      }}
      onPointerMove={(event) => {
        const held = grip.current;
        if (!held) return;
        const [px, py] = [event.clientX - held.dx, event.clientY - held.dy];
        if (Math.hypot(px - x, py - y) < 1) return;
        const inside = (v: number, lo: number, hi: number) => Math.min(hi, Math.max(lo, v));
        store.mover.get()?.(n, toPoint(inside(px, box.x0, box.x1), inside(py, box.y0, box.y1)));
      }}
      onPointerUp={letGo}
      onPointerCancel={letGo}
      onKeyDown={(event) => {
        const move = moves[event.key];
        if (!move) return;
        event.preventDefault();
        const times = event.shiftKey ? 5 : 1;
        store.mover.get()?.(n, [pH + move[0] * STEP.pH * times, Eh + move[1] * STEP.Eh * times]);
      }}
    >
      <span
        className={classes(
          "absolute top-0 left-1/2 h-[18px] w-[18px] -translate-x-1/2 border-2 border-verdigris text-center font-mono text-xs leading-[14px] font-bold",
          lit ? "bg-verdigris text-paper" : "bg-sheet text-verdigris",
        )}
      >
        {n}
      </span>
      <span aria-hidden className="absolute top-[18px] bottom-[3px] left-1/2 w-0.5 -translate-x-1/2 bg-verdigris" />
      <span
        aria-hidden
        className="absolute bottom-0 left-1/2 h-1.5 w-1.5 -translate-x-1/2 rounded-full bg-verdigris outline outline-sheet"
      />
    </button>
  );
}
