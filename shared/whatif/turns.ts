import type { Problem } from "../schemas/problem";
import { deepestPoint } from "../setpoint/deepestPoint";
import { clearances, widest, type Segment } from "../setpoint/segments";
import type { Limit, Solution, Window } from "../solution";
import { changesBetween, stands, steps, type Changes, type Stands } from "./jumps";

/** What happens at one setting as it rises.
 *  opens, closes: a window comes from nothing or shrinks to nothing; parts, joins: a window becomes two or two become one;
 *  holds, slips: the best margin rises above one control band or falls below it;
 *  jumps: neither, but margin or open ground are other at one stroke */
export type TurnKind = "opens" | "closes" | "parts" | "joins" | "holds" | "slips" | "jumps";

export interface Turn {
  readonly kind: TurnKind;
  /** the setting, C, activity or g/L: the middle of `between` */
  readonly at: number;
  /** as it stands before and beyond; no further apart than the tolerance */
  readonly between: readonly [number, number];
  /** windows before and beyond */
  readonly windows: readonly [number, number];
  /** the limits that meet where the window shrinks to nothing, or those the best set point stands between */
  readonly limits: readonly Limit[];
  /** where no window is left: the requirements that cannot hold together */
  readonly conflicts: Solution["conflicts"];
  /** the window did not shrink: candidates or rules change here, and with them the ground at one stroke */
  readonly abrupt: boolean;
  /** of a jump: margin and ground on both sides, and what is other beyond it; null where nothing jumps */
  readonly jump: (Stands & Changes) | null;
}

const jumpOf = (low: Solution, high: Solution, band: Problem["controlBand"]): Turn["jump"] => {
  const sides = stands(low, high);
  return steps(sides, band) ? { ...sides, ...changesBetween(low, high, band) } : null;
};

/** Where margin or open ground jump and nothing opens, closes or passes a band.
 *  @param low, high  settings a tolerance apart and their solutions, low first     @param band  control bands     @returns  the turn; null where nothing jumps */
export function jumpBetween(
  low: { at: number; solution: Solution },
  high: { at: number; solution: Solution },
  band: Problem["controlBand"],
): Turn | null {
  const jump = jumpOf(low.solution, high.solution, band);
  return (
    jump && {
      kind: "jumps",
      at: (low.at + high.at) / 2,
      between: [low.at, high.at],
      windows: [low.solution.windows.length, high.solution.windows.length],
      limits: [],
      conflicts: [],
      abrupt: true,
      jump,
    }
  );
}

/** A window under this many control bands of depth, next to a root, is one that comes or goes. */
const NOTHING_LEFT = 0.1;

const segmentOf = ({ from, to }: Limit, band: Problem["controlBand"]): Segment => ({
  ax: from[0] / band.pH,
  ay: from[1] / band.Eh,
  bx: to[0] / band.pH,
  by: to[1] / band.Eh,
});

/** How deep a window is, in control bands of pH and Eh, and the limits that stop it being deeper.
 *  @param window  of a solution     @param band  control bands     @returns  depth and the limits the deepest box touches, nearest first
 *  @source  setpoint/deepestPoint.ts */
export function depthOf(window: Window, band: Problem["controlBand"]): { depth: number; limits: Limit[] } {
  const border = window.limits.map((limit) => ({ limit, segment: segmentOf(limit, band) }));
  const deepest = deepestPoint(border.map((b) => b.segment));
  if (!deepest) return { depth: 0, limits: [] };
  const reach = border
    .map(({ limit, segment }) => ({ limit, way: widest(clearances(segment), deepest.u, deepest.v)[1] }))
    .sort((a, b) => a.way - b.way);
  const most = deepest.margin * 1.02 + 1e-9;
  return { depth: deepest.margin, limits: reach.filter((r) => r.way <= most).map((r) => r.limit) };
}

const known = (l: Limit) => [l.kind, l.metal, l.inside, l.outside, l.side].join();
const once = (limits: readonly Limit[]): Limit[] =>
  limits.filter((l, i) => limits.findIndex((o) => known(o) === known(l)) === i);

/** What happens between two settings a tolerance apart, of which one has more windows.
 *  @param low, high  settings and their solutions, low first     @param band  control bands     @returns  the turn
 *  @source  the window least deep on the side that has more */
export function turnBetween(
  low: { at: number; solution: Solution },
  high: { at: number; solution: Solution },
  band: Problem["controlBand"],
): Turn {
  const [n, m] = [low.solution.windows.length, high.solution.windows.length];
  const [more, less] = m > n ? [high.solution, low.solution] : [low.solution, high.solution];
  const depths = more.windows.map((w) => depthOf(w, band)).sort((a, b) => a.depth - b.depth);
  const least = depths[0] ?? { depth: 0, limits: [] };
  const vanishes = least.depth < NOTHING_LEFT;
  const none = less.windows.length === 0;
  const rises = m > n;
  const kind = vanishes || none ? (rises ? "opens" : "closes") : rises ? "parts" : "joins";
  return {
    kind,
    at: (low.at + high.at) / 2,
    between: [low.at, high.at],
    windows: [n, m],
    limits: vanishes ? once(least.limits) : [],
    conflicts: less.conflicts,
    abrupt: !vanishes && none,
    jump: jumpOf(low.solution, high.solution, band),
  };
}

/** Where the best margin passes one control band.
 *  @param low, high  settings and their solutions, low first     @param band  control bands     @returns  the turn, with the limits the
 *  deepest box of the better side touches */
export function gripBetween(
  low: { at: number; solution: Solution },
  high: { at: number; solution: Solution },
  band: Problem["controlBand"],
): Turn {
  const held = (s: Solution) => (s.setPoint?.margin ?? 0) >= 1;
  const rises = held(high.solution);
  const best = (rises ? high : low).solution.windows[0];
  return {
    kind: rises ? "holds" : "slips",
    at: (low.at + high.at) / 2,
    between: [low.at, high.at],
    windows: [low.solution.windows.length, high.solution.windows.length],
    limits: best ? once(best.setPoint.mixedPotential ? pHWalls(best, band) : depthOf(best, band).limits) : [],
    conflicts: [],
    abrupt: Math.abs((low.solution.setPoint?.margin ?? 0) - (high.solution.setPoint?.margin ?? 0)) > NOTHING_LEFT,
    jump: jumpOf(low.solution, high.solution, band),
  };
}

/** The two walls a set point of mixed potential stands between. */
function pHWalls(window: Window, band: Problem["controlBand"]): Limit[] {
  const most = window.setPoint.margin * 1.02 + 1e-9;
  return window.limits.filter((l) => l.distancePH !== null && Math.abs(l.distancePH) / band.pH <= most);
}
