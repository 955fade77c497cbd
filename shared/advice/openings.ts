import { analyse, type Analysis } from "../analysis";
import type { Convex } from "../geometry/convex";
import { askedOf } from "../hazards/excluded";
import { ok, type Outcome } from "../outcome";
import { atTemperature, type Gammas } from "../plan/toProblem";
import { solidsBases, TEMPERATURE_RANGE_C, type Problem } from "../schemas/problem";
import { solve } from "../solve";
import { demandName, type Demand, type Solution } from "../solution";
import type { ChemicalData } from "../species/chemicalData";
import { windowPieces } from "../windows/pieces";
import { gapBetween, type Gap } from "./gap";
import { nearest, stepsOf, type OnProgress, type Walk } from "./search";

/** One thing that could be changed to open a window, and the smallest change that does; `to` null: none does. */
export interface Opening {
  /** the last two are the threshold (bar) or the pH of a hazard kept out: told so that the hazard is named, never to be followed blindly */
  readonly change: "activity" | "ligand" | "temperature" | "solidsBasis" | "hazardPressure" | "hazardPH";
  /** metal, component or gas */
  readonly of?: string;
  readonly from: number | string;
  /** just past the root: a window exists here */
  readonly to: number | string | null;
  /** the problem with the change made; absent when none helps */
  readonly problem?: Problem;
  /** how far was looked */
  readonly searched: string;
}

/** What parts a set that cannot hold from ground where it could: another member, or, for a single demand, the edges of the map. */
export type Across = "members" | "water" | "frame" | "frame and water";

