import { lazy, Suspense } from "react";
import { Button } from "../../../components/Button";
import { Term } from "../../../components/Help";
import { Loading } from "../../../components/status";
import { Note, SectionHead } from "../../../components/text";
import { useTold } from "../../../map/trialStore";
import { windowName } from "../../../map/view";
import type { NextListProps } from "./NextList";

const load = () => import("./NextList");
const NextList = lazy(load);

const FIRST = { count: 4, kept: null, aside: [], withinReach: true } as const;

/** What to try next: closed until somebody asks, since it reads every trial and triangulates them. */
export function NextTrials(props: NextListProps) {
  const { store, chosen } = props;
  const asked = useTold(store.asked);
  const near = () => void load().catch(() => undefined);
  return (
    <section aria-label="Next trials" className="mt-5">
      <SectionHead
        aside={
          asked ? (
            <Button kind="quiet" className="no-print h-auto!" onClick={() => store.asked.set(null)}>
              hide
            </Button>
          ) : (
            <Term word="nextTrials">largest gaps</Term>
          )
        }
      >
        Next trials
      </SectionHead>
      {asked ? (
        <Suspense fallback={<Loading label="Looking for gaps" />}>
          <NextList {...props} />
        </Suspense>
      ) : (
        <div className="no-print flex items-center justify-between gap-3 py-1.5">
          <Note>Conditions in window {windowName(chosen)} that nothing tried comes near.</Note>
          <Button onClick={() => store.asked.set(FIRST)} onPointerEnter={near} onFocus={near}>
            Propose
          </Button>
        </div>
      )}
    </section>
  );
}
