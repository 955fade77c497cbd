import { useMatch, useNavigate } from "react-router-dom";
import { Menu, MenuChoice } from "../components/Menu";
import { usePlan } from "../lib/plans";
import { selectProject, useProject } from "../lib/project";

/** Site and project: of the plan on the screen, else of the plans list. A menu where there is a choice. */
export function Place() {
  const planId = useMatch("/plans/:planId/*")?.params.planId;
  const { data: plan } = usePlan(planId);
  const { project, projects } = useProject();
  const navigate = useNavigate();
  const site = planId ? plan?.siteName : project?.siteName;
  const name = planId ? plan?.projectName : project?.name;
  const id = planId ? plan?.projectId : project?.id;
  if (!site || !name || !id) return null;
  const text = `${site} / ${name}`;
  const look = "flex min-w-0 items-center truncate text-muted";
  if (!projects || projects.length < 2) return <span className={look}>{text}</span>;
  return (
    <Menu
      align="start"
      trigger={
        <button type="button" className={`${look} hover:text-ink`} title="Change project">
          {text}
        </button>
      }
    >
      <MenuChoice
        value={id}
        onChange={(next) => {
          selectProject(next);
          void navigate("/plans");
        }}
        options={projects.map((p) => ({ value: p.id, label: `${p.siteName} / ${p.name}` }))}
      />
    </Menu>
  );
}
