import { useMemo, type ReactNode } from "react";
import { FREE_ACID_BELOW, type FreeAcidCurve } from "../../../../shared/activity/freeAcid";
import type { Analysis } from "../../../../shared/analysis";
import type { Problem } from "../../../../shared/schemas/problem";
import type { Limit, Point, Window } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { type LimitSentence, limitSentences, type Naming } from "../../../../shared/windows/limitWords";
import { AcidAmount } from "../../../components/AcidAmount";
import { Term } from "../../../components/Help";
import { MethodLink, SpeciesLink } from "../../../components/SourceLink";
import { SectionHead } from "../../../components/text";
import { classes } from "../../../lib/classes";
import { fixed, withUnit } from "../../../lib/format";
import type { LimitStore } from "../../../map/limitStore";
import { useTold } from "../../../map/trialStore";
import { bandWords, mVWords, pHWords } from "../model/distances";
import { limitKey } from "../model/limitKey";
import { LimitMoves } from "./LimitMoves";
import { Reaction } from "./Reaction";

/** Each way out of the window: what happens there, by which reaction, and how far it is. */
export function LimitsBlock({
  window,
  name,
  naming,
  band,
  freeAcid = null,
  analysis,
  data,
  limitStore,
}: {
  window: Window;
  name: string;
  naming: Naming;
  band: Problem["controlBand"];
  /** of a sulfate liquor */
  freeAcid?: FreeAcidCurve | null;
  /** what the solution was read from; null while the plan cannot be solved */
  analysis: Analysis | null;
  data: ChemicalData;
  /** which limit is pointed at, here or on the map */
  limitStore: LimitStore;
}) {
  const sentences = useMemo(() => limitSentences(window, naming), [window, naming]);
  return (
    <section aria-label={`What shuts window ${name}`} className="mt-4">
      <SectionHead
        aside={
          <>
            <Term word="windowLimit">limits</Term> · <MethodLink to="windows" />
          </>
        }
      >
        What shuts window {name}
      </SectionHead>
      <ul>
        {sentences.map((sentence) => (
          <Sentence
            key={`${sentence.side} ${sentence.what}`}
            sentence={sentence}
            band={band}
            acid={acidTo(sentence, window, freeAcid)}
            limitStore={limitStore}
            moves={
              analysis && (
                <LimitMoves {...{ sentence, analysis, data }} setPoint={window.setPoint} metalName={naming.metalName} />
              )
            }
          />
        ))}
      </ul>
    </section>
  );
}

/** g/L of free acid from the set point to a limit along pH, where both stand low enough for it to be said; more acid above zero. */
function acidTo({ axis, distance, side }: LimitSentence, { setPoint }: Window, curve: FreeAcidCurve | null) {
  if (curve === null || axis !== "pH" || distance === null) return null;
  const pH = setPoint.pH + (side === "low pH" ? -distance : distance);
  if (Math.min(pH, setPoint.pH) >= FREE_ACID_BELOW) return null;
  const [here, there] = [curve.at(setPoint.pH), curve.at(pH)];
  return here.withinSulfate && there.withinSulfate ? there.gPerL - here.gPerL : null;
}

const middle = ({ from, to }: Limit): Point => [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2];

function Sentence({
  sentence,
  band,
  acid,
  moves,
  limitStore,
}: {
  sentence: LimitSentence;
  band: Problem["controlBand"];
  acid: number | null;
  moves: ReactNode;
  limitStore: LimitStore;
}) {
  const key = limitKey(sentence);
  const pointed = useTold(limitStore.pointed) === key;
  const named = useTold(limitStore.named)?.key === key;
  const { side, what, limit, others, distance, axis, bands } = sentence;
  const further = others.filter((o) => o.reaction !== limit.reaction);
  return (
    <li
      className={classes("hairline py-1", pointed && "bg-tint")}
      onPointerEnter={() => limitStore.pointed.set(key)}
      onPointerLeave={() => limitStore.pointed.set(null)}
      onFocus={() => limitStore.pointed.set(key)}
      onBlur={() => limitStore.pointed.set(null)}
    >
      <div className="flex items-baseline justify-between gap-3">
        <button
          type="button"
          aria-pressed={named}
          title={named ? "Take its name off the map" : "Name it on the map"}
          className="touch-word text-left hover:underline"
          onClick={() => limitStore.named.set(named ? null : { key, at: middle(limit) })}
        >
          <b>{side}</b> {what}
        </button>
        <span className="shrink-0 font-mono whitespace-nowrap">
          {distance === null
            ? withUnit(fixed(bands, 1), "bands")
            : axis === "pH"
              ? pHWords(distance)
              : mVWords(distance)}
        </span>
      </div>
      <Why limit={limit} />
      {distance === null && (
        <div className="text-sm text-muted">
          not straight along {axis} from the set point: nearest within{" "}
          <span className="whitespace-nowrap">{bandWords(bands, band)}</span>
        </div>
      )}
      {acid !== null && (
        <div className="text-sm text-muted">
          <AcidAmount gPerL={Math.abs(acid)} /> {acid > 0 ? "more" : "less"} free acid, by the same reckoning
        </div>
      )}
      {moves}
      {further.length > 0 && (
        <details className="text-sm text-muted">
          <summary className="w-fit">
            and {further.length === 1 ? "one more reaction" : `${further.length} more reactions`} on this side
          </summary>
          {further.map((other) => (
            <Why key={`${other.reaction ?? ""}${other.from.join()}`} limit={other} />
          ))}
        </details>
      )}
    </li>
  );
}

function Why({ limit }: { limit: Limit }) {
  return (
    <div className="text-sm text-muted">
      {limit.reactionTerms ? (
        <Reaction terms={limit.reactionTerms} />
      ) : limit.inside && limit.outside ? (
        <>
          <SpeciesLink id={limit.inside} /> <span className="font-mono">→</span> <SpeciesLink id={limit.outside} />
        </>
      ) : null}
    </div>
  );
}
