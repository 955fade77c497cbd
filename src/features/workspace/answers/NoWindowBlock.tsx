import { Fragment } from "react";
import { gapSentence, wayWords, type Way } from "../../../../shared/advice/gapWords";
import type { Advice, ConflictGap, Opening } from "../../../../shared/advice/openings";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import { keptWords, pressureWords } from "../../../../shared/hazards/words";
import { type Demand, demandName, type Solution } from "../../../../shared/solution";
import { tenorText } from "../../../../shared/words/tenor";
import { Button } from "../../../components/Button";
import { Formula } from "../../../components/Formula";
import { MethodLink } from "../../../components/SourceLink";
import { FormulaText } from "../../../components/FormulaText";
import { Note, SectionHead } from "../../../components/text";
import { celsius, fixed, significant, withUnit } from "../../../lib/format";
import { requirementWord } from "../../../lib/planWords";
import { mVWords, pHWords } from "../model/distances";
import type { Awaited } from "../model/useAsked";
import { Stopped, Working } from "./Working";

type Conflict = readonly Demand[];

export interface NoWindowProps {
  solution: Pick<Solution, "conflicts">;
  inputs: Pick<PlanInputs, "metals">;
  metalName: (element: string) => string;
  advice: Awaited<Advice>;
  /** absent where the plan is only looked at */
  onApply?: (opening: Opening) => void;
}

/** No window: which requirements cannot hold together, how far apart they stand, and the smallest change that opens one. */
export function NoWindowBlock({ solution, inputs, metalName, advice, onApply }: NoWindowProps) {
  const gaps = advice.state === "there" ? advice.value.gaps : [];
  return (
    <section aria-label="No window">
      <SectionHead aside={<MethodLink to="noWindow" />}>No window is open</SectionHead>
      {solution.conflicts.length === 0 ? (
        <p className="py-1">The frame and the water lines leave no ground where all metals are as required.</p>
      ) : (
        <ul>
          {solution.conflicts.map((set) => {
            const key = set.map(demandName).join();
            const gap = gaps.find((g) => g.members.join() === key);
            return (
              <li key={key} className="hairline py-1">
                <ConflictWords set={set} metalName={metalName} />
                {gap && <GapWords gap={gap} set={set} metalName={metalName} />}
              </li>
            );
          })}
        </ul>
      )}
      <div className="mt-4">
        <SectionHead aside={<MethodLink to="opens" />}>What would open one</SectionHead>
        {advice.state === "waiting" && (
          <Working
            awaited={advice}
            doing="Looking for the smallest change of each number that opens a window"
            words={({ done, total }) => `step ${done} of ${total} at most`}
          />
        )}
        {advice.state === "stopped" && <Stopped again={advice.again}>The search was stopped.</Stopped>}
        {advice.state === "failed" && (
          <p role="alert" className="py-1 text-sm">
            The search failed: {advice.message}. Move a number and watch the map.
          </p>
        )}
        {advice.state === "there" && (
          <Openings openings={advice.value.openings} inputs={inputs} metalName={metalName} onApply={onApply} />
        )}
      </div>
    </section>
  );
}

function ConflictWords({ set, metalName }: { set: Conflict; metalName: (element: string) => string }) {
  const [only] = set;
  if (set.length === 1 && only)
    return (
      <>
        Nowhere on this map is{" "}
        {only.gas === undefined ? <DemandWords demand={only} metalName={metalName} /> : <KeptWords demand={only} />}.
      </>
    );
  return (
    <>
      {set.map((c, i) => (
        <Fragment key={demandName(c)}>
          {i > 0 && (i === set.length - 1 ? " and " : ", ")}
          <DemandWords demand={c} metalName={metalName} />
        </Fragment>
      ))}{" "}
      cannot hold together.
    </>
  );
}

/** "zinc dissolved", or for a hazard "HCN below 50 ppm over the liquor". */
function DemandWords({ demand, metalName }: { demand: Demand; metalName: (element: string) => string }) {
  if (demand.gas !== undefined) return <KeptWords demand={demand} />;
  return (
    <>
      <b>{metalName(demand.metal)}</b> {requirementWord[demand.requirement]}
    </>
  );
}

const KeptWords = ({ demand }: { demand: Extract<Demand, { metal?: undefined }> }) => (
  <b>
    <FormulaText text={keptWords(demand)} />
  </b>
);

const where: Readonly<Record<Exclude<ConflictGap["across"], "members">, string>> = {
  water: "It would be beyond the water lines",
  frame: "It would be beyond this map",
  "frame and water": "It would be beyond this map and the water lines",
};

/** "Their grounds lie 0.62 pH apart at one Eh, and 0.21 V apart at one pH." */
function GapWords({
  gap: { gap, members, across, nearest },
  set,
  metalName,
}: {
  gap: ConflictGap;
  set: Conflict;
  metalName: (element: string) => string;
}) {
  const many = members.length > 2;
  const together = many && <>Any two of them can; it is the {members.length} together that leave no ground. </>;
  if (gap === null)
    return members.length === 1 ? <Note>Nor is it anywhere within the widest map.</Note> : <Note>{together}</Note>;
  const pH: Way | null = gap.pH === null ? null : [pHWords(gap.pH), "at one Eh"];
  const Eh: Way | null = gap.Eh === null ? null : [mVWords(gap.Eh), "at one pH"];
  const parts = [pH, Eh].filter((part) => part !== null);
  const sentence =
    across === "members"
      ? parts.length === 0
        ? "Their grounds share neither a pH nor an Eh."
        : gapSentence(set, nearest, parts, metalName)
      : parts.length === 0
        ? `${where[across]}, at another pH and another Eh.`
        : `${where[across]}, ${wayWords(parts, "away")}.`;
  return (
    <Note>
      {together}
      <FormulaText text={sentence} />
      {parts.length > 0 && pH === null && " No Eh meets both."}
      {parts.length > 0 && Eh === null && " No pH meets both."}
    </Note>
  );
}

