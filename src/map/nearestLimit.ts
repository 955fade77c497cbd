import type { ReactNode } from "react";
import type { Point } from "../../shared/solution";

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

function distanceTo(
  [x, y]: readonly [number, number],
  [ax, ay]: readonly [number, number],
  [bx, by]: readonly [number, number],
): number {
  const [dx, dy] = [bx - ax, by - ay];
  const t = Math.min(1, Math.max(0, ((x - ax) * dx + (y - ay) * dy) / (dx * dx + dy * dy || 1)));
  return Math.hypot(ax + t * dx - x, ay + t * dy - y);
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
    const distance = distanceTo(here, toPixel(...limit.from), toPixel(...limit.to));
    if (distance < least) [best, least] = [limit, distance];
  }
  return best;
}
