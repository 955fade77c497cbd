import { Link, useNavigate } from "react-router-dom";
import type { CampaignRow } from "../../../shared/schemas/campaign";
import type { CampaignSummaryAnswer } from "../../../shared/schemas/campaignSummary";
import { Button, ButtonLink } from "../../components/Button";
import { Select } from "../../components/Select";
import { ErrorNote } from "../../components/status";
import { Note, Row, SectionHead } from "../../components/text";
import { useRestoreCampaign } from "../../lib/campaigns";
import { useMay } from "../../lib/session";
import { CampaignVerdict } from "./CampaignVerdict";

/** The campaign in hand: what it asks, what it rests on, what came out. */
export function CampaignDetail({
  campaign,
  summary,
  others,
}: {
  campaign: CampaignRow;
  summary: CampaignSummaryAnswer | null;
  others: readonly CampaignRow[];
}) {
  const navigate = useNavigate();
  const mayWrite = useMay("review");
  const restore = useRestoreCampaign();
  const rest = others.filter(({ id }) => id !== campaign.id);
  return (
    <aside
      aria-label={`Campaign ${campaign.code}`}
      className="w-[300px] shrink-0 overflow-y-auto border-l border-rule px-5 pt-3 pb-6 "
    >
      <h2 className="text-lg">{campaign.code}</h2>
      <p className="font-bold">{campaign.title}</p>
      {campaign.invented && <Note>Invented data, for demonstration.</Note>}
      {campaign.question !== "" && <p className="mt-1">{campaign.question}</p>}
      {campaign.deletedAt === null ? (
        <div className="mt-3 flex flex-wrap items-center gap-2">
          <ButtonLink to={`/campaigns/${campaign.id}`} kind="primary">
            Open
          </ButtonLink>
          {mayWrite && <ButtonLink to={`/campaigns/${campaign.id}/edit`}>Edit</ButtonLink>}
          {rest.length > 0 && (
            <Select
              label="Compare with another campaign"
              layout="bare"
              value=""
              placeholder="compare with"
              onChange={(other) => void navigate(`/campaigns/compare?a=${campaign.id}&b=${other}`)}
              options={rest.map(({ id, code, title }) => ({ value: id, label: code, note: title }))}
            />
          )}
        </div>
      ) : (
        mayWrite && (
          <Button className="mt-3" disabled={restore.isPending} onClick={() => restore.mutate(campaign)}>
            Restore
          </Button>
        )
      )}
      {restore.error && <ErrorNote className="mt-2" doing="Not restored" error={restore.error} />}
      <SectionHead className="mt-5">Rests on</SectionHead>
      <Row
        label={<Link to={`/plans/${campaign.planId}?revision=${campaign.planRevision}`}>{campaign.planName}</Link>}
        below={
          summary &&
          (summary.plan.failure ??
            `${summary.plan.temperatureC} °C, ${summary.plan.windows === 0 ? "no window" : `${summary.plan.windows} ${summary.plan.windows === 1 ? "window" : "windows"}`}`)
        }
      >
        <span className="text-sm">revision {campaign.planRevision}</span>
      </Row>
      {summary?.feeds.map(({ id, name, n }) => (
        <Row key={id} label={<Link to={`/feeds/${id}`}>{name}</Link>}>
          <span className="text-sm text-muted">n {n}</span>
        </Row>
      ))}
      {summary && <CampaignVerdict summary={summary} />}
    </aside>
  );
}
