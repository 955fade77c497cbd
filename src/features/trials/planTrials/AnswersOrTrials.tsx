import { useState, type ReactNode } from "react";
import { Tabs } from "../../../components/choice";
import type { PotentialScale } from "../../../lib/potential";
import { Tried } from "./Tried";
import { TrialsPanel } from "./TrialsPanel";
import type { PlanTrials } from "./usePlanTrials";

/** The right side of a plan: what it answers, and what was tried on it. */
export function AnswersOrTrials({
  trials,
  scale,
  children,
}: {
  /** null while the layer is off */
  trials: PlanTrials | null;
  scale: PotentialScale;
  children: ReactNode;
}) {
  const [shown, setShown] = useState<"answers" | "trials">("answers");
  if (trials === null) return <>{children}</>;
  const count = trials.trials.length;
  return (
    <Tabs
      label="Answers and trials"
      className="-mt-1 print:contents"
      value={shown}
      onChange={setShown}
      panels={[
        {
          value: "answers",
          label: "Answers",
          content: (
            <>
              {children}
              <Tried trials={trials} onTable={() => setShown("trials")} />
            </>
          ),
        },
        {
          value: "trials",
          label: count > 0 ? `Trials, ${count}` : "Trials",
          content: <TrialsPanel trials={trials} scale={scale} />,
        },
      ]}
    />
  );
}
