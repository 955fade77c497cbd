import { useMemo } from "react";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Limit, SetPoint } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import type { Sweep, SweepWish } from "../../../../shared/whatif/sweep";
import { jumpReasons, jumpWords } from "../../../../shared/whatif/jumpWords";
import type { Turn, TurnKind } from "../../../../shared/whatif/turns";
import { settingBounds, settingOf, usualRange, variedOf, withSetting } from "../../../../shared/whatif/vary";
import { componentWord } from "../../../../shared/words/componentWord";
import type { Asker, Tell } from "../../../workers/asker";
import { Button } from "../../../components/Button";
import { FormulaText } from "../../../components/FormulaText";
import { NumberField } from "../../../components/NumberField";
import { Select } from "../../../components/Select";
import { ErrorNote, Progress } from "../../../components/status";
import { Note, SectionHead } from "../../../components/text";
import { classes } from "../../../lib/classes";
import { fixed } from "../../../lib/format";
import type { MapMetal } from "../../../map/view";
import type { FilmWish } from "../address/view";
import { bandWords } from "../model/distances";
import type { Edit } from "../model/edit";
import { useAsked } from "../model/useAsked";
import { Curve } from "./Curve";
import { settingKey, settingName, settingText, settingUnit, standing, tidySetting } from "./settingWords";
import { SmallMap } from "./SmallMap";

export interface FilmProps {
  wish: FilmWish;
  onWish: (wish: FilmWish | null) => void;
  inputs: PlanInputs;
  data: ChemicalData;
  metals: readonly MapMetal[];
  setPoint: SetPoint | null;
  /** absent where the plan is only looked at */
  edit?: ((change: Edit) => void) | undefined;
}

/** The filmstrip a plan begins with: its temperature. */
export const firstFilm = (inputs: PlanInputs): FilmWish => ({
  vary: { kind: "temperature" },
  range: usualRange(inputs, { kind: "temperature" }),
  frames: 7,
});

const ask = (asker: Asker, key: string, signal: AbortSignal, tell: Tell) =>
  asker.ask<"sweep">({ kind: "sweep", ...(JSON.parse(key) as { inputs: PlanInputs; wish: SweepWish }) }, signal, tell);

