import { reagentById } from "../reach/reagents";
import type { Caution, HazardContext } from "./context";
import { limitsText } from "./exposure";
import { HCN_PH } from "./words";
import { chlorine, organicWithOxidant, oxygen } from "./oxidantRules";

export { hazardContext, type Caution, type CautionCode, type HazardContext } from "./context";

/** pH below which a named procedure is asked for. */
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
      limits: limitsText("HCN"),
      confirm: low ? "This set point runs under a named procedure" : null,
    },
  ];
}

const list = (words: string[]): string => words.join(" and ");

const cementingReagents: Readonly<Record<string, string>> = { "zinc-dust": "Zn", "iron-scrap": "Fe", aluminium: "Al" };

/** Elements of a feed mineral, read off its id. */
const holds = (id: string, element: string): boolean => new RegExp(`${element}(?![a-z])`).test(id.split("(s")[0] ?? id);

/** (b) Zinc, iron or aluminium as cementing metal in acid: arsine and stibine with arsenic or antimony; hydrogen anyway. The metal is one
 *  that the plan keeps dissolved while another is won as metal, or a reagent in use. */
function cementation(c: HazardContext): Caution[] {
  const wins = c.metals.some((m) => m.requirement === "metal");
  const dissolving = c.metals.filter((m) => wins && m.requirement === "dissolved").map((m) => m.element);
  const added = (c.circuit.reagents ?? []).flatMap((r) => cementingReagents[r] ?? []);
  const carriers = [...new Set([...dissolving, ...added])].filter((e) => e in cementing);
  if (carriers.length === 0) return [];
  if (c.setPoint !== null && c.setPoint.pH >= 7) return [];
  const named = carriers.map((e) => cementing[e] ?? e).join(" or ");
  const present = Object.keys(hydrides).filter(
    (e) =>
      c.components.includes(e) || c.metals.some((m) => m.element === e) || c.feedMinerals.some((id) => holds(id, e)),
  );
  const agents = (present.length === 0 ? Object.keys(hydrides) : present).map((e) => `${e}H3`);
  const arsine: Caution = {
    code: "ARSINE",
    agents,
    text:
      present.length === 0
        ? `Cementing with ${named} in acid makes arsine or stibine where the liquor holds arsenic or antimony above detection. This plan names neither: look at the assay before the test.`
        : `Cementing with ${named} in acid, with ${list(present.map((e) => hydrides[e]?.element ?? e))} in the plan: fresh hydrogen makes ${list(present.map((e) => hydrides[e]?.gas ?? e))}. Arsine has no useful odour warning.`,
    limits: agents.map(limitsText).join(" "),
    confirm: null,
  };
  const hydrogen: Caution = {
    code: "HYDROGEN",
    agents: ["H2"],
    text:
      `The cementing metal (${named}) also makes hydrogen from the liquor: vent it, and keep ignition away.` +
      (carriers.includes("Zn") ? " Zinc dust is combustible, and wet dust makes hydrogen in the drum." : ""),
    limits: limitsText("H2"),
    confirm: null,
  };
  return [arsine, hydrogen];
}

/** (c) Sulfide in the liquor or a sulfide mineral in the feed, pH under 4, no oxidant dosed. */
function hydrogenSulfide(c: HazardContext): Caution[] {
  const minerals = c.feedMinerals.filter(isSulfideMineral);
  if (minerals.length === 0 && !c.sulfideSulfur) return [];
  if (c.setPoint === null || c.setPoint.pH >= 4) return [];
  if (c.dosed.some((d) => oxidants.has(d)) || (c.circuit.reagents ?? []).some(isOxidant)) return [];
  return [
    {
      code: "H2S",
      agents: ["H2S"],
      text: `${minerals.length > 0 ? "A sulfide mineral" : "Sulfide"} meets acid below pH 4 with no oxidant dosed: H2S leaves the slurry, and dulls the sense of smell.`,
      limits: limitsText("H2S"),
      confirm: null,
    },
  ];
}
/** as defaults.csv names what is dosed */
const oxidants: ReadonlySet<string> = new Set(["persulfate", "chlorate", "peroxide", "nitrate"]);
/** Air alone does not count: a slurry that takes sulfide acid can be short of oxygen. */
const isOxidant = (id: string): boolean => id !== "air" && reagentById.get(id)?.kind === "oxidant";

/** (e) Ammonia above pH 9.5 and warmer than 40 C. */
function ammonia(c: HazardContext): Caution[] {
  if (!c.components.includes("NH3") || c.setPoint === null || c.setPoint.pH <= 9.5 || c.temperatureC <= 40) return [];
  return [
    {
      code: "NH3",
      agents: ["NH3"],
      text: "Ammonia above pH 9.5 and 40 C strips from the liquor: closed vessels and a scrubber; eyes first.",
      limits: limitsText("NH3"),
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
  ...chlorine(context),
  ...ammonia(context),
  ...organicWithOxidant(context),
  ...oxygen(context),
];
