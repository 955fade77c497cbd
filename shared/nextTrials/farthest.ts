import { Delaunay } from "d3-delaunay";
import type { Segment } from "../setpoint/segments";
import { clearanceAt, crossingOf, inRoom, type Room } from "./room";

type Spot = readonly [u: number, v: number];

export interface Farthest {
  readonly u: number;
  readonly v: number;
  /** straight distance to the nearest site, control bands */
  readonly gap: number;
}

/** Gaps and clearances closer than this count as equal. */
const SAME = 1e-6;

/** Of equally good spots the one deepest inside, of those the lowest pH, of those the lowest Eh.
 *  @param found  not empty     @param depth  distance to the nearest limit */
export function settleTies<T extends { readonly u: number; readonly v: number; readonly gap: number }>(
  found: readonly T[],
  depth: (spot: T) => number,
): T {
  const most = (list: readonly T[], of: (spot: T) => number): T[] => {
    const values = list.map(of);
    const best = Math.max(...values);
    return list.filter((_, i) => values[i]! >= best - SAME);
  };
  const deepest = most(
    most(found, (s) => s.gap),
    depth,
  );
  return most(
    most(deepest, (s) => -s.u),
    (s) => -s.v,
  )[0]!;
}

/** The part of the middle line of two sites that can meet the room: long enough to cross all of it. */
function middleLine(a: Spot, b: Spot, reach: number): Segment {
  const [mu, mv] = [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2];
  const [du, dv] = [b[1] - a[1], a[0] - b[0]];
  const size = Math.hypot(du, dv);
  const [pu, pv] = [(du / size) * reach, (dv / size) * reach];
  return { ax: mu - pu, ay: mv - pv, bx: mu + pu, by: mv + pv };
}

/** The point as far from three sites; null where they stand in line. */
function middleOfThree(a: Spot, b: Spot, c: Spot): Spot | null {
  const [bx, by, cx, cy] = [b[0] - a[0], b[1] - a[1], c[0] - a[0], c[1] - a[1]];
  const det = 2 * (bx * cy - by * cx);
  if (det === 0) return null;
  const [bb, cc] = [bx * bx + by * by, cx * cx + cy * cy];
  return [a[0] + (cy * bb - by * cc) / det, a[1] + (bx * cc - cx * bb) / det];
}

/** The point of the room whose nearest site is farthest away. Within one Voronoi cell the distance to its site is convex, so that it is
 *  largest in a corner of what the cell and the room share: a Voronoi vertex, a crossing of a Voronoi edge with the room's
 *  border, or a corner of the room. All of them are looked at, no grid.
 *  @param room  in control bands     @param given  sites, at least one, in control bands     @returns  the point; null where the room is empty
 *  @source  largest empty circle by the Voronoi diagram (Shamos and Hoey 1975, from memory); Delaunay triangulation by d3-delaunay */
export function farthestPoint(room: Room, given: readonly Spot[]): Farthest | null {
  if (room.corners.length === 0 || given.length === 0) return null;
  // in one order, so that rounding does not depend on theirs
  const sites = [...given].sort((a, b) => a[0] - b[0] || a[1] - b[1]);
  const delaunay = Delaunay.from(sites.map(([u, v]): [number, number] => [u, v]));
  const distance = (site: Spot, u: number, v: number) => Math.hypot(site[0] - u, site[1] - v);
  // a site alone has -1 for a neighbour
  const near = sites.map((_, i) => [...delaunay.neighbors(i)].filter((j) => sites[j] !== undefined));
  const nearestOf = ([u, v]: Spot) =>
    sites.reduce((least, s, i) => (distance(s, u, v) < distance(sites[least]!, u, v) ? i : least), 0);
  const nearest = (u: number, v: number) => distance(sites[nearestOf([u, v])]!, u, v);
  let best = -Infinity;
  let found: Farthest[] = [];
  const offer = ([u, v]: Spot, from: number, known: boolean) => {
    const way = distance(sites[from]!, u, v);
    if (way < best - SAME) return;
    // nearer to a neighbour: not on the cell of this site, and another pair's business
    for (const j of near[from] ?? []) if (distance(sites[j]!, u, v) < way - SAME) return;
    if (!known && !inRoom(room, u, v)) return;
    const gap = nearest(u, v);
    if (gap < best - SAME) return;
    found.push({ u, v, gap });
    if (gap > best) {
      best = gap;
      found = found.filter((f) => f.gap >= best - SAME);
    }
  };
  for (const corner of room.corners) offer(corner, nearestOf(corner), true);
  const [us, vs] = [room.corners.map((c) => c[0]), room.corners.map((c) => c[1])];
  const low: Spot = [Math.min(...us), Math.min(...vs)];
  const size = Math.hypot(Math.max(...us) - low[0], Math.max(...vs) - low[1]);
  sites.forEach((a, i) => {
    for (const j of near[i] ?? []) {
      const b = sites[j]!;
      if (j <= i || (a[0] === b[0] && a[1] === b[1])) continue;
      const far = distance(a, low[0], low[1]) + distance(b, low[0], low[1]) + 2 * size;
      const line = middleLine(a, b, far);
      for (const edge of room.edges) {
        const at = crossingOf(line, edge);
        if (at) offer(at, i, false);
      }
    }
  });
  const { triangles } = delaunay;
  for (let t = 0; t + 2 < triangles.length; t += 3) {
    const i = triangles[t]!;
    const [a, b, c] = [sites[i], sites[triangles[t + 1]!], sites[triangles[t + 2]!]]; // one or two sites span no triangle
    const at = a && b && c && middleOfThree(a, b, c);
    if (at) offer(at, i, false);
  }
  return settleTies(found, ({ u, v }) => clearanceAt(room.border, u, v));
}
