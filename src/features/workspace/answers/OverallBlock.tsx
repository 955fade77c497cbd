import { lazy, Suspense } from "react";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Problem } from "../../../../shared/schemas/problem";
import type { Solution, Window } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { Loading } from "../../../components/status";
import { MethodLink } from "../../../components/SourceLink";
import { Term } from "../../../components/Help";
import { SectionHead } from "../../../components/text";
import { Fold } from "../asks/Fold";
import type { Edit } from "../model/edit";

const OverallList = lazy(() => import("./OverallList"));

/** The balanced overall reactions at the set point, worked out when somebody looks. */
export function OverallBlock({
  window,
  ...rest
}: {
  problem: Problem;
  inputs: PlanInputs;
  solution: Solution;
  window: Window;
  data: ChemicalData;
  /** absent where the plan is only looked at */
  onInputs?: ((edit: Edit) => void) | undefined;
}) {
  const { inputs } = rest;
  const feed = inputs.feedMinerals.length;
  return (
    <section aria-label="Overall reactions" className="mt-4">
      <SectionHead aside={<MethodLink to="overall" />}>
        <Term word="overallReaction">Overall reactions</Term>
      </SectionHead>
      <Fold
        className="pt-1"
        title={
          feed === 0
            ? "From the plan’s metals"
            : `From ${feed === 1 ? "the feed mineral" : `${feed} feed minerals`} and the metals`
        }
      >
        <Suspense fallback={<Loading label="Balancing" />}>
          <OverallList {...rest} setPoint={window.setPoint} />
        </Suspense>
      </Fold>
    </section>
  );
}
