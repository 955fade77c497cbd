import type { CampaignRow, CampaignStage } from "../../../../shared/schemas/campaign";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import { trialCreate, type TrialKind } from "../../../../shared/schemas/trial";
import type { TrialListRow } from "../../../../shared/schemas/trialRows";
import type { TrialValues } from "../model/trialValues";

/** The code after the highest one: NL-2-20 → NL-2-21; the campaign's own code with -01 where there is none yet. */
export function nextCode(campaign: Pick<CampaignRow, "code">, codes: readonly string[]): string {
  let best: { head: string; n: number; width: number } | null = null;
  for (const code of codes) {
    const [, head = "", digits] = /^(.*?)(\d+)$/.exec(code) ?? [];
    if (digits === undefined) continue;
    const n = Number(digits);
    if (best === null || n > best.n) best = { head, n, width: digits.length };
  }
  return best ? `${best.head}${String(best.n + 1).padStart(best.width, "0")}` : `${campaign.code}-01`;
}

/** What a trial of this stage is: as the trials before it, else by what the plan asks of the target. */
export function kindOf(
  stage: CampaignStage,
  trials: readonly Pick<TrialListRow, "stage" | "kind">[],
  inputs: Pick<PlanInputs, "metals"> | undefined,
): TrialKind {
  const before = trials.find((t) => t.stage === stage.code);
  if (before) return before.kind;
  return inputs?.metals.find(({ element }) => element === stage.target)?.requirement === "metal"
    ? "cementation"
    : "leach";
}

/** A trial with nothing planned yet. */
export function emptyTrial(part: Pick<TrialValues, "feedId" | "code" | "kind" | "stage">): TrialValues {
  const { campaignId: _, ...values } = trialCreate.parse({ campaignId: "none", ...part });
  return values;
}

/** The next one like it: planned conditions, charge and what was measured out stay, everything that was read is gone. */
export const likeIt = (trial: TrialValues, code: string): TrialValues => {
  const empty = emptyTrial({ feedId: trial.feedId, code, kind: trial.kind, stage: trial.stage });
  return { ...empty, planned: trial.planned, operator: trial.operator, replicateOf: trial.replicateOf };
};
