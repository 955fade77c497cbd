import { energiesAt } from "../../shared/gibbs/energies";
import type { Solution } from "../../shared/solution";
import type { ChemicalData, SpeciesEnergy } from "../../shared/species/chemicalData";
import { kelvin } from "../../shared/units";

/** How the energy of a species on the map reaches the plan's temperature, and what is to be known of it there. */
export type Trust = ReadonlyMap<string, Pick<SpeciesEnergy, "model" | "trusted" | "warning">>;

/** Stands behind the name of every field whose species is beyond its trusted temperatures. */
export const BEYOND = "†";

/** Trust of every species that rules a field. */
export function trustOf(
  { fields, temperatureC }: Pick<Solution, "fields" | "temperatureC">,
  data: ChemicalData,
): Trust {
  const energies = energiesAt(data, kelvin(temperatureC));
  return new Map(fields.map(({ species }) => [species, energies.of(species)] as const));
}

export const isBeyond = (trust: Trust | undefined, species: string): boolean =>
  (trust?.get(species)?.warning ?? null) !== null;
