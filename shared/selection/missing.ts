import type { ChemicalData, Species } from "../species/chemicalData";
import { componentKind, ligandNumbers } from "./components";

/** What a species of a metal of the question takes part with and has no total for: a second metal is another matter (it is left out and told).
 *  @param species  named by the question     @param metals  elements asked about     @param hasTotal  whether a component has one
 *  @returns  components, in the order of the composition; none for a species of no metal asked about */
export function withoutTotal(
  species: Species,
  metals: readonly string[],
  hasTotal: (component: string) => boolean,
  data: ChemicalData,
  sulfateReduction: boolean,
): string[] {
  const metal = metals.find((m) => species.composition[m] !== undefined);
  if (metal === undefined) return [];
  return ligandNumbers(species, metal, sulfateReduction)
    .map(([component]) => component)
    .filter((component) => !hasTotal(component) && componentKind(data, component) !== "metal");
}
