import type { CampaignSummaryAnswer } from "../../../shared/schemas/campaignSummary";
import type { StageSummary } from "../../../shared/trials/summary";
import { Note, Remark, SectionHead } from "../../components/text";
import { counted } from "../../lib/format";
import { countWords, tallySentence } from "../../lib/tallyWords";

/** Stage by stage, in words: what the trials gave inside and outside, and what is counted apart. */
export function CampaignVerdict({ summary }: { summary: CampaignSummaryAnswer }) {
  return (
    <>
      {summary.stages.map((stage) => (
        <StageVerdict key={stage.stage.code} stage={stage} judged={summary.plan.failure === null} />
      ))}
      <Note className="pt-3">
        No significance is claimed: windows were not drawn at random, and trials were not blocked.
      </Note>
    </>
  );
}

function StageVerdict({ stage, judged }: { stage: StageSummary; judged: boolean }) {
  const { places } = stage;
  const rest = (["off the map", "not placed", "rejected"] as const).filter((count) => places[count].n > 0);
  return (
    <>
      <SectionHead className="mt-5" aside={`n ${stage.n}`}>
        {stage.stage.code}, {stage.stage.name}
      </SectionHead>
      {stage.n === 0 ? (
        <Note className="pt-1">No trial yet.</Note>
      ) : judged ? (
        <>
          {places.inside.n > 0 && <p className="pt-1">{tallySentence(places, "inside", stage.stage)}</p>}
          {places.outside.n > 0 && <p className="pt-1">{tallySentence(places, "outside", stage.stage)}</p>}
          {places.apart.n > 0 && (
            <p className="pt-1 text-muted">{tallySentence(places, "apart", stage.stage)} Drawn open, counted apart.</p>
          )}
        </>
      ) : (
        <Note className="pt-1">The plan revision cannot be solved: nothing is judged.</Note>
      )}
      {rest.length > 0 && (
        <Note className="pt-1">
          {rest.map((count) => `${places[count].n} ${countWords[count]}`).join(", ")}
          {places.rejected.n > 0 && "; rejected ones enter no figure"}.
        </Note>
      )}
      {stage.open > 0 && (
        <Remark className="mt-2">
          {counted(stage.open, "account")} outside 95 to 105&#8239;%: read those recoveries with their own page open.
        </Remark>
      )}
    </>
  );
}
