import type { SpeciesRow } from "../../../shared/schemas/chemistry";

export const phaseWord: Readonly<Record<SpeciesRow["phase"], string>> = {
  aq: "dissolved",
  s: "solid",
  l: "liquid",
  g: "gas",
};
