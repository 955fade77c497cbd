import { useState } from "react";
import { useNavigate } from "react-router-dom";
import type { FeedRow } from "../../../shared/schemas/feed";
import { Button } from "../../components/Button";
import { PageHead } from "../../components/PageHead";
import { DataTable } from "../../components/DataTable";
import { ListPane } from "../../components/ListPane";
import { NoProject } from "../../components/NoProject";
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
      <PageHead
        title="Feeds"
        about={
          <Note>
            {feeds.data &&
              `${counted(feeds.data.length, deleted === "true" ? "deleted feed" : "feed")} in this project`}
          </Note>
        }
      >
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
            records="feeds"
            sought="name, element"
            filter={filter}
            onFilter={setFilter}
            shelf={deleted}
            onShelf={setDeleted}
            shelves={shelves}
            query={feeds}
            empty={
              deleted === "true" ? (
                <Empty title="Nothing deleted">A deleted feed keeps its assays and can be restored.</Empty>
              ) : (
                <Empty title="No feed yet" action={create(true)}>
                  A feed is what is leached: its head assays, which of them counts, and the minerals that hold each
                  metal. Every account starts from it.{!mayWrite && " A metallurgist enters the first one."}
                </Empty>
              )
            }
          >
            <DataTable
              caption="Feeds"
              rows={feeds.data ?? []}
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
          </ListPane>
          {selected && <FeedDetail key={selected.id} feed={selected} onOpen={() => open(selected)} />}
        </div>
      )}
      {project && (
        <CreateFeedDialog open={creating} onOpenChange={setCreating} projectId={project.id} onCreated={open} />
      )}
    </>
  );
}
