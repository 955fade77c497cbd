import { Fragment } from "react";
import { Link } from "react-router-dom";
import type { PlanRow } from "../../shared/schemas/plan";
import { SpeciesName } from "./Formula";
import { Remark } from "./text";

/** The library changed under a saved plan: which species, and what the revision still stands on. */
export function DataChanged({ plan, className }: { plan: PlanRow; className?: string }) {
  if (!plan.dataOutdated) return null;
  const { changedSpecies: changed, latest } = plan;
  return (
    <Remark {...(className === undefined ? {} : { className })}>
      The chemistry changed since revision {latest.number}
      {changed.length > 0 && (
        <>
          :{" "}
          {changed.slice(0, 6).map((id, i) => (
            <Fragment key={id}>
              {i > 0 && ", "}
              <Link to={`/chemistry/${encodeURIComponent(id)}`}>
                <SpeciesName id={id} withPhase />
              </Link>
            </Fragment>
          ))}
          {changed.length > 6 && ` and ${changed.length - 6} more`}
        </>
      )}
      . The revision keeps the numbers it used:{" "}
      <Link to={`/plans/${plan.id}?revision=${latest.number}`}>open it as it was</Link>. Opened now, the plan is solved
      with today’s library; saving a revision takes it over.
    </Remark>
  );
}
