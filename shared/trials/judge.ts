import { sideOfLoop } from "../geometry/loop";
import { clearances, widest, type Segment } from "../setpoint/segments";
import type { Limit, Outline, Solution } from "../solution";

export type Verdict =
  | "inside" // of a window, its edge counted in
  | "outside"
  | "off the map"; // beyond the frame the revision was solved in: not judged

export interface Judgement {
  readonly verdict: Verdict;
  /** index into the solution's windows; null outside */
  readonly window: number | null;
  /** true where the potential's own uncertainty reaches across a limit */
  readonly unsure: boolean;
  /** the nearest limit of all windows, with its distance in control bands, counted as the margin is; the frame only where
   *  nothing else bounds; null without a window */
  readonly nearest: { readonly window: number; readonly limit: Limit; readonly distance: number } | null;
}

interface Band {
  readonly pH: number;
  readonly Eh: number;
}

const insideOutline = ({ outer, holes }: Outline, pH: number, Eh: number): boolean =>
  sideOfLoop(outer, pH, Eh) >= 0 && holes.every((hole) => sideOfLoop(hole, pH, Eh) <= 0);

const windowAt = ({ windows }: Solution, pH: number, Eh: number): number =>
  windows.findIndex((w) => w.polygons.some((p) => insideOutline(p, pH, Eh)));

function straightTo({ ax, ay, bx, by }: Segment, u: number, v: number): number {
  const [dx, dy] = [bx - ax, by - ay];
  const length = dx * dx + dy * dy;
  const t = length === 0 ? 0 : Math.min(1, Math.max(0, ((u - ax) * dx + (v - ay) * dy) / length));
  return Math.hypot(ax + t * dx - u, ay + t * dy - v);
}

/** Counted as the margin is, in half-widths of the box of control bands. */
function nearestLimit(solution: Solution, pH: number, Eh: number, band: Band): Judgement["nearest"] {
  const limits = solution.windows.flatMap((w, window) => w.limits.map((limit) => ({ window, limit })));
  const real = limits.filter(({ limit }) => limit.kind !== "frame");
  const [u, v] = [pH / band.pH, Eh / band.Eh];
  let nearest: Judgement["nearest"] = null;
  let straight = Infinity;
  for (const { window, limit } of real.length > 0 ? real : limits) {
    const edge: Segment = {
      ax: limit.from[0] / band.pH,
      ay: limit.from[1] / band.Eh,
      bx: limit.to[0] / band.pH,
      by: limit.to[1] / band.Eh,
    };
    const distance = Math.max(0, widest(clearances(edge), u, v)[1]);
    // Limits that meet in a corner are often equally far as boxes: the one nearer in a straight line is the one faced.
    const line = straightTo(edge, u, v);
    if (
      nearest !== null &&
      (distance > nearest.distance + 1e-9 || (distance > nearest.distance - 1e-9 && line >= straight))
    )
      continue;
    nearest = { window, limit, distance };
    straight = line;
  }
  return nearest;
}

/** Whether a measured point lies in a window of a solution. Polygons are taken exactly as they stand; a point on an edge is inside.
 *  @param point  pH, V vs SHE and its +- V     @param solution  of the revision shown     @param band  control bands, for distances
 *  @returns  the verdict, and the nearest limit     @source  geometry/loop.ts, setpoint/segments.ts */
export function judge(
  point: { readonly pH: number; readonly Eh: number; readonly EhUncertainty?: number },
  solution: Solution,
  band: Band,
): Judgement {
  const { pH, Eh, EhUncertainty = 0 } = point;
  const { frame } = solution;
  const onMap = pH >= frame.pH[0] && pH <= frame.pH[1] && Eh >= frame.Eh[0] && Eh <= frame.Eh[1];
  const at = windowAt(solution, pH, Eh);
  const ends = [Eh - EhUncertainty, Eh + EhUncertainty].map((E) => windowAt(solution, pH, E) >= 0);
  return {
    verdict: !onMap ? "off the map" : at >= 0 ? "inside" : "outside",
    window: at >= 0 ? at : null,
    unsure: onMap && EhUncertainty > 0 && ends.some((inside) => inside !== at >= 0),
    nearest: nearestLimit(solution, pH, Eh, band),
  };
}
