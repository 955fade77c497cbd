import { useState } from "react";
import type { CampaignRow } from "../../../../shared/schemas/campaign";
import type { TrialRow } from "../../../../shared/schemas/trial";
import { useCreateCampaign } from "../../../lib/campaigns";
import { useCreateTrial } from "../../../lib/trials";
import type { TrialValues } from "../model/trialValues";
import type { MadeTrials } from "./Planned";

type NewCampaign = Parameters<ReturnType<typeof useCreateCampaign>["mutateAsync"]>[0];

/** Plans trial after trial in a campaign, a new one first made. Where one is refused the ones before it stay planned (`done` says how
 *  many), and the next start goes on with the rest. */
export function usePlanning(onMade: (made: MadeTrials) => void) {
  const createCampaign = useCreateCampaign();
  const createTrial = useCreateTrial();
  const [made, setMade] = useState<{ campaign: CampaignRow | null; trials: readonly TrialRow[] }>({
    campaign: null,
    trials: [],
  });
  const [state, setState] = useState<{ busy: boolean; error: unknown; progress: string | null }>({
    busy: false,
    error: null,
    progress: null,
  });

  async function run(campaign: CampaignRow | NewCampaign, values: readonly TrialValues[]) {
    let madeCampaign = made.campaign;
    const trials = [...made.trials];
    try {
      if (!("id" in campaign) && madeCampaign === null) madeCampaign = await createCampaign.mutateAsync(campaign);
      const home = "id" in campaign ? campaign : madeCampaign!;
      for (const one of values) {
        setState({ busy: true, error: null, progress: `planning ${one.code}` });
        trials.push(await createTrial.mutateAsync({ ...one, campaignId: home.id }));
      }
      onMade({ campaign: home, madeCampaign, trials });
    } catch (error) {
      setMade({ campaign: madeCampaign, trials });
      setState({ busy: false, error, progress: null });
    }
  }

  return {
    ...state,
    /** how many stand already */
    done: made.trials.length,
    start: (campaign: CampaignRow | NewCampaign, values: readonly TrialValues[]) => {
      setState({ busy: true, error: null, progress: null });
      void run(campaign, values);
    },
  };
}
