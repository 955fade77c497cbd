import { insideLoop } from "../geometry/loop";

/** Label placement in pixels of the map, y downwards. Pure; nothing here knows chemistry. */
export type Pixel = readonly [x: number, y: number];
export interface Box {
  x0: number;
  y0: number;
  x1: number;
  y1: number;
}

export interface LabelWish {
  id: string;
  /** pieces that make up the field, in px */
  pieces: readonly (readonly Pixel[])[];
  /** parts of the pieces where the name must not stand */
  holes?: readonly (readonly Pixel[])[];
  width: number;
  height: number;
}

export type Segment = readonly [Pixel, Pixel];

/** Labels stay on this lattice, so that they hold still while a field's edge moves under the hand. */
const LATTICE = 14;
const FINE = 5;
const GROWTH = [1, 1.25, 1.6, 2.1, 2.8] as const;

const overlaps = (a: Box, b: Box): boolean => a.x0 < b.x1 && b.x0 < a.x1 && a.y0 < b.y1 && b.y0 < a.y1;

/** Clips a polygon to a box (Sutherland and Hodgman 1974). */
export function clipToBox(ring: readonly Pixel[], { x0, y0, x1, y1 }: Box): Pixel[] {
  const cut = (points: readonly Pixel[], axis: 0 | 1, bound: number, keep: 1 | -1): Pixel[] =>
    points.flatMap((a, i) => {
      const b = points[(i + 1) % points.length] as Pixel;
      const [ia, ib] = [keep * (a[axis] - bound) >= 0, keep * (b[axis] - bound) >= 0];
      const t = (bound - a[axis]) / (b[axis] - a[axis]);
      const crossing: Pixel = [a[0] + t * (b[0] - a[0]), a[1] + t * (b[1] - a[1])];
      return ia ? (ib ? [a] : [a, crossing]) : ib ? [crossing] : [];
    });
  return cut(cut(cut(cut(ring, 0, x0, 1), 0, x1, -1), 1, y0, 1), 1, y1, -1);
}

function boundsOf(points: readonly Pixel[]): Box {
  let [x0, y0, x1, y1] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const [x, y] of points) {
    x0 = Math.min(x0, x);
    y0 = Math.min(y0, y);
    x1 = Math.max(x1, x);
    y1 = Math.max(y1, y);
  }
  return { x0, y0, x1, y1 };
}

const centredBox = (x: number, y: number, width: number, height: number): Box => ({
  x0: x - width / 2,
  y0: y - height / 2,
  x1: x + width / 2,
  y1: y + height / 2,
});

const around = (box: Box): Pixel[] => {
  const { x0, y0, x1, y1 } = box;
  const [xm, ym] = [(x0 + x1) / 2, (y0 + y1) / 2];
  return [
    [x0, y0],
    [x1, y0],
    [x1, y1],
    [x0, y1],
    [xm, y0],
    [xm, y1],
    [x0, ym],
    [x1, ym],
  ];
};

function centroid(pieces: readonly (readonly Pixel[])[]): Pixel {
  let [sx, sy, weight] = [0, 0, 0];
  for (const ring of pieces) {
    for (let i = 0; i < ring.length; i++) {
      const a = ring[i] as Pixel;
      const b = ring[(i + 1) % ring.length] as Pixel;
      const cross = a[0] * b[1] - b[0] * a[1];
      sx += ((a[0] + b[0]) / 3) * cross;
      sy += ((a[1] + b[1]) / 3) * cross;
      weight += cross;
    }
  }
  const first = pieces[0]?.[0] ?? [0, 0];
  return weight === 0 ? first : [sx / weight, sy / weight];
}

/** Whether a segment enters a box (Liang and Barsky 1984). */
function crosses([ax, ay]: Pixel, [bx, by]: Pixel, { x0, y0, x1, y1 }: Box): boolean {
  let [enter, leave] = [0, 1];
  for (const [p, q] of [
    [ax - bx, ax - x0],
    [bx - ax, x1 - ax],
    [ay - by, ay - y0],
    [by - ay, y1 - ay],
  ] as const) {
    if (p === 0) {
      if (q < 0) return false;
    } else if (p < 0) enter = Math.max(enter, q / p);
    else leave = Math.min(leave, q / p);
  }
  return enter <= leave;
}

