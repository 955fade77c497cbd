import type { Agent } from "supertest";
import { expect } from "vitest";
import type { ProjectRow } from "../../shared/schemas/api";
import type { CampaignCreate, CampaignRow } from "../../shared/schemas/campaign";
import type { FeedCreate, FeedRow } from "../../shared/schemas/feed";
import type { PlanRow } from "../../shared/schemas/plan";
import type { PlanInputs } from "../../shared/schemas/plan";
import type { TrialCreate, TrialInput, TrialRow } from "../../shared/schemas/trial";

/** A typed number. */
export const typed = (text: string, unit: string) => ({ text, unit });

/** A feed in which no field is blank, typed as people type. */
export const unusualFeed: Omit<FeedCreate, "projectId"> = {
  name: "Roast 7, north bin",
  description: "Composite of two shifts.",
  heads: [
    { element: "Zn", value: typed("56,4", "%"), method: "titration", laboratory: "works", head: false },
    { element: "Zn", value: typed("55.8", "%"), method: "XRF", laboratory: "outside", head: true },
    { element: "Fe", value: typed("9.1", "%"), method: "XRF", laboratory: "outside", head: true },
    { element: "Ag", value: typed("<20", "g/t"), method: "fire assay", laboratory: "outside", head: true },
  ],
  minerals: [{ mineral: "ZnO(s)", element: "Zn", share: typed("88", "%") }],
  carbonate: typed("0.4", "%"),
  moisture: typed("1,5", "%"),
  p80: typed("0.075", "mm"),
  solidDensity: typed("5.1", "t/m3"),
};

/** Zinc dissolved, iron solid, in sulfate: the plan the records below are laid out on. */
export const zincInputs: PlanInputs = {
  temperatureC: 60,
  preset: "sulfate",
  metals: [
    {
      element: "Zn",
      role: "target",
      requirement: "dissolved",
      entry: "activity",
      value: 0.08,
      gammaFrom: "one",
      gamma: null,
    },
    {
      element: "Fe",
      role: "gangue",
      requirement: "solid",
      entry: "activity",
      value: 1e-5,
      gammaFrom: "one",
      gamma: null,
    },
  ],
  ligands: [{ component: "S", activity: 0.5 }],
  others: [],
  ionicStrength: null,
  sulfateReduction: false,
  solidsBasis: "fresh",
  feedMinerals: [],
  dosed: [],
  leftOut: [],
  putBack: [],
  frame: { pH: [1, 8], Eh: [-0.2, 1.2] },
  water: { bound: "both" },
  controlBand: { pH: 0.15, Eh: 0.03 },
};

export const unusualCampaign: Omit<CampaignCreate, "projectId" | "planId"> = {
  code: "C-26A",
  title: "Neutral leach, acid and time",
  question: "Does the second hour pay?",
  planRevision: 1,
  notes: "Bench 2 only.",
  stages: [
    { code: "NL", name: "neutral leach", target: "Zn", gangue: "Fe" },
    { code: "CE", name: "copper cementation", target: "Cu", gangue: null },
  ],
};

const zn = (text: string, unit = "g/L") => ({ analyte: "Zn", value: typed(text, unit), method: "ICP" });
const fe = (text: string, unit = "g/L") => ({ analyte: "Fe", value: typed(text, unit), method: "ICP" });
const acid = (text: string) => ({ analyte: "H2SO4", value: typed(text, "g/L"), method: "titration" });

