import { useParams, useSearchParams } from "react-router-dom";
import { ButtonLink } from "../../components/Button";
import { ErrorNote, Loading } from "../../components/status";
import { useChemistry } from "../../lib/chemistry";
import { ApiFailure } from "../../lib/failure";
import { usePlan, useRevisions } from "../../lib/plans";
import { usePageTitle } from "../../lib/title";
import { useOpened } from "./address/useOpened";
import { Workspace } from "./Workspace";

/** A plan, or with ?revision=n one of its saved states as it was, with the chemistry data it froze. */
export default function WorkspacePage() {
  const { planId = "" } = useParams();
  const [search] = useSearchParams();
  const number = search.get("revision");
  const plan = usePlan(planId, number === null);
  const revisions = useRevisions(planId, number !== null);
  const frozen = number === null ? null : revisions.data?.find((r) => String(r.number) === number);
  const current = useChemistry(undefined, number === null);
  const past = useChemistry(frozen?.dataVersion, frozen !== null && frozen !== undefined);
  const chemistry = number === null ? current : past;
  const of = `${planId} ${number ?? ""}`;
  const opened = useOpened(of, plan.data, frozen);
  usePageTitle(plan.data?.name);

  const wrong =
    // A look that failed while the plan stands open takes nothing from the table.
    (plan.data ? null : plan.error) ??
    (number === null ? null : revisions.error) ??
    chemistry.error ??
    (number !== null && revisions.data && !frozen ? new Error(`Revision ${number} does not exist.`) : null);
  // What is not there will not come by asking again.
  const gone = !(wrong instanceof ApiFailure) || wrong.status === 404;
  if (wrong) {
    return (
      <div className="p-5">
        <ErrorNote
          doing="The plan could not be opened"
          error={wrong}
          {...(gone
            ? {}
            : {
                retry: () => {
                  void plan.refetch();
                  if (number !== null) void revisions.refetch();
                  void chemistry.refetch();
                },
              })}
        />
        <div className="pt-3">
          <ButtonLink to={plan.data ? `/plans/${planId}` : "/plans"}>
            {plan.data ? "To the plan as it stands" : "To the plans"}
          </ButtonLink>
        </div>
      </div>
    );
  }
  if (!plan.data || !chemistry.data || frozen === undefined || !opened)
    return (
      <div className="px-5">
        <Loading label="Opening the plan" />
      </div>
    );
  return <Workspace key={of} plan={plan.data} frozen={frozen} data={chemistry.data} start={opened} />;
}
