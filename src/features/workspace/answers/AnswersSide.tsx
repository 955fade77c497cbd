import { lazy, Suspense } from "react";
import { Loading } from "../../../components/status";
import type { PotentialScale } from "../../../lib/potential";
import type { LimitStore } from "../../../map/limitStore";
import type { ProposalStore } from "../../../map/proposalStore";
import { NextTrials } from "../../trials/nextTrials/NextTrials";
import { AnswersOrTrials } from "../../trials/planTrials/AnswersOrTrials";
import type { PlanTrials } from "../../trials/planTrials/usePlanTrials";
import { applyOpening, holdSetPoint } from "../model/adviceEdit";
import type { Answers } from "../model/useAnswers";
import type { useLook } from "../model/useLook";
import type { MapModel } from "../model/useMapModel";
import type { Table } from "../model/useTable";
import { AnswersPanel } from "./AnswersPanel";
import { ChooseReagents } from "./ChooseReagents";

const DataChanged = lazy(async () => ({ default: (await import("../../../components/DataChanged")).DataChanged }));
const NotSolved = lazy(() => import("../asks/NotSolved"));
const CommentsPanel = lazy(() => import("../comments/CommentsPanel"));

/** The right side: the comments while they are open, else what the plan answers and what was tried on it. */
export function AnswersSide({
  table,
  answers,
  look,
  map,
  trials,
  scale,
  limitStore,
  proposals,
  onCloseComments,
}: {
  table: Table;
  answers: Answers;
  look: ReturnType<typeof useLook>;
  map: MapModel | null;
  trials: PlanTrials;
  scale: PotentialScale;
  limitStore: LimitStore;
  proposals: ProposalStore;
  onCloseComments: () => void;
}) {
  const { plan, frozen, data, draft, inputs, fixed } = table;
  const { solution, chosen, failure, window } = answers;
  const { edit, procedures } = draft;
  const revision = frozen?.number ?? null;
  if (look.view.comments)
    return (
      <Suspense fallback={<Loading label="Opening the comments" />}>
        <CommentsPanel
          {...{ plan, solution, data, chosen, scale, revision }}
          through={map?.through ?? null}
          onShow={look.setPinned}
          onClose={onCloseComments}
        />
      </Suspense>
    );
  return (
    <AnswersOrTrials
      trials={look.map.layers.trials ? trials : null}
      scale={scale}
      next={
        solution &&
        window && (
          <NextTrials
            store={proposals}
            plan={plan}
            revision={revision ?? draft.basedOn}
            unsaved={frozen === null && draft.changed}
            {...{ inputs, solution, data, chosen, trials, scale, procedures }}
            reaches={map?.reaches ?? []}
          />
        )
      }
      shown={look.view.side}
      onShow={look.setSide}
    >
      {frozen === null && plan.dataOutdated && (
        <Suspense fallback={null}>
          <DataChanged plan={plan} className="mb-3" />
        </Suspense>
      )}
      {failure && (
        <Suspense fallback={null}>
          <NotSolved />
        </Suspense>
      )}
      {solution && map && (
        <AnswersPanel
          {...answers}
          {...{ inputs, solution, data, scale, limitStore, procedures }}
          onChoose={answers.choose}
          reaches={map.reaches}
          pH={map.through[0]}
          chooseReagents={<ChooseReagents preset={inputs.preset} value={look.reagents} onChange={look.choose} />}
          onProcedure={draft.nameProcedure}
          onApply={fixed ? undefined : (opening) => edit(applyOpening(opening))}
          onInputs={fixed ? undefined : edit}
          onLetGo={fixed ? undefined : () => edit(holdSetPoint(null))}
        />
      )}
    </AnswersOrTrials>
  );
}
