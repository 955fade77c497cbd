import { useMemo } from "react";
import { Link, useSearchParams } from "react-router-dom";
import { ButtonLink } from "../../components/Button";
import { Select } from "../../components/Select";
import { ErrorNote, Loading } from "../../components/status";
import { Empty, Note } from "../../components/text";
import { useCampaign, useCampaigns } from "../../lib/campaigns";
import { useChemistry } from "../../lib/chemistry";
import { useFeeds } from "../../lib/feeds";
import { useProject, useProjectOf } from "../../lib/project";
import { useMay } from "../../lib/session";
import { useSolvedRevision } from "../../lib/solvedRevision";
import { usePageTitle } from "../../lib/title";
import { useAllTrials } from "../../lib/trials";
import { PlanTrial } from "./plan/PlanTrial";

/** A trial laid out before it is run. */
export default function PlanTrialPage() {
  usePageTitle("Plan a trial");
  const mayRecord = useMay("writeBench");
  const [search, setSearch] = useSearchParams();
  const { project } = useProject();
  const wanted = search.get("campaign") ?? undefined;
  const campaign = useCampaign(wanted);
  useProjectOf(campaign.data?.projectId);
  const projectId = campaign.data?.projectId ?? project?.id;
  const campaigns = useCampaigns(projectId);
  const feeds = useFeeds(projectId);
  const trials = useAllTrials(
    { campaignId: wanted ?? "", sort: "code", order: "desc", deleted: "all" },
    wanted !== undefined,
  );
  const chemistry = useChemistry();
  const { solved } = useSolvedRevision(campaign.data?.planId, campaign.data?.planRevision);
  const codes = useMemo(() => (trials.data ?? []).map(({ code }) => code), [trials.data]);
  const error = campaign.error ?? feeds.error ?? trials.error ?? chemistry.error ?? campaigns.error;
  if (!mayRecord)
    return (
      <div className="px-5">
        <Empty title="For the bench">Trials are planned by technicians and metallurgists.</Empty>
      </div>
    );
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2 border-b border-rule px-5 py-2">
        <h1 className="text-lg">Plan a trial</h1>
        <Select
          label="Campaign"
          layout="bare"
          value={wanted ?? ""}
          placeholder="choose the campaign"
          onChange={(id) => setSearch({ campaign: id }, { replace: true })}
          options={(campaigns.data ?? []).map(({ id, code, title }) => ({
            value: id,
            label: `campaign ${code}`,
            text: code,
            note: title,
          }))}
        />
        {campaign.data && (
          <Note>
            on <Link to={`/plans/${campaign.data.planId}`}>{campaign.data.planName}</Link>, revision{" "}
            {campaign.data.planRevision}
          </Note>
        )}
      </div>
      {error ? (
        <div className="measure p-5">
          <ErrorNote doing="The campaign could not be read" error={error} retry={() => window.location.reload()} />
        </div>
      ) : wanted === undefined ? (
        <div className="px-5">
          <Empty
            title={campaigns.data?.length === 0 ? "No campaign yet" : "Which campaign?"}
            action={
              campaigns.data?.length === 0 ? <ButtonLink to="/campaigns">To the campaigns</ButtonLink> : undefined
            }
          >
            A trial belongs to a campaign: it names the plan, the revision and the stages.
          </Empty>
        </div>
      ) : !campaign.data || !feeds.data || !trials.data || !chemistry.data ? (
        <div className="px-5">
          <Loading label="Reading the campaign" />
        </div>
      ) : feeds.data.length === 0 ? (
        <div className="px-5">
          <Empty title="No feed yet" action={<ButtonLink to="/feeds">To the feeds</ButtonLink>}>
            A trial needs a feed: its account starts from the head assay. A metallurgist enters feeds.
          </Empty>
        </div>
      ) : (
        <PlanTrial
          key={campaign.data.id}
          campaign={campaign.data}
          feeds={feeds.data}
          before={trials.data}
          codes={codes}
          data={chemistry.data}
          solved={solved}
        />
      )}
    </>
  );
}
