import { createContext, useContext } from "react";
import type { Failure } from "../../../../shared/outcome";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { SetPoint, Solution } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import type { PotentialScale } from "../../../lib/potential";
import type { Edit } from "../model/edit";

/** What every question of the left panel needs. */
export interface Asking {
  inputs: PlanInputs;
  edit: (change: Edit, about?: string) => void;
  settle: () => void;
  data: ChemicalData;
  solution: Solution | null;
  failure: Failure | null;
  /** of the window in hand */
  setPoint: SetPoint | null;
  scale: PotentialScale;
  /** a frozen revision is looked at, not changed */
  readOnly: boolean;
  /** element in focus on the map */
  focus: string | null;
  onFocus: (element: string | null) => void;
}

export const AskingContext = createContext<Asking | null>(null);

/** @throws Error outside the workspace */
export function useAsking(): Asking {
  const asking = useContext(AskingContext);
  if (!asking) throw new Error("useAsking belongs inside the workspace");
  return asking;
}

/** The solver's refusal where it concerns this part of the inputs, else null. */
export const failureAt = (failure: Failure | null, path: string): string | null =>
  failure !== null && (failure.path === path || failure.path.startsWith(`${path}.`)) ? failure.message : null;
