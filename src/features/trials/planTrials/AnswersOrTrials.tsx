import { lazy, Suspense, type ReactNode } from "react";
import { Tabs } from "../../../components/choice";
import { Loading } from "../../../components/status";
import type { PotentialScale } from "../../../lib/potential";
import { Tried } from "./Tried";
import type { PlanTrials } from "./usePlanTrials";

// The table comes in with the first look at it.
const TrialsPanel = lazy(async () => ({ default: (await import("./TrialsPanel")).TrialsPanel }));

/** The right side of a plan: what it answers, and what was tried on it. */
export function AnswersOrTrials({
  trials,
  scale,
  next,
  shown,
  onShow,
  children,
}: {
  /** null while the layer is off */
  trials: PlanTrials | null;
  scale: PotentialScale;
  /** what to try next; stands below either */
  next: ReactNode;
  shown: "answers" | "trials";
  onShow: (side: "answers" | "trials") => void;
  children: ReactNode;
}) {
  if (trials === null)
    return (
      <>
        {children}
        {next}
      </>
    );
  const count = trials.trials.length;
  return (
    <Tabs
      label="Answers and trials"
      className="-mt-1 print:contents"
      value={shown}
      onChange={onShow}
      panels={[
        {
          value: "answers",
          label: "Answers",
          content: (
            <>
              {children}
              <Tried trials={trials} onTable={() => onShow("trials")} />
              {next}
            </>
          ),
        },
        {
          value: "trials",
          label: count > 0 ? `Trials, ${count}` : "Trials",
          content: (
            <Suspense fallback={<Loading label="Opening the trials" />}>
              <TrialsPanel trials={trials} scale={scale} />
              {next}
            </Suspense>
          ),
        },
      ]}
    />
  );
}
