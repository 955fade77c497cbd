import { useState } from "react";
import { useNavigate } from "react-router-dom";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { Button } from "../../components/Button";
import { useMay } from "../../lib/session";
import { EditSpeciesDialog } from "./EditSpeciesDialog";

/** The way to a species of the site's own. */
export function AddSpecies({ data }: { data: ChemicalData }) {
  const mayEdit = useMay("editChemistry");
  const navigate = useNavigate();
  const [open, setOpen] = useState(false);
  if (!mayEdit) return null;
  return (
    <>
      <Button onClick={() => setOpen(true)}>Add a species</Button>
      <EditSpeciesDialog
        open={open}
        onOpenChange={setOpen}
        data={data}
        id={null}
        version={0}
        onSaved={({ speciesId }) => {
          setOpen(false);
          void navigate(`/chemistry/${encodeURIComponent(speciesId)}`);
        }}
      />
    </>
  );
}
