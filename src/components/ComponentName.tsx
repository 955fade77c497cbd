import type { ChemicalData } from "../../shared/species/chemicalData";
import { Formula } from "./Formula";

/** What a component is called: elements by name, ligand groups by the first word of their note. */
export function componentWord(data: ChemicalData, component: string): string {
  const element = data.tables.elements.find(({ symbol }) => symbol === component);
  return element?.name ?? data.components.get(component)?.note.split(/[;\s]/)[0] ?? "";
}

/** "NH₃ ammonia": a component of a liquor, typeset and named. */
export function ComponentName({ data, component }: { data: ChemicalData; component: string }) {
  return (
    <>
      <Formula formula={component} className="font-mono" />{" "}
      <span className="text-muted">{componentWord(data, component)}</span>
    </>
  );
}
