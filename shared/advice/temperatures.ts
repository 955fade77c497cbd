import type { Convex } from "../geometry/convex";
import type { Outline, Point } from "../solution";
import { connect } from "../geometry/region";
import type { Problem } from "../schemas/problem";
import { temperatureLimits } from "../selection/leftOut";
import { prepare } from "../selection/prepare";
import { clearances, widest, type Segment } from "../setpoint/segments";
import type { ChemicalData } from "../species/chemicalData";
import { isSliver } from "../windows/pieces";
import { outlinesOf } from "../windows/shutGround";

/** Above and below a temperature at which the species that count change, this far apart, K. */
const BESIDE = 1e-6;

/** Temperatures at which the species that count change (fresh solids that set in, defaults that end), between two ends.
 *  @param problem  the solver validates it     @param data  library     @param low, high  C     @returns  C, rising
 *  @source  the species chosen on both sides of every limit of the rules (selection/leftOut.ts) */
export function ruleTemperatures(problem: Problem, data: ChemicalData, low: number, high: number): number[] {
  const chosenAt = (temperatureC: number): string => {
    const prepared = prepare({ ...problem, temperatureC }, data);
    if (!prepared.ok) return prepared.error.message;
    const { metals, components, sulfateReduction } = prepared.value;
    return JSON.stringify([sulfateReduction, ...[...metals, ...components].map((c) => c.species.map((s) => s.id))]);
  };
  return temperatureLimits(data).filter(
    (limit) => limit > low && limit <= high && chosenAt(limit - BESIDE) !== chosenAt(limit),
  );
}

/** Where to start: both ends, both sides of every rule, and 25 C, where models change slope. Between two neighbours of one stretch every
 *  line of the map moves smoothly.
 *  @param low, high  C     @param rules  of `ruleTemperatures`     @returns  stretches that cover the range
 *  @example smoothStretches(20, 60, [50]).length // => 3 */
export function smoothStretches(low: number, high: number, rules: readonly number[]): [number, number][] {
  const cuts: [number, number][] = [
    ...rules.map((rule): [number, number] => [rule - BESIDE, rule]),
    ...(low < 25 && 25 < high ? [[25, 25] satisfies [number, number]] : []),
  ].sort((a, b) => a[0] - b[0]);
  const ends = [low, ...cuts.flat(), high];
  const stretches: [number, number][] = [];
  for (let i = 0; i + 1 < ends.length; i += 2) stretches.push([ends[i]!, ends[i + 1]!]);
  return stretches;
}

/** The border of ground in pieces; hairs that are no ground left out.
 *  @param pieces  convex, disjoint     @returns  outlines of its connected regions */
export function borderOf(pieces: readonly Convex[]): Outline[] {
  const regions = connect(pieces).filter((r) => r.pieces.some((i) => !isSliver(pieces[i]!)));
  return outlinesOf(pieces, regions);
}

const loopsOf = (outlines: readonly Outline[]): (readonly Point[])[] => outlines.flatMap((o) => [o.outer, ...o.holes]);

const segmentsOf = (outlines: readonly Outline[], scale: Point): Segment[] =>
  loopsOf(outlines).flatMap((loop) =>
    loop.map((p, i) => {
      const q = loop[i + 1 === loop.length ? 0 : i + 1]!;
      return { ax: p[0] / scale[0], ay: p[1] / scale[1], bx: q[0] / scale[0], by: q[1] / scale[1] };
    }),
  );

/** How far the border of ground moved: the greatest way from a corner of either border to the other border, in units of the scale.
 *  @param a, b  outlines     @param scale  pH and V that count as one     @returns  0 where nothing moved; Infinity where one of them is gone
 *  @source  Hausdorff distance of the borders at their corners, by the box that `clearances` grows
 *  @example borderMove([], [], [0.001, 0.001]) // => 0 */
export function borderMove(a: readonly Outline[], b: readonly Outline[], scale: Point): number {
  if (a.length === 0 && b.length === 0) return 0;
  if (a.length === 0 || b.length === 0) return Infinity;
  const oneWay = (from: readonly Outline[], to: readonly Outline[]): number => {
    const border = segmentsOf(to, scale).map(clearances);
    let most = 0;
    for (const p of loopsOf(from).flat()) {
      let least = Infinity;
      for (const s of border) least = Math.min(least, Math.max(0, widest(s, p[0] / scale[0], p[1] / scale[1])[1]));
      most = Math.max(most, least);
    }
    return most;
  };
  return Math.max(oneWay(a, b), oneWay(b, a));
}
