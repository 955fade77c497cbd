import type { MapTrials } from "../../../../shared/schemas/trialRows";
import { tally, type Tally } from "../../../../shared/trials/tally";
import type { PlacedTrial } from "../../../lib/judgedTrials";
import { fixed } from "../../../lib/format";
import { type ColourScale, markSymbols, type MarkSymbol, type TrialMark } from "../../../map/trialMarks";

/** What the points are coloured by. */
export const colourings = ["recoveryPct", "gangueDissolvedPct", "selectivityPct"] as const;
export type Colouring = (typeof colourings)[number];
export const colouringWords: Readonly<Record<Colouring, string>> = {
  recoveryPct: "recovery",
  gangueDissolvedPct: "gangue dissolved",
  selectivityPct: "selectivity",
};

/** A marker a stage, in the order in which campaigns and their stages come; a seventh stage repeats the first marker. */
export function stageMarkers(campaigns: MapTrials["campaigns"]): Map<string, MarkSymbol> {
  const codes = new Set(campaigns.flatMap(({ stages }) => stages.map(({ code }) => code)));
  return new Map([...codes].map((code, i) => [code, markSymbols[i % markSymbols.length] ?? "circle"]));
}

/** Trials that have a place and are not rejected, as points. */
export const marksOf = (
  trials: readonly PlacedTrial[],
  markers: ReadonlyMap<string, MarkSymbol>,
  colouring: Colouring,
): TrialMark[] =>
  trials.flatMap(({ id, code, stage, count, figures }) => {
    const { pH, Eh, pHCooled } = figures;
    if (pH === null || Eh === null || count === "rejected") return [];
    return [
      {
        id,
        code,
        pH,
        Eh,
        symbol: markers.get(stage) ?? "circle",
        value: figures[colouring],
        open: count === "apart",
        cooled: pHCooled,
      },
    ];
  });

/** What the marks mean, for a picture that travels without its legend. */
export function marksInWords(
  marks: readonly TrialMark[],
  { lo, hi }: ColourScale,
  markers: ReadonlyMap<string, MarkSymbol>,
  colouring: Colouring,
): string {
  const drawn = new Set(marks.map(({ symbol }) => symbol));
  const stages = [...markers].filter(([, symbol]) => drawn.has(symbol)).map(([code, symbol]) => `${symbol} ${code}`);
  const open = marks.some((m) => m.open) ? "; open: other conditions" : "";
  const cooled = marks.some((m) => m.cooled) ? "; dotted: pH of a cooled sample" : "";
  const unit = colouring === "selectivityPct" ? " points" : " %";
  return `${marks.length} trials by ${colouringWords[colouring]}, pale ${fixed(lo, 0)} to dark ${fixed(hi, 0)}${unit}; ${stages.join(", ")}${open}${cooled}`;
}

export interface StageTally {
  code: string;
  target: string;
  gangue: string | null;
  tally: Tally;
}

/** A tally a stage: a mean over two targets would say nothing. Stages of one code with one target count together. */
export function stageTallies(trials: readonly PlacedTrial[]): StageTally[] {
  const groups = new Map<string, PlacedTrial[]>();
  for (const trial of trials) {
    const { code, target, gangue } = trial.stageOf;
    const key = [code, target, gangue ?? ""].join("\n");
    groups.set(key, [...(groups.get(key) ?? []), trial]);
  }
  return [...groups.values()].flatMap((group) => {
    const stage = group[0]?.stageOf;
    return stage ? [{ code: stage.code, target: stage.target, gangue: stage.gangue, tally: tally(group) }] : [];
  });
}
