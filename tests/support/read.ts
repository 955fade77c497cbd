import type { Outline, Point, Solution } from "../../shared/solution";

export type Axis = "pH" | "E";

/** Even-odd over all loops of all windows. */
export function insideWindows(solution: Solution, pH: number, Eh: number): boolean {
  return solution.windows.some((w) => w.polygons.some((p) => insideOutline(p, pH, Eh)));
}

export function insideOutline({ outer, holes }: Outline, pH: number, Eh: number): boolean {
  return insideLoop(outer, pH, Eh) && !holes.some((h) => insideLoop(h, pH, Eh));
}

function insideLoop(loop: readonly Point[], pH: number, Eh: number): boolean {
  let inside = false;
  loop.forEach((p, i) => {
    const q = loop[(i + 1) % loop.length]!;
    if (p[1] > Eh !== q[1] > Eh && pH < p[0] + ((Eh - p[1]) / (q[1] - p[1])) * (q[0] - p[0])) inside = !inside;
  });
  return inside;
}

/** Whether a segment meets the open inside of a box. */
function meetsBox(a: Point, b: Point, pH: readonly [number, number], E: readonly [number, number]): boolean {
  let [t0, t1] = [0, 1];
  for (const [axis, range] of [
    [0, pH],
    [1, E],
  ] as const) {
    const d = b[axis] - a[axis];
    const low = range[0] + 1e-12 - a[axis];
    const high = range[1] - 1e-12 - a[axis];
    if (d === 0) {
      if (low > 0 || high < 0) return false;
      continue;
    }
    const [u, v] = d > 0 ? [low / d, high / d] : [high / d, low / d];
    t0 = Math.max(t0, u);
    t1 = Math.min(t1, v);
  }
  return t0 < t1;
}

const loopsOf = (solution: Solution): readonly Point[][] =>
  solution.windows.flatMap((w) => w.polygons.flatMap((p) => [p.outer, ...p.holes]));

const borderMeets = (solution: Solution, pH: readonly [number, number], E: readonly [number, number]): boolean =>
  loopsOf(solution).some((loop) => loop.some((p, i) => meetsBox(p, loop[(i + 1) % loop.length]!, pH, E)));

const middle = ([lo, hi]: readonly [number, number]): number => (lo + hi) / 2;

/** Every point of the box lies in a window: its middle does and no border runs through it. */
export const containsBox = (s: Solution, pH: readonly [number, number], E: readonly [number, number]): boolean =>
  insideWindows(s, middle(pH), middle(E)) && !borderMeets(s, pH, E);

/** Some point of the box lies in a window: its middle does, or a border runs through it. */
export const overlapsBox = (s: Solution, pH: readonly [number, number], E: readonly [number, number]): boolean =>
  insideWindows(s, middle(pH), middle(E)) || borderMeets(s, pH, E);

/** Lowest and highest value of the windows along a line. */
export function lineThroughWindows(solution: Solution, along: Axis, level: number): [number, number] {
  const [axis, other] = along === "pH" ? ([0, 1] as const) : ([1, 0] as const);
  const hits: number[] = [];
  for (const loop of loopsOf(solution))
    loop.forEach((p, i) => {
      const q = loop[(i + 1) % loop.length]!;
      if (p[other] <= level !== q[other] <= level)
        hits.push(p[axis] + ((level - p[other]) / (q[other] - p[other])) * (q[axis] - p[axis]));
    });
  return [Math.min(...hits), Math.max(...hits)];
}

/** Where two named fields of a metal touch along a line, read at the given pH (E): the values on the other axis. */
export function borderValues(
  solution: Solution,
  metal: string,
  [first, second]: readonly [string, string],
  at: { pH?: number; E?: number },
  axis: Axis,
): number[] {
  const [other, level] = axis === "pH" ? ([1, at.E!] as const) : ([0, at.pH!] as const);
  const along = axis === "pH" ? 0 : 1;
  const ends = (species: string): number[] =>
    solution.fields
      .filter((f) => f.metal === metal && f.species === species)
      .flatMap((f) =>
        f.polygon.flatMap((p, i) => {
          const q = f.polygon[(i + 1) % f.polygon.length]!;
          if (p[other] <= level === q[other] <= level) return [];
          return [p[along] + ((level - p[other]) / (q[other] - p[other])) * (q[along] - p[along])];
        }),
      );
  const others = ends(second);
  return ends(first).filter((x) => others.some((y) => Math.abs(x - y) < 1e-9));
}
