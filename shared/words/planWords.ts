import type { SolutionWarning } from "../solution";
import type { PlanInputs, PlanMetal, PresetName } from "../schemas/plan";
import type { Requirement } from "../schemas/problem";

/** Names of lixiviants as the screens write them; in the order a list shows them. */
export const lixiviantName: Readonly<Record<PresetName, string>> = {
  sulfate: "sulfate",
  sulfate_sulfide: "sulfate with sulfide",
  chloride: "chloride",
  ammonia: "ammonia",
  ammonia_carbonate: "ammonia and carbonate",
  cyanide: "cyanide",
  carbonate: "carbonate",
  thiosulfate_ammonia: "thiosulfate and ammonia",
  glycine: "glycine",
  water: "water, no ligand",
};

export const requirementWord: Readonly<Record<Requirement, string>> = {
  dissolved: "dissolved",
  solid: "solid",
  metal: "metal",
  compound: "compound",
  free: "free",
};

/** What a metal's number means: a liquor carries it, at most so much dissolves, at most so much is left. */
export function amountWord({
  role,
  requirement,
}: Pick<PlanMetal, "role" | "requirement">): "carry" | "at most" | "leave at most" | "at" {
  if (requirement === "free" || role === "watched") return "at";
  if (requirement === "dissolved") return "carry";
  return requirement === "metal" || role === "target" ? "leave at most" : "at most";
}

export const solidsBasisWord: Readonly<Record<PlanInputs["solidsBasis"], string>> = {
  feed: "as in the feed",
  fresh: "fresh, form in hours",
  aged: "aged, most stable",
};

export const waterBoundWord: Readonly<Record<PlanInputs["water"]["bound"], string>> = {
  both: "both water lines",
  upper: "the oxygen line",
  lower: "the hydrogen line",
  none: "no water line",
};

/** What a warning of the solution is about. */
export const warningWord: Readonly<Record<SolutionWarning["code"], string>> = {
  TEMPERATURE_TRUST: "beyond its trusted temperature",
  LIGAND_DRAWN_DOWN: "a ligand would be drawn down",
  METASTABLE: "metastable",
  KINETICS: "slow",
  SATURATION_PRESSURE: "under pressure",
};
