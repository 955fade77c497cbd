import { useState } from "react";
import { useNavigate } from "react-router-dom";
import type { FeedRow } from "../../../shared/schemas/feed";
import { Button } from "../../components/Button";
import { Segmented } from "../../components/choice";
import { DataTable } from "../../components/DataTable";
import { SearchField } from "../../components/SearchField";
import { NoProject } from "../../components/NoProject";
import { ErrorNote, Loading } from "../../components/status";
import { Empty, Note } from "../../components/text";
import { useFeeds, type DeletedFilter } from "../../lib/feeds";
import { counted } from "../../lib/format";
import { useProject } from "../../lib/project";
import { useMay } from "../../lib/session";
import { usePageTitle } from "../../lib/title";
import { CreateFeedDialog } from "./CreateFeedDialog";
import { feedColumns } from "./feedColumns";
import { FeedDetail } from "./FeedDetail";

const shelves = [
  { value: "false", label: "Current" },
  { value: "true", label: "Deleted" },
] as const satisfies { value: DeletedFilter; label: string }[];

/** The feeds of one project, and beside them the one in hand. */
export default function FeedsPage() {
  usePageTitle("Feeds");
  const mayWrite = useMay("review");
  const { project, projects } = useProject();
  const navigate = useNavigate();
  const [deleted, setDeleted] = useState<DeletedFilter>("false");
  const [filter, setFilter] = useState("");
  const [chosen, setChosen] = useState<string>();
  const [creating, setCreating] = useState(false);
  const feeds = useFeeds(project?.id, deleted);
  const selected = feeds.data?.find(({ id }) => id === chosen) ?? feeds.data?.[0];
  const open = (feed: FeedRow) => void navigate(`/feeds/${feed.id}`);
  const create = (primary: boolean) =>
    mayWrite &&
    project && (
      <Button kind={primary ? "primary" : "plain"} onClick={() => setCreating(true)}>
        New feed
      </Button>
    );
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2 border-b border-rule px-5 py-2">
        <h1 className="text-lg">Feeds</h1>
        <Note>
          {feeds.data && `${counted(feeds.data.length, deleted === "true" ? "deleted feed" : "feed")} in this project`}
        </Note>
        <span className="flex-1" />
        {/* The list has a primary action of its own beside it: opening what is chosen. */}
        {create(false)}
      </div>
      {projects?.length === 0 ? (
        <div className="px-5">
          <NoProject />
        </div>
      ) : (
        <div className="flex min-h-0 flex-1">
          <section aria-label="Feeds of the project" className="flex min-w-0 flex-1 flex-col px-5 pt-3">
            <div className="flex flex-wrap items-center gap-4 pb-2">
              <SearchField label="Filter feeds" placeholder="name, element" value={filter} onChange={setFilter} />
              <Segmented label="Which feeds" value={deleted} onChange={setDeleted} options={shelves} />
            </div>
            {feeds.error ? (
              <ErrorNote doing="The feeds could not be read" error={feeds.error} retry={() => void feeds.refetch()} />
            ) : !feeds.data ? (
              <Loading label="Reading the feeds" />
            ) : feeds.data.length === 0 ? (
              deleted === "true" ? (
                <Empty title="Nothing deleted">A deleted feed keeps its assays and can be restored.</Empty>
              ) : (
                <Empty title="No feed yet" action={create(true)}>
                  A feed is what is leached: its head assays, which of them counts, and the minerals that hold each
                  metal. Every account starts from it.{!mayWrite && " A metallurgist enters the first one."}
                </Empty>
              )
            ) : (
              <DataTable
                caption="Feeds"
                rows={feeds.data}
                columns={feedColumns}
                rowKey={({ id }) => id}
                filter={filter}
                initialSort={{ id: "name" }}
                selectedKey={selected?.id}
                onSelect={({ id }) => setChosen(id)}
                onOpen={open}
                rowHeight={48}
                className="min-h-0 flex-1 pb-4"
                empty={`No feed matches “${filter}”.`}
              />
            )}
          </section>
          {selected && <FeedDetail key={selected.id} feed={selected} onOpen={() => open(selected)} />}
        </div>
      )}
      {project && (
        <CreateFeedDialog open={creating} onOpenChange={setCreating} projectId={project.id} onCreated={open} />
      )}
    </>
  );
}
