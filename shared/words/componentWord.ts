import type { ChemicalData } from "../species/chemicalData";

/** What a component is called: elements by name, ligand groups by the first word of their note. */
export function componentWord(data: ChemicalData, component: string): string {
  const element = data.tables.elements.find(({ symbol }) => symbol === component);
  return element?.name ?? data.components.get(component)?.note.split(/[;\s]/)[0] ?? "";
}
