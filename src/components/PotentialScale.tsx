import { usePreferences } from "../lib/preferences";
import { Segmented } from "./choice";
import { Dialog } from "./Dialog";
import { Row } from "./text";

/** The scale on which potentials are shown, remembered for the member. */
export function PotentialScaleFields() {
  const [preferences, change] = usePreferences();
  return (
    <Row label="Unit">
      <Segmented
        label="Unit of potential"
        value={preferences.potentialUnit}
        onChange={(potentialUnit) => change({ potentialUnit })}
        options={[
          { value: "V", label: "V" },
          { value: "mV", label: "mV" },
        ]}
      />
    </Row>
  );
}

export function PotentialScaleDialog(props: { open: boolean; onOpenChange: (open: boolean) => void }) {
  return (
    <Dialog
      {...props}
      title="Potential scale"
      width={460}
      description="Plans are solved and stored in volts against the standard hydrogen electrode. What is shown is up to you; the scale always stands beside the number."
    >
      <PotentialScaleFields />
    </Dialog>
  );
}
