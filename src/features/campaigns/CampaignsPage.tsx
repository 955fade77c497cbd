import { useQueries } from "@tanstack/react-query";
import { useMemo, useState } from "react";
import { useNavigate } from "react-router-dom";
import type { CampaignRow } from "../../../shared/schemas/campaign";
import type { CampaignSummaryAnswer } from "../../../shared/schemas/campaignSummary";
import { Button } from "../../components/Button";
import { PageHead } from "../../components/PageHead";
import { DataTable } from "../../components/DataTable";
import { ListPane } from "../../components/ListPane";
import { NoProject } from "../../components/NoProject";
import { tableCsv } from "../../components/tableModel";
import { Empty, Note } from "../../components/text";
import { campaignSummaryQuery, useCampaigns } from "../../lib/campaigns";
import { downloadText } from "../../lib/csv";
import { counted } from "../../lib/format";
import { useProject } from "../../lib/project";
import { useMay } from "../../lib/session";
import { usePageTitle } from "../../lib/title";
import { CampaignDetail } from "./CampaignDetail";
import { CreateCampaignDialog } from "./CreateCampaignDialog";
import { exportedStageColumns, stageColumns } from "./stageColumns";
import { stageRows, type StageRow } from "./stageRows";

const shelves = [
  { value: "false", label: "Current" },
  { value: "true", label: "Deleted" },
] as const;
type Shelf = (typeof shelves)[number]["value"];

/** The campaigns of one project, a line a stage: how many, what came out, inside and outside; beside them the one in hand. */
export default function CampaignsPage() {
  usePageTitle("Campaigns");
  const mayWrite = useMay("review");
  const { project, projects } = useProject();
  const navigate = useNavigate();
  const [deleted, setDeleted] = useState<Shelf>("false");
  const [filter, setFilter] = useState("");
  const [chosen, setChosen] = useState<string>();
  const [creating, setCreating] = useState(false);
  const [shown, setShown] = useState<readonly StageRow[]>([]);
  const campaigns = useCampaigns(project?.id, deleted);
  const summaries = useSummaries(campaigns.data);
  const rows = useMemo(() => stageRows(campaigns.data ?? [], summaries), [campaigns.data, summaries]);
  const selected = rows.find(({ key }) => key === chosen) ?? shown[0] ?? rows[0];
  const open = ({ id }: CampaignRow) => void navigate(`/campaigns/${id}`);
  const create = (primary: boolean) =>
    mayWrite &&
    project && (
      <Button kind={primary ? "primary" : "plain"} onClick={() => setCreating(true)}>
        New campaign
      </Button>
    );
  return (
    <>
      <PageHead
        title="Campaigns"
        about={
          <Note>
            {campaigns.data &&
              `${counted(campaigns.data.length, deleted === "true" ? "deleted campaign" : "campaign")} in this project`}
          </Note>
        }
      >
        <Button
          disabled={shown.length === 0}
          onClick={() => downloadText("gangueway-campaigns.csv", tableCsv(shown, exportedStageColumns))}
        >
          Export CSV
        </Button>
        {/* The list has a primary action of its own beside it: opening what is chosen. */}
        {create(false)}
      </PageHead>
      {projects?.length === 0 ? (
        <div className="px-5">
          <NoProject />
        </div>
      ) : (
        <div className="flex min-h-0 flex-1">
          <ListPane
            records="campaigns"
            sought="code, title, stage, metal"
            filter={filter}
            onFilter={setFilter}
            shelf={deleted}
            onShelf={setDeleted}
            shelves={shelves}
            query={campaigns}
            empty={
              deleted === "true" ? (
                <Empty title="Nothing deleted">A deleted campaign keeps its trials and can be restored.</Empty>
              ) : (
                <Empty title="No campaign yet" action={create(true)}>
                  A campaign tries one question on the ground: trials laid out on a revision of a plan, stage by stage.
                  {!mayWrite && " A metallurgist makes the first one."}
                </Empty>
              )
            }
          >
            <DataTable
              caption="Campaigns, a line a stage"
              rows={rows}
              columns={stageColumns}
              rowKey={({ key }) => key}
              filter={filter}
              initialSort={{ id: "campaign" }}
              selectedKey={selected?.key}
              onSelect={({ key }) => setChosen(key)}
              onOpen={({ campaign }) => open(campaign)}
              onShown={setShown}
              rowHeight={48}
              className="min-h-0 flex-1"
              empty={`No campaign matches “${filter}”.`}
            />
            <Note className="py-2">
              Mean over the trials that have the figure, range below it; rejected trials are left out. Reagent: acid, or
              cementing metal, consumed per kg of target. Inside and outside: by the plan revision of each campaign.
            </Note>
          </ListPane>
          {selected && (
            <CampaignDetail
              key={selected.campaign.id}
              campaign={selected.campaign}
              summary={summaries.get(selected.campaign.id) ?? null}
              others={campaigns.data ?? []}
            />
          )}
        </div>
      )}
      {project && (
        <CreateCampaignDialog open={creating} onOpenChange={setCreating} projectId={project.id} onCreated={open} />
      )}
    </>
  );
}

/** One function for good: another one at every drawing would make another map of the same answers. */
const byCampaign = (results: readonly { data: CampaignSummaryAnswer | undefined }[]) =>
  new Map(results.flatMap(({ data }) => (data ? [[data.campaign.id, data] as const] : [])));

/** The summaries that have come so far, by campaign. */
function useSummaries(campaigns: readonly CampaignRow[] | undefined) {
  const queries = useMemo(
    () => (campaigns ?? []).filter(({ deletedAt }) => deletedAt === null).map(({ id }) => campaignSummaryQuery(id)),
    [campaigns],
  );
  return useQueries({ queries, combine: byCampaign });
}
