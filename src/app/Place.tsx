import { useLocation, useMatch, useNavigate } from "react-router-dom";
import { Menu, MenuChoice } from "../components/Menu";
import { usePlan } from "../lib/plans";
import { selectProject, useProject } from "../lib/project";

const lists = ["/bench", "/campaigns", "/feeds"];

/** Site and project: of the plan on the screen, else of the plans list. A menu where there is a choice. */
export function Place() {
  const planId = useMatch("/plans/:planId/*")?.params.planId;
  const { data: plan } = usePlan(planId);
  const { project, projects } = useProject();
  const navigate = useNavigate();
  const { pathname } = useLocation();
  const site = planId ? plan?.siteName : project?.siteName;
  const name = planId ? plan?.projectName : project?.name;
  const id = planId ? plan?.projectId : project?.id;
  if (!site || !name || !id) return null;
  const text = `${site} / ${name}`;
  const look = "flex min-w-0 items-center text-muted";
  const shown = <span className="truncate">{text}</span>;
  if (!projects || projects.length < 2) return <span className={look}>{shown}</span>;
  return (
    <Menu
      align="start"
      trigger={
        <button type="button" className={`${look} hover:text-ink`} title="Change project">
          {shown}
        </button>
      }
    >
      <MenuChoice
        value={id}
        onChange={(next) => {
          selectProject(next);
          // A plan, a feed, a trial belong to one project; the list they stand in is there in every one.
          void navigate(lists.find((list) => pathname.startsWith(list)) ?? "/plans");
        }}
        options={projects.map((p) => ({ value: p.id, label: `${p.siteName} / ${p.name}` }))}
      />
    </Menu>
  );
}
