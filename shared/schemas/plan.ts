import { z } from "./z";
import { hazardGases } from "../hazards/gases";
import { circuitSchema } from "./circuit";
import {
  componentTotal,
  controlBandSchema,
  excludedHazards,
  frameSchema,
  requirements,
  roles,
  solidsBases,
  TEMPERATURE_RANGE_C,
  waterSchema,
} from "./problem";

export const presetNames = [
  "sulfate",
  "sulfate_sulfide",
  "chloride",
  "ammonia",
  "ammonia_carbonate",
  "cyanide",
  "carbonate",
  "thiosulfate_ammonia",
  "glycine",
  "water",
] as const;
export type PresetName = (typeof presetNames)[number];

/** One metal line of a plan: the typed number and how it is to be read. */
export const planMetal = z.object({
  element: z.string().min(1),
  role: z.enum(roles),
  requirement: z.enum(requirements),
  /** activity entered as such, or a tenor in g/L turned into one */
  entry: z.enum(["activity", "gPerL"]),
  value: z.number().positive().max(1000),
  gammaFrom: z.enum(["one", "davies", "typed"]),
  gamma: z.number().positive().max(100).nullable(),
});
export type PlanMetal = z.infer<typeof planMetal>;

const rising = z.tuple([z.number(), z.number()]).refine(([lo, hi]) => lo <= hi, { message: "the range must rise" });

/** Ranges over which a window is to hold; the solver itself does not see them. */
export const holdRanges = z.object({
  temperatureC: rising
    .refine(([lo, hi]) => lo >= TEMPERATURE_RANGE_C.min && hi <= TEMPERATURE_RANGE_C.max, {
      message: `the temperatures must lie in ${TEMPERATURE_RANGE_C.min} to ${TEMPERATURE_RANGE_C.max} C`,
    })
    .optional(),
  /** activity by element */
  activities: z
    .record(
      z.string(),
      rising.refine(([lo]) => lo > 0, { message: "an activity must be above 0" }),
    )
    .optional(),
});
export type HoldRanges = z.infer<typeof holdRanges>;

/** A total of the liquor: mol/L is what counts, and what it was typed in is how it is shown. */
export const planTotal = componentTotal.extend({ unit: z.literal("g/L").optional() });
export type PlanTotal = z.infer<typeof planTotal>;

/** A control band typed in g/L of free acid: the pH band beside it is its conversion at this pH, made when it was typed. */
export const freeAcidBand = z.object({ gPerL: z.number().positive().max(500), atPH: z.number().min(-2).max(1.5) });
export type FreeAcidBand = z.infer<typeof freeAcidBand>;

/** How an overall reaction is to be written, by what it starts from: products by component, and what closes its electrons. */
export const overallChoice = z.object({
  products: z.record(z.string(), z.string()).optional(),
  /** an id of reactions/redoxReagents.ts, or "open": electrons stay */
  redox: z.string().optional(),
});
export type OverallChoice = z.infer<typeof overallChoice>;

/** Everything a plan asks; a revision freezes it. */
export const planInputs = z.object({
  temperatureC: z.number().min(TEMPERATURE_RANGE_C.min).max(TEMPERATURE_RANGE_C.max),
  preset: z.enum(presetNames),
  metals: z.array(planMetal).min(1).max(16),
  ligands: z.array(planTotal),
  others: z.array(planTotal),
  /** mol/kg, for Davies; null: gamma 1 */
  ionicStrength: z.number().positive().max(20).nullable(),
  sulfateReduction: z.boolean(),
  solidsBasis: z.enum(solidsBases),
  feedMinerals: z.array(z.string()),
  dosed: z.array(z.string()),
  leftOut: z.array(z.object({ species: z.string(), reason: z.string().min(1) })),
  putBack: z.array(z.string()),
  frame: frameSchema,
  water: waterSchema,
  controlBand: controlBandSchema,
  /** absent: the band of pH was typed as pH */
  freeAcidBand: freeAcidBand.optional(),
  /** choices for overall reactions, by species id of the start; the window does not see them */
  overall: z.record(z.string(), overallChoice).optional(),
  /** gases whose ground windows keep out of; absent in plans from before there were any: none */
  excludedHazards: excludedHazards.optional(),
  /** for the caution rules alone; the solver does not see it */
  circuit: circuitSchema.optional(),
  /** over which the window is to hold; absent: only what the plan says */
  ranges: holdRanges.optional(),
  /** a set point placed by hand, V vs SHE; absent: the deepest point of the window */
  heldSetPoint: z.object({ pH: z.number(), Eh: z.number() }).optional(),
});
export type PlanInputs = z.infer<typeof planInputs>;

export const planCreate = z.object({
  projectId: z.string().min(1),
  name: z.string().trim().min(1).max(120),
  description: z.string().max(2000).default(""),
  inputs: planInputs,
});
export const planUpdate = z.object({
  name: z.string().trim().min(1).max(120).optional(),
  description: z.string().max(2000).optional(),
  archived: z.boolean().optional(),
});
export const revisionCreate = z.object({ note: z.string().trim().max(500), inputs: planInputs });

/** What a window sheet shows beside the revision itself: a scale beside SHE (an electrode of electrodes.csv at its temperature, C; the
 *  liquor's unless given), the window it speaks of (the best unless given; one that is not there gives the best), and the gases whose regions
 *  are drawn, parted by commas (those that reach the window unless given); and the reagents whose reach is told, likewise (the usual ones of
 *  the liquor unless given). */
export const windowSheetQuery = z.object({
  electrode: z.string().min(1).max(40).optional(),
  electrodeC: z.coerce.number().min(0).max(100).optional(),
  window: z.coerce.number().int().min(0).max(999).optional(),
  gases: z
    .string()
    .max(200)
    .transform((text) => text.split(",").filter((gas) => gas !== ""))
    .pipe(z.array(z.enum(hazardGases)))
    .optional(),
  reach: z
    .string()
    .max(1000)
    .transform((text) => text.split(",").filter((id) => id !== ""))
    .optional(),
});

/** As the server answers. */
export interface RevisionRow {
  planId: string;
  number: number;
  note: string;
  author: string;
  createdAt: string; // ISO 8601
  dataVersion: string;
  inputs: PlanInputs;
}
export interface PlanRow {
  id: string;
  projectId: string;
  projectName: string;
  siteName: string;
  name: string;
  description: string;
  /** demo data is invented and says so */
  invented: boolean;
  archived: boolean;
  version: number;
  createdAt: string;
  updatedAt: string;
  revisionCount: number;
  /** those taken back not counted */
  commentCount: number;
  latest: RevisionRow;
  /** the library changed since the latest revision in species that it may use; it keeps its own until it is saved again */
  dataOutdated: boolean;
  /** which ones */
  changedSpecies: string[];
}
