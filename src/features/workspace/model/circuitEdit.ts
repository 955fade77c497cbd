import type { Circuit } from "../../../../shared/schemas/circuit";
import type { Edit } from "./edit";

/** What stands around the leach, changed in part; undefined takes a word back, and a plan of which nothing is said carries none.
 *  @param change  of the circuit     @returns  the edit */
export const setCircuit =
  (change: { [Key in keyof Circuit]: Circuit[Key] | undefined }): Edit =>
  (p) => {
    const { circuit: old = {}, ...rest } = p;
    const said = Object.entries({ ...old, ...change }).filter(
      ([, value]) => value !== undefined && value !== false && !(Array.isArray(value) && value.length === 0),
    );
    return said.length > 0 ? { ...rest, circuit: Object.fromEntries(said) } : rest;
  };

/** A reagent in use, or no longer. */
export const toggleReagent =
  (id: string): Edit =>
  (p) => {
    const { reagents = [] } = p.circuit ?? {};
    return setCircuit({ reagents: reagents.includes(id) ? reagents.filter((r) => r !== id) : [...reagents, id] })(p);
  };
