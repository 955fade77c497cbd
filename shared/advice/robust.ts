import { analyse, type Analysis } from "../analysis";
import type { Convex } from "../geometry/convex";
import { common as commonGround } from "../geometry/overlay";
import { ok, fail, type Outcome } from "../outcome";
import type { HazardGas } from "../hazards/gases";
import { atTemperature, type Gammas } from "../plan/toProblem";
import { TEMPERATURE_RANGE_C, type Problem, type Requirement } from "../schemas/problem";
import { coupleAt } from "../setpoint/couple";
import { setPointOf } from "../setpoint/setPoint";
import type { Outline, Point, SetPoint } from "../solution";
import type { ChemicalData } from "../species/chemicalData";
import { atOnce, type InTurns } from "../turns";
import type { OnProgress } from "./search";
import { borderMove, borderOf, ruleTemperatures, smoothStretches } from "./temperatures";

/** Ranges over which a window is to hold. */
export interface Ranges {
  readonly temperatureC?: readonly [number, number];
  readonly activities?: Readonly<Record<string, readonly [number, number]>>;
}

export interface RobustWindow extends Outline {
  readonly area: number;
  /** by the metric of the plan; a couple counts where it sets Eh at every temperature solved */
  readonly setPoint: SetPoint;
  /** what sets Eh there, temperature by temperature from low to high; none where Eh is a mixed potential at one of them */
  readonly couples: readonly CoupleOver[];
}

/** A couple that sets Eh from one temperature solved to another, C. */
export interface CoupleOver {
  /** reduced, oxidised */
  readonly couple: readonly [string, string];
  readonly from: number;
  readonly to: number;
}

export interface Robust {
  readonly windows: readonly RobustWindow[];
  readonly checked: {
    /** C */
    readonly temperatures: readonly number[];
    /** C, where the solids that count change: solved on both sides */
    readonly rules: readonly number[];
    /** between any two temperatures three more moved no edge by 0.001 pH or 1 mV, or no ground is left to have one */
    readonly settled: boolean;
    readonly activities: readonly { metal: string; at: number; why: string }[];
  };
}

const SETTLED: readonly [number, number] = [0.001, 0.001];
/** bisections in a row that must move nothing before a stretch is done */
const QUIET = 2;
const ON_FRAME = 1e-9;
/** As many temperatures are solved at most; then the answer says that its edges still moved. */
export const MOST_TEMPERATURES = 129;

/** The window that holds over stated ranges of temperature and of each metal's activity.
 *  Activities by monotony: a dissolved species' potential rises by RT/nu ln a, solids do not move, so raising a shrinks
 *  where the metal is dissolved and widens where it is solid, metal or compound; the worse end alone is solved.
 *  Temperatures: both ends and both sides of every rule of the tables, then each stretch between them is halved until neither its middle nor
 *  the middles of its halves move an edge by 0.001 pH or 1 mV, or there are 129.
 *  An element whose gas is kept out is worst at its higher end where it is free: more of it gives more gas; where it is to be solid
 *  its window lies in fields whose pressure does not depend on the activity.
 *  @param problem  validated by the solver     @param ranges  C; activities by element, low and high     @param data  library
 *  @param onProgress  temperatures solved, and the most there can be
 *  @param gammas  of the plan: tenors by Davies without a range become activities anew at every temperature
 *  @returns  outlines with set points (margin in control bands), and what was checked
 *  @source  docs/method.md, section 7 */
export const robustWindow = (
  problem: Problem,
  ranges: Ranges,
  data: ChemicalData,
  onProgress?: OnProgress,
  gammas?: Gammas,
): Outcome<Robust> => atOnce(robustInTurns(problem, ranges, data, onProgress, gammas));

/** The same, a temperature a turn.
 *  @param problem, ranges, data, onProgress, gammas  as `robustWindow`     @returns  as `robustWindow`     @source  as `robustWindow` */
