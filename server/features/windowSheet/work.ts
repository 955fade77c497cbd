import { adviceGaps, type ConflictGap } from "../../../shared/advice/openings";
import { robustInTurns, type Robust } from "../../../shared/advice/robust";
import { freeAcid, FREE_ACID_BELOW, type FreeAcid } from "../../../shared/activity/freeAcid";
import { analyse } from "../../../shared/analysis";
import { referencePotential } from "../../../shared/electrodes/convert";
import { electrodeSeries } from "../../../shared/electrodes/series";
import { energiesAt } from "../../../shared/gibbs/energies";
import type { HazardGas } from "../../../shared/hazards/gases";
import { sharesGround } from "../../../shared/hazards/reachesWindow";
import { hazardRegions, type HazardMap, type HazardRegion } from "../../../shared/hazards/regions";
import { cautionsFor, hazardContext, type Caution } from "../../../shared/hazards/rules";
import { ok, type Outcome } from "../../../shared/outcome";
import { toProblem } from "../../../shared/plan/toProblem";
import { rangesOf } from "../../../shared/plan/rangesOf";
import { usualReagents } from "../../../shared/reach/reach";
import { reachAnswers, type ReachAnswer } from "../../../shared/reach/verdict";
import { planReactions, type PlanReaction } from "../../../shared/reactions/ofPlan";
import type { PlanInputs, PlanRow, RevisionRow } from "../../../shared/schemas/plan";
import type { Problem } from "../../../shared/schemas/problem";
import { heldSetPoint, type HeldSetPoint } from "../../../shared/setpoint/held";
import { solve } from "../../../shared/solve";
import type { Solution, Window } from "../../../shared/solution";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { atOnce, type InTurns } from "../../../shared/turns";
import { kelvin } from "../../../shared/units";
import { limitSentences, namingOf, type LimitSentence, type Naming } from "../../../shared/windows/limitWords";
import { celsius } from "../../../shared/words/numbers";

/** A reference electrode beside the SHE scale. */
export interface ProbeScale {
  /** "Ag/AgCl, 3 mol/L KCl" */
  label: string;
  /** C, of the electrode */
  temperatureC: number;
  /** V vs SHE */
  offset: number;
  /** what its table leaves open; null inside it */
  remark: string | null;
}

/** How the energy of a species on the sheet is known. */
export interface GradedSpecies {
  id: string;
  grade: string;
  /** it stands on a limit of the window */
  limits: boolean;
}

/** Everything one window sheet says, worked out by the core with the library that the revision froze. */
export interface SheetWork {
  plan: Pick<PlanRow, "name" | "projectName" | "siteName" | "invented" | "revisionCount">;
  revision: RevisionRow;
  /** the library the revision froze */
  data: ChemicalData;
  solution: Solution;
  naming: Naming;
  /** index into the windows; the one of a held set point, else the best */
  chosen: number;
  window: Window | null;
  held: HeldSetPoint | null;
  sentences: readonly LimitSentence[];
  gaps: readonly ConflictGap[];
  hazards: HazardMap | null;
  /** gases whose region is drawn: those asked for, else those that reach the window */
  drawnGases: readonly HazardRegion[];
  /** gases whose region shares ground with the window: they are told of, drawn or not */
  reachingGases: readonly HazardRegion[];
  /** what holds over the ranges of the plan; null where it has none, or a failure in words */
  robust: Robust | { failed: string } | null;
  /** what the reagents chosen bring the slurry to, in the order of the table; none without a window */
  reach: readonly ReachAnswer[];
  /** overall reactions at the set point as the plan's choices have them; none without a window */
  reactions: readonly PlanReaction[];
  cautions: readonly Caution[];
  species: readonly GradedSpecies[];
  /** beside a pH no electrode holds; null elsewhere */
  acid: FreeAcid | null;
  probe: ProbeScale | null;
}

const probeRemark = {
  table: null,
  borrowed: "its change with temperature is borrowed from the standard Ag/AgCl electrode",
  extrapolated: "its potential is carried on beyond its table",
} as const;

/** @returns  null for SHE and for an electrode that the library does not know at that temperature */
export function probeScale(data: ChemicalData, id: string | undefined, temperatureC: number): ProbeScale | null {
  const series = electrodeSeries(data.tables).find((s) => s.id === id);
  const found = series && referencePotential(series, temperatureC);
  if (!series || !found?.ok) return null;
  const { E, basis, uncertainty } = found.value;
  const why = probeRemark[basis];
  const remark = why && `${series.label} at ${celsius(temperatureC)}: ${why}, ±${Math.round(uncertainty * 1000)} mV.`;
  return { label: series.label, temperatureC, offset: E, remark };
}

