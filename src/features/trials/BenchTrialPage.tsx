import { useParams } from "react-router-dom";
import { ErrorNote, Loading } from "../../components/status";
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
  const error = trial.error ?? campaign.error ?? chemistry.error;
  if (trial.data && campaign.data && chemistry.data)
    return <Bench key={trialId} trial={trial.data} campaign={campaign.data} data={chemistry.data} />;
  return (
    <div className="measure px-5 py-3 text-lg">
      {error ? (
        <ErrorNote
          doing="The trial could not be opened"
          error={error}
          retry={() => void Promise.all([trial.refetch(), campaign.refetch(), chemistry.refetch()])}
        />
      ) : (
        <Loading label="Opening the trial" />
      )}
    </div>
  );
}
