import { useNavigate } from "react-router-dom";
import { useCreatePlan } from "../../lib/plans";
import { selectProject } from "../../lib/project";

/** Writes a plan and goes to it; the error stays beside the form, which keeps what was entered. */
export function useCreateAndOpen(done: () => void) {
  const navigate = useNavigate();
  const create = useCreatePlan();
  return {
    error: create.error,
    busy: create.isPending,
    start: (body: Parameters<typeof create.mutate>[0]) =>
      create.mutate(body, {
        onSuccess: (plan) => {
          selectProject(plan.projectId);
          done();
          void navigate(`/plans/${plan.id}`);
        },
      }),
  };
}
