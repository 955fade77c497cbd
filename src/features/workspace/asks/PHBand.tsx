import { lazy, Suspense } from "react";
import { FREE_ACID_BELOW } from "../../../../shared/activity/freeAcid";
import { NumberField } from "../../../components/NumberField";
import { setPHBand } from "../model/edit";
import { useAsking } from "./context";

// Few loops are run on free acid.
const AcidPHBand = lazy(() => import("./AcidPHBand"));

/** How closely pH is held: in pH, or below pH 1.5 in a sulfate liquor in g/L of free acid. */
export function PHBand() {
  const { inputs, setPoint } = useAsking();
  const sulfate = inputs.ligands.some((l) => l.component === "S");
  const low = setPoint !== null && setPoint.pH < FREE_ACID_BELOW && sulfate;
  if (!low && !inputs.freeAcidBand) return <PlainPHBand />;
  return (
    <Suspense fallback={<PlainPHBand />}>
      <AcidPHBand low={low} />
    </Suspense>
  );
}

export function PlainPHBand() {
  const { inputs, edit, readOnly } = useAsking();
  return (
    <NumberField
      label="Control band of pH"
      labelText="pH ±"
      value={inputs.controlBand.pH}
      above={0}
      max={5}
      step={0.05}
      width={6}
      show={(x) => x.toFixed(2)}
      readOnly={readOnly}
      onCommit={(pH) => edit(setPHBand(pH))}
    />
  );
}