interface Spot {
  at: Pixel;
  /** lines of other fields that would run through the name */
  crossed: number;
  /** how far the name could grow and still fit, as an index into GROWTH */
  room: number;
  far: number;
}

const better = (a: Spot, b: Spot | null): boolean =>
  b === null || (a.crossed !== b.crossed ? a.crossed < b.crossed : a.room !== b.room ? a.room > b.room : a.far < b.far);

/** Where one label fits: where it stood if it still fits there, else the lattice point that fewest lines cross, then with most room, then
 *  nearest the field's middle. */
function place(
  wish: LabelWish,
  view: Box,
  taken: readonly Box[],
  lines: readonly Segment[],
  before: Pixel | undefined,
): Pixel | null {
  const pieces = wish.pieces.map((ring) => clipToBox(ring, view)).filter((ring) => ring.length >= 3);
  if (pieces.length === 0) return null;
  const bounds = pieces.map(boundsOf);
  const holes = wish.holes ?? [];
  const within = ([x, y]: Pixel) =>
    !holes.some((ring) => insideLoop(ring, x, y)) &&
    pieces.some((ring, i) => {
      const b = bounds[i] as Box;
      return x >= b.x0 && x <= b.x1 && y >= b.y0 && y <= b.y1 && insideLoop(ring, x, y);
    });
  const fits = (x: number, y: number, growth: number) =>
    around(centredBox(x, y, wish.width * growth, wish.height * growth)).every(within);
  const free = (x: number, y: number) => {
    const own = centredBox(x, y, wish.width, wish.height);
    return within([x, y]) && !taken.some((other) => overlaps(own, other)) && fits(x, y, 1);
  };
  if (before && free(...before)) return before;
  const box = boundsOf(pieces.flat());
  const [spareX, spareY] = [box.x1 - box.x0 - wish.width, box.y1 - box.y0 - wish.height];
  if (spareX < 0 || spareY < 0) return null;
  const near = lines.filter(([a, b]) => crosses(a, b, box));
  const middle = centroid(pieces);
  const search = (stepX: number, stepY: number): Pixel | null => {
    let best: Spot | null = null;
    for (let x = Math.ceil((box.x0 + wish.width / 2) / stepX) * stepX; x <= box.x1 - wish.width / 2; x += stepX) {
      for (let y = Math.ceil((box.y0 + wish.height / 2) / stepY) * stepY; y <= box.y1 - wish.height / 2; y += stepY) {
        if (!free(x, y)) continue;
        const own = centredBox(x, y, wish.width, wish.height);
        const crossed = near.reduce((n, [a, b]) => n + Number(crosses(a, b, own)), 0);
        if (best !== null && crossed > best.crossed) continue;
        let room = 0;
        while (room + 1 < GROWTH.length && fits(x, y, GROWTH[room + 1] ?? 1)) room++;
        const spot = { at: [x, y] as const, crossed, room, far: Math.hypot(x - middle[0], y - middle[1]) };
        if (better(spot, best)) best = spot;
      }
    }
    return best?.at ?? null;
  };
  // A large field is searched coarsely, always on multiples of one lattice, so that its name holds still.
  const coarse = (spare: number) => LATTICE * 2 ** Math.max(0, Math.floor(Math.log2(spare / (10 * LATTICE))));
  return search(coarse(spareX), coarse(spareY)) ?? search(FINE, FINE);
}

/** Places labels in the order given, so that the weightier ones come first; what fits nowhere is left out.
 *  @param wishes  fields with the size of their names, px     @param view  the part of the map in sight, px
 *  @param taken  boxes no label may cover     @param lines  boundaries a name should rather not sit on, px
 *  @param before  where labels stood: one that still fits there stays, which takes no search; for a moving map
 *  @returns  the middle of each label that fits, by id */
export function placeLabels(
  wishes: readonly LabelWish[],
  view: Box,
  taken: readonly Box[],
  lines: readonly Segment[] = [],
  before: ReadonlyMap<string, Pixel> = new Map(),
): Map<string, Pixel> {
  const boxes = [...taken];
  const placed = new Map<string, Pixel>();
  for (const wish of wishes) {
    const at = place(wish, view, boxes, lines, before.get(wish.id));
    if (at === null) continue;
    placed.set(wish.id, at);
    boxes.push(centredBox(at[0], at[1], wish.width + 4, wish.height + 2));
  }
  return placed;
}
