import { useState } from "react";
import { Link, useNavigate, useParams } from "react-router-dom";
import type { CampaignRow } from "../../../shared/schemas/campaign";
import { Button, ButtonLink } from "../../components/Button";
import { HistoryDialog } from "../../components/HistoryDialog";
import { Menu, MenuItem, MenuLabel, MenuSeparator } from "../../components/Menu";
import { PageHead } from "../../components/PageHead";
import { ReasonDialog } from "../../components/ReasonDialog";
import { ErrorNote, Loading, Opening, Status } from "../../components/status";
import { Note, Remark, Row, SectionHead } from "../../components/text";
import {
  useCampaign,
  useCampaigns,
  useCampaignSummary,
  useDeleteCampaign,
  useRestoreCampaign,
} from "../../lib/campaigns";
import { counted } from "../../lib/format";
import { useProjectOf } from "../../lib/project";
import { useMay } from "../../lib/session";
import { usePageTitle } from "../../lib/title";
import { trialsFile } from "../../lib/trials";
import { campaignWords } from "./campaignModel";
import { CampaignVerdict } from "./CampaignVerdict";
import { TrialsTable } from "./TrialsTable";
import { useTrialList } from "./useTrialList";

export default function CampaignPage() {
  const { campaignId = "" } = useParams();
  const campaign = useCampaign(campaignId);
  usePageTitle(campaign.data ? `Campaign ${campaign.data.code}` : "Campaign");
  if (campaign.data) return <Campaign key={campaignId} campaign={campaign.data} />;
  return <Opening what="campaign" asked={[campaign]} />;
}

/** The trials of one campaign, and beside them what it asks and what came out. */
function Campaign({ campaign }: { campaign: CampaignRow }) {
  const navigate = useNavigate();
  useProjectOf(campaign.projectId);
  const mayReview = useMay("review");
  const mayRecord = useMay("writeBench");
  const summary = useCampaignSummary(campaign.id);
  const others = (useCampaigns(campaign.projectId).data ?? []).filter(({ id }) => id !== campaign.id);
  const list = useTrialList(campaign.id);
  const remove = useDeleteCampaign();
  const restore = useRestoreCampaign();
  const [dialog, setDialog] = useState<"history" | "delete" | null>(null);
  const deleted = campaign.deletedAt !== null;
  return (
    <>
      <PageHead
        up={
          <Link to="/campaigns" className="text-sm text-muted">
            Campaigns
          </Link>
        }
        title={campaign.code}
        about={
          <>
            <span className="min-w-0 truncate">{campaign.title}</span>
            {campaign.figuresDue > 0 && (
              <Status>figures of {counted(campaign.figuresDue, "trial")} are being worked out anew …</Status>
            )}
          </>
        }
      >
        <Menu trigger={<Button>Export</Button>}>
          <MenuLabel>As listed, all pages, CSV</MenuLabel>
          {(
            [
              ["trials", "A line a trial, with figures"],
              ["readings", "A line a reading, as read and vs SHE"],
              ["assays", "A line an assay, as typed"],
            ] as const
          ).map(([lines, words]) => (
            <MenuItem key={lines} onSelect={() => window.location.assign(trialsFile(list.query, lines))}>
              {words}
            </MenuItem>
          ))}
        </Menu>
        <Menu trigger={<Button>More</Button>}>
          {others.length > 0 && (
            <>
              <MenuLabel>Compare with</MenuLabel>
              {others.map(({ id, code, title }) => (
                <MenuItem
                  key={id}
                  note={title}
                  onSelect={() => void navigate(`/campaigns/compare?a=${campaign.id}&b=${id}`)}
                >
                  {code}
                </MenuItem>
              ))}
              <MenuSeparator />
            </>
          )}
          <MenuItem onSelect={() => setDialog("history")}>History …</MenuItem>
          {mayReview && !deleted && (
            <>
              <MenuItem onSelect={() => void navigate(`/campaigns/${campaign.id}/edit`)}>Edit the campaign …</MenuItem>
              <MenuSeparator />
              <MenuItem danger onSelect={() => setDialog("delete")}>
                Delete …
              </MenuItem>
            </>
          )}
        </Menu>
        {deleted
          ? mayReview && (
              <Button kind="primary" disabled={restore.isPending} onClick={() => restore.mutate(campaign)}>
                Restore
              </Button>
            )
          : mayRecord && (
              <ButtonLink kind="primary" to={`/trials/plan?campaign=${campaign.id}`}>
                Plan a trial
              </ButtonLink>
            )}
      </PageHead>
      <div className="flex min-h-0 flex-1 max-lg:flex-col max-lg:overflow-y-auto">
        <section
          aria-label="Trials of the campaign"
          className="flex min-w-0 flex-1 flex-col px-5 pt-3 max-lg:min-h-[640px] max-lg:shrink-0"
        >
          {deleted && (
            <Remark className="mb-3">
              This campaign was deleted. Its trials stand in no list until it is restored.
            </Remark>
          )}
          <TrialsTable campaign={campaign} list={list} />
        </section>
        <aside
          aria-label="What the campaign says"
          className="shrink-0 border-rule px-5 pt-3 pb-8 max-lg:border-t lg:w-[300px] lg:overflow-y-auto lg:border-l"
        >
          {campaign.invented && <Note className="pb-2">Invented data, for demonstration.</Note>}
          {campaign.question !== "" && (
            <>
              <SectionHead>Question</SectionHead>
              <p className="pt-1 pb-3">{campaign.question}</p>
            </>
          )}
          <SectionHead>Rests on</SectionHead>
          <Row
            label={<Link to={`/plans/${campaign.planId}?revision=${campaign.planRevision}`}>{campaign.planName}</Link>}
          >
            <span className="text-sm">revision {campaign.planRevision}</span>
          </Row>
          {summary.data?.feeds.map(({ id, name, n }) => (
            <Row key={id} label={<Link to={`/feeds/${id}`}>{name}</Link>}>
              <span className="text-sm text-muted">n {n}</span>
            </Row>
          ))}
          {campaign.notes !== "" && <p className="pt-3 text-sm whitespace-pre-wrap">{campaign.notes}</p>}
          {summary.error ? (
            <ErrorNote
              className="mt-4"
              doing="The summary could not be read"
              error={summary.error}
              retry={() => void summary.refetch()}
            />
          ) : summary.data ? (
            <CampaignVerdict summary={summary.data} />
          ) : (
            <Loading label="Judging the trials" />
          )}
        </aside>
      </div>
      <HistoryDialog
        open={dialog === "history"}
        onOpenChange={(open) => !open && setDialog(null)}
        title={`History of campaign ${campaign.code}`}
        path={`/campaigns/${encodeURIComponent(campaign.id)}`}
        words={campaignWords}
      />
      <ReasonDialog
        open={dialog === "delete"}
        onOpenChange={(open) => !open && setDialog(null)}
        title={`Delete campaign ${campaign.code}`}
        description="It leaves the list with its trials, and can be restored from “Deleted” with all of them."
        action="Delete"
        danger
        busy={remove.isPending}
        error={remove.error}
        onConfirm={(reason) =>
          remove.mutate(
            { id: campaign.id, version: campaign.version, reason },
            { onSuccess: () => void navigate("/campaigns") },
          )
        }
      />
    </>
  );
}
