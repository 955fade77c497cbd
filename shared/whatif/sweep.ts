import { analyse } from "../analysis";
import { fail, ok, type Failure, type Outcome } from "../outcome";
import { toProblem } from "../plan/toProblem";
import type { PlanInputs } from "../schemas/plan";
import { heldSetPoint } from "../setpoint/held";
import { solve } from "../solve";
import type { Point, SetPoint, Solution } from "../solution";
import type { ChemicalData } from "../species/chemicalData";
import { stands, steps } from "./jumps";
import { gripBetween, jumpBetween, turnBetween, type Turn } from "./turns";
import { isLogarithmic, settingBounds, settingOf, steps as evenSteps, withSetting, type Varied } from "./vary";

export interface SweepWish {
  readonly varied: Varied;
  /** ends, C, activity or g/L */
  readonly range: readonly [number, number];
  /** settings that get a small map of their own, 2 to 15, evenly spaced, both ends among them */
  readonly frames: number;
  /** further settings worked out between two neighbours of those, for the curve */
  readonly between: number;
  /** a point whose margin is followed while the setting moves, pH and V vs SHE; absent: none is */
  readonly kept?: Point;
}

/** One setting worked out. */
export interface Sample {
  readonly at: number;
  readonly windows: number;
  /** open ground in the frame, pH x V */
  readonly area: number;
  /** of the best window, chosen anew; null without one */
  readonly setPoint: SetPoint | null;
  /** control bands from the point that is kept to the nearest limit; negative outside; null without a window or a point */
  readonly kept: number | null;
}

/** What a small map shows. */
export interface SweepFrame extends Sample {
  readonly solution: Pick<Solution, "windows" | "shut" | "waterLines" | "frame">;
}

export interface Sweep {
  readonly varied: Varied;
  readonly frames: readonly SweepFrame[];
  /** rising; the frames are among them */
  readonly samples: readonly Sample[];
  /** in the order of rising settings */
  readonly turns: readonly Turn[];
  /** turns stand no further off than this: kelvin, or decades of an amount */
  readonly tolerance: number;
  /** settings that could not be solved, with the reason */
  readonly failed: readonly { readonly at: number; readonly error: Failure }[];
}

/** Turns are narrowed to 0.01 K, or 1e-4 of a decade (0.02 %). */
const TOLERANCE = { temperature: 0.01, amount: 1e-4, total: 1e-4 } as const;

interface State {
  readonly at: number;
  readonly solution: Solution;
}

/** One setting of a plan varied over a range, everything else as it stands: the windows at each setting, and the settings at which
 *  a window opens, closes, parts, joins or passes a margin of one control band, or at which margin or open ground jump.
 *  @param inputs  of a plan     @param wish  what is varied, over which range, how finely     @param data  library
 *  @param tell  told the share done, 0 to 1, after every setting
 *  @returns  samples, frames and turns; a range that does not rise or leaves the bounds fails with its values. A setting that cannot be
 *            solved is listed, not drawn. Between two samples two turns that undo each other can be missed: the samples are as close
 *            as `frames` and `between` say
 *  @source  the solver at each setting (solve.ts); bisection on the number of windows, on the margin, and on every
 *            stretch over which margin or ground step further than a smooth line would, to the tolerance */
