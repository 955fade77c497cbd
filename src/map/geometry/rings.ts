import type { Point } from "../../../shared/solution";
import type { Coordinate } from "../plotTypes";

/** Twice the signed area; positive when counter-clockwise in (pH, Eh). */
export function signedArea2(ring: readonly Point[]): number {
  let sum = 0;
  for (let i = 0; i < ring.length; i++) {
    const [x0, y0] = ring[i] as Point;
    const [x1, y1] = ring[(i + 1) % ring.length] as Point;
    sum += x0 * y1 - x1 * y0;
  }
  return sum;
}

const turned = (ring: readonly Point[], counterClockwise: boolean): readonly Point[] =>
  signedArea2(ring) > 0 === counterClockwise ? ring : [...ring].reverse();

/** Coordinates of one `toself` trace: a gap between rings, outer rings counter-clockwise, holes clockwise, so that SVG's nonzero
 *  rule leaves the holes empty. Every ring is closed, since a stroke would else miss its last side. */
export function ringCoordinates(
  polygons: readonly { outer: readonly Point[]; holes: readonly (readonly Point[])[] }[],
  toShown: (Eh: number) => number,
): { x: Coordinate[]; y: Coordinate[] } {
  const x: Coordinate[] = [];
  const y: Coordinate[] = [];
  const add = (ring: readonly Point[]) => {
    if (ring.length < 3) return;
    if (x.length > 0) {
      x.push(null);
      y.push(null);
    }
    for (let i = 0; i <= ring.length; i++) {
      const [pH, Eh] = ring[i % ring.length] as Point;
      x.push(pH);
      y.push(toShown(Eh));
    }
  };
  for (const { outer, holes } of polygons) {
    add(turned(outer, true));
    for (const hole of holes) add(turned(hole, false));
  }
  return { x, y };
}

/** Coordinates of open lines with a gap between them. */
export function lineCoordinates(
  lines: readonly (readonly Point[])[],
  toShown: (Eh: number) => number,
): { x: Coordinate[]; y: Coordinate[] } {
  const x: Coordinate[] = [];
  const y: Coordinate[] = [];
  for (const line of lines) {
    if (x.length > 0) {
      x.push(null);
      y.push(null);
    }
    for (const [pH, Eh] of line) {
      x.push(pH);
      y.push(toShown(Eh));
    }
  }
  return { x, y };
}
