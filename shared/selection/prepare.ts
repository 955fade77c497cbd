import type { z } from "zod";
import { fail, ok, type Outcome } from "../outcome";
import { problemSchema, type Problem, type Requirement } from "../schemas/problem";
import type { ChemicalData, Species } from "../species/chemicalData";
import { withSpecies } from "../species/library";
import { componentKind, holdsSulfate, ligandNumbers, speciesHolding, SULFIDE_SULFUR } from "./components";
import { leavesOut } from "./leftOut";

/** Sulfate is not reduced in a leach below this (defaults.csv, rule:sulfate-sulfide). */
const SULFATE_REDUCTION_FROM_C = 150;

export interface PreparedMetal {
  readonly element: string;
  readonly requirement: Requirement;
  readonly activity: number;
  readonly gPerL?: number;
  readonly gamma?: number;
  readonly species: readonly Species[];
}
export interface PreparedComponent {
  readonly component: string;
  readonly activity: number;
  readonly species: readonly Species[];
}
/** A validated problem with every species chosen. */
export interface Prepared {
  readonly problem: Problem;
  readonly data: ChemicalData;
  readonly sulfateReduction: boolean;
  readonly metals: readonly PreparedMetal[];
  readonly components: readonly PreparedComponent[];
  readonly leftOut: readonly { species: string; reason: string }[];
}

const valueAt = (input: unknown, path: readonly PropertyKey[]): unknown =>
  path.reduce<unknown>((v, key) => (v === null || v === undefined ? v : (v as Record<PropertyKey, unknown>)[key]), input);

/** The first complaint of zod as a failure with path, bound and value. */
export function failureOf(error: z.ZodError, input: unknown): Outcome<never> {
  const issue = error.issues[0]!;
  const path = issue.path.map(String).join(".");
  const value = valueAt(input, issue.path);
  const range = issue.code === "too_small" || issue.code === "too_big";
  const got = value === undefined ? "nothing" : JSON.stringify(value);
  return fail(range ? "OUT_OF_RANGE" : "INVALID_INPUT", path, `${issue.message}; got ${got}`);
}

/** Validates a problem and chooses the species that count.
 *  @param input  anything; must be a problem (schemas/problem.ts)     @param library  chemistry
 *  @returns  the prepared problem, or the first failure with path, bound and value
 *  @source  docs/method.md, steps 1 to 3 */
export function prepare(input: unknown, library: ChemicalData): Outcome<Prepared> {
  const parsed = problemSchema.safeParse(input);
  if (!parsed.success) return failureOf(parsed.error, input);
  const problem = parsed.data;
  const extended = problem.species?.length ? withSpecies(library, problem.species) : ok(library);
  if (!extended.ok) return extended;
  const data = extended.value;
  const sulfateReduction = problem.sulfateReduction ?? problem.temperatureC >= SULFATE_REDUCTION_FROM_C;

  const totals = componentTotals(problem, data, sulfateReduction);
  if (!totals.ok) return totals;
  const named = namedSpecies(problem, data, totals.value, sulfateReduction);
  if (!named.ok) return named;

  const out = leavesOut(problem, data);
  const leftOut: { species: string; reason: string }[] = [];
  const components: PreparedComponent[] = [];
  for (const [component, activity] of totals.value) {
    const species = componentSpecies(data, component, sulfateReduction).filter((s) => !reject(s, out, leftOut));
    if (species.length === 0)
      return fail("UNKNOWN_COMPONENT", "ligands", `${component} has no species left that could hold its total`);
    components.push({ component, activity, species });
  }

  const metals: PreparedMetal[] = [];
  const seen = new Set<string>();
  for (const [i, metal] of problem.metals.entries()) {
    const path = `metals.${i}.element`;
    if (componentKind(data, metal.element) === "unknown" || !data.molarMass.has(metal.element))
      return fail("UNKNOWN_METAL", path, `"${metal.element}" is not an element of the library`);
    if (seen.has(metal.element)) return fail("INVALID_INPUT", path, `${metal.element} stands twice in the list of metals`);
    if (totals.value.has(metal.element))
      return fail("INVALID_INPUT", path, `${metal.element} is both a metal and a component with a total`);
    seen.add(metal.element);
    const species = metalSpecies(metal.element, { problem, data, totals: totals.value, sulfateReduction, out, leftOut });
    if (species.length === 0)
      return fail("UNKNOWN_METAL", path, `no species of ${metal.element} is left in this problem`);
    const tenor =
      metal.gPerL === undefined
        ? {}
        : { gPerL: metal.gPerL, gamma: metal.gamma ?? 1 };
    const activity = metal.activity ?? (metal.gPerL! / data.molarMass.get(metal.element)!) * (metal.gamma ?? 1);
    metals.push({ element: metal.element, requirement: metal.requirement, activity, ...tenor, species });
  }
  return ok({ problem, data, sulfateReduction, metals, components, leftOut });
}

