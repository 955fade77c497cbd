import { z } from "zod";
import { trialsQuery, type TrialFigures, type TrialKind, type TrialRow, type TrialStatus } from "./trial";

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

/** A trial as a point on the map, and the line of the table beside it. */
export interface MapTrial {
  id: string;
  code: string;
  campaignId: string;
  campaignCode: string;
  /** the plan and revision the campaign was laid out on */
  planRevision: number;
  stage: string;
  kind: TrialKind;
  status: TrialStatus;
  feedId: string;
  /** of the stage's target in the liquor, g/L; null where it was not assayed */
  tenor: number | null;
  /** totals as measured, else as planned */
  ligands: { component: string; value: number; unit: string }[];
  figures: TrialFigures;
}
export interface MapTrials {
  rows: MapTrial[];
  campaigns: { id: string; code: string; title: string; planId: string; planRevision: number }[];
}

/** What a file of trials holds a line of: trials with their figures, or their readings, or their assays as typed. */
export const trialsCsvQuery = trialsQuery
  .omit({ limit: true, offset: true })
  .extend({ lines: z.enum(["trials", "readings", "assays"]).default("trials") });
