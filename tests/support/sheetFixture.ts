import type { PlanInputs, PlanMetal, RevisionRow } from "../../shared/schemas/plan";

export const metal = (
  element: string,
  role: PlanMetal["role"],
  requirement: PlanMetal["requirement"],
  value: number,
  more: Partial<PlanMetal> = {},
): PlanMetal => ({ element, role, requirement, entry: "activity", value, gammaFrom: "one", gamma: null, ...more });

/** Zinc carried, iron held back, copper watched, in hot sulfate. */
export const sheetInputs: PlanInputs = {
  temperatureC: 57.5,
  preset: "sulfate",
  metals: [
    metal("Zn", "target", "dissolved", 9.25, { entry: "gPerL", gammaFrom: "typed", gamma: 0.38 }),
    metal("Fe", "gangue", "solid", 3e-6),
    metal("Cu", "watched", "free", 2e-3),
  ],
  ligands: [{ component: "S", activity: 0.45 }],
  others: [{ component: "K", activity: 0.02 }],
  ionicStrength: null,
  sulfateReduction: false,
  solidsBasis: "fresh",
  feedMinerals: ["ZnO(s)"],
  dosed: ["peroxide"],
  leftOut: [{ species: "CuO(s)", reason: "never seen in this tank" }],
  putBack: [],
  frame: { pH: [1, 8], Eh: [-0.2, 1.2] },
  water: { bound: "both" },
  controlBand: { pH: 0.17, Eh: 0.025 },
};

export const sheetPlan = {
  name: "Third tank",
  projectName: "Second stage",
  siteName: "North works",
  invented: false,
  revisionCount: 4,
};

export const sheetRevision = (dataVersion: string, inputs = sheetInputs): RevisionRow => ({
  planId: "third-tank",
  number: 3,
  note: "Peroxide in place of air.",
  author: "The metallurgist",
  createdAt: "2026-06-01T23:30:00.000Z",
  dataVersion,
  inputs,
});

/** Cadmium cemented on zinc dust, arsenic beside it. */
export const dustInputs: PlanInputs = {
  ...sheetInputs,
  temperatureC: 55,
  metals: [
    metal("Cd", "gangue", "metal", 1e-6),
    metal("Zn", "target", "dissolved", 0.1),
    metal("As", "watched", "free", 1e-4),
  ],
  feedMinerals: [],
  dosed: [],
  leftOut: [],
  frame: { pH: [1, 7], Eh: [-1.2, 0.6] },
  water: { bound: "upper" },
};