type LeftOut = { species: string; reason: string }[];

function reject(species: Species, out: (id: string) => string | null, leftOut: LeftOut): boolean {
  const reason = out(species.id);
  if (reason !== null) leftOut.push({ species: species.id, reason });
  return reason !== null;
}

function componentTotals(problem: Problem, data: ChemicalData, sulfateReduction: boolean): Outcome<Map<string, number>> {
  const totals = new Map<string, number>();
  for (const [list, entries] of [
    ["ligands", problem.ligands],
    ["others", problem.others ?? []],
  ] as const) {
    for (const [i, { component, activity }] of entries.entries()) {
      const path = `${list}.${i}.component`;
      const kind = componentKind(data, component);
      if (kind === "unknown")
        return fail("UNKNOWN_COMPONENT", path, `"${component}" is not a component of the library`);
      if (kind === "metal")
        return fail("UNKNOWN_COMPONENT", path, `${component} is a metal: a second metal as a component is not solved here`);
      if (totals.has(component)) return fail("INVALID_INPUT", path, `${component} has two totals`);
      if (component === SULFIDE_SULFUR && sulfateReduction)
        return fail("INVALID_INPUT", path, `with sulfate reduction on, sulfur is one pool: give its total as S`);
      totals.set(component, activity);
    }
  }
  return ok(totals);
}

/** Species made of the component, H and O alone: they share its total. */
function componentSpecies(data: ChemicalData, component: string, sulfateReduction: boolean): Species[] {
  const main = component === SULFIDE_SULFUR ? "S" : component;
  return speciesHolding(data, main).filter((s) => {
    if (s.phase === "g") return false;
    if (!Object.keys(s.composition).every((c) => c === main || c === "H" || c === "O")) return false;
    if (main !== "S" || sulfateReduction) return true;
    return holdsSulfate(s) === (component === "S");
  });
}

interface Choice {
  problem: Problem;
  data: ChemicalData;
  totals: ReadonlyMap<string, number>;
  sulfateReduction: boolean;
  out: (id: string) => string | null;
  leftOut: LeftOut;
}

function metalSpecies(metal: string, choice: Choice): Species[] {
  const { problem, data, totals, sulfateReduction, out, leftOut } = choice;
  const only = problem.only ? new Set(problem.only) : null;
  return speciesHolding(data, metal).filter((s) => {
    if (s.phase === "g" || (only && !only.has(s.id))) return false;
    const missing = ligandNumbers(s, metal, sulfateReduction).filter(([c]) => !totals.has(c));
    const second = missing.find(([c]) => componentKind(data, c) === "metal");
    if (second) {
      leftOut.push({ species: s.id, reason: `holds ${second[0]} as well: a second metal is not solved here` });
      return false;
    }
    const absentLigand = missing.some(([c]) => componentKind(data, c) === "ligand");
    if (absentLigand) return false; // not of this lixiviant
    if (missing.length > 0) {
      leftOut.push({ species: s.id, reason: `${missing[0]![0]} has no total` });
      return false;
    }
    return !reject(s, out, leftOut);
  });
}

/** Ids the problem names must exist, and what it wants in must find its components. */
function namedSpecies(
  problem: Problem,
  data: ChemicalData,
  totals: ReadonlyMap<string, number>,
  sulfateReduction: boolean,
): Outcome<null> {
  const metals = problem.metals.map((m) => m.element);
  for (const list of ["leftOut", "putBack", "only", "feedMinerals"] as const) {
    for (const [i, id] of (problem[list] ?? []).entries()) {
      const species = data.species.get(id);
      const path = `${list}.${i}`;
      if (!species) return fail("UNKNOWN_SPECIES", path, `"${id}" is not a species of the library`);
      if (list === "leftOut") continue;
      const metal = metals.find((m) => species.composition[m] !== undefined);
      if (metal === undefined) continue;
      for (const [component] of ligandNumbers(species, metal, sulfateReduction)) {
        if (totals.has(component) || componentKind(data, component) === "metal") continue;
        return fail("LIGAND_MISSING", path, `${id} needs ${component}, which has no total in this problem`);
      }
    }
  }
  return ok(null);
}
