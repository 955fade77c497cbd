import type { Problem } from "../../../shared/schemas/problem";

const frame: Problem["frame"] = { pH: [0, 12], Eh: [-1, 1.4] };

/** Four metals in sulfate: the demo's neutral leach on a frame that shows every diagram whole. */
export const fourInSulfate: Problem = {
  temperatureC: 60,
  metals: [
    { element: "Zn", requirement: "dissolved", activity: 0.08 },
    { element: "Fe", requirement: "solid", activity: 1e-5 },
    { element: "Cu", requirement: "free", activity: 1e-3 },
    { element: "Cd", requirement: "free", activity: 1e-3 },
  ],
  ligands: [{ component: "S", activity: 0.5 }],
  solidsBasis: "fresh",
  frame,
  controlBand: { pH: 0.15, Eh: 0.03 },
};

/** The same with all four asked for something. */
export const fourDemanding: Problem = {
  ...fourInSulfate,
  metals: [
    { element: "Zn", requirement: "dissolved", activity: 0.08 },
    { element: "Fe", requirement: "solid", activity: 1e-5 },
    { element: "Cu", requirement: "dissolved", activity: 1e-3 },
    { element: "Cd", requirement: "dissolved", activity: 1e-3 },
  ],
};

/** Eight metals in sulfate and chloride. */
export const eightMixed: Problem = {
  ...fourInSulfate,
  metals: [
    { element: "Zn", requirement: "dissolved", activity: 0.08 },
    { element: "Fe", requirement: "solid", activity: 1e-5 },
    { element: "Cu", requirement: "dissolved", activity: 1e-3 },
    { element: "Cd", requirement: "dissolved", activity: 1e-3 },
    { element: "Pb", requirement: "free", activity: 1e-4 },
    { element: "Ni", requirement: "dissolved", activity: 1e-3 },
    { element: "Co", requirement: "dissolved", activity: 1e-3 },
    { element: "Mn", requirement: "free", activity: 1e-2 },
  ],
  ligands: [
    { component: "S", activity: 0.5 },
    { component: "Cl", activity: 0.5 },
  ],
};
