import type { Problem } from "../../shared/schemas/problem";
import type { ChemicalData, Species } from "../../shared/species/chemicalData";

/** Which species count, read from the tables a second time and in the plainest way: the twin of shared/selection. */

const inert = new Set(["H", "O"]);
const lixiviantElements = ["S", "N", "C", "Cl", "F", "P"];

export const metalsOfLibrary = (data: ChemicalData): string[] =>
  [...data.components]
    .filter(([c, { kind }]) => kind === "element" && !inert.has(c) && !lixiviantElements.includes(c))
    .map(([c]) => c);

export const isCoupled = (p: Problem): boolean => p.sulfateReduction ?? p.temperatureC >= 150;

/** S of a species by pool: two while sulfate is not reduced. */
export function poolOf(species: Species, component: string, coupled: boolean): string {
  if (component !== "S" || coupled) return component;
  return ["SO4", "S2O8"].some((group) => species.formula.includes(group)) ? "S" : "S(sulfide)";
}

export const totalsOf = (p: Problem): Map<string, number> =>
  new Map([...p.ligands, ...(p.others ?? [])].map(({ component, activity }) => [component, activity]));

const conditionHolds = (when: string, p: Problem, id: string): boolean =>
  when.split(",").every((c) => {
    const asFeed = p.feedMinerals?.includes(id) ?? false;
    if (c === "always") return true;
    if (c === "unless_feed" || c === "as_product") return !asFeed;
    if (c === "sulfate_couple=off") return false; // the pool of sulfide sulfur decides
    if (c === "role:iron_gangue") return p.metals.some((m) => m.element === "Fe" && m.role === "gangue");
    if (c.startsWith("unless_dosed:")) return !p.dosed?.includes(c.slice("unless_dosed:".length));
    if (c.startsWith("T<")) return p.temperatureC < Number(c.slice(2));
    if (c.startsWith("T>=")) return p.temperatureC >= Number(c.slice(3));
    throw new Error(c);
  });

/** Whether the plan, the solids basis or the defaults leave a species out. */
export function isLeftOut(id: string, p: Problem, data: ChemicalData): boolean {
  if (p.leftOut?.includes(id)) return true;
  if (p.solidsBasis === undefined) return false;
  if (p.putBack?.includes(id) || p.feedMinerals?.includes(id)) return false;
  if (p.solidsBasis !== "aged") {
    const row = data.tables.solidsBasis.find((r) => r.id === id);
    if (row?.fresh === "in") return false;
    if (row && (row.below_C === null || p.temperatureC < row.below_C)) return true;
  }
  return data.tables.defaults.some((r) => r.id === id && conditionHolds(r.when, p, id));
}

/** Condensed species of one metal with a total for everything else they hold. */
export function speciesOfMetal(metal: string, p: Problem, data: ChemicalData): Species[] {
  const totals = totalsOf(p);
  return [...data.species.values()].filter(
    (s) =>
      metal in s.composition &&
      s.phase !== "g" &&
      Object.keys(s.composition).every((c) => c === metal || inert.has(c) || totals.has(poolOf(s, c, isCoupled(p)))) &&
      (p.only === undefined || p.only.includes(s.id)) &&
      !isLeftOut(s.id, p, data),
  );
}

/** Condensed species made of one component, H and O. */
export function speciesOfComponent(component: string, p: Problem, data: ChemicalData): Species[] {
  const element = component === "S(sulfide)" ? "S" : component;
  return [...data.species.values()].filter(
    (s) =>
      element in s.composition &&
      s.phase !== "g" &&
      Object.keys(s.composition).every((c) => c === element || inert.has(c)) &&
      poolOf(s, element, isCoupled(p)) === component &&
      !isLeftOut(s.id, p, data),
  );
}
