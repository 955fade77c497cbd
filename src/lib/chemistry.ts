import { queryOptions, useQuery } from "@tanstack/react-query";
import { valueOf } from "../../shared/outcome";
import type { ChemicalTables } from "../../shared/schemas/chemistry";
import type { ChemicalData } from "../../shared/species/chemicalData";
import { libraryFrom } from "../../shared/species/library";
import { api } from "./api";
import { keys } from "./queries";

const built = new WeakMap<ChemicalTables, ChemicalData>();

/** The library of these tables, indexed once an object. */
export function libraryOf(tables: ChemicalTables): ChemicalData {
  const known = built.get(tables);
  if (known) return known;
  const made = valueOf(libraryFrom(tables));
  built.set(tables, made);
  return made;
}

export const chemistryQuery = (version?: string) =>
  queryOptions({
    queryKey: version === undefined ? keys.chemistry : keys.chemistryVersion(version),
    queryFn: ({ signal }) =>
      api.get<ChemicalTables>(version === undefined ? "/chemistry" : `/chemistry/versions/${version}`, { signal }),
    structuralSharing: false,
    staleTime: Infinity,
    gcTime: Infinity,
  });

/** The chemistry library in force, or the version a revision froze. `data` is one stable object while the version stands. */
export const useChemistry = (version?: string, enabled = true) =>
  useQuery({ ...chemistryQuery(version), enabled, select: libraryOf });
