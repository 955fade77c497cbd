import { useDeferredValue, useEffect, useMemo, useState } from "react";
import { MOST_TRIALS } from "../../../../shared/nextTrials/nextTrials";
import { cautionsFor, hazardContext } from "../../../../shared/hazards/rules";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Reach } from "../../../../shared/reach/reach";
import type { Point, Solution } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { namingOf } from "../../../../shared/windows/limitWords";
import { Button } from "../../../components/Button";
import { Check, Segmented } from "../../../components/choice";
import { ErrorNote, Loading } from "../../../components/status";
import { Note } from "../../../components/text";
import { whenOpened } from "../../../components/whenOpened";
import { counted, fixed } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";
import { useMay } from "../../../lib/session";
import type { ProposalStore } from "../../../map/proposalStore";
import { useTold } from "../../../map/trialStore";
import { windowName } from "../../../map/view";
import type { PlanTrials } from "../planTrials/usePlanTrials";
import {
  cautionsBeyond,
  type Proposal,
  moveTo,
  proposalsOf,
  reachSpan,
  reasonOf,
  setAside,
  sitesOf,
} from "./nextModel";
import { Planned, type MadeTrials } from "./Planned";
import type { PlanTheseProps } from "./PlanThese";
import { ProposalItem } from "./ProposalItem";

const PlanThese = whenOpened<PlanTheseProps>(() => import("./PlanThese"));

export interface NextListProps {
  store: ProposalStore;
  plan: { id: string; projectId: string; name: string };
  /** trials are laid out on it */
  revision: number;
  /** the map shows something else than that revision */
  unsaved: boolean;
  inputs: PlanInputs;
  solution: Solution;
  data: ChemicalData;
  /** index of the window in hand */
  chosen: number;
  trials: PlanTrials;
  scale: PotentialScale;
  /** of the chosen reagents */
  reaches: readonly Reach[];
  /** named for the plan's own cautions, by their code */
  procedures: Readonly<Record<string, string>>;
}

const counts = Array.from({ length: MOST_TRIALS }, (_, i) => ({ value: String(i + 1), label: String(i + 1) }));

const spanWords = ([lo, hi]: readonly [number, number], scale: PotentialScale): string =>
  hi === Infinity ? `${scale.format(lo)} and up` : `${scale.format(lo)} to ${scale.format(hi)}`;

