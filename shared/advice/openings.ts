import { analyse } from "../analysis";
import { ok, type Outcome } from "../outcome";
import { solidsBases, TEMPERATURE_RANGE_C, type Problem } from "../schemas/problem";
import { solve } from "../solve";
import type { Solution } from "../solution";
import type { ChemicalData } from "../species/chemicalData";
import { windowPieces } from "../windows/pieces";
import { gapBetween, type Gap } from "./gap";

/** One thing that could be changed to open a window, and the smallest change that does; `to` null: none does. */
export interface Opening {
  readonly change: "activity" | "ligand" | "temperature" | "solidsBasis";
  /** metal or component, for activity and ligand */
  readonly of?: string;
  readonly from: number | string;
  /** just past the root: a window exists here */
  readonly to: number | string | null;
  /** the problem with the change made; absent when none helps */
  readonly problem?: Problem;
  /** how far was looked */
  readonly searched: string;
}

export interface ConflictGap {
  readonly metals: readonly string[];
  /** of a pair; null for single requirements and larger sets */
  readonly gap: Gap | null;
}

export interface Advice {
  readonly conflicts: Solution["conflicts"];
  readonly gaps: readonly ConflictGap[];
  readonly openings: readonly Opening[];
}

const DECADES = 8;
const STEPS_PER_DECADE = 4;
const KELVIN_STEP = 2.5;
/** a root is narrowed to this: decades of activity, or kelvin */
const RESOLUTION = 1e-4;

/** Why a problem has no window and what would open one: the gaps of conflicting pairs, and for each single activity,
 *  ligand total, the temperature and the solids basis the smallest change that opens a window.
 *  @param input  problem     @param data  library     @returns  advice; openings are empty where there is a window already
 *  @source  docs/method.md: outward search in even steps, then bisection on the existence of a window; between two steps
 *           an opening narrower than a step can be missed, and `searched` says how far and how finely it looked */
export function adviceFor(input: unknown, data: ChemicalData): Outcome<Advice> {
  const solved = solve(input, data);
  if (!solved.ok) return solved;
  const { conflicts, windows } = solved.value;
  if (windows.length > 0) return ok({ conflicts, gaps: [], openings: [] });
  const problem = input as Problem;
  return ok({ conflicts, gaps: adviceGaps(problem, data, conflicts), openings: openingsOf(problem, data) });
}

/** How far the grounds of conflicting requirements stand apart.
 *  @param problem, data, conflicts  of one solution without a window     @returns  a gap for each pair; null for other sets
 *  @source  geometry of exact pieces (gap.ts) */
export function adviceGaps(problem: Problem, data: ChemicalData, conflicts: Solution["conflicts"]): ConflictGap[] {
  const analysed = analyse(problem, data);
  if (!analysed.ok) return [];
  const { cells, metals, bounds } = analysed.value;
  const regionOf = (metal: string) =>
    windowPieces(
      cells,
      metals.filter((m) => m.metal.element === metal),
      bounds,
    ).map((p) => p.piece);
  return conflicts.map((set) => ({
    metals: set.map((s) => s.metal),
    gap: set.length === 2 ? gapBetween(regionOf(set[0]!.metal), regionOf(set[1]!.metal)) : null,
  }));
}

const opens = (problem: Problem, data: ChemicalData): boolean => {
  const analysed = analyse(problem, data);
  return analysed.ok && analysed.value.pieces.length > 0;
};

/** Smallest |x - from| at which `test` holds, looking outward in steps to both ends, then bisecting to the resolution. */
function nearest(test: (x: number) => boolean, from: number, low: number, high: number, step: number): number | null {
  for (let k = 1; from + k * step <= high + step || from - k * step >= low - step; k++) {
    let best: number | null = null;
    for (const side of [-1, 1]) {
      const outer = Math.min(high, Math.max(low, from + side * k * step));
      const inner = Math.min(high, Math.max(low, from + side * (k - 1) * step));
      if (outer === inner || !test(outer)) continue;
      let [no, yes] = [inner, outer];
      while (Math.abs(yes - no) > RESOLUTION) {
        const mid = (no + yes) / 2;
        if (test(mid)) yes = mid;
        else no = mid;
      }
      if (best === null || Math.abs(yes - from) < Math.abs(best - from)) best = yes;
    }
    if (best !== null) return best;
  }
  return null;
}

function openingsOf(problem: Problem, data: ChemicalData): Opening[] {
  const out: Opening[] = [];
  const found = (base: Omit<Opening, "to" | "problem">, to: number | string | null, changed: Problem | null): void => {
    out.push(changed === null || to === null ? { ...base, to: null } : { ...base, to, problem: changed });
  };
  const span = `${DECADES} decades either way, in quarter decades`;
  problem.metals.forEach((m, i) => {
    if (m.requirement === "free") return;
    const from = m.activity ?? m.gPerL!;
    const at = (log: number): Problem => ({
      ...problem,
      metals: problem.metals.map((o, k) =>
        k !== i ? o : m.activity === undefined ? { ...o, gPerL: 10 ** log } : { ...o, activity: 10 ** log },
      ),
    });
    const log = Math.log10(from);
    const top = m.activity === undefined ? 3 : 2;
    const to = nearest(
      (x) => opens(at(x), data),
      log,
      log - DECADES,
      Math.min(top, log + DECADES),
      1 / STEPS_PER_DECADE,
    );
    found(
      { change: "activity", of: m.element, from, searched: span },
      to === null ? null : 10 ** to,
      to === null ? null : at(to),
    );
  });
  problem.ligands.forEach((l, i) => {
    const at = (log: number): Problem => ({
      ...problem,
      ligands: problem.ligands.map((o, k) => (k === i ? { ...o, activity: 10 ** log } : o)),
    });
    const log = Math.log10(l.activity);
    const to = nearest((x) => opens(at(x), data), log, log - DECADES, Math.min(2, log + DECADES), 1 / STEPS_PER_DECADE);
    found(
      { change: "ligand", of: l.component, from: l.activity, searched: span },
      to === null ? null : 10 ** to,
      to === null ? null : at(to),
    );
  });
  const atT = (temperatureC: number): Problem => ({ ...problem, temperatureC });
  const { min, max } = TEMPERATURE_RANGE_C;
  const T = nearest((x) => opens(atT(x), data), problem.temperatureC, min, max, KELVIN_STEP);
  found(
    { change: "temperature", from: problem.temperatureC, searched: `${min} to ${max} C in steps of ${KELVIN_STEP} K` },
    T,
    T === null ? null : atT(T),
  );
  if (problem.solidsBasis !== undefined) {
    const to =
      solidsBases.find((b) => b !== problem.solidsBasis && opens({ ...problem, solidsBasis: b }, data)) ?? null;
    found(
      { change: "solidsBasis", from: problem.solidsBasis, searched: "all three" },
      to,
      to === null ? null : { ...problem, solidsBasis: to },
    );
  }
  return out;
}
