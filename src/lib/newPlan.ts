import { withMissingTotals } from "../../shared/plan/missingTotals";
import type { PlanInputs, PlanMetal, PresetName } from "../../shared/schemas/plan";
import type { Frame } from "../../shared/schemas/problem";
import type { ChemicalData } from "../../shared/species/chemicalData";
import { cyanideRule, presetLigands } from "./presetLigands";

/** What happens to the target in the step that is planned. */
export const steps = ["leach", "cementation", "precipitation"] as const;
export type Step = (typeof steps)[number];

const precious: ReadonlySet<string> = new Set(["Au", "Ag", "Pt", "Pd", "Hg"]);

const line = (
  element: string,
  role: PlanMetal["role"],
  requirement: PlanMetal["requirement"],
  value: number,
): PlanMetal => ({
  element,
  role,
  requirement,
  entry: "activity",
  value,
  gammaFrom: "one",
  gamma: null,
});

/** Where the circuits of a lixiviant usually run; a starting frame, common practice, no source. */
const frames: Readonly<Record<PresetName, Frame>> = {
  sulfate: { pH: [0, 8], Eh: [-0.2, 1.2] },
  sulfate_sulfide: { pH: [0, 10], Eh: [-0.4, 1.2] },
  chloride: { pH: [0, 7], Eh: [-0.2, 1.4] },
  ammonia: { pH: [7, 13], Eh: [-0.8, 0.8] },
  ammonia_carbonate: { pH: [7, 13], Eh: [-0.8, 0.8] },
  cyanide: { pH: [9, 13], Eh: [-0.8, 0.6] },
  carbonate: { pH: [7, 13], Eh: [-0.8, 0.8] },
  thiosulfate_ammonia: { pH: [7, 12], Eh: [-0.6, 0.6] },
  glycine: { pH: [7, 13], Eh: [-0.6, 0.8] },
  water: { pH: [0, 14], Eh: [-1, 1.4] },
};

export interface NewPlan {
  step: Step;
  preset: PresetName;
  target: string;
  /** stays behind in a leach or precipitation; the dust or scrap in cementation */
  other: string | null;
  temperatureC: number;
}

/** The first question of a plan; everything in it can be changed in the workspace. */
export function newPlanInputs({ step, preset, target, other, temperatureC }: NewPlan, data: ChemicalData): PlanInputs {
  const metals: PlanMetal[] = [];
  if (step === "leach") {
    metals.push(line(target, "target", "dissolved", precious.has(target) ? 1e-5 : 0.05));
    if (other) metals.push(line(other, "gangue", "solid", 1e-5));
  } else if (step === "cementation") {
    metals.push(line(target, "target", "metal", 1e-6));
    if (other) metals.push(line(other, "gangue", "dissolved", 0.1));
  } else {
    metals.push(line(target, "target", "compound", 1e-5));
    if (other) metals.push(line(other, "gangue", "dissolved", 0.05));
  }
  const frame = frames[preset];
  return {
    temperatureC,
    preset,
    metals,
    ligands: presetLigands(data, preset),
    others: [],
    ionicStrength: null,
    sulfateReduction: preset === "sulfate_sulfide",
    solidsBasis: "fresh",
    feedMinerals: [],
    dosed: [],
    leftOut: [],
    putBack: [],
    frame: step === "cementation" ? { pH: frame.pH, Eh: [-1.2, 0.6] } : frame,
    // reduction: hydrogen is a loss there, not a limit
    water: { bound: step === "cementation" ? "none" : "both" },
    controlBand: { pH: 0.15, Eh: 0.03 },
    ...(preset === "cyanide" ? { excludedHazards: [cyanideRule] } : {}),
  };
}

/** A metal as the user takes it over from a feed. */
export interface FeedLine {
  element: string;
  role: PlanMetal["role"];
  gPerL: number;
}

export interface FeedPlan {
  preset: PresetName;
  temperatureC: number;
  lines: readonly FeedLine[];
  minerals: readonly string[];
  /** total of a sulfate liquor, mol/L; null: the preset's */
  sulfate: number | null;
}

/** The first question of a leach of a feed: its metals at the tenors taken over, its minerals named, and what these need of
 *  the liquor given a first total. */
export function feedPlanInputs(
  { preset, temperatureC, lines, minerals, sulfate }: FeedPlan,
  data: ChemicalData,
): PlanInputs {
  const base = newPlanInputs(
    { step: "leach", preset, target: lines[0]?.element ?? "", other: null, temperatureC },
    data,
  );
  const metals = lines.map(({ element, role, gPerL }): PlanMetal => ({
    element,
    role,
    requirement: role === "gangue" ? "solid" : role === "target" ? "dissolved" : "free",
    entry: "gPerL",
    value: gPerL,
    gammaFrom: "one",
    gamma: null,
  }));
  const ligands = base.ligands.map((l) => (l.component === "S" && sulfate !== null ? { ...l, activity: sulfate } : l));
  return withMissingTotals({ ...base, metals, ligands, feedMinerals: [...minerals] }, data);
}