/** A leach in which every field has a value of its own; its account closes. 50 g of calcine at 55.8 % Zn into 0.5 L of return acid. */
export const unusualTrial: Omit<TrialCreate, "campaignId" | "feedId"> = {
  code: "NL-07",
  kind: "leach",
  stage: "NL",
  status: "balanced",
  statusReason: "assays came on Friday",
  operator: "Bench 2",
  startedAt: "2026-04-29T08:15:00+02:00",
  endedAt: "2026-04-29T11:15:00+02:00",
  replicateOf: null,
  planned: {
    temperature: typed("60", "C"),
    pH: typed("4.2", "pH"),
    orp: { value: typed("430", "mV"), electrode: "AGCL-3M", electrodeTemperature: typed("25", "C") },
    freeAcid: typed("1", "g/L"),
    tenor: typed("95", "g/L"),
    ligands: [{ component: "S", value: typed("1.4", "mol/L") }],
    doses: [
      {
        role: "acid",
        reagent: "H2SO4",
        amount: typed("40", "g"),
        strength: typed("98", "% w/w"),
        density: typed("1.84", "kg/L"),
        at: typed("0.1", "h"),
        reason: "initial",
      },
    ],
    cementingMetal: { metal: "Zn", dosed: typed("1", "g"), active: typed("95", "%"), unreacted: typed("0.1", "g") },
    solids: typed("10", "% w/w"),
    p80: typed("75", "um"),
    duration: typed("180", "min"),
  },
  measured: {
    readings: [
      {
        at: typed("1", "h"),
        temperature: typed("58,5", "C"),
        pH: { value: typed("3.9", "pH"), temperature: typed("58.5", "C"), cooledSample: false },
        orp: { value: typed("-12", "mV"), electrode: "SCE", electrodeTemperature: typed("22", "C") },
        note: "foam",
      },
      {
        at: typed("3", "h"),
        temperature: typed("61", "C"),
        pH: { value: typed("4,35", "pH"), temperature: typed("25", "C"), cooledSample: true },
        orp: { value: typed("412", "mV"), electrode: "AGCL-3M", electrodeTemperature: typed("25", "C") },
        note: "settled",
      },
    ],
    ligands: [{ component: "S", value: typed("1.3", "mol/L") }],
    doses: [
      {
        role: "acid",
        reagent: "H2SO4",
        amount: typed("20", "mL"),
        strength: typed("96", "% w/w"),
        density: typed("1.835", "kg/L"),
        at: typed("0.5", "h"),
        reason: "pH control",
      },
    ],
    cementingMetal: { metal: "Zn", dosed: typed("2", "g"), active: typed("94", "%"), unreacted: typed("0.2", "g") },
    solids: typed("9.5", "% w/w"),
    p80: typed("82", "um"),
    duration: typed("185", "min"),
  },
  charge: {
    wetMass: typed("50.76", "g"),
    moisture: typed("1.5", "%"),
    dryMass: typed("50,0", "g"),
    liquorVolume: typed("500", "mL"),
    liquorDensity: typed("1.18", "kg/L"),
    liquorAssays: [zn("45"), fe("0.02"), acid("70")],
  },
  samples: [
    {
      at: typed("1", "h"),
      volume: typed("10", "mL"),
      assays: [zn("80"), fe("<0.005")],
      makeUpVolume: typed("10", "mL"),
      makeUpAssays: [zn("45")],
      drySolids: typed("0.2", "g"),
      solidsAssays: [zn("12", "%")],
    },
  ],
  products: {
    vesselVolume: typed("0.5", "L"),
    filtrateVolume: typed("0.46", "L"),
    liquorDensity: typed("1.2", "kg/L"),
    finalAssays: [zn("95.2"), fe("0.004"), acid("2")],
    washVolume: typed("0.3", "L"),
    washAssays: [zn("1.1")],
    residueDryMass: typed("14.1", "g"),
    residueAssays: [zn("16.4", "%"), fe("32", "%")],
  },
  notes: '=HYPERLINK("http://x.example")',
};

/** The least a trial needs. */
export const bareTrial: Omit<TrialInput, "campaignId" | "feedId"> = { code: "NL-08", kind: "leach", stage: "NL" };

const made = async <Row>(client: Agent, path: string, values: object): Promise<Row> => {
  const answer = await client.post(path).send(values);
  if (answer.status !== 201) expect.fail(`POST ${path}: ${answer.text}`);
  return answer.body as Row;
};

export interface Bench {
  project: ProjectRow;
  plan: PlanRow;
  feed: FeedRow;
  campaign: CampaignRow;
  addFeed: (values?: Partial<FeedCreate>) => Promise<FeedRow>;
  addCampaign: (values?: Partial<CampaignCreate>) => Promise<CampaignRow>;
  addTrial: (values?: Partial<TrialInput>, client?: Agent) => Promise<TrialRow>;
}

/** A project with a plan, a feed and a campaign, made by a metallurgist. */
export async function bench(metallurgist: Agent, inputs = zincInputs): Promise<Bench> {
  const project = await made<ProjectRow>(metallurgist, "/api/projects", { siteName: "North works", name: "Calcine" });
  const projectId = project.id;
  const plan = await made<PlanRow>(metallurgist, "/api/plans", { projectId, name: "tank 2", inputs });
  const addFeed = (values = {}) => made<FeedRow>(metallurgist, "/api/feeds", { projectId, ...unusualFeed, ...values });
  const addCampaign = (values = {}) =>
    made<CampaignRow>(metallurgist, "/api/campaigns", { projectId, planId: plan.id, ...unusualCampaign, ...values });
  const [feed, campaign] = [await addFeed(), await addCampaign()];
  const addTrial = (values = {}, client = metallurgist) =>
    made<TrialRow>(client, "/api/trials", { campaignId: campaign.id, feedId: feed.id, ...unusualTrial, ...values });
  return { project, plan, feed, campaign, addFeed, addCampaign, addTrial };
}
