import { insideOf, type Segment } from "../../shared/setpoint/segments";
import { boxDistance } from "./shapes";

const unit = { pH: 1, Eh: 1 };

/** Box distance to the border by hand, point against segment. */
export const clearanceAt = (border: readonly Segment[], u: number, v: number): number =>
  Math.min(...border.map((s) => boxDistance([u, v], [[s.ax, s.ay], [s.bx, s.by]], unit))); // prettier-ignore

/** A point of the region deeper than a claim by more than `slack`, or null where there is none: squares are halved until their
 *  centre's clearance and half-width leave no room. Gives up (undefined) after `budget` squares. */
export function deeperThan(
  border: readonly Segment[],
  claim: number,
  slack: number,
  budget = 60_000,
): [number, number] | null | undefined {
  const us = border.map((s) => s.ax);
  const vs = border.map((s) => s.ay);
  const half = Math.max(Math.max(...us) - Math.min(...us), Math.max(...vs) - Math.min(...vs)) / 2;
  let squares: [number, number, number][] = [
    [(Math.max(...us) + Math.min(...us)) / 2, (Math.max(...vs) + Math.min(...vs)) / 2, half],
  ];
  for (let n = 0; squares.length > 0;) {
    const next: typeof squares = [];
    for (const [u, v, h] of squares) {
      if (++n > budget) return undefined;
      const inside = insideOf(border, u, v);
      const clearance = clearanceAt(border, u, v);
      if (inside && clearance > claim + slack) return [u, v];
      if ((inside ? clearance : -clearance) + h <= claim + slack) continue;
      for (const a of [-1, 1]) for (const b of [-1, 1]) next.push([u + (a * h) / 2, v + (b * h) / 2, h / 2]);
    }
    squares = next;
  }
  return null;
}
