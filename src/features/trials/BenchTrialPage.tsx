import { useParams } from "react-router-dom";
import { Opening } from "../../components/status";
import { useCampaign } from "../../lib/campaigns";
import { useChemistry } from "../../lib/chemistry";
import { usePageTitle } from "../../lib/title";
import { useTrial } from "../../lib/trials";
import { Bench } from "./bench/Bench";

/** A trial at the bench. */
export default function BenchTrialPage() {
  const { trialId = "" } = useParams();
  const trial = useTrial(trialId);
  const campaign = useCampaign(trial.data?.campaignId);
  const chemistry = useChemistry();
  usePageTitle(trial.data ? `Bench, ${trial.data.code}` : "Bench");
  if (trial.data && campaign.data && chemistry.data)
    return <Bench key={trialId} trial={trial.data} campaign={campaign.data} data={chemistry.data} />;
  return <Opening what="trial" asked={[trial, campaign, chemistry]} />;
}
