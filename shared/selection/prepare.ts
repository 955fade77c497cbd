import type { z } from "zod";
import { fail, ok, type Outcome } from "../outcome";
import { problemSchema, type MetalInput, type Problem, type Requirement } from "../schemas/problem";
import type { ChemicalData, Species } from "../species/chemicalData";
import { withSpecies } from "../species/library";
import { energiesAt } from "../gibbs/energies";
import { wholeFactor } from "../planes/formation";
import { kelvin } from "../units";
import { chooseSpecies } from "./choose";
import { componentKind, SULFIDE_SULFUR } from "./components";

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
  path.reduce<unknown>(
    (v, key) => (v === null || v === undefined ? v : (v as Record<PropertyKey, unknown>)[key]),
    input,
  );

/** A value as people would write it, cut where it gets long. */
function shown(value: unknown): string {
  if (value === undefined) return "nothing";
  if (typeof value === "number" || typeof value === "bigint") return String(value);
  const text = (JSON.stringify(value) as string | undefined) ?? typeof value;
  return text.length > 80 ? `${text.slice(0, 77)}...` : text;
}

/** The first complaint of zod as a failure with path, bound and value. */
export function failureOf(error: z.ZodError, input: unknown): Outcome<never> {
  const issue = error.issues[0]!;
  const unknown = issue.code === "unrecognized_keys" ? issue.keys.slice(0, 1) : [];
  const keys = [...issue.path, ...unknown];
  const outside = (issue.code === "too_small" || issue.code === "too_big") && issue.origin === "number";
  const given = valueAt(input, keys);
  return fail(
    outside ? "OUT_OF_RANGE" : "INVALID_INPUT",
    keys.map(String).join("."),
    given === undefined && issue.code !== "custom" ? issue.message : `${issue.message}; got ${shown(given)}`,
  );
}

/** Validates a problem and chooses the species that count.
 *  @param input  anything; must be a problem (schemas/problem.ts)     @param library  chemistry
 *  @returns  the prepared problem, or the first failure with path, bound and value
 *  @source  docs/method.md, sections 1 to 3 */
export function prepare(input: unknown, library: ChemicalData): Outcome<Prepared> {
  const parsed = problemSchema.safeParse(input);
  if (!parsed.success) return failureOf(parsed.error, input);
  const problem = parsed.data;
  const extended = problem.species?.length ? withSpecies(library, problem.species) : ok(library);
  if (!extended.ok) return extended;
  const own = ownSpeciesFit(problem, extended.value);
  if (!own.ok) return own;
  const data = extended.value;
  const sulfateReduction = problem.sulfateReduction ?? problem.temperatureC >= SULFATE_REDUCTION_FROM_C;

  const totals = componentTotals(problem, data, sulfateReduction);
  if (!totals.ok) return totals;
  const chosen = chooseSpecies(problem, data, totals.value, sulfateReduction);
  if (!chosen.ok) return chosen;
  const { components, metals, leftOut } = chosen.value;
  return ok({
    problem,
    data,
    sulfateReduction,
    metals: problem.metals.map((m, i) => preparedMetal(m, metals[i]!, data)),
    components: [...totals.value].map(([component, activity], i) => ({ component, activity, species: components[i]! })),
    leftOut,
  });
}

/** Largest |G| of a species that the grid of planes holds exactly with all its atoms, kJ/mol. */
const LARGEST_G = 1e5;

/** A row the problem brings along must fit the exact grid of planes, its atoms in small fractions, its energy in bounds; and
 *  there must be a way to take it to the temperature. */
function ownSpeciesFit({ species = [], temperatureC }: Problem, data: ChemicalData): Outcome<null> {
  for (const [i, { id, dGf_kJ, composition }] of species.entries()) {
    if (!(Math.abs(dGf_kJ) <= LARGEST_G))
      return fail(
        "OUT_OF_RANGE",
        `species.${i}.dGf_kJ`,
        `${id}: at most ${LARGEST_G} kJ/mol either way; got ${dGf_kJ}`,
      );
    if (wholeFactor(Object.values(data.species.get(id)!.composition)) === null)
      return fail(
        "BAD_DATA",
        `species.${i}.composition`,
        `${id}: fractions of an atom no finer than a twelfth; got ${composition}`,
      );
    if (!reaches(data, temperatureC, id))
      return fail(
        "BAD_DATA",
        `species.${i}.S_J`,
        `${id} needs its entropy: without one it is counted from simpler species, and here there are none, or it is one of them itself`,
      );
  }
  return ok(null);
}

/** Whether the energy of a species can be worked out: a row without entropy is held against others, which may lead back to it. */
function reaches(data: ChemicalData, temperatureC: number, id: string): boolean {
  try {
    return Number.isFinite(energiesAt(data, kelvin(temperatureC)).of(id).G);
  } catch {
    return false;
  }
}

function preparedMetal(metal: MetalInput, species: readonly Species[], data: ChemicalData): PreparedMetal {
  const { element, requirement, gPerL, gamma = 1 } = metal;
  if (gPerL === undefined) return { element, requirement, activity: metal.activity!, species };
  return { element, requirement, activity: (gPerL / data.molarMass.get(element)!) * gamma, gPerL, gamma, species };
}

function componentTotals(
  problem: Problem,
  data: ChemicalData,
  sulfateReduction: boolean,
): Outcome<Map<string, number>> {
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
        return fail(
          "UNKNOWN_COMPONENT",
          path,
          `${component} is a metal: a second metal as a component is not solved here`,
        );
      if (totals.has(component)) return fail("INVALID_INPUT", path, `${component} has two totals`);
      if (component === SULFIDE_SULFUR && sulfateReduction)
        return fail("INVALID_INPUT", path, `with sulfate reduction on, sulfur is one pool: give its total as S`);
      totals.set(component, activity);
    }
  }
  return ok(totals);
}
