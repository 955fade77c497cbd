import { useMemo } from "react";
import { Note, SectionHead } from "../../../components/text";
import { countWords, tallySentence } from "../../../lib/tallyWords";
import { Button } from "../../../components/Button";
import { stageTallies } from "./planTrialsModel";
import type { PlanTrials } from "./usePlanTrials";

/** What was tried, in words: recovery and gangue dissolved, inside and outside of what the map shows. */
export function Tried({ trials: { answer, trials }, onTable }: { trials: PlanTrials; onTable?: () => void }) {
  const stages = useMemo(() => stageTallies(trials), [trials]);
  if (!answer || answer.rows.length === 0) return null;
  return (
    <section aria-label="Tried" className="mt-5">
      <SectionHead
        aside={
          onTable && (
            <Button kind="quiet" className="no-print h-auto!" onClick={onTable}>
              table of {trials.length}
            </Button>
          )
        }
      >
        Tried
      </SectionHead>
      {stages.map(({ code, target, gangue, tally }) => {
        const rest = (["off the map", "not placed", "rejected"] as const).filter((count) => tally[count].n > 0);
        return (
          <div key={`${code} ${target}`} className="hairline py-1">
            <p>
              <b className="font-mono">{code}</b>{" "}
              {(["inside", "outside"] as const)
                .filter((count) => tally[count].n > 0)
                .map((count) => tallySentence(tally, count, { target, gangue }))
                .join(" ") || "None judged."}
            </p>
            {tally.apart.n > 0 && (
              <p className="text-muted">{tallySentence(tally, "apart", { target, gangue })} Drawn open.</p>
            )}
            {rest.length > 0 && (
              <Note>{rest.map((count) => `${tally[count].n} ${countWords[count]}`).join(", ")}.</Note>
            )}
          </div>
        );
      })}
      <Note className="pt-1">Judged against what the map shows now. No significance is claimed.</Note>
    </section>
  );
}
