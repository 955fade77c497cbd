import type { Analysis } from "../analysis";
import { allowedAt } from "../reach/verdict";
import type { Limit, Point, Solution, Window } from "../solution";
import { coupleAt } from "./couple";
import { marginAt, type MarginHere } from "./marginAt";
import { clearances, insideOf, widest, type Segment } from "./segments";

type Band = Readonly<Record<"pH" | "Eh", number>>;

const segmentOf = ({ from, to }: Limit, band: Band): Segment => ({
  ax: from[0] / band.pH,
  ay: from[1] / band.Eh,
  bx: to[0] / band.pH,
  by: to[1] / band.Eh,
});

/** Signed way along one axis to a limit; null where the line through the point misses it. */
function wayAlong({ from, to }: Limit, at: Point, axis: 0 | 1): number | null {
  const other = axis === 0 ? 1 : 0;
  const span = to[other] - from[other];
  const t = span === 0 ? Number.NaN : (at[other] - from[other]) / span;
  return t >= 0 && t <= 1 ? from[axis] + t * (to[axis] - from[axis]) - at[axis] : null;
}

/** The index of the window that holds a point, else of the one whose border is nearest in control bands.
 *  @param windows  of a solution     @param at  pH, Eh (V vs SHE at T)     @param band  control bands
 *  @returns  index and whether the point is inside; null without a window     @source  winding number, box distance (segments.ts) */
export function windowAt(
  windows: readonly Window[],
  at: Point,
  band: Band,
): { readonly index: number; readonly inside: boolean } | null {
  const [u, v] = [at[0] / band.pH, at[1] / band.Eh];
  let best: { index: number; way: number } | null = null;
  for (const [index, window] of windows.entries()) {
    const border = window.limits.map((l) => segmentOf(l, band));
    if (insideOf(border, u, v)) return { index, inside: true };
    const way = Math.min(...border.map((s) => Math.max(0, widest(clearances(s), u, v)[1])));
    if (best === null || way < best.way) best = { index, way };
  }
  return best && { index: best.index, inside: false };
}

export interface HeldSetPoint {
  /** index of the window the point stands in, or the nearest */
  readonly index: number;
  readonly inside: boolean;
  /** the window with its set point, margin and distances read from the point held */
  readonly window: Window;
  /** nearest limit; null where none is met along pH */
  readonly here: MarginHere | null;
}

/** A set point placed by hand: its window, margin and distances in place of the deepest point's.
 *  @param analysis  of the plan, for the couple that sets Eh there     @param solution  of the same plan
 *  @param at  pH, Eh (V vs SHE at T)     @param band  control bands
 *  @returns  the window as if this were its set point; margin below zero outside; null without a window
 *  @source  docs/method.md, section 6, at another point */
export function heldSetPoint(
  analysis: Analysis,
  solution: Pick<Solution, "windows">,
  at: Point,
  band: Band,
): HeldSetPoint | null {
  const found = windowAt(solution.windows, at, band);
  const window = found && solution.windows[found.index];
  if (!found || !window) return null;
  const couple = coupleAt(analysis.prepared.data, analysis.cells, analysis.metals, analysis.basis, at);
  const mixedPotential = couple === null;
  const here = marginAt(window, at, band, mixedPotential);
  const EhRange = mixedPotential ? allowedAt(window, at[0]).find(([lo, hi]) => at[1] >= lo && at[1] <= hi) : undefined;
  return {
    ...found,
    here,
    window: {
      ...window,
      setPoint: {
        pH: at[0],
        Eh: at[1],
        margin: here?.margin ?? 0,
        mixedPotential,
        ...(EhRange ? { EhRange } : {}),
        ...(couple ? { couple } : {}),
        cutByFrame: here?.nearest.kind === "frame",
      },
      limits: window.limits.map((limit) => ({
        ...limit,
        distance: Math.max(0, widest(clearances(segmentOf(limit, band)), at[0] / band.pH, at[1] / band.Eh)[1]),
        distancePH: wayAlong(limit, at, 0),
        distanceEh: wayAlong(limit, at, 1),
      })),
    },
  };
}
