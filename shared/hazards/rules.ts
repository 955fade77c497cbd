import type { PlanInputs } from "../schemas/plan";
import { SULFIDE_SULFUR } from "../selection/components";

/** What the rules look at: nothing but the plan's inputs and where its set point stands. */
export interface HazardContext {
  temperatureC: number;
  /** components that have a total: ligands and others */
  components: readonly string[];
  metals: readonly { element: string; requirement: string }[];
  feedMinerals: readonly string[];
  dosed: readonly string[];
  /** sulfide sulfur is in the plan: its couple is on, or it has a total of its own */
  sulfideSulfur: boolean;
  /** null while no window is open: a rule about the set point's pH then waits, one about acid does not */
  setPoint: { pH: number; Eh: number } | null;
}

export type CautionCode = "HCN" | "ARSINE" | "HYDROGEN" | "H2S" | "NH3";

export interface Caution {
  code: CautionCode;
  /** as it would be typed; the screen typesets it */
  agents: string[];
  text: string;
  /** US exposure values as recorded in December 2026; null for agents without one */
  limits: string | null;
  /** asks the user to name the procedure it runs under before it counts as read */
  confirm: string | null;
}

/** pH at and above which a cyanide liquor keeps most of its cyanide from leaving as HCN, and below which a named procedure is asked for. */
export const HCN_PH = 10.5;
export const HCN_CONFIRM_PH = 10.0;

const cementing: Readonly<Record<string, string>> = { Zn: "zinc", Fe: "iron", Al: "aluminium" };
const hydrides: Readonly<Record<string, { element: string; gas: string }>> = {
  As: { element: "arsenic", gas: "arsine" },
  Sb: { element: "antimony", gas: "stibine" },
};

/** Whether a mineral holds sulfur below zero: sulfur beside another element, and no oxygen (sulfates and thiosulfates hold it).
 *  @param id  as in the tables, `FeAsS(s,arsenopyrite)`     @returns  true for sulfides, disulfides and sulfosalts */
export function isSulfideMineral(id: string): boolean {
  const formula = id.replace(/\((s|l|g|aq)(,[^)]*)?\)$/, "");
  return /S(?![a-z])/.test(formula) && !/O(?![a-z])/.test(formula) && /[A-RT-Z]|S[a-z]/.test(formula);
}

/** (a) Cyanide and a set point under pH 10.5.
 *  @source  common practice; the exposure values are NIOSH and OSHA as recorded */
function hydrogenCyanide(c: HazardContext): Caution[] {
  if (!c.components.includes("CN") || c.setPoint === null || c.setPoint.pH >= HCN_PH) return [];
  const low = c.setPoint.pH < HCN_CONFIRM_PH;
  return [
    {
      code: "HCN",
      agents: ["HCN"],
      text:
        "Cyanide is in this liquor and the set point stands below pH 10.5, where cyanide leaves as HCN gas. Never acidify it; check pH before mixing streams or draining to a common sump." +
        (low ? " Cyanide destruction runs in this range, under a procedure of its own." : ""),
      limits: "HCN: NIOSH 4.7 ppm short-term (skin), OSHA 10 ppm (skin), IDLH 50 ppm (from memory).",
      confirm: low ? "This set point runs under a named procedure" : null,
    },
  ];
}

const list = (words: string[]): string => words.join(" and ");