export function sweep(
  inputs: PlanInputs,
  wish: SweepWish,
  data: ChemicalData,
  tell: (share: number) => void = () => undefined,
): Outcome<Sweep> {
  const wrong = wrongWish(inputs, wish);
  if (wrong) return wrong;
  const { varied, range, kept } = wish;
  const band = inputs.controlBand;
  const stride = wish.between + 1;
  const settings = evenSteps(varied, range, (wish.frames - 1) * stride + 1);
  const tolerance = TOLERANCE[varied.kind];
  const failed: { at: number; error: Failure }[] = [];

  const problemAt = (at: number) => toProblem(withSetting(inputs, varied, at), data);
  const stateAt = (at: number, shutGround: boolean): State | null => {
    const outcome = solve(problemAt(at), data, { shutGround });
    if (outcome.ok) return { at, solution: outcome.value };
    failed.push({ at, error: outcome.error });
    return null;
  };
  const keptMargin = (at: number, solution: Solution): number | null => {
    if (!kept || solution.windows.length === 0) return null;
    const analysis = analyse(problemAt(at), data);
    const held = analysis.ok ? heldSetPoint(analysis.value, solution, kept, band) : null;
    return held?.here?.margin ?? null;
  };

  const frames: SweepFrame[] = [];
  const samples: Sample[] = [];
  const turns: Turn[] = [];
  const [scale, unscale] = isLogarithmic(varied) ? [Math.log10, (x: number) => 10 ** x] : [Number, Number];
  let before: State | null = null;
  settings.forEach((at, i) => {
    const isFrame = i % stride === 0;
    const state = stateAt(at, isFrame);
    if (state) {
      const { solution } = state;
      const sample = sampleOf(state);
      if (before) turns.push(...turnsBetween(before, state));
      samples.push(sample);
      if (isFrame) {
        const { windows, shut, waterLines, frame } = solution;
        frames.push({ ...sample, solution: { windows, waterLines, frame, ...(shut ? { shut } : {}) } });
      }
    }
    before = state;
    tell((i + 1) / settings.length);
  });
  return ok({ varied, frames, samples, turns, tolerance, failed });

  function turnsBetween(low: State, high: State): Turn[] {
    const paired = [
      ...narrowed(low, high, (s) => s.windows.length).map((pair) => ({ pair, turn: turnBetween(...pair, band) })),
      ...narrowed(low, high, (s) => Number((s.setPoint?.margin ?? 0) >= 1)).map((pair) => ({
        pair,
        turn: gripBetween(...pair, band),
      })),
    ];
    const met = paired.map(({ turn }) => turn);
    const jumps = jumpsBetween(low, high).filter(([a, b]) => !met.some(({ between: [c, d] }) => a.at < d && c < b.at));
    // Both sides are drawn, once each, so that the curve stands upright there.
    const sides = [...paired.filter(({ turn }) => turn.jump !== null).map(({ pair }) => pair), ...jumps].flat();
    const each = new Map(sides.map((state) => [state.at, state]));
    samples.push(...[...each.values()].sort((a, b) => a.at - b.at).map(sampleOf));
    const jumped = jumps.map(([a, b]) => jumpBetween(a, b, band)).filter((turn) => turn !== null);
    return [...met, ...jumped].sort((a, b) => a.at - b.at);
  }

  function sampleOf({ at, solution }: State): Sample {
    return {
      at,
      windows: solution.windows.length,
      area: solution.windows.reduce((sum, w) => sum + w.area, 0),
      setPoint: solution.setPoint,
      kept: keptMargin(at, solution),
    };
  }

  /** Neighbouring settings within the tolerance between which margin or ground still step. */
  function jumpsBetween(low: State, high: State): [State, State][] {
    if (!steps(stands(low.solution, high.solution), band)) return [];
    const [a, b] = [scale(low.at), scale(high.at)];
    if (b - a <= tolerance) return [[low, high]];
    const middle = stateAt(unscale((a + b) / 2), false);
    return middle === null ? [] : [...jumpsBetween(low, middle), ...jumpsBetween(middle, high)];
  }

  /** Neighbouring settings within the tolerance between which a count changes; where it changes twice on the way, both. */
  function narrowed(low: State, high: State, count: (s: Solution) => number): [State, State][] {
    if (count(low.solution) === count(high.solution)) return [];
    const [a, b] = [scale(low.at), scale(high.at)];
    if (b - a <= tolerance) return [[low, high]];
    const middle = stateAt(unscale((a + b) / 2), false);
    if (middle === null) return [];
    return [...narrowed(low, middle, count), ...narrowed(middle, high, count)];
  }
}

function wrongWish(
  inputs: PlanInputs,
  { varied, range: [from, to], frames, between }: SweepWish,
): Outcome<never> | null {
  if (settingOf(inputs, varied) === null)
    return fail("INVALID_INPUT", "varied", `the plan has no ${varied.kind === "temperature" ? "temperature" : `${varied.kind} of ${varied.of}`}`); // prettier-ignore
  const [low, high] = settingBounds(inputs, varied);
  if (!(from < to && from >= low && to <= high))
    return fail("OUT_OF_RANGE", "range", `${from} to ${to}; must rise and lie in ${low} to ${high}`);
  if (!(Number.isInteger(frames) && frames >= 2 && frames <= 15))
    return fail("OUT_OF_RANGE", "frames", `${frames}; must be a whole number from 2 to 15`);
  if (!(Number.isInteger(between) && between >= 0 && between <= 30))
    return fail("OUT_OF_RANGE", "between", `${between}; must be a whole number from 0 to 30`);
  return null;
}
