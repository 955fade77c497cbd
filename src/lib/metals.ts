import type { ChemicalData } from "../../shared/species/chemicalData";
import { componentKind } from "../../shared/selection/components";

const built = new WeakMap<ChemicalData, { value: string; label: string; text: string }[]>();

/** The metals the library knows, for a list to choose from: "Zn, zinc". */
export function metalOptions(data: ChemicalData): { value: string; label: string; text: string }[] {
  const known = built.get(data);
  if (known) return known;
  const options = data.tables.elements
    .filter(({ symbol }) => componentKind(data, symbol) === "metal")
    .map(({ symbol, name }) => ({ value: symbol, label: `${symbol}, ${name}`, text: `${symbol} ${name}` }))
    .sort((a, b) => a.value.localeCompare(b.value));
  built.set(data, options);
  return options;
}
