import { readTables } from "../../server/chemistry/readTables";
import { valueOf } from "../../shared/outcome";
import type { ChemicalData } from "../../shared/species/chemicalData";
import { libraryFrom } from "../../shared/species/library";

let library: ChemicalData | undefined;

/** The library of shared/data, read once a test file. */
export function chemistry(): ChemicalData {
  library ??= valueOf(libraryFrom(readTables().tables));
  return library;
}
