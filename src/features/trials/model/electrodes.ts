import { electrodeSeries, type ElectrodeSeries } from "../../../../shared/electrodes/series";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { shortElectrode } from "../../../lib/potential";

export const electrodesOf = (data: ChemicalData): readonly ElectrodeSeries[] => electrodeSeries(data.tables);

/** For a list: every reference electrode of the library, and a meter that converts by itself. */
export const electrodeOptions = (electrodes: readonly ElectrodeSeries[]): { value: string; label: string }[] => [
  ...electrodes.map(({ id, label }) => ({ value: id, label: shortElectrode(label) })),
  { value: "SHE", label: "SHE, converted by the meter" },
];

export const electrodeName = (electrodes: readonly ElectrodeSeries[], id: string | null): string => {
  if (id === null) return "no electrode";
  const found = electrodes.find((series) => series.id === id);
  return found ? shortElectrode(found.label) : id;
};
