import type { CampaignStage } from "../../shared/schemas/campaign";
import type { PlanInputs } from "../../shared/schemas/plan";

/** A first stage guessed from the plan: its target against the gangue that must stay solid. */
export function stageFromPlan({ metals }: Pick<PlanInputs, "metals">): CampaignStage {
  const target = metals.find(({ role }) => role === "target");
  const gangue = metals.find(({ role }) => role === "gangue");
  const won = target?.requirement === "metal";
  return {
    code: won ? "C" : "L",
    name: won ? "cementation" : "leach",
    target: target?.element ?? metals[0]?.element ?? "",
    gangue: won ? null : (gangue?.element ?? null),
  };
}