function freeAcidAt(data: ChemicalData, { inputs }: RevisionRow, window: Window | null): FreeAcid | null {
  const sulfate = inputs.ligands.find((l) => l.component === "S")?.activity;
  if (!window || window.setPoint.pH >= FREE_ACID_BELOW || sulfate === undefined) return null;
  const acid = freeAcid(data, window.setPoint.pH, sulfate, inputs.temperatureC);
  return acid.ok ? acid.value : null;
}

function gradesOf(data: ChemicalData, { fields, temperatureC }: Solution, window: Window | null): GradedSpecies[] {
  const limits = new Set(window?.limits.flatMap((l) => [l.inside, l.outside]));
  const energies = energiesAt(data, kelvin(temperatureC));
  return [...new Set(fields.map((f) => f.species))]
    .map((id) => ({ id, grade: data.species.get(id)?.row.grade ?? "C", limits: limits.has(id), of: energies.of(id) }))
    .sort((a, b) => Number(b.limits) - Number(a.limits) || (a.id < b.id ? -1 : 1))
    .map(({ id, grade, limits: on }) => ({ id, grade, limits: on }));
}

function* robustOf(problem: Problem, inputs: PlanInputs, data: ChemicalData): InTurns<SheetWork["robust"]> {
  const asking = problem.metals.filter((m) => m.requirement !== "free").map((m) => m.element);
  const over = rangesOf(inputs.ranges, asking);
  if (over === null) return null;
  const found = yield* robustInTurns(problem, over, data, undefined, inputs);
  return found.ok ? found.value : { failed: found.error.message };
}

/** What the sheet is asked to show beside the revision: all of it may be left out. */
export interface SheetWishes {
  probe?: ProbeScale | null | undefined;
  window?: number | undefined;
  gases?: readonly HazardGas[] | undefined;
  /** reagents whose reach is told; the usual ones of the liquor unless given */
  reach?: readonly string[] | undefined;
}

/** Solves a revision once more and gathers what its sheet says; over ranges a temperature a turn, so that others are answered meanwhile.
 *  @returns  the work; a failure where the inputs cannot be solved with the library */
export function* workInTurns(
  plan: SheetWork["plan"],
  revision: RevisionRow,
  data: ChemicalData,
  { probe = null, window: wanted = 0, gases, reach = usualReagents(revision.inputs) }: SheetWishes = {},
): InTurns<Outcome<SheetWork>> {
  const { inputs } = revision;
  const problem = toProblem(inputs, data);
  const solved = solve(problem, data, { shutGround: true });
  if (!solved.ok) return solved;
  const analysed = analyse(problem, data);
  if (!analysed.ok) return analysed;
  const at = inputs.heldSetPoint;
  const held = at ? heldSetPoint(analysed.value, solved.value, [at.pH, at.Eh], inputs.controlBand) : null;
  const windows = solved.value.windows.map((w, i) => (i === held?.index ? held.window : w));
  const solution = { ...solved.value, windows };
  const chosen = held?.index ?? (wanted < windows.length ? wanted : 0);
  const window = windows[chosen] ?? null;
  const setPoint = window?.setPoint ?? null;
  const regions = hazardRegions(analysed.value, { setPoint });
  const hazards = regions.ok ? regions.value : null;
  const naming = namingOf(data, solution);
  const reachingGases = hazards?.regions.filter((r) => window && sharesGround(r.region, window.polygons)) ?? [];
  const work: SheetWork = {
    plan,
    revision,
    data,
    solution,
    naming,
    chosen,
    window,
    held,
    sentences: window ? limitSentences(window, naming) : [],
    gaps: window ? [] : adviceGaps(problem, data, solution.conflicts),
    hazards,
    drawnGases: gases ? (hazards?.regions.filter((r) => gases.includes(r.gas)) ?? []) : reachingGases,
    reachingGases,
    robust: yield* robustOf(problem, inputs, data),
    reach: window ? reachAnswers(data, window, inputs, reach) : [],
    reactions: setPoint ? planReactions(problem, data, inputs, solution, setPoint) : [],
    cautions: cautionsFor(hazardContext(inputs, setPoint)),
    species: gradesOf(data, solution, window),
    acid: freeAcidAt(data, revision, window),
    probe,
  };
  return ok(work);
}

/** The same at once, for those who have nobody waiting. */
export const workOf = (...asked: Parameters<typeof workInTurns>): Outcome<SheetWork> => atOnce(workInTurns(...asked));