/** One setting of the plan varied, everything else as it stands: small maps, the curve of ground and margin, and where windows open and close. */
export function Film({ wish, onWish, inputs, data, metals, setPoint, edit }: FilmProps) {
  const { vary, range, frames } = wish;
  const key = useMemo(() => {
    const kept = setPoint && [setPoint.pH, setPoint.Eh];
    return JSON.stringify({ inputs, wish: { varied: vary, range, frames, between: 5, ...(kept ? { kept } : {}) } });
  }, [inputs, vary, range, frames, setPoint]);
  const answer = useAsked<Sweep>(data, key, ask);
  const here = settingOf(inputs, vary);
  const [low, high] = settingBounds(inputs, vary);
  const unit = settingUnit(inputs, vary);
  const end = (label: string, index: 0 | 1) => (
    <NumberField
      layout="bare"
      label={label}
      value={range[index]}
      {...(unit ? { unit } : {})}
      width={7}
      min={index === 0 ? low : range[0]}
      max={index === 0 ? range[1] : high}
      onCommit={(x) =>
        x !== range[1 - index] && onWish({ ...wish, range: index === 0 ? [x, range[1]] : [range[0], x] })
      }
    />
  );
  return (
    <div className="min-h-0 flex-1 overflow-y-auto px-4 pt-2 pb-6" data-testid="film">
      <div className="flex flex-wrap items-baseline gap-x-3 gap-y-1">
        <b>What if</b>
        <Select
          label="Setting varied"
          layout="bare"
          value={settingKey(vary)}
          onChange={(next) => {
            const found = variedOf(inputs).find((v) => settingKey(v) === next);
            if (found) onWish({ ...wish, vary: found, range: usualRange(inputs, found) });
          }}
          options={variedOf(inputs).map((v) => ({
            value: settingKey(v),
            label: settingName(inputs, v),
            text: settingName(inputs, v),
            note: `now ${standing(inputs, v)}`,
          }))}
        />
        <span>goes from</span> {end("From", 0)} <span>to</span> {end("To", 1)} <span>in</span>
        <NumberField
          layout="bare"
          label="Small maps"
          value={frames}
          min={5}
          max={9}
          width={2}
          onCommit={(n) => onWish({ ...wish, frames: Math.round(n) })}
        />{" "}
        <span>maps</span>
        <span className="flex-1" />
        <Button kind="quiet" className="h-auto!" onClick={() => onWish(null)}>
          back to the map
        </Button>
      </div>
      {answer.state === "waiting" && (
        <div role="status" className="py-2 text-sm text-muted">
          Solving every setting … <Progress {...(answer.share === undefined ? {} : { share: answer.share })} />
        </div>
      )}
      {answer.state === "failed" && (
        <ErrorNote className="mt-2" doing="This could not be worked out" error={new Error(answer.message)} />
      )}
      {answer.state === "there" && (
        <>
          <ol className="mt-3 grid grid-cols-[repeat(auto-fill,minmax(128px,1fr))] gap-3" aria-label="Small maps">
            {answer.value.frames.map((frame) => {
              const to = tidySetting(vary, frame.at);
              const words = settingText(inputs, vary, frame.at);
              return (
                <li key={frame.at}>
                  <button
                    type="button"
                    disabled={!edit}
                    title={edit ? `Set the plan to ${words}; Undo takes it back` : undefined}
                    aria-label={`${words}: ${frame.windows === 0 ? "no window" : `margin ${fixed(frame.setPoint?.margin ?? 0, 1)} bands`}${edit ? "; set the plan to it" : ""}`}
                    onClick={() => edit?.((p) => withSetting(p, vary, to))}
                    className={classes(
                      "block w-full text-left",
                      to === here && "outline-2 outline-offset-2 outline-verdigris",
                    )}
                  >
                    <SmallMap frame={frame} metals={metals} />
                    <span className="flex justify-between gap-2 pt-0.5 font-mono text-xs">
                      <b>{words}</b>
                      <span className="text-muted">
                        {frame.setPoint ? `${fixed(frame.setPoint.margin, 1)} bands` : "no window"}
                      </span>
                    </span>
                  </button>
                </li>
              );
            })}
          </ol>
          <Curve sweep={answer.value} inputs={inputs} here={here} />
          <SectionHead className="mt-2">Where it opens, closes and jumps</SectionHead>
          {answer.value.turns.length === 0 && (
            <Note className="py-1">
              Nowhere in this range: windows neither open nor close, nothing jumps, and the margin stays on one side of
              a control band.
            </Note>
          )}
          <ul>
            {answer.value.turns.map((turn) => (
              <li key={`${turn.kind} ${turn.at}`} className="hairline py-1">
                <TurnLine turn={turn} inputs={inputs} wish={wish} data={data} />
              </li>
            ))}
          </ul>
          <Note className="pt-1">
            Worked out at {answer.value.samples.length} settings, straight lines between them; openings, closings and
            jumps are narrowed to {vary.kind === "temperature" ? "0.01 K" : "0.02 %"}. Two that undo each other between
            neighbouring settings can be missed. One control band is ±{bandWords(1, inputs.controlBand)}.
          </Note>
          {answer.value.failed.map(({ at, error }) => (
            <Note key={at}>
              Not solved at {settingText(inputs, vary, at)}: {error.message}.
            </Note>
          ))}
        </>
      )}
    </div>
  );
}

const does: Readonly<Record<TurnKind, string>> = {
  opens: "a window opens",
  closes: "a window closes",
  parts: "a window parts in two",
  joins: "two windows join",
  holds: "the margin rises above one control band",
  slips: "the margin falls below one control band",
  jumps: "",
};

const limitText = (l: Limit): string =>
  l.kind === "metal" ? `${l.inside ?? ""} / ${l.outside ?? ""}` : l.kind === "water" ? `water’s ${l.side ?? ""} line` : l.kind === "frame" ? "the edge of the frame" : `hazard ${l.side ?? ""}`; // prettier-ignore

function TurnLine({
  turn,
  inputs,
  wish,
  data,
}: {
  turn: Turn;
  inputs: PlanInputs;
  wish: FilmWish;
  data: ChemicalData;
}) {
  const reasons = turn.jump ? jumpReasons(turn.jump, (element) => componentWord(data, element)) : [];
  return (
    <>
      <b className="font-mono">{settingText(inputs, wish.vary, turn.at, 4)}</b>{" "}
      {turn.kind === "jumps" && turn.jump ? jumpWords(turn.jump) : does[turn.kind]}
      {turn.abrupt && turn.kind !== "jumps" && ", all at once"}
      {reasons.length > 0 && (
        <>
          : <FormulaText text={reasons.join("; ")} />
        </>
      )}
      {turn.limits.length > 0 && (
        <>
          {turn.kind === "opens" || turn.kind === "closes" ? ", closed by " : ", between "}
          <FormulaText text={turn.limits.map(limitText).join(" and ")} />
        </>
      )}
      .
    </>
  );
}