const isHazard = ({ change }: Opening): boolean => change === "hazardPressure" || change === "hazardPH";

/** What helps comes first, and a hazard's own limit after it. */
const order = (o: Opening): number => (o.to === null ? 2 : isHazard(o) ? 1 : 0);

function Openings({
  openings,
  inputs,
  metalName,
  onApply,
}: {
  openings: readonly Opening[];
  inputs: Pick<PlanInputs, "metals">;
  metalName: (element: string) => string;
  onApply: ((opening: Opening) => void) | undefined;
}) {
  const helpful = openings.some((o) => o.to !== null && !isHazard(o));
  return (
    <>
      {!helpful && (
        <p className="py-1">
          No single number opens a window, as far as was looked. Two may together, or another lixiviant or requirement.
        </p>
      )}
      <ul>
        {[...openings]
          .sort((a, b) => order(a) - order(b))
          .map((opening) => (
            <li key={`${opening.change} ${opening.of ?? ""}`} className="hairline py-1">
              <div className="flex items-baseline justify-between gap-3">
                <span className="min-w-0">
                  <Subject opening={opening} inputs={inputs} metalName={metalName} />
                </span>
                {opening.to !== null && onApply && !isHazard(opening) && (
                  <Button className="h-6! px-2!" onClick={() => onApply(opening)}>
                    {actionWords(opening, inputs)}
                  </Button>
                )}
              </div>
              <div className="text-sm text-muted">
                {opening.to === null ? (
                  <>none opens a window; looked over {opening.searched}</>
                ) : (
                  <>
                    from <Amount opening={opening} of={opening.from} inputs={inputs} /> to{" "}
                    <Amount opening={opening} of={opening.to} inputs={inputs} />
                    {typeof opening.to === "number" && !isHazard(opening) && <FactorWords opening={opening} />}
                    {isHazard(opening) && (
                      <>
                        . Told so that you know what stands in the way: this limit protects people and is changed by
                        hand, under your site’s procedure, or not at all
                      </>
                    )}
                  </>
                )}
              </div>
            </li>
          ))}
      </ul>
      {helpful && (
        <Note className="py-1">
          The smallest change of each by itself; the number is the first at which a window exists, and is narrow there.
          Give it more for a margin.
        </Note>
      )}
    </>
  );
}

function Subject({
  opening,
  inputs,
  metalName,
}: {
  opening: Opening;
  inputs: Pick<PlanInputs, "metals">;
  metalName: (element: string) => string;
}) {
  switch (opening.change) {
    case "activity":
      return (
        <b>
          {inGrams(opening, inputs) ? "Tenor" : "Activity"} of {metalName(opening.of ?? "")}
        </b>
      );
    case "ligand":
      return (
        <b>
          Total of <Formula formula={opening.of ?? ""} className="font-mono" />
        </b>
      );
    case "temperature":
      return <b>Temperature</b>;
    case "solidsBasis":
      return <b>Solids basis</b>;
    case "hazardPressure":
    case "hazardPH":
      return (
        <b>
          Limit against <Formula formula={opening.of ?? ""} />
        </b>
      );
  }
}

const inGrams = ({ of }: Opening, { metals }: Pick<PlanInputs, "metals">): boolean =>
  metals.find((m) => m.element === of)?.entry === "gPerL";

function unitOf(opening: Opening, inputs: Pick<PlanInputs, "metals">): string | null {
  if (opening.change === "ligand") return "mol/L";
  return opening.change === "activity" && inGrams(opening, inputs) ? "g/L" : null;
}

function Amount({
  opening,
  of,
  inputs,
}: {
  opening: Opening;
  of: number | string;
  inputs: Pick<PlanInputs, "metals">;
}) {
  if (opening.change === "hazardPressure" && typeof of === "number")
    return <span className="font-mono whitespace-nowrap">{pressureWords(of)}</span>;
  if (opening.change === "hazardPH" && typeof of === "number")
    return <span className="font-mono whitespace-nowrap">pH {fixed(of, 2)}</span>;
  if (typeof of === "string") return <b className="font-normal text-ink">{of}</b>;
  const text = opening.change === "temperature" ? celsius(of, 1) : significant(of, 3);
  const unit = unitOf(opening, inputs);
  const said = unit === "g/L" ? tenorText(of, 3) : unit ? withUnit(text, unit) : text;
  return <span className="font-mono whitespace-nowrap">{said}</span>;
}

/** How much that is: 40 times less, 12 K warmer. */
function FactorWords({ opening: { change, from, to } }: { opening: Opening }) {
  if (typeof from !== "number" || typeof to !== "number") return null;
  if (change === "temperature")
    return (
      <>
        , {fixed(Math.abs(to - from), 1)} K {to > from ? "warmer" : "colder"}
      </>
    );
  const times = to > from ? to / from : from / to;
  return (
    <>
      , {times < 10 ? fixed(times, 1) : significant(times, 2)} times {to > from ? "more" : "less"}
    </>
  );
}

function actionWords(opening: Opening, inputs: Pick<PlanInputs, "metals">): string {
  const { change, to } = opening;
  if (typeof to === "string") return `Take ${to}`;
  if (change === "temperature") return `Set ${celsius(to ?? 0, 1)}`;
  const unit = unitOf(opening, inputs);
  if (unit === "g/L") return `Set ${tenorText(to ?? 0, 3)}`;
  return `Set ${withUnit(significant(to ?? 0, 3), unit ?? "")}`.trim();
}
