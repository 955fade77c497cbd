import { componentKind } from "../../../../shared/selection/components";
import type { ChemicalData } from "../../../../shared/species/chemicalData";

/** Whether a part of a mineral is a metal: what its ligands become goes without choosing. */
export const isMetalOf = (data: ChemicalData, component: string): boolean => componentKind(data, component) === "metal";
