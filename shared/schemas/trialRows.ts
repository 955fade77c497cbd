import { z } from "./z";
import type { CampaignRow } from "./campaign";
import { trialsQuery, type TrialFigures, type TrialKind, type TrialRow, type TrialStatus } from "./trial";
import type { Charge, Measured, Planned, Products } from "./trialRecord";

/** The parts of a trial that a list does not carry: GET /api/trials/:id has them. */
export type TrialRecordPart = "planned" | "measured" | "charge" | "samples" | "products";

/** A trial as a list shows it. */
export type TrialListRow = Omit<TrialRow, TrialRecordPart> & {
  /** code of the trial this one repeats */
  replicateOfCode: string | null;
};

/** Ids parted by commas, as a query carries them. */
const ids = z
  .string()
  .transform((text) => text.split(",").filter((id) => id !== ""))
  .pipe(z.array(z.string().max(80)).min(1).max(100));

/** Which trials the map of a plan shows: those of the plan's own campaigns, of the named campaigns, or of the whole project. */
export const mapTrialsQuery = z.object({
  campaignIds: ids.optional(),
  scope: z.enum(["plan", "project"]).default("plan"),
});

/** What decides whether a trial may be judged on a plan's map (trials/comparable.ts); of the assays the stage's target alone. */
export interface ComparedTrial {
  kind: TrialKind;
  planned: Pick<Planned, "tenor" | "ligands">;
  measured: Pick<Measured, "ligands">;
  charge: Pick<Charge, "liquorAssays" | "liquorDensity">;
  products: Pick<Products, "finalAssays" | "liquorDensity">;
  /** g/L of the target had all of it dissolved (trials/couldCarry.ts); null where that is not known */
  couldCarry?: number | null;
  /** g/L H2SO4 titrated in the final liquor (trials/trialAcid.ts); null where it was not */
  freeAcid?: number | null;
  /** where it is to stand (trials/plannedPoint.ts), V vs SHE; null where pH or ORP is not planned */
  plannedAt?: { pH: number; Eh: number; temperatureC: number | null } | null;
}

/** A trial as a point on the map, and the line of the table beside it. */
export interface MapTrial {
  id: string;
  code: string;
  campaignId: string;
  stage: string;
  status: TrialStatus;
  feedId: string;
  feedName: string;
  startedAt: string | null;
  /** reference electrode of its ORP; null without */
  electrode: string | null;
  compared: ComparedTrial;
  figures: TrialFigures;
}
export interface MapTrials {
  rows: MapTrial[];
  campaigns: Pick<CampaignRow, "id" | "code" | "title" | "planId" | "planRevision" | "stages">[];
}

/** What a file of trials holds a line of: trials with their figures, or their readings, or their assays as typed. */
export const trialsCsvQuery = trialsQuery
  .omit({ limit: true, offset: true })
  .extend({ lines: z.enum(["trials", "readings", "assays"]).default("trials") });
