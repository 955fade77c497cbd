import { useState } from "react";
import { Link } from "react-router-dom";
import type { CampaignRow } from "../../../../shared/schemas/campaign";
import type { TrialRow } from "../../../../shared/schemas/trial";
import { Button } from "../../../components/Button";
import { ErrorNote } from "../../../components/status";
import { useDeleteCampaign } from "../../../lib/campaigns";
import { counted } from "../../../lib/format";
import { useDeleteTrial } from "../../../lib/trials";

/** What one action made, so that one action takes it back. */
export interface MadeTrials {
  campaign: Pick<CampaignRow, "id" | "code">;
  /** the campaign was made with them */
  madeCampaign: CampaignRow | null;
  trials: readonly TrialRow[];
}

const WHY = "planned from proposals by mistake: undone";

/** The trials that were just planned, and the way back. */
export function Planned({ made, onGone }: { made: MadeTrials; onGone: () => void }) {
  const removeTrial = useDeleteTrial();
  const removeCampaign = useDeleteCampaign();
  const [left, setLeft] = useState(made.trials);
  const [busy, setBusy] = useState(false);
  const { campaign, madeCampaign } = made;
  async function undo() {
    setBusy(true);
    try {
      for (const { id, version } of left) {
        await removeTrial.mutateAsync({ id, version, reason: WHY });
        setLeft((old) => old.filter((t) => t.id !== id));
      }
      if (madeCampaign)
        await removeCampaign.mutateAsync({ id: madeCampaign.id, version: madeCampaign.version, reason: WHY });
      onGone();
    } catch {
      setBusy(false); // the note below says what stands in the way
    }
  }
  const codes = left.map(({ code }) => code);
  return (
    <div role="status" className="border-l-4 border-verdigris bg-sheet px-3 py-1.5">
      <p>
        {counted(left.length, "trial")} planned in <Link to={`/campaigns/${campaign.id}`}>{campaign.code}</Link>:{" "}
        <span className="font-mono">{codes.join(", ")}</span>.{" "}
        <Button kind="quiet" className="no-print h-auto!" disabled={busy} onClick={() => void undo()}>
          {busy ? "taking back …" : "Undo"}
        </Button>
      </p>
      {(removeTrial.error ?? removeCampaign.error) && (
        <ErrorNote doing="Not taken back" error={removeTrial.error ?? removeCampaign.error} />
      )}
    </div>
  );
}
