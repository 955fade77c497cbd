import { SULFIDE_SULFUR } from "../selection/components";
import type { ChemicalData } from "../species/chemicalData";

/** What a component is called: elements by name, ligand groups by the first word of their note. */
export function componentWord(data: ChemicalData, component: string): string {
  const element = data.tables.elements.find(({ symbol }) => symbol === component);
  return element?.name ?? data.components.get(component)?.note.split(/[;\s]/)[0] ?? "";
}

/** A total of the liquor as it is entered: sulfur is sulfate while sulfate is not reduced, carbon carbonate.
 *  @param data  library     @param component  ligand or other component     @param sulfateReduction  all sulfur is one pool
 *  @returns  a word     @example ligandWord(chemistry(), "S", false).length // => 7 */
export function ligandWord(data: ChemicalData, component: string, sulfateReduction: boolean): string {
  if (component === SULFIDE_SULFUR) return "sulfide";
  if (component === "S" && !sulfateReduction) return "sulfate";
  return component === "C" ? "carbonate" : componentWord(data, component);
}
