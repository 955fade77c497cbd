import { type ReactNode, useEffect } from "react";
import type { Frame } from "../../shared/schemas/problem";
import type { Point } from "../../shared/solution";
import type { ThemeColours } from "../lib/theme";
import { mapPixels, type Sheet, type SheetBox } from "./boxes";
import { type CursorStore, useCursor } from "./cursorStore";
import type { LimitStore } from "./limitStore";
import { useTold } from "./trialStore";

/** One edge of a window and what is said of it. */
export interface NamedLimit {
  /** the sentence it belongs to; several edges may share one */
  key: string;
  from: Point;
  to: Point;
  /** metal, reaction, distance */
  words: ReactNode;
}

/** px from an edge that still mean it: of a pointer, and of a finger */
const REACH = 7;
const FINGER = 22;

type Pixel = readonly [number, number];

/** Where an edge comes nearest to a place, and how far that is. */
function nearestOn([x, y]: Pixel, [ax, ay]: Pixel, [bx, by]: Pixel): { place: [number, number]; distance: number } {
  const [dx, dy] = [bx - ax, by - ay];
  const t = Math.min(1, Math.max(0, ((x - ax) * dx + (y - ay) * dy) / (dx * dx + dy * dy || 1)));
  const place: [number, number] = [ax + t * dx, ay + t * dy];
  return { place, distance: Math.hypot(place[0] - x, place[1] - y) };
}

/** The edge nearest to a place, within a finger's reach of it. */
export function nearestLimit(
  limits: readonly NamedLimit[],
  toPixel: (pH: number, Eh: number) => [number, number],
  at: Point,
  byFinger = false,
): NamedLimit | null {
  const here = toPixel(...at);
  let best: NamedLimit | null = null;
  let least = byFinger ? FINGER : REACH;
  for (const limit of limits) {
    const { distance } = nearestOn(here, toPixel(...limit.from), toPixel(...limit.to));
    if (distance < least) [best, least] = [limit, distance];
  }
  return best;
}

/** Beside a limit that lies out of sight its name stands at the border. */
const into = ({ x0, y0, x1, y1 }: SheetBox, [x, y]: readonly [number, number]): [number, number] => [
  Math.min(x1, Math.max(x0, x)),
  Math.min(y1, Math.max(y0, y)),
];

interface LimitHoverProps {
  limits: readonly NamedLimit[];
  store: LimitStore;
  cursor: CursorStore;
  sheet: Sheet;
  visible: Frame;
  colours: ThemeColours;
}

/** Names the window limit under the cursor and shows where it runs; one that is pointed at in the list is shown as well. A limit that was
 *  tapped, or pressed in the list, keeps its name until it is pressed again, something else is tapped or Escape lets it go. */
export function LimitHover({ limits, store, cursor, sheet, visible, colours }: LimitHoverProps) {
  const at = useCursor(cursor);
  const pointed = useTold(store.pointed);
  const named = useTold(store.named);
  const { toPixel, box } = mapPixels(sheet, visible);
  const under = at && nearestLimit(limits, toPixel, at);
  const key = under?.key ?? null;
  const pointing = at !== null;
  useEffect(() => {
    if (pointing) store.pointed.set(key);
  }, [store, key, pointing]);
  useEffect(() => (pointing ? () => store.pointed.set(null) : undefined), [store, pointing]);

  useEffect(() => {
    if (named === null) return;
    const onKey = (event: KeyboardEvent) => {
      if (event.key === "Escape") store.named.set(null);
    };
    window.addEventListener("keydown", onKey);
    return () => window.removeEventListener("keydown", onKey);
  }, [named, store]);

  const keys = under ? [under.key] : [pointed, named?.key];
  const shown = limits.filter((l) => keys.includes(l.key));
  if (shown.length === 0) return null;
  const said = under ?? (named && shown.find((l) => l.key === named.key));
  // The plan may have moved the limit since it was named: its name goes along.
  const beside = (wanted: Point) =>
    shown
      .filter((l) => l.key === named?.key)
      .map(({ from, to }) => nearestOn(toPixel(...wanted), toPixel(...from), toPixel(...to)))
      .reduce((a, b) => (b.distance < a.distance ? b : a)).place;
  const [x, y] = under && at ? toPixel(...at) : said && named ? into(box, beside(named.at)) : [0, 0];
  const left = x < (box.x0 + box.x1) / 2;
  const above = y > (box.y0 + box.y1) / 2;
  return (
    <>
      <svg
        aria-hidden
        className="no-print pointer-events-none absolute top-0 left-0"
        width={sheet.width}
        height={sheet.height}
        data-testid="limit-shown"
      >
        {shown.map(({ from, to }) => {
          const [[x1, y1], [x2, y2]] = [toPixel(...from), toPixel(...to)];
          return (
            <line
              key={`${x1} ${y1} ${x2} ${y2}`}
              {...{ x1, y1, x2, y2 }}
              stroke={colours.verdigris}
              strokeWidth={6}
              strokeLinecap="round"
              opacity={0.45}
            />
          );
        })}
      </svg>
      {said && (
        <div
          role="tooltip"
          data-testid="limit-words"
          className="no-print pointer-events-none absolute z-10 max-w-72 border border-ink bg-sheet px-2 py-1 text-sm"
          style={{
            [left ? "left" : "right"]: left ? x + 14 : sheet.width - x + 14,
            [above ? "bottom" : "top"]: above ? sheet.height - y + 14 : y + 14,
          }}
        >
          {said.words}
        </div>
      )}
    </>
  );
}
