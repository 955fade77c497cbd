import { fail, ok, type Outcome } from "../outcome";
import type { Problem } from "../schemas/problem";
import type { ChemicalData, Species } from "../species/chemicalData";
import { componentKind, ligandNumbers, speciesHolding, SULFIDE_SULFUR } from "./components";
import { isSulfate } from "../species/sulfur";
import { ligandWord } from "../words/componentWord";
import { leavesOut, temperatureStage } from "./leftOut";
import { withoutTotal } from "./missing";

/** Which species count, in the order of the problem's components and metals. */
export interface Chosen {
  readonly components: readonly (readonly Species[])[];
  readonly metals: readonly (readonly Species[])[];
  readonly leftOut: readonly { species: string; reason: string }[];
}

/** The last choices per library: a moving slider asks for the same species again and again. */
const remembered = new WeakMap<ChemicalData, Map<string, Outcome<Chosen>>>();
const REMEMBERED = 16;

/** Chooses the species of every component and metal of a validated problem. Depends on the numbers of the problem only
 *  through the temperature stages of the defaults, so that a choice can be used again.
 *  @param problem, data     @param totals  component -> total     @param sulfateReduction  one sulfur pool or two
 *  @returns  the choice, or UNKNOWN_METAL, UNKNOWN_COMPONENT, UNKNOWN_SPECIES, LIGAND_MISSING, INVALID_INPUT with a path
 *  @source  docs/method.md, sections 2 and 3 */
export function chooseSpecies(
  problem: Problem,
  data: ChemicalData,
  totals: ReadonlyMap<string, number>,
  sulfateReduction: boolean,
): Outcome<Chosen> {
  const { leftOut, putBack, only, feedMinerals, dosed, solidsBasis } = problem;
  const key = JSON.stringify([
    problem.metals.map((m) => [m.element, m.role]),
    [...totals.keys()],
    [sulfateReduction, solidsBasis, temperatureStage(data, problem.temperatureC)],
    [leftOut, putBack, only, feedMinerals, dosed],
  ]);
  const known = remembered.get(data) ?? new Map<string, Outcome<Chosen>>();
  remembered.set(data, known);
  const before = known.get(key);
  if (before) return before;
  if (known.size >= REMEMBERED) known.delete(known.keys().next().value!);
  const chosen = choose(problem, data, totals, sulfateReduction);
  known.set(key, chosen);
  return chosen;
}

function choose(
  problem: Problem,
  data: ChemicalData,
  totals: ReadonlyMap<string, number>,
  sulfateReduction: boolean,
): Outcome<Chosen> {
  const named = namedSpecies(problem, data, totals, sulfateReduction);
  if (!named.ok) return named;
  const out = leavesOut(problem, data);
  const leftOut: LeftOut = [];
  const components: Species[][] = [];
  for (const component of totals.keys()) {
    const species = componentSpecies(data, component, sulfateReduction).filter((s) => !reject(s, out, leftOut));
    if (species.length === 0)
      return fail(
        "UNKNOWN_COMPONENT",
        pathOf(component, problem),
        `${component} has no species left that could hold its total`,
      );
    components.push(species);
  }
  const metals: Species[][] = [];
  const seen = new Set<string>();
  for (const [i, { element }] of problem.metals.entries()) {
    const path = `metals.${i}.element`;
    const kind = componentKind(data, element);
    if (kind === "unknown" || !data.molarMass.has(element))
      return fail("UNKNOWN_METAL", path, `"${element}" is not an element of the library`);
    if (kind === "ligand" || data.components.get(element)?.kind === "ligand_group")
      return fail("UNKNOWN_METAL", path, `${element} is no metal: it takes a total among the ligands`);
    if (seen.has(element)) return fail("INVALID_INPUT", path, `${element} stands twice in the list of metals`);
    if (totals.has(element))
      return fail("INVALID_INPUT", path, `${element} is both a metal and a component with a total`);
    seen.add(element);
    const species = metalSpecies(element, { problem, data, totals, sulfateReduction, out, leftOut });
    if (species.length === 0) return fail("UNKNOWN_METAL", path, `no species of ${element} is left in this problem`);
    metals.push(species);
  }
  return ok({ components, metals, leftOut });
}

function pathOf(component: string, { ligands, others = [] }: Problem): string {
  const ligand = ligands.findIndex((l) => l.component === component);
  return ligand >= 0
    ? `ligands.${ligand}.component`
    : `others.${others.findIndex((o) => o.component === component)}.component`;
}

type LeftOut = { species: string; reason: string }[];

function reject(species: Species, out: (id: string) => string | null, leftOut: LeftOut): boolean {
  const reason = out(species.id);
  if (reason !== null) leftOut.push({ species: species.id, reason });
  return reason !== null;
}

/** Species made of the component, H and O alone: they share its total. */
function componentSpecies(data: ChemicalData, component: string, sulfateReduction: boolean): Species[] {
  const main = component === SULFIDE_SULFUR ? "S" : component;
  return speciesHolding(data, main).filter((s) => {
    if (s.phase === "g") return false;
    if (!Object.keys(s.composition).every((c) => c === main || c === "H" || c === "O")) return false;
    if (main !== "S" || sulfateReduction) return true;
    return isSulfate(s.formula) === (component === "S");
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
      const [component] = withoutTotal(species, metals, (c) => totals.has(c), data, sulfateReduction);
      if (component === undefined) continue;
      const word = ligandWord(data, component, sulfateReduction);
      const remedy = `give ${component} (${word}) a total, or take ${species.name} out of ${list}`;
      return fail("LIGAND_MISSING", path, `${id} needs ${component}, which has no total in this problem: ${remedy}`);
    }
  }
  return ok(null);
}
