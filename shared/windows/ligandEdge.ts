import type { MetalFields } from "../fields/fields";
import { sameLine, turn, type Line } from "../geometry/line";
import type { Point } from "../solution";
import type { EdgeMeaning } from "./pieces";
import { fulfils } from "./requirement";

type MetalMeaning = Extract<EdgeMeaning, { kind: "metal" }>;

/** Part of a border stretch with one metal to blame. */
export interface Blame {
  readonly meaning: MetalMeaning;
  readonly from: Point;
  readonly to: Point;
}

/** A species of a metal that stands on one side of a line, from one place along it to another. */
interface Standing {
  readonly plane: number;
  readonly from: number;
  readonly to: number;
}

const alike = (a: Line, b: Line): boolean => Math.sign(a[1]) === Math.sign(b[1]) && Math.sign(a[2]) === Math.sign(b[2]);

/** Places along a line, walked with its positive side on the left. */
const placeOn =
  (line: Line) =>
  (x: number, y: number): number =>
    (x * line[2] - y * line[1]) / Math.hypot(line[1], line[2]);

/** The fields of one metal that touch a line, on its positive side or beyond it. Which edges lie on the line is decided exactly. */
function standings(m: MetalFields, line: Line): { inside: Standing[]; outside: Standing[] } {
  const place = placeOn(line);
  const found = { inside: [] as Standing[], outside: [] as Standing[] };
  for (const { pieces } of m.cells)
    for (const { plane, piece } of pieces)
      piece.lines.forEach((own, e) => {
        if (turn(own, line) !== 0 || !sameLine(own, line)) return;
        const start = e === 0 ? piece.x.length - 1 : e - 1;
        const [a, b] = [place(piece.x[start]!, piece.y[start]!), place(piece.x[e]!, piece.y[e]!)];
        found[alike(own, line) ? "inside" : "outside"].push({ plane, from: Math.min(a, b), to: Math.max(a, b) });
      });
  return found;
}

const holder = (list: readonly Standing[], t: number): number | undefined =>
  list.find((s) => s.from <= t && t <= s.to)?.plane;

/** A ligand-cell edge on a window's border: some metal changes state right on it. Splits the stretch where the species on
 *  either side change and names for each part the first metal, in the order of the problem, that is not as required beyond.
 *  @param metals  fields of all metals     @param line  the edge, positive in the window     @param from, to  the stretch
 *  @returns  parts in the order of the walk     @throws Error when every metal is as required beyond: no border at all
 *  @source  exact coincidence of lines (geometry/line.ts) */
export function acrossLigandEdge(metals: readonly MetalFields[], line: Line, from: Point, to: Point): Blame[] {
  const place = placeOn(line);
  const [start, end] = [place(...from), place(...to)];
  const sides = metals.map((m) => standings(m, line));
  const cuts = sides
    .flatMap((s) => [...s.inside, ...s.outside])
    .flatMap((s) => [s.from, s.to])
    .filter((t) => t > start + 1e-12 && t < end - 1e-12)
    .sort((a, b) => a - b);
  const at = (t: number): Point => {
    const share = (t - start) / (end - start);
    return [from[0] + share * (to[0] - from[0]), from[1] + share * (to[1] - from[1])];
  };
  const out: Blame[] = [];
  let low = start;
  for (const high of [...cuts, end]) {
    if (high - low < 1e-12 && high !== end) continue;
    const meaning = blameAt(metals, sides, (low + high) / 2);
    if (!meaning) throw new Error(`no metal changes state across the ligand edge from pH ${from[0]}, ${from[1]} V`);
    const a = low === start ? from : at(low);
    const b = high === end ? to : at(high);
    out.push({ meaning, from: a, to: b });
    low = high;
  }
  return out;
}

function blameAt(
  metals: readonly MetalFields[],
  sides: readonly { inside: readonly Standing[]; outside: readonly Standing[] }[],
  t: number,
): MetalMeaning | null {
  for (const [metal, m] of metals.entries()) {
    const inside = holder(sides[metal]!.inside, t);
    const outside = holder(sides[metal]!.outside, t);
    if (inside !== undefined && outside !== undefined && !fulfils(m.metal.requirement, m.states[outside]!))
      return { kind: "metal", metal, inside, outside };
  }
  return null;
}
