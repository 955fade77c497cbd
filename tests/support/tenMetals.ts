import { demoPlans } from "../../server/demo/plans";
import type { PlanInputs, PlanMetal } from "../../shared/schemas/plan";

const lines: readonly [string, PlanMetal["role"], PlanMetal["requirement"], number][] = [
  ["Zn", "target", "dissolved", 0.08],
  ["Cu", "target", "dissolved", 1e-3],
  ["Cd", "target", "dissolved", 1e-3],
  ["Co", "target", "dissolved", 1e-4],
  ["Fe", "gangue", "solid", 1e-5],
  ["Al", "gangue", "solid", 1e-2],
  ["Ni", "gangue", "dissolved", 1e-3],
  ["Mn", "gangue", "dissolved", 1e-2],
  ["As", "watched", "free", 1e-5],
  ["Pb", "watched", "free", 1e-5],
];

/** The invented neutral leach of the demo with ten metals, as many as a map is to carry: four wanted, four that must be as asked beside them, two watched. */
export function tenMetals(): PlanInputs {
  const base = demoPlans.find((plan) => plan.id === "demo-neutral-leach")?.revisions.at(-1)?.inputs;
  if (!base) throw new Error("the demo has no neutral leach");
  return {
    ...base,
    metals: lines.map(([element, role, requirement, value]) => ({
      element,
      role,
      requirement,
      value,
      entry: "activity",
      gammaFrom: "one",
      gamma: null,
    })),
  };
}
