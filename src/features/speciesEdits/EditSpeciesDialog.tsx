import type { SpeciesEditRow } from "../../../shared/schemas/speciesEdit";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { whenOpened } from "../../components/whenOpened";

export interface EditSpeciesDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  data: ChemicalData;
  /** null adds a species */
  id: string | null;
  /** of the species, 0 where it was never edited */
  version: number;
  onSaved: (edit: SpeciesEditRow) => void;
}

export const EditSpeciesDialog = whenOpened<EditSpeciesDialogProps>(() => import("./EditSpecies"));
