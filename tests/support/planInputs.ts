import type { PlanInputs } from "../../shared/schemas/plan";

/** Inputs in which no field has its usual value, so that one lost on the way shows. */
export const unusualInputs: PlanInputs = {
  temperatureC: 47.5,
  preset: "ammonia",
  metals: [
    {
      element: "Cu",
      role: "watched",
      requirement: "free",
      entry: "gPerL",
      value: 3.25,
      gammaFrom: "typed",
      gamma: 0.42,
    },
    {
      element: "Zn",
      role: "gangue",
      requirement: "compound",
      entry: "activity",
      value: 2e-7,
      gammaFrom: "davies",
      gamma: null,
    },
  ],
  ligands: [{ component: "NH3", activity: 1.75, unit: "g/L" }],
  others: [{ component: "K", activity: 0.05 }],
  ionicStrength: 0.35,
  sulfateReduction: true,
  solidsBasis: "aged",
  feedMinerals: ["CuO(s)"],
  dosed: ["peroxide"],
  leftOut: [{ species: "ZnO(s)", reason: "passive in this liquor" }],
  putBack: ["Cu(OH)2(s)"],
  frame: { pH: [7.5, 12.5], Eh: [-0.75, 0.65] },
  water: { bound: "upper", oxygenV: 0.3, hydrogenV: 0.7 },
  controlBand: { pH: 0.25, Eh: 0.045 },
  freeAcidBand: { gPerL: 2.5, atPH: 0.85 },
  overall: { "CuO(s)": { products: { Cu: "Cu^2+(aq)" }, redox: "open" } },
  excludedHazards: [{ gas: "NH3", bar: 0.0125 }],
};