export function* robustInTurns(
  problem: Problem,
  ranges: Ranges,
  data: ChemicalData,
  onProgress?: OnProgress,
  gammas?: Gammas,
): InTurns<Outcome<Robust>> {
  const bad = badRange(ranges);
  if (bad) return bad;
  const activities: { metal: string; at: number; why: string }[] = [];
  const gives = new Set((problem.excludedHazards ?? []).map((h) => hydrideOf[h.gas] ?? ""));
  /** the least of each metal: what a couple must live on */
  const least = new Map(Object.entries(ranges.activities ?? {}).map(([metal, [lo]]) => [metal, lo]));
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
  const worstAt = atTemperature(worst, gammas, data);
  const solved = new Map<number, Analysis>();
  let ground: readonly Convex[] | null = null;
  /** Takes one more temperature in; the failure where it cannot be solved. */
  const take = (temperatureC: number): Outcome<null> => {
    if (solved.has(temperatureC)) return ok(null);
    const analysed = analyse(worstAt(temperatureC), data);
    if (!analysed.ok) return analysed;
    const pieces = analysed.value.pieces.map((p) => p.piece);
    ground = ground === null ? pieces : commonGround(ground, pieces);
    solved.set(temperatureC, analysed.value);
    onProgress?.(solved.size, low === high ? 1 : MOST_TEMPERATURES);
    return ok(null);
  };
  const rules = ruleTemperatures(worst, data, low, high);
  const stretches = low === high ? [] : smoothStretches(low, high, rules);
  for (const t of low === high ? [low] : stretches.flat()) {
    const taken = take(t);
    if (!taken.ok) return taken;
    yield;
  }
  let border = borderOf(ground ?? []);
  // breadth first, so that what is left undone at the end is spread over the range
  let open = stretches.map(([from, to]) => ({ from, to, quiet: 0 }));
  while (open.length > 0 && border.length > 0 && solved.size + open.length <= MOST_TEMPERATURES) {
    const next: typeof open = [];
    for (const { from, to, quiet } of open) {
      const middle = (from + to) / 2;
      const taken = take(middle);
      if (!taken.ok) return taken;
      yield;
      const now = borderOf(ground ?? []);
      const still = borderMove(border, now, SETTLED) < 1 ? quiet + 1 : 0;
      border = now;
      if (still < QUIET) next.push({ from, to: middle, quiet: still }, { from: middle, to, quiet: still });
    }
    open = next;
  }
  const byHeat = [...solved].sort(([a], [b]) => a - b);
  return ok({
    windows: border.map((outline) => robustWindowOf(outline, problem, (at) => couplesOverAll(byHeat, least, at))),
    checked: {
      temperatures: [...solved.keys()].sort((a, b) => a - b),
      rules,
      settled: open.length === 0 || border.length === 0,
      activities,
    },
  });
}

/** The couples that set Eh at a point at every temperature, each metal at the least it may carry; none where at one there is none. */
function couplesOverAll(
  byHeat: readonly (readonly [temperatureC: number, Analysis])[],
  least: ReadonlyMap<string, number>,
  at: Point,
): CoupleOver[] {
  const runs: CoupleOver[] = [];
  for (const [temperatureC, { prepared, cells, metals, basis }] of byHeat) {
    const poorest = metals.map((m) => ({
      ...m,
      metal: { ...m.metal, activity: least.get(m.metal.element) ?? m.metal.activity },
    }));
    const couple = coupleAt(prepared.data, cells, poorest, basis, at);
    if (couple === null) return [];
    const last = runs.at(-1);
    if (last?.couple.join() === couple.join()) runs[runs.length - 1] = { ...last, to: temperatureC };
    else runs.push({ couple, from: temperatureC, to: temperatureC });
  }
  return runs;
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

function robustWindowOf(
  outline: Outline,
  problem: Problem,
  couplesFor: (at: Point) => readonly CoupleOver[],
): RobustWindow {
  const { controlBand: band, frame } = problem;
  const onFrame = (p: Point, q: Point): boolean =>
    ([0, 1] as const).some((axis) =>
      (axis === 0 ? frame.pH : frame.Eh).some(
        (side) => Math.abs(p[axis] - side) < ON_FRAME && Math.abs(q[axis] - side) < ON_FRAME,
      ),
    );
  const loops = [outline.outer, ...outline.holes];
  const segments = loops.flatMap((loop) =>
    loop.map((p, i) => {
      const q = loop[i + 1 === loop.length ? 0 : i + 1]!;
      return {
        ax: p[0] / band.pH,
        ay: p[1] / band.Eh,
        bx: q[0] / band.pH,
        by: q[1] / band.Eh,
        frame: onFrame(p, q),
      };
    }),
  );
  const area = loops.reduce((sum, loop) => sum + signedArea(loop), 0);
  let couples: readonly CoupleOver[] = [];
  const setPoint = setPointOf(segments, band, (at) => {
    couples = couplesFor(at);
    // the plan's own temperature speaks for the set point where it is one of those solved
    const own = couples.find((c) => problem.temperatureC <= c.to) ?? couples.at(-1);
    return own ? [...own.couple] : null;
  })!;
  return { ...outline, area, setPoint, couples };
}

const signedArea = (loop: readonly Point[]): number =>
  loop.reduce((sum, p, i) => {
    const q = loop[i + 1 === loop.length ? 0 : i + 1]!;
    return sum + (p[0] * q[1] - q[0] * p[1]) / 2;
  }, 0);