/** The proposed conditions with their reasons; each can be moved or set aside; all become planned trials in one action. */
export default function NextList(props: NextListProps) {
  const { store, inputs, solution, data, chosen, trials, scale } = props;
  const mayPlan = useMay("writeBench");
  const told = useTold(store.asked);
  const [moving, setMoving] = useState<number | null>(null);
  const [planning, setPlanning] = useState(false);
  const [made, setMade] = useState<MadeTrials | null>(null);
  const window = solution.windows[chosen];
  const name = windowName(chosen);
  const naming = useMemo(() => namingOf(data, solution), [data, solution]);
  const sites = useMemo(() => sitesOf(trials.trials, inputs), [trials.trials, inputs]);
  // A drag of the plan moves at once; the gaps follow when there is time.
  const ground = useDeferredValue(
    useMemo(() => ({ window, band: inputs.controlBand, sites }), [window, inputs.controlBand, sites]),
  );
  const asked = told ?? { count: 1, kept: null, aside: [], withinReach: true };
  const span = useMemo(() => reachSpan(props.reaches), [props.reaches]);
  const found = useMemo(
    () => (told && ground.window ? proposalsOf(told, ground.window, ground.band, ground.sites, span) : null),
    [told, ground, span],
  );
  const ready = trials.answer !== undefined;
  const points = useMemo(() => (ready && found ? found.points : []), [ready, found]);

  useEffect(() => {
    store.marks.set(
      points.map(({ n, pH, Eh }) => ({
        n,
        pH,
        Eh,
        label: `Proposed trial ${n}, pH ${fixed(pH, 2)}, ${scale.format(Eh)}`,
      })),
    );
    store.mover.set((n, at) => {
      const now = store.asked.get();
      if (now) store.asked.set(moveTo(now, points, n, at));
    });
  }, [store, points, scale]);
  useEffect(
    () => () => {
      store.marks.set([]);
      store.mover.set(null);
    },
    [store],
  );

  if (trials.error !== null && !ready)
    return <ErrorNote doing="The trials could not be read" error={trials.error} retry={trials.retry} />;
  if (!window || !found) return <Note className="py-1.5">Without a window there is nothing to try.</Note>;
  if (!ready) return <Loading label="Reading the trials" />;
  const cautions = (p: Proposal) => cautionsBeyond(inputs, p, window.setPoint);
  const move = (n: number, at: Point) => store.asked.set(moveTo(asked, points, n, at));
  const counting = counted(sites.length, "trial");
  return (
    <>
      <div className="no-print flex flex-wrap items-center justify-between gap-2 py-1.5">
        <span>Trials</span>
        <Segmented
          label="How many"
          value={String(asked.count)}
          onChange={(count) => store.asked.set({ ...asked, count: Number(count) })}
          options={counts}
        />
      </div>
      <Note>
        {sites.length === 0 ? "No comparable trial counts yet." : `Away from ${counting} tried or planned`}
        {sites.length > 0 && (trials.scope === "plan" ? " on this plan." : " in the project.")}{" "}
        {found.along === "pH"
          ? `Eh is a mixed potential here: spread along pH at ${scale.format(window.setPoint.Eh)} ${scale.label.replace(/^\S+ /, "")}.`
          : `At least ${fixed(found.keepOff, 1)} control bands inside every limit, so that a loop holds them.`}{" "}
        Eh in {scale.label}.
      </Note>
      {span && found.along === "both" && (
        <Check checked={asked.withinReach} onChange={(withinReach) => store.asked.set({ ...asked, withinReach })}>
          <span className="text-sm">Only where the chosen reagents reach: {spanWords(span, scale)}</span>
        </Check>
      )}
      <ol aria-label="Proposed conditions" className="pt-1">
        {points.map((p) => (
          <ProposalItem
            key={p.n}
            proposal={p}
            cautions={cautions(p)}
            alike={(c) =>
              points.find((q) => q.n < p.n && cautions(q).some((other) => other.text === c.text))?.n ?? null
            }
            reason={reasonOf(p, { along: found.along, naming, window: name, tried: sites.length })}
            store={store}
            scale={scale}
            moving={moving === p.n}
            onMoving={(on) => setMoving(on ? p.n : null)}
            onMove={(at) => move(p.n, at)}
            onDrop={() => {
              setMoving(null);
              store.asked.set(setAside(asked, points, p.n));
            }}
            last={points.length === 1}
          />
        ))}
      </ol>
      {found.full && (
        <Note className="py-1">
          {points.length === 0 && span && asked.withinReach && found.along === "both"
            ? `Where the chosen reagents reach, nothing in window ${name} is left farther than one control band from what is tried or planned.`
            : points.length === 0
              ? `Every place in window ${name} lies within one control band of what is tried or planned: nothing is left to tell apart. Repeats of the set point would show the scatter.`
              : `No more than ${points.length}: every other place lies within one control band of one that is taken.`}
        </Note>
      )}
      {(asked.kept !== null || asked.aside.length > 0) && (
        <p className="no-print flex items-baseline justify-between gap-3 text-sm text-muted">
          <span>
            {[
              asked.kept !== null && "They stay where they are now",
              asked.aside.length > 0 && `${asked.aside.length} set aside`,
            ]
              .filter(Boolean)
              .join("; ")}
            .
          </span>
          <Button
            kind="quiet"
            className="h-auto!"
            onClick={() =>
              store.asked.set({
                ...asked,
                kept: null,
                aside: [],
                count: Math.min(MOST_TRIALS, asked.count + asked.aside.length),
              })
            }
          >
            propose anew
          </Button>
        </p>
      )}
      {made && <Planned made={made} onGone={() => setMade(null)} />}
      {points.length > 0 && mayPlan && (
        <div className="no-print pt-2">
          <Button onClick={() => setPlanning(true)}>
            {points.length === 1 ? "Plan this trial" : `Plan these ${points.length} trials`}
          </Button>
        </div>
      )}
      {points.length > 0 && !mayPlan && (
        <Note className="pt-1">Technicians and metallurgists turn them into planned trials.</Note>
      )}
      <PlanThese
        open={planning}
        onOpenChange={setPlanning}
        onMade={(next) => {
          setMade(next);
          setPlanning(false);
          store.asked.set({ ...asked, kept: null, aside: [] });
        }}
        proposals={points.map((p) => ({
          ...p,
          cautions: cautionsFor(hazardContext(inputs, p)),
          reason: reasonOf(p, { along: found.along, naming, window: name, tried: sites.length }),
        }))}
        window={chosen}
        {...props}
      />
    </>
  );
}
