import { Dialog } from "./Dialog";
import { PotentialScaleFields } from "./PotentialScale";
import type { PotentialScaleDialogProps } from "./PotentialScaleDialog";

export default function PotentialScaleSheet({ liquorC, ...dialog }: PotentialScaleDialogProps) {
  return (
    <Dialog
      {...dialog}
      title="Potential scale"
      width={520}
      description="Plans are solved and stored in volts against the standard hydrogen electrode. What is shown is up to you; the scale always stands beside the number."
    >
      <PotentialScaleFields {...(liquorC === undefined ? {} : { liquorC })} />
    </Dialog>
  );
}
