import { useMemo, useState } from "react";
import { Link, useNavigate } from "react-router-dom";
import type { CampaignRow } from "../../../shared/schemas/campaign";
import { trialStatuses } from "../../../shared/schemas/trial";
import { Button, ButtonLink } from "../../components/Button";
import { Segmented } from "../../components/choice";
import { DataTable } from "../../components/DataTable";
import { Pager } from "../../components/Pager";
import { SearchField } from "../../components/SearchField";
import { Select } from "../../components/Select";
import { ErrorNote, Loading } from "../../components/status";
import { Empty, Note } from "../../components/text";
import { useFeeds } from "../../lib/feeds";
import { usePotentialScale } from "../../lib/potential";
import { useMay } from "../../lib/session";
import { useTrials } from "../../lib/trials";
import { trialColumns } from "./trialColumns";
import type { useTrialList } from "./useTrialList";

/** Trials of a campaign, sorted, filtered and paged by the server; arrow keys walk them, Enter opens one. */
export function TrialsTable({ campaign, list }: { campaign: CampaignRow; list: ReturnType<typeof useTrialList> }) {
  const navigate = useNavigate();
  const mayRecord = useMay("writeBench");
  const scale = usePotentialScale();
  const { query, asked, sort, offset, limit, put, filtered } = list;
  const trials = useTrials(query);
  const feeds = useFeeds(campaign.projectId).data ?? [];
  const [chosen, setChosen] = useState<string>();
  const all = (label: string) => ({ value: "all", label });
  const page = trials.data;
  const rows = page?.rows;
  const columns = useMemo(() => {
    const kinds = new Set((rows ?? []).map(({ kind }) => kind));
    const several = new Set((rows ?? []).map(({ feedId }) => feedId)).size > 1;
    return trialColumns(scale, { feeds: several, leach: kinds.has("leach"), cementation: kinds.has("cementation") });
  }, [scale, rows]);
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-3 gap-y-2 pb-2">
        <SearchField
          label="Find a trial"
          placeholder="code, operator, note"
          className="w-48!"
          value={asked.find}
          onChange={(find) => put({ find })}
        />
        {campaign.stages.length > 1 && (
          <Select
            label="Stage"
            layout="bare"
            value={asked.stage}
            onChange={(stage) => put({ stage })}
            options={[
              all("every stage"),
              ...campaign.stages.map((s) => ({ value: s.code, label: `${s.code}, ${s.name}` })),
            ]}
          />
        )}
        <Select
          label="Status"
          layout="bare"
          value={asked.status}
          onChange={(status) => put({ status })}
          options={[all("any status"), ...trialStatuses.map((value) => ({ value, label: value }))]}
        />
        {feeds.length > 1 && (
          <Select
            label="Feed"
            layout="bare"
            value={asked.feed}
            onChange={(feed) => put({ feed })}
            options={[all("any feed"), ...feeds.map(({ id, name }) => ({ value: id, label: name }))]}
          />
        )}
        <Segmented
          label="Which trials"
          value={asked.deleted}
          onChange={(deleted) => put({ deleted })}
          options={[
            { value: "false", label: "Current" },
            { value: "true", label: "Deleted" },
          ]}
        />
        <Note className="ml-auto">{page && `${page.total} ${page.total === 1 ? "trial" : "trials"}`}</Note>
      </div>
      {trials.error ? (
        <ErrorNote doing="The trials could not be read" error={trials.error} retry={() => void trials.refetch()} />
      ) : !page ? (
        <Loading label="Reading the trials" />
      ) : page.total === 0 && !filtered ? (
        asked.deleted === "true" ? (
          <Empty title="Nothing deleted">A deleted trial keeps its record and can be restored from its page.</Empty>
        ) : (
          <Empty
            title="No trial yet"
            action={
              mayRecord &&
              campaign.deletedAt === null && (
                <ButtonLink kind="primary" to={`/trials/plan?campaign=${campaign.id}`}>
                  Plan a trial
                </ButtonLink>
              )
            }
          >
            A trial is one vessel: what was planned, what was read, what came out. Its account says how far to trust it.
          </Empty>
        )
      ) : (
        <>
          <DataTable
            caption={`Trials of campaign ${campaign.code}`}
            rows={page.rows}
            columns={columns}
            rowKey={({ id }) => id}
            sorted={{
              by: sort,
              onSort: ({ id, desc }) => put({ sort: id === "code" ? "" : id, order: desc ? "desc" : "" }),
            }}
            selectedKey={chosen}
            onSelect={({ id }) => setChosen(id)}
            onOpen={({ id }) => void navigate(`/trials/${id}`)}
            muted={({ status }) => status === "rejected"}
            className="min-h-0 flex-1"
            empty={
              <>
                No trial is like that.{" "}
                <Button kind="quiet" onClick={() => put({ find: "", stage: "", status: "", feed: "" })}>
                  Show all
                </Button>
              </>
            }
          />
          <Pager
            what="trials"
            total={page.total}
            limit={limit}
            offset={offset}
            onOffset={(from) => put({ from: String(from) }, true)}
          />
          <Note className="py-2">
            {page.rows.some(({ figures }) => figures.pHCooled) && "* pH of a cooled sample, not corrected. "}
            Recovery on the calculated head where it could be worked out. Enter or double click opens a trial;{" "}
            {chosen !== undefined && <Link to={`/trials/${chosen}`}>open the one in hand</Link>}
            {chosen === undefined && "arrow keys walk them"}.
          </Note>
        </>
      )}
    </>
  );
}
