import { useState } from "react";
import { useNavigate, useSearchParams } from "react-router-dom";
import type { PlanRow } from "../../../shared/schemas/plan";
import { Button } from "../../components/Button";
import { DataTable } from "../../components/DataTable";
import { ListPane } from "../../components/ListPane";
import { PageHead } from "../../components/PageHead";
import { ErrorNote, Status } from "../../components/status";
import { Empty, Note } from "../../components/text";
import { counted } from "../../lib/format";
import { usePlans, useUpdatePlan, type ArchivedFilter } from "../../lib/plans";
import { useProject } from "../../lib/project";
import { useMay } from "../../lib/session";
import { usePageTitle } from "../../lib/title";
import { CreatePlanDialog } from "./CreatePlanDialog";
import { planColumns } from "./planColumns";
import { PlanDetail } from "./PlanDetail";
import { CreateProjectDialog } from "./CreateProjectDialog";

const shelves = [
  { value: "false", label: "Current" },
  { value: "true", label: "Archived" },
] as const satisfies { value: ArchivedFilter; label: string }[];

/** The plans of one project, and beside them the one in hand. */
export default function PlansPage() {
  usePageTitle("Plans");
  const mayWrite = useMay("writePlans");
  const { project, projects } = useProject();
  const [archived, setArchived] = useState<ArchivedFilter>("false");
  const [filter, setFilter] = useState("");
  const [chosen, setChosen] = useState<string>();
  const [shelved, setShelved] = useState<PlanRow | null>(null);
  // A feed's screen leads here with the feed in hand.
  const [search, setSearch] = useSearchParams();
  const feedId = search.get("feed") ?? undefined;
  const [dialog, setDialog] = useState<"plan" | "project" | null>(feedId !== undefined && mayWrite ? "plan" : null);
  const plans = usePlans(project?.id, archived);
  const navigate = useNavigate();
  const selected = plans.data?.find((plan) => plan.id === chosen) ?? plans.data?.[0];
  function close(open: boolean) {
    if (open) return;
    setDialog(null);
    if (feedId !== undefined) setSearch({}, { replace: true });
  }

  return (
    <>
      <PageHead
        title="Plans"
        about={
          <Note>
            {project && plans.data
              ? `${counted(plans.data.length, archived === "true" ? "archived plan" : "plan")} in this project`
              : ""}
          </Note>
        }
      >
        {mayWrite && projects?.length !== 0 && (
          <>
            <Button onClick={() => setDialog("project")}>New project</Button>
            {project && <Button onClick={() => setDialog("plan")}>New plan</Button>}
          </>
        )}
      </PageHead>
      {projects?.length === 0 ? (
        <div className="px-5">
          <Empty
            title="No project yet"
            action={
              mayWrite && (
                <Button kind="primary" onClick={() => setDialog("project")}>
                  New project
                </Button>
              )
            }
          >
            A project is a circuit of a site. Its plans ask where each metal dissolves and where it stays solid.
            {!mayWrite && " A metallurgist makes the first one."}
          </Empty>
        </div>
      ) : (
        <div className="flex min-h-0 flex-1">
          <ListPane
            records="plans"
            sought="name, metal, lixiviant"
            filter={filter}
            onFilter={setFilter}
            shelf={archived}
            onShelf={(next) => {
              setArchived(next);
              setShelved(null);
            }}
            shelves={shelves}
            query={plans}
            said={shelved && <Shelved key={shelved.version} plan={shelved} onDone={() => setShelved(null)} />}
            empty={
              archived === "true" ? (
                <Empty title="Nothing archived">
                  An archived plan keeps its revisions and can be taken back at any time.
                </Empty>
              ) : (
                <Empty
                  title="No plan yet"
                  action={
                    mayWrite && (
                      <Button kind="primary" onClick={() => setDialog("plan")}>
                        New plan
                      </Button>
                    )
                  }
                >
                  A plan asks one question: at which pH and potential is every metal as it should be in this step? It
                  starts from a feed’s assays, or from a metal and a lixiviant.
                  {!mayWrite && " A metallurgist writes the first one."}
                </Empty>
              )
            }
          >
            <DataTable
              caption="Plans"
              rows={plans.data ?? []}
              columns={planColumns}
              rowKey={(plan) => plan.id}
              filter={filter}
              initialSort={{ id: "saved", desc: true }}
              selectedKey={selected?.id}
              onSelect={(plan) => setChosen(plan.id)}
              onOpen={(plan) => void navigate(`/plans/${plan.id}`)}
              muted={(plan) => plan.archived}
              rowHeight={48}
              className="min-h-0 flex-1 pb-4"
              empty={
                <>
                  No plan matches “{filter}”.{" "}
                  <Button kind="quiet" onClick={() => setFilter("")}>
                    Clear the filter
                  </Button>
                </>
              }
            />
          </ListPane>
          {selected && (
            <PlanDetail
              key={selected.id}
              plan={selected}
              onCopied={(plan) => setChosen(plan.id)}
              onShelved={setShelved}
            />
          )}
        </div>
      )}
      <CreateProjectDialog open={dialog === "project"} onOpenChange={close} />
      {project && projects && (
        <CreatePlanDialog
          open={dialog === "plan"}
          onOpenChange={close}
          projects={projects}
          projectId={project.id}
          feedId={feedId}
        />
      )}
    </>
  );
}

/** What was just done to a plan that has left the list, and the way back. */
function Shelved({ plan, onDone }: { plan: PlanRow; onDone: () => void }) {
  const update = useUpdatePlan();
  const undo = () =>
    update.mutate({ id: plan.id, version: plan.version, archived: !plan.archived }, { onSuccess: onDone });
  return (
    <div className="hairline flex flex-wrap items-baseline gap-x-4 pb-1">
      <Status>
        {plan.name} {plan.archived ? "is archived." : "stands among the current plans again."}
      </Status>
      <Button kind="quiet" className="h-auto!" disabled={update.isPending} onClick={undo}>
        Undo
      </Button>
      {update.error && <ErrorNote error={update.error} />}
    </div>
  );
}
