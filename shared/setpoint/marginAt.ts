import type { Limit, Point, Window } from "../solution";
import { clearances, insideOf, widest, type Segment } from "./segments";

export interface MarginHere {
  /** control bands to the nearest limit; negative outside the window */
  readonly margin: number;
  /** the limit that is nearest */
  readonly nearest: Limit;
}

/** The margin at any point, for a set point under the hand.
 *  @param window  solved     @param at  pH, Eh (V vs SHE at T)     @param band  control bands
 *  @param pHAlone  count pH only, as for a mixed potential     @returns  margin and nearest limit; null where no limit is met
 *  @source  box distance to each limit (segments.ts) */
export function marginAt(
  window: Window,
  at: Point,
  band: { pH: number; Eh: number },
  pHAlone = false,
): MarginHere | null {
  const [u, v] = [at[0] / band.pH, at[1] / band.Eh];
  const border = window.limits.map((limit): { limit: Limit; s: Segment } => ({
    limit,
    s: {
      ax: limit.from[0] / band.pH,
      ay: limit.from[1] / band.Eh,
      bx: limit.to[0] / band.pH,
      by: limit.to[1] / band.Eh,
    },
  }));
  const inside = insideOf(
    border.map((b) => b.s),
    u,
    v,
  );
  let best: MarginHere | null = null;
  for (const { limit, s } of border) {
    const way = pHAlone ? alongPH(s, u, v) : Math.max(0, widest(clearances(s), u, v)[1]);
    if (way !== null && (best === null || way < Math.abs(best.margin)))
      best = { margin: inside ? way : -way, nearest: limit };
  }
  return best;
}

const alongPH = (s: Segment, u: number, v: number): number | null =>
  s.ay <= v === s.by <= v ? null : Math.abs(s.ax + ((v - s.ay) / (s.by - s.ay)) * (s.bx - s.ax) - u);
