import { HCN_PH } from "../../shared/hazards/words";
import type { PlanInputs, PlanMetal } from "../../shared/schemas/plan";

/** Everything at this site is invented; the numbers are of the usual size for such circuits and stand for no plant. */
export const demoSite = "Tarn Hollow (invented)";

export interface DemoPlan {
  id: string;
  project: string;
  name: string;
  description: string;
  /** oldest first; each is written whole, so that a reader sees what the revision froze */
  revisions: { note: string; at: string; inputs: PlanInputs }[];
}

type Line = Pick<PlanMetal, "element" | "role" | "requirement" | "value">;
const metals = (...lines: Line[]): PlanMetal[] =>
  lines.map((line) => ({ ...line, entry: "activity", gammaFrom: "one", gamma: null }));

const unlessSaid = {
  others: [],
  ionicStrength: null,
  sulfateReduction: false,
  solidsBasis: "fresh",
  feedMinerals: [],
  dosed: [],
  leftOut: [],
  putBack: [],
  water: { bound: "both" },
  controlBand: { pH: 0.15, Eh: 0.03 },
} satisfies Partial<PlanInputs>;

const neutralLeach: PlanInputs = {
  ...unlessSaid,
  temperatureC: 60,
  preset: "sulfate",
  metals: metals(
    { element: "Zn", role: "target", requirement: "dissolved", value: 0.08 },
    { element: "Fe", role: "gangue", requirement: "solid", value: 1e-5 },
    { element: "Cu", role: "watched", requirement: "free", value: 1e-3 },
    { element: "Cd", role: "watched", requirement: "free", value: 1e-3 },
  ),
  ligands: [{ component: "S", activity: 0.5 }],
  frame: { pH: [1, 8], Eh: [-0.2, 1.2] },
};

const zincDust: PlanInputs = {
  ...unlessSaid,
  temperatureC: 55,
  preset: "sulfate",
  metals: metals(
    { element: "Cu", role: "gangue", requirement: "metal", value: 1e-6 },
    { element: "Cd", role: "gangue", requirement: "metal", value: 1e-6 },
    { element: "Zn", role: "target", requirement: "dissolved", value: 0.1 },
  ),
  ligands: [{ component: "S", activity: 0.5 }],
  frame: { pH: [1, 7], Eh: [-1.2, 0.6] },
  water: { bound: "none" },
};

const oxideHeap: PlanInputs = {
  ...unlessSaid,
  temperatureC: 25,
  preset: "sulfate",
  metals: metals(
    { element: "Cu", role: "target", requirement: "dissolved", value: 0.02 },
    { element: "Fe", role: "watched", requirement: "free", value: 0.02 },
  ),
  ligands: [{ component: "S", activity: 0.1 }],
  feedMinerals: ["CuO(s)"],
  frame: { pH: [0, 7], Eh: [-0.2, 1.2] },
};

const cyanideLeach: PlanInputs = {
  ...unlessSaid,
  temperatureC: 25,
  preset: "cyanide",
  metals: metals(
    { element: "Au", role: "target", requirement: "dissolved", value: 1e-5 },
    { element: "Ag", role: "target", requirement: "dissolved", value: 1e-5 },
    { element: "Fe", role: "gangue", requirement: "solid", value: 1e-6 },
  ),
  ligands: [{ component: "CN", activity: 0.01 }],
  frame: { pH: [9, 13], Eh: [-0.8, 0.6] },
  excludedHazards: [{ gas: "HCN", pHAtLeast: HCN_PH }],
};

const ammoniaLeach: PlanInputs = {
  ...unlessSaid,
  temperatureC: 45,
  preset: "ammonia_carbonate",
  metals: metals(
    { element: "Ni", role: "target", requirement: "dissolved", value: 0.1 },
    { element: "Co", role: "watched", requirement: "free", value: 5e-3 },
    { element: "Fe", role: "gangue", requirement: "solid", value: 1e-5 },
  ),
  ligands: [
    { component: "NH3", activity: 4 },
    { component: "C", activity: 1 },
  ],
  frame: { pH: [7, 13], Eh: [-0.8, 0.6] },
  controlBand: { pH: 0.2, Eh: 0.04 },
};

export const demoProjects = [
  { id: "demo-calcine", name: "Calcine circuit" },
  { id: "demo-heap", name: "Oxide heap" },
  { id: "demo-gold", name: "Gold plant" },
  { id: "demo-nickel", name: "Nickel pilot" },
];

export const demoPlans: DemoPlan[] = [
  {
    id: "demo-neutral-leach",
    project: "demo-calcine",
    name: "Neutral leach, second tank",
    description:
      "Zinc calcine in return acid: zinc dissolves while iron goes out as hydroxide; copper and cadmium are watched on their way to purification.",
    revisions: [
      {
        note: "First draft: the most stable solids, zinc and iron alone.",
        at: "2026-08-31T07:40:00.000Z",
        inputs: { ...neutralLeach, solidsBasis: "aged", metals: neutralLeach.metals.slice(0, 2) },
      },
      {
        note: "Fresh solids: goethite needs days at this temperature, ferrihydrite is what the tank makes. The iron edge moves up in pH.",
        at: "2026-09-08T12:15:00.000Z",
        inputs: { ...neutralLeach, metals: neutralLeach.metals.slice(0, 2) },
      },
      {
        note: "Copper and cadmium watched, after the thickener overflow showed both; zincite named as what the calcine brings.",
        at: "2026-09-21T06:55:00.000Z",
        inputs: { ...neutralLeach, feedMinerals: ["ZnO(s)"] },
      },
    ],
  },
  {
    id: "demo-zinc-dust",
    project: "demo-calcine",
    name: "Zinc-dust purification",
    description: "Copper and cadmium cemented on zinc dust from neutral solution; zinc itself has to stay dissolved.",
    revisions: [
      {
        note: "Copper alone, as in the first stage.",
        at: "2026-09-02T09:05:00.000Z",
        inputs: { ...zincDust, metals: zincDust.metals.filter(({ element }) => element !== "Cd") },
      },
      {
        note: "Cadmium down to 1e-6 as well: it takes most of the drive that the dust has.",
        at: "2026-09-24T13:30:00.000Z",
        inputs: zincDust,
      },
    ],
  },
  {
    id: "demo-oxide-heap",
    project: "demo-heap",
    name: "Oxide heap, acid on the last lift",
    description: "Copper oxide ore under raffinate; iron goes round with the liquor and is watched, not held back.",
    revisions: [{ note: "From the column tests.", at: "2026-09-10T10:20:00.000Z", inputs: oxideHeap }],
  },
  {
    id: "demo-cyanide-leach",
    project: "demo-gold",
    name: "Cyanide leach, first two tanks",
    description: "Gold and silver in aerated cyanide, iron left in the solids; lime keeps the pH above the HCN region.",
    revisions: [{ note: "At 500 mg/L sodium cyanide.", at: "2026-09-14T08:45:00.000Z", inputs: cyanideLeach }],
  },
  {
    id: "demo-ammonia-leach",
    project: "demo-nickel",
    name: "Ammonia-carbonate leach of reduced ore",
    description:
      "Nickel as ammines in ammonia and ammonium carbonate, cobalt watched, iron back to hydroxide on aeration.",
    revisions: [
      {
        note: "Ammonia and carbonate as in the pilot's first week.",
        at: "2026-09-17T14:10:00.000Z",
        inputs: ammoniaLeach,
      },
    ],
  },
];
