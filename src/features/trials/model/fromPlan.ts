import type { CampaignStage } from "../../../../shared/schemas/campaign";
import type { Feed } from "../../../../shared/schemas/feed";
import type { Planned } from "../../../../shared/schemas/trialRecord";
import type { Solution } from "../../../../shared/solution";
import { tenorOfLine } from "../../../../shared/trials/comparable";
import { couldCarry } from "../../../../shared/trials/couldCarry";
import { tenorInput } from "../../../../shared/words/tenor";
import { fixed, inputTextExact, withUnit } from "../../../lib/format";
import type { SolvedRevision } from "../../../lib/solvedRevision";
import type { TrialValues } from "./trialValues";

/** Set points one can lay a trial out on. */
export const windowChoices = ({ windows }: Solution): { value: string; label: string; words: string }[] =>
  windows.map(({ setPoint }, i) => ({
    value: String(i),
    label: `window ${String.fromCharCode(65 + (i % 26))}`,
    words: `pH ${fixed(setPoint.pH, 2)}, ${withUnit(fixed(setPoint.Eh, 2), "V")} vs SHE`,
  }));

const typed = (x: number, figures = 3) => inputTextExact(Number(x.toPrecision(figures)), 2);

/** Tenor a trial is laid out on: g/L as the plan states it, else what its own charge could carry, else what the plan's activity says
 *  of it. */
function tenorFrom(
  trial: TrialValues,
  { inputs, data }: SolvedRevision,
  stage: CampaignStage | null,
  feed: Feed | null,
): number | null {
  const line = trial.kind === "leach" ? inputs.metals.find((m) => m.element === stage?.target) : undefined;
  if (line === undefined || stage === null) return null;
  const charged = feed && line.entry === "activity" ? couldCarry(trial, feed, stage.target, data.molarMass) : null;
  return charged ?? tenorOfLine(line, inputs, data);
}

/** Planned conditions from the plan: temperature, the set point of a window, the totals of its ligands and the tenor its target
 *  carries. The potential goes in against SHE; the bench reads it against its own electrode. What was planned by hand and the plan
 *  says nothing of stays. */
export function plannedFromPlan(
  trial: TrialValues,
  revision: SolvedRevision,
  window: number,
  stage: CampaignStage | null,
  feed: Feed | null,
): Planned {
  const { inputs, solution } = revision;
  const at = solution?.windows[window]?.setPoint;
  const { planned } = trial;
  const tenor = tenorFrom(trial, revision, stage, feed);
  return {
    ...planned,
    temperature: { text: String(inputs.temperatureC), unit: "C" },
    ...(at && {
      pH: { text: at.pH.toFixed(2), unit: "pH" },
      orp: {
        value: { text: String(Math.round(at.Eh * 1000)), unit: "mV" },
        electrode: "SHE",
        electrodeTemperature: { text: "", unit: "C" },
      },
    }),
    ...(tenor !== null && { tenor: { text: tenorInput(Number(tenor.toPrecision(3))), unit: "g/L" } }),
    ligands: inputs.ligands.map(({ component, activity }) => ({
      component,
      value: { text: typed(activity), unit: "mol/L" },
    })),
  };
}
