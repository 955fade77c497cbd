import { analyse } from "../analysis";
import type { Convex } from "../geometry/convex";
import { common as commonGround } from "../geometry/overlay";
import { connect, type Region } from "../geometry/region";
import { ok, fail, type Outcome } from "../outcome";
import type { HazardGas } from "../hazards/gases";
import { TEMPERATURE_RANGE_C, type Problem, type Requirement } from "../schemas/problem";
import { deepestPoint } from "../setpoint/deepestPoint";
import type { Outline, Point } from "../solution";
import type { ChemicalData } from "../species/chemicalData";
import type { OnProgress } from "./search";
import { outlinesOf } from "../windows/shutGround";

/** Ranges over which a window is to hold. */
export interface Ranges {
  readonly temperatureC?: readonly [number, number];
  readonly activities?: Readonly<Record<string, readonly [number, number]>>;
}

export interface RobustWindow extends Outline {
  readonly area: number;
  readonly setPoint: { readonly pH: number; readonly Eh: number; readonly margin: number };
}

export interface Robust {
  readonly windows: readonly RobustWindow[];
  readonly checked: {
    /** C */
    readonly temperatures: readonly number[];
    /** no edge moved further than 0.001 pH and 1 mV when the temperatures were doubled */
    readonly settled: boolean;
    readonly activities: readonly { metal: string; at: number; why: string }[];
  };
}

const SETTLED: readonly [number, number] = [0.001, 0.001];
const MOST_TEMPERATURES = 65;

/** The window that holds over stated ranges of temperature and of each metal's activity.
 *  Activities by monotony: a dissolved species' potential rises by RT/nu ln a, solids do not move, so raising a shrinks
 *  where the metal is dissolved and widens where it is solid, metal or compound; the worse end alone is solved.
 *  Temperature is refined by halving until no edge moves over 0.001 pH and 1 mV, or 65 temperatures.
 *  An element whose gas is kept out is worst at its higher end where it is free: more of it gives more gas; where it is to be solid
 *  its window lies in fields whose pressure does not depend on the activity.
 *  @param problem  validated by the solver     @param ranges  C; activities by element, low and high     @param data  library
 *  @param onProgress  temperatures solved, and the most there can be
 *  @returns  outlines with set points (margin in control bands), and what was checked
 *  @source  docs/method.md, step 7 */
export function robustWindow(
  problem: Problem,
  ranges: Ranges,
  data: ChemicalData,
  onProgress?: OnProgress,
): Outcome<Robust> {
  const bad = badRange(ranges);
  if (bad) return bad;
  const activities: { metal: string; at: number; why: string }[] = [];
  const gives = new Set((problem.excludedHazards ?? []).map((h) => hydrideOf[h.gas] ?? ""));
  const worst: Problem = {
    ...problem,
    metals: problem.metals.map((m) => {
      const range = ranges.activities?.[m.element];
      const gasKept = gives.has(m.element);
      if (!range || (m.requirement === "free" && !gasKept)) return m;
      const high = m.requirement === "dissolved" || m.requirement === "free";
      const at = high ? range[1] : range[0];
      activities.push({ metal: m.element, at, why: whyWorst(m.requirement) });
      return { element: m.element, requirement: m.requirement, ...(m.role ? { role: m.role } : {}), activity: at };
    }),
  };
  const [low, high] = ranges.temperatureC ?? [problem.temperatureC, problem.temperatureC];
  const piecesAt = new Map<number, readonly Convex[]>();
  const solveAt = (temperatureC: number): Outcome<readonly Convex[]> => {
    const known = piecesAt.get(temperatureC);
    if (known) return ok(known);
    const analysed = analyse({ ...worst, temperatureC }, data);
    if (!analysed.ok) return analysed;
    const pieces = analysed.value.pieces.map((p) => p.piece);
    piecesAt.set(temperatureC, pieces);
    onProgress?.(piecesAt.size, low === high ? 1 : MOST_TEMPERATURES);
    return ok(pieces);
  };
  let count = low === high ? 1 : 3;
  let before: readonly Outline[] | null = null;
  for (;;) {
    const temperatures = Array.from({ length: count }, (_, i) =>
      count === 1 ? low : low + ((high - low) * i) / (count - 1),
    );
    let common: readonly Convex[] | null = null;
    for (const t of temperatures) {
      const pieces = solveAt(t);
      if (!pieces.ok) return pieces;
      common = common === null ? pieces.value : commonGround(common, pieces.value);
    }
    const shapes = common ?? [];
    const regions = connect(shapes);
    const outlines = outlinesOf(shapes, regions);
    const settled = count === 1 || (before !== null && stayed(before, outlines));
    if (settled || count >= MOST_TEMPERATURES) {
      return ok({
        windows: regions.map((r, i) => robustWindowOf(r, outlines[i]!, problem.controlBand)),
        checked: { temperatures, settled, activities },
      });
    }
    before = outlines;
    count = 2 * count - 1;
  }
}

const hydrideOf: Partial<Record<HazardGas, string>> = { AsH3: "As", SbH3: "Sb" };

function whyWorst(requirement: Requirement): string {
  if (requirement === "dissolved") return "dissolved: the more it must carry, the smaller its ground";
  if (requirement === "free")
    return "free, and its gas is kept out: the more there is, the wider the ground the gas takes";
  return `${requirement}: the less may stay dissolved, the smaller its ground`;
}

function badRange({ temperatureC, activities = {} }: Ranges): Outcome<never> | null {
  if (temperatureC) {
    const [lo, hi] = temperatureC;
    const { min, max } = TEMPERATURE_RANGE_C;
    if (!(lo <= hi && lo >= min && hi <= max))
      return fail("OUT_OF_RANGE", "temperatureC", `${lo} to ${hi} C; must rise and lie in ${min} to ${max} C`);
  }
  for (const [metal, [lo, hi]] of Object.entries(activities))
    if (!(lo > 0 && lo <= hi))
      return fail("OUT_OF_RANGE", `activities.${metal}`, `${lo} to ${hi}; must be above 0 and rise`);
  return null;
}

/** Every corner of one set of outlines has a corner of the other within reach, both ways. */
function stayed(a: readonly Outline[], b: readonly Outline[]): boolean {
  const corners = (list: readonly Outline[]): Point[] => list.flatMap((o) => [...o.outer, ...o.holes.flat()]);
  const near = (p: Point, q: Point): boolean =>
    Math.abs(p[0] - q[0]) < SETTLED[0] && Math.abs(p[1] - q[1]) < SETTLED[1];
  const [ca, cb] = [corners(a), corners(b)];
  return (
    a.length === b.length && ca.every((p) => cb.some((q) => near(p, q))) && cb.every((q) => ca.some((p) => near(p, q)))
  );
}

function robustWindowOf(region: Region, outline: Outline, band: Problem["controlBand"]): RobustWindow {
  const segments = [outline.outer, ...outline.holes].flatMap((loop) =>
    loop.map((p, i) => {
      const q = loop[i + 1 === loop.length ? 0 : i + 1]!;
      return { ax: p[0] / band.pH, ay: p[1] / band.Eh, bx: q[0] / band.pH, by: q[1] / band.Eh };
    }),
  );
  const deepest = deepestPoint(segments)!;
  return {
    ...outline,
    area: region.area,
    setPoint: { pH: deepest.u * band.pH, Eh: deepest.v * band.Eh, margin: deepest.margin },
  };
}