/** (b) Zinc, iron or aluminium as cementing metal in acid: arsine and stibine with arsenic or antimony; hydrogen anyway. */
function cementation(c: HazardContext): Caution[] {
  const cements = c.metals.some((m) => m.requirement === "metal");
  const carriers = c.metals
    .filter((m) => m.requirement === "dissolved" && m.element in cementing)
    .map((m) => m.element);
  if (!cements || carriers.length === 0) return [];
  if (c.setPoint !== null && c.setPoint.pH >= 7) return [];
  const named = carriers.map((e) => cementing[e] ?? e).join(" or ");
  const present = Object.keys(hydrides).filter(
    (e) => c.components.includes(e) || c.metals.some((m) => m.element === e),
  );
  const arsine: Caution = {
    code: "ARSINE",
    agents: (present.length === 0 ? Object.keys(hydrides) : present).map((e) => `${e}H3`),
    text:
      present.length === 0
        ? `Cementing with ${named} in acid makes arsine or stibine where the liquor holds arsenic or antimony above detection. This plan names neither: look at the assay before the test.`
        : `Cementing with ${named} in acid, with ${list(present.map((e) => hydrides[e]?.element ?? e))} in the plan: fresh hydrogen makes ${list(present.map((e) => hydrides[e]?.gas ?? e))}. Arsine has no useful odour warning.`,
    limits:
      "AsH3: NIOSH ceiling 0.002 mg/m3 (15 min), OSHA 0.05 ppm, IDLH 3 ppm (from memory). SbH3: NIOSH 0.1 ppm, OSHA 0.1 ppm, IDLH 5 ppm.",
    confirm: null,
  };
  const hydrogen: Caution = {
    code: "HYDROGEN",
    agents: ["H2"],
    text:
      `The cementing metal (${named}) also makes hydrogen from the liquor: vent it, and keep ignition away.` +
      (carriers.includes("Zn") ? " Zinc dust is combustible, and wet dust makes hydrogen in the drum." : ""),
    limits: "H2: flammable from 4 to 75 % by volume in air (from memory).",
    confirm: null,
  };
  return [arsine, hydrogen];
}

/** (c) Sulfide in the liquor or a sulfide mineral in the feed, pH under 4, no oxidant dosed. */
function hydrogenSulfide(c: HazardContext): Caution[] {
  const minerals = c.feedMinerals.filter(isSulfideMineral);
  if (minerals.length === 0 && !c.sulfideSulfur) return [];
  if (c.setPoint === null || c.setPoint.pH >= 4) return [];
  if (c.dosed.some((d) => oxidants.has(d))) return [];
  return [
    {
      code: "H2S",
      agents: ["H2S"],
      text: `${minerals.length > 0 ? "A sulfide mineral" : "Sulfide"} meets acid below pH 4 with no oxidant dosed: H2S leaves the slurry, and dulls the sense of smell.`,
      limits: "H2S: NIOSH ceiling 10 ppm (10 min), OSHA ceiling 20 ppm, peak 50 ppm (10 min), IDLH 100 ppm.",
      confirm: null,
    },
  ];
}
/** as defaults.csv names what is dosed */
const oxidants: ReadonlySet<string> = new Set(["persulfate", "chlorate", "peroxide", "nitrate"]);

/** (e) Ammonia above pH 9.5 and warmer than 40 C. */
function ammonia(c: HazardContext): Caution[] {
  if (!c.components.includes("NH3") || c.setPoint === null || c.setPoint.pH <= 9.5 || c.temperatureC <= 40) return [];
  return [
    {
      code: "NH3",
      agents: ["NH3"],
      text: "Ammonia above pH 9.5 and 40 C strips from the liquor: closed vessels and a scrubber; eyes first.",
      limits: "NH3: NIOSH 25 ppm, short-term 35 ppm, OSHA 50 ppm, IDLH 300 ppm.",
      confirm: null,
    },
  ];
}

/** Cautions that a plan's set point triggers, cyanide first. Nothing is blocked; nothing passes without a word.
 *  @param context  from `hazardContext`, or built by hand     @returns  none to several, each with its own wording
 *  @source  common practice, and exposure values of NIOSH and OSHA as recorded; values marked "from memory" were not re-read */
export const cautionsFor = (context: HazardContext): Caution[] => [
  ...hydrogenCyanide(context),
  ...cementation(context),
  ...hydrogenSulfide(context),
  ...ammonia(context),
];

/** The part of a plan that the rules look at. */
export function hazardContext(
  inputs: Pick<
    PlanInputs,
    "temperatureC" | "ligands" | "others" | "metals" | "feedMinerals" | "dosed" | "sulfateReduction" | "preset"
  >,
  setPoint: { pH: number; Eh: number } | null,
): HazardContext {
  const components = [...inputs.ligands, ...inputs.others].map((c) => c.component);
  return {
    temperatureC: inputs.temperatureC,
    components,
    metals: inputs.metals.map(({ element, requirement }) => ({ element, requirement })),
    feedMinerals: inputs.feedMinerals,
    dosed: inputs.dosed,
    sulfideSulfur:
      components.includes(SULFIDE_SULFUR) ||
      (components.includes("S") && (inputs.sulfateReduction || inputs.preset === "sulfate_sulfide")),
    setPoint: setPoint && { pH: setPoint.pH, Eh: setPoint.Eh },
  };
}
