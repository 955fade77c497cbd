import { useParams } from "react-router-dom";
import { Opening } from "../../components/status";
import { useCampaign } from "../../lib/campaigns";
import { useChemistry } from "../../lib/chemistry";
import { usePageTitle } from "../../lib/title";
import { useTrial } from "../../lib/trials";
import { TrialEditor } from "./TrialEditor";

/** One trial: its record, its accounts. */
export default function TrialPage() {
  const { trialId = "" } = useParams();
  const trial = useTrial(trialId);
  const campaign = useCampaign(trial.data?.campaignId);
  const chemistry = useChemistry();
  usePageTitle(trial.data ? `Trial ${trial.data.code}` : "Trial");
  if (trial.data && campaign.data && chemistry.data)
    return <TrialEditor key={trialId} trial={trial.data} campaign={campaign.data} data={chemistry.data} />;
  return <Opening what="trial" asked={[trial, campaign, chemistry]} />;
}
