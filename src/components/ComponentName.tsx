import type { ChemicalData } from "../../shared/species/chemicalData";
import { componentWord } from "../../shared/words/componentWord";
import { Formula } from "./Formula";

export { componentWord };

/** "NH₃ ammonia": a component of a liquor, typeset and named. */
export function ComponentName({ data, component }: { data: ChemicalData; component: string }) {
  return (
    <>
      <Formula formula={component} className="font-mono" />{" "}
      <span className="text-muted">{componentWord(data, component)}</span>
    </>
  );
}
