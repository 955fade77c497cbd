import { isDeepStrictEqual } from "node:util";
import type { PlanInputs } from "../../../shared/schemas/plan";
import type { ChemicalData, Species } from "../../../shared/species/chemicalData";
import type { Chemistry } from "../chemistry/library";

/** Everything the solver takes from a species: not its name, nor who said so. */
function usedOf(data: ChemicalData, id: string) {
  const species = data.species.get(id);
  if (!species) return null;
  const { name: _name, source: _source, grade: _grade, note: _note, ...numbers } = species.row;
  const rule = data.extrapolation.get(id) ?? null;
  const correspondence = data.tables.correspondence.filter((row) => row.ion_class === numbers.ion_class);
  return { numbers, rule, correspondence: numbers.ion_class === null ? [] : correspondence };
}

/** Species that one library has otherwise than another, or not at all. */
function changedBetween(then: ChemicalData, now: ChemicalData): Species[] {
  const changed: Species[] = [];
  for (const id of new Set([...then.species.keys(), ...now.species.keys()])) {
    if (isDeepStrictEqual(usedOf(then, id), usedOf(now, id))) continue;
    const species = now.species.get(id) ?? then.species.get(id);
    if (species) changed.push(species);
  }
  return changed;
}

/** May the plan's solution rest on this species? It holds nothing but what the plan has, or the plan names it. */
function mayUse(inputs: PlanInputs, { id, composition }: Species): boolean {
  if (inputs.leftOut.some(({ species }) => species === id)) return false;
  if (inputs.feedMinerals.includes(id) || inputs.putBack.includes(id)) return true;
  const totals = [...inputs.ligands, ...inputs.others].map(({ component }) =>
    component === "S(sulfide)" ? "S" : component,
  );
  const present = new Set(["H", "O", ...inputs.metals.map(({ element }) => element), ...totals]);
  return Object.keys(composition).every((component) => present.has(component));
}

/** null: the library of then cannot be read any more, so that nothing can be said of single species */
export type OutdatedSpecies = (latest: { dataVersion: string; inputs: PlanInputs }) => string[] | null;

/** Which species of a revision's metals and ligands stand otherwise in the library of today. */
export function outdatedSpecies(chemistry: Chemistry): OutdatedSpecies {
  let current = "";
  let known = new Map<string, Species[] | null>();
  return ({ dataVersion, inputs }) => {
    const now = chemistry.data;
    if (dataVersion === now.version) return [];
    if (current !== now.version) known = new Map();
    current = now.version;
    let changed = known.get(dataVersion);
    if (changed === undefined) {
      const then = chemistry.libraryOf(dataVersion);
      changed = then.ok ? changedBetween(then.value, now) : null;
      known.set(dataVersion, changed);
    }
    return changed && changed.filter((species) => mayUse(inputs, species)).map(({ id }) => id);
  };
}
