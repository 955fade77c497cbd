import { z } from "./z";
import { pageQuery } from "./api";

const text = (max: number) => z.string().trim().max(max);
const analyte = text(20).min(1);

/** A stage of the circuit that a campaign tries. Its trials share a marker on the map and a line in the summary. */
export const campaignStage = z.object({
  /** short, as it stands in a trial: "NL" */
  code: text(12).min(1),
  name: text(80).min(1),
  /** the metal whose recovery the stage is judged by: dissolved in a leach, won out in a cementation */
  target: analyte,
  /** the metal that should stay in the solids; null where none is watched */
  gangue: analyte.nullable().default(null),
});
export type CampaignStage = z.output<typeof campaignStage>;

const codesAreUnique = (stages: readonly CampaignStage[], context: z.RefinementCtx): void => {
  stages.forEach(({ code }, i) => {
    if (stages.findIndex((other) => other.code === code) < i)
      context.addIssue({ code: "custom", path: [i, "code"], message: `stage ${code} stands twice` });
  });
};

const campaignFields = {
  code: text(24).min(1),
  title: text(160).min(1),
  /** what the campaign is to answer */
  question: text(1000),
  planId: z.string().min(1),
  /** the plan's revision the trials were laid out on */
  planRevision: z.number().int().positive(),
  notes: text(4000),
  stages: z.array(campaignStage).min(1, "a campaign needs at least one stage").max(12).superRefine(codesAreUnique),
};

export const campaignCreate = z.object({
  projectId: z.string().min(1),
  ...campaignFields,
  question: campaignFields.question.default(""),
  notes: campaignFields.notes.default(""),
});
export const campaignUpdate = z.object(campaignFields).partial();

export const campaignsQuery = pageQuery.extend({
  projectId: z.string().min(1).optional(),
  planId: z.string().min(1).optional(),
  deleted: z.enum(["true", "false", "all"]).default("false"),
  /** part of a code, a title or the question */
  search: z.string().trim().max(80).optional(),
  sort: z.enum(["code", "title", "updatedAt", "trialCount"]).default("updatedAt"),
  order: z.enum(["asc", "desc"]).default("desc"),
});

export type CampaignCreate = z.output<typeof campaignCreate>;

/** As the server answers. */
export interface CampaignRow extends CampaignCreate {
  id: string;
  projectName: string;
  planName: string;
  invented: boolean;
  version: number;
  createdAt: string; // ISO 8601
  updatedAt: string;
  deletedAt: string | null;
  trialCount: number;
  /** trials whose figures still rest on the stages before the last change: they are being worked out anew */
  figuresDue: number;
}
