import { expect } from "vitest";
import type { Point, Solution, Window } from "../../shared/solution";

const cornersOf = (w: Window): Point[] =>
  w.polygons.flatMap((p) => [p.outer, ...p.holes].flat()).sort((a, b) => a[0] - b[0] || a[1] - b[1]);

/** How far two loops' corners lie apart, matched each to its nearest. */
function gap(a: readonly Point[], b: readonly Point[]): number {
  const to = (list: readonly Point[]) => (p: Point) =>
    Math.min(...list.map((q) => Math.hypot(p[0] - q[0], p[1] - q[1])));
  return Math.max(...a.map(to(b)), ...b.map(to(a)));
}

/** The same windows, wherever the walk began and in whatever order they stand; moved by a shift. Corners in the middle of a
 *  straight side do not count: which metal is named where two shut along one line is a matter of order. */
export function expectSameWindows(a: Solution, b: Solution, shift: Point = [0, 0]): void {
  expect(b.windows.length).toBe(a.windows.length);
  const rest = [...b.windows];
  for (const w of a.windows) {
    const corners = cornersOf(w).map((p): Point => [p[0] + shift[0], p[1] + shift[1]]);
    const apart = rest.map((v) => gap(corners, cornersOf(v)));
    const at = apart.indexOf(Math.min(...apart));
    const [twin] = rest.splice(at, 1);
    expect(Math.min(...apart)).toBeLessThan(1e-6);
    expect(twin!.area).toBeCloseTo(w.area, 6);
    expect(twin!.polygons[0]!.holes.length).toBe(w.polygons[0]!.holes.length);
    expect(twin!.setPoint.pH).toBeCloseTo(w.setPoint.pH + shift[0], 4);
    expect(twin!.setPoint.Eh).toBeCloseTo(w.setPoint.Eh + shift[1], 4);
    expect(twin!.setPoint.margin).toBeCloseTo(w.setPoint.margin, 5);
    expect(twin!.controllable).toBe(w.controllable);
  }
}

export const areaOfWindows = (s: Solution): number => s.windows.reduce((sum, w) => sum + w.area, 0);
