import type { PlanInputs } from "../schemas/plan";
import { componentKind } from "../selection/components";
import { withoutTotal } from "../selection/missing";
import type { ChemicalData } from "../species/chemicalData";
import { FIRST_TOTAL } from "./totals";

export interface MissingTotal {
  readonly component: string;
  /** where its total belongs */
  readonly list: "ligands" | "others";
  /** what asks for it, in the order of the plan */
  readonly species: readonly string[];
}

/** Components that the plan's feed minerals and species put back are made of and that have no total: without one the plan cannot be solved.
 *  @param inputs  of a plan     @param data  library     @returns  each component once, with the species that need it
 *  @source  the rule by which the solver refuses (selection/choose.ts, LIGAND_MISSING) */
export function missingTotals(
  {
    metals,
    ligands,
    others,
    feedMinerals,
    putBack,
    sulfateReduction,
  }: Pick<PlanInputs, "metals" | "ligands" | "others" | "feedMinerals" | "putBack" | "sulfateReduction">,
  data: ChemicalData,
): MissingTotal[] {
  const totals = new Set([...ligands, ...others].map((t) => t.component));
  const elements = metals.map((m) => m.element);
  const needed = new Map<string, string[]>();
  for (const id of new Set([...feedMinerals, ...putBack])) {
    const species = data.species.get(id);
    if (!species) continue;
    for (const component of withoutTotal(species, elements, (c) => totals.has(c), data, sulfateReduction))
      needed.set(component, [...(needed.get(component) ?? []), id]);
  }
  return [...needed].map(([component, species]) => ({
    component,
    list: componentKind(data, component) === "partner" ? "others" : "ligands",
    species,
  }));
}

/** The plan with every such component in its liquor, at FIRST_TOTAL; nothing else changes.
 *  @param inputs  of a plan     @param data  library     @returns  inputs; the same where nothing is missing */
export function withMissingTotals(inputs: PlanInputs, data: ChemicalData): PlanInputs {
  return missingTotals(inputs, data).reduce<PlanInputs>(
    (p, { component, list }) => ({ ...p, [list]: [...p[list], { component, activity: FIRST_TOTAL }] }),
    inputs,
  );
}