export interface ConflictGap {
  /** metals and gases of the conflict, in its order */
  readonly members: readonly string[];
  readonly across: Across;
  /** of the members: the one that stands nearest to the ground the others have in common; null for a single demand */
  readonly nearest: string | null;
  /** null where a single demand holds nowhere */
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
const PH_STEP = 0.25;
/** lowest pH rule and highest pressure that a problem can state */
const LEAST_PH_RULE = 7;
const MOST_BAR = 1e4;

/** Why a problem has no window and what would open one: the gaps of conflicting pairs, and for each single activity,
 *  ligand total, the temperature, the solids basis and each hazard kept out the smallest change that opens a window.
 *  @param input  problem     @param data  library     @param onProgress  steps of the search done, and in all
 *  @param gammas  of the plan: tenors by Davies become activities anew at every temperature tried
 *  @returns  advice; openings are empty where there is a window already
 *  @source  outward search in even steps, then bisection on the existence of a window; between two steps
 *           an opening narrower than a step can be missed, and `searched` says how far and how finely it looked */
export function adviceFor(
  input: unknown,
  data: ChemicalData,
  onProgress?: OnProgress,
  gammas?: Gammas,
): Outcome<Advice> {
  const solved = solve(input, data);
  if (!solved.ok) return solved;
  const { conflicts, windows } = solved.value;
  if (windows.length > 0) return ok({ conflicts, gaps: [], openings: [] });
  const problem = input as Problem;
  return ok({
    conflicts,
    gaps: adviceGaps(problem, data, conflicts),
    openings: openingsOf(problem, data, onProgress, gammas),
  });
}

/** As far as a search for a single demand's ground goes beyond the frame. */
const WIDE = { pH: [-2, 16], Eh: [-3, 3] } as const;

/** How far the grounds of conflicting requirements stand apart: in a set, the least gap of one member to the ground that the others have in
 *  common; for a single demand, how far beyond the water lines or the frame its ground begins.
 *  @param problem, data, conflicts  of one solution without a window     @returns  a gap for each set
 *  @source  geometry of exact pieces (gap.ts) */
export function adviceGaps(problem: Problem, data: ChemicalData, conflicts: Solution["conflicts"]): ConflictGap[] {
  const analysed = analyse(problem, data);
  if (!analysed.ok) return [];
  const ground = groundIn(analysed.value);
  return conflicts.map((set): ConflictGap => {
    const members = set.map(demandName);
    if (set.length === 1) return { members, nearest: null, ...beyond(set[0]!, problem, data, analysed.value) };
    const gaps = set.map((demand, i) => ({
      nearest: members[i]!,
      gap: gapBetween(ground([demand]), ground(set.filter((other) => other !== demand))),
    }));
    const [least] = gaps.sort((a, b) => sizeOf(a.gap, problem) - sizeOf(b.gap, problem));
    return { members, across: "members", nearest: least!.nearest, gap: least!.gap };
  });
}

/** A gap in control bands, by its smaller way: what is nearest is what a loop has least to go to. */
const sizeOf = ({ pH, Eh }: Gap, { controlBand }: Problem): number =>
  Math.min((pH ?? Infinity) / controlBand.pH, (Eh ?? Infinity) / controlBand.Eh);

/** Ground on which some demands hold together. @param waterBinds  false: the water lines are left aside */
const groundIn =
  ({ cells, metals, bounds, hazards }: Analysis) =>
  (demands: readonly Demand[], waterBinds = true): Convex[] =>
    windowPieces(
      cells,
      metals.filter((m) => demands.some((d) => d.metal === m.metal.element)),
      waterBinds ? bounds : [],
      hazards.filter((h) => demands.some((d) => d.gas !== undefined && d.gas === h.gas)),
    ).map((p) => p.piece);

/** Where a demand that holds nowhere on the map would hold: past the water lines, past the frame, or past both. */
function beyond(
  demand: Demand,
  problem: Problem,
  data: ChemicalData,
  here: Analysis,
): Pick<ConflictGap, "across" | "gap"> {
  const allowed = groundIn(here)([]);
  const { pH, Eh } = problem.frame;
  const wide = analyse(
    {
      ...problem,
      frame: {
        pH: [Math.min(pH[0], WIDE.pH[0]), Math.max(pH[1], WIDE.pH[1])],
        Eh: [Math.min(Eh[0], WIDE.Eh[0]), Math.max(Eh[1], WIDE.Eh[1])],
      },
    },
    data,
  );
  const places: [Across, Convex[]][] = [
    ["water", groundIn(here)([demand], false)],
    ["frame", wide.ok ? groundIn(wide.value)([demand]) : []],
    ["frame and water", wide.ok ? groundIn(wide.value)([demand], false) : []],
  ];
  const found = places.find(([, pieces]) => pieces.length > 0);
  if (allowed.length === 0 || found === undefined) return { across: "frame and water", gap: null };
  return { across: found[0], gap: gapBetween(found[1], allowed) };
}

const opens = (problem: Problem, data: ChemicalData): boolean => {
  const analysed = analyse(problem, data);
  return analysed.ok && analysed.value.pieces.length > 0;
};

/** A number that can be changed: how the problem looks with it at a place of the walk, and what that place is called. */
interface Knob {
  readonly base: Omit<Opening, "to" | "problem">;
  readonly walk: Walk;
  readonly at: (x: number) => Problem;
  readonly value: (x: number) => number;
}

const power = (log: number): number => 10 ** log;
const span = `${DECADES} decades either way, in quarter decades`;
const decades = (from: number, high: number): Walk => {
  const log = Math.log10(from);
  return { from: log, low: log - DECADES, high: Math.min(high, log + DECADES), step: 1 / STEPS_PER_DECADE };
};

const metalKnobs = (problem: Problem): Knob[] =>
  problem.metals.flatMap((m, i) => {
    if (m.requirement === "free") return [];
    const from = m.activity ?? m.gPerL!;
    const at = (log: number): Problem => ({
      ...problem,
      metals: problem.metals.map((o, k) =>
        k !== i ? o : m.activity === undefined ? { ...o, gPerL: 10 ** log } : { ...o, activity: 10 ** log },
      ),
    });
    const base = { change: "activity", of: m.element, from, searched: span } as const;
    return [{ base, walk: decades(from, m.activity === undefined ? 3 : 2), at, value: power }];
  });

const ligandKnobs = (problem: Problem): Knob[] =>
  problem.ligands.map((l, i) => ({
    base: { change: "ligand", of: l.component, from: l.activity, searched: span },
    walk: decades(l.activity, 2),
    at: (log) => ({
      ...problem,
      ligands: problem.ligands.map((o, k) => (k === i ? { ...o, activity: 10 ** log } : o)),
    }),
    value: power,
  }));

function temperatureKnob(problem: Problem, data: ChemicalData, gammas?: Gammas): Knob {
  const { min, max } = TEMPERATURE_RANGE_C;
  const from = problem.temperatureC;
  return {
    base: { change: "temperature", from, searched: `${min} to ${max} °C in steps of ${KELVIN_STEP} K` },
    walk: { from, low: min, high: max, step: KELVIN_STEP },
    at: atTemperature(problem, gammas, data),
    value: (x) => x,
  };
}

/** A hazard kept out gives way in one direction only: a higher pressure, a lower pH. */
const hazardKnobs = (problem: Problem): Knob[] =>
  (problem.excludedHazards ?? []).map((h, i): Knob => {
    const { gas, bar, pHAtLeast } = askedOf(h);
    const become = (change: { bar: number } | { pHAtLeast: number }): Problem => ({
      ...problem,
      excludedHazards: problem.excludedHazards!.map((o, k) => (k === i ? { gas, ...change } : o)),
    });
    if (bar === undefined) {
      const searched = `down to pH ${LEAST_PH_RULE}, in steps of ${PH_STEP}`;
      return {
        base: { change: "hazardPH", of: gas, from: pHAtLeast, searched },
        walk: { from: pHAtLeast, low: LEAST_PH_RULE, high: pHAtLeast, step: PH_STEP },
        at: (x) => become({ pHAtLeast: x }),
        value: (x) => x,
      };
    }
    const log = Math.log10(bar);
    const high = Math.min(Math.log10(MOST_BAR), log + DECADES);
    return {
      base: { change: "hazardPressure", of: gas, from: bar, searched: `${DECADES} decades up, in quarter decades` },
      walk: { from: log, low: log, high, step: 1 / STEPS_PER_DECADE },
      at: (x) => become({ bar: power(x) }),
      value: power,
    };
  });

function openingsOf(problem: Problem, data: ChemicalData, onProgress?: OnProgress, gammas?: Gammas): Opening[] {
  const knobs = [
    ...metalKnobs(problem),
    ...ligandKnobs(problem),
    temperatureKnob(problem, data, gammas),
    ...hazardKnobs(problem),
  ];
  const total = knobs.reduce((sum, { walk }) => sum + stepsOf(walk), 0);
  let before = 0;
  const openings = knobs.map(({ base, walk, at, value }): Opening => {
    let steps = 0;
    const to = nearest(
      (x) => opens(at(x), data),
      walk,
      () => onProgress?.(before + ++steps, total),
    );
    before += stepsOf(walk);
    onProgress?.(before, total);
    return to === null ? { ...base, to } : { ...base, to: value(to), problem: at(to) };
  });
  return [...openings, ...basisOpening(problem, data)];
}

function basisOpening(problem: Problem, data: ChemicalData): Opening[] {
  const from = problem.solidsBasis;
  if (from === undefined) return [];
  const to = solidsBases.find((b) => b !== from && opens({ ...problem, solidsBasis: b }, data));
  const base = { change: "solidsBasis", from, searched: "all three" } as const;
  return [to === undefined ? { ...base, to: null } : { ...base, to, problem: { ...problem, solidsBasis: to } }];
}
