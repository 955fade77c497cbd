import { z } from "./z";
import { pageQuery } from "./api";
import { entryOf } from "./entry";

const text = (max: number) => z.string().trim().max(max);

/** One head assay. Several may stand for one element; the one marked `head` is the one accounts use. */
export const headAssay = z.object({
  element: text(20).min(1),
  value: entryOf("solidAssay"),
  method: text(120).default(""),
  laboratory: text(120).default(""),
  /** this is the head of its element */
  head: z.boolean().default(false),
});

export const feedMineral = z.object({
  /** id of a species of the library, as `CuO(s)`, or free text */
  mineral: text(80).min(1),
  /** which metal's share is meant */
  element: text(20).min(1),
  /** share of that metal held by this mineral */
  share: entryOf("share"),
});

const headsAreUnique = (heads: readonly z.output<typeof headAssay>[], context: z.RefinementCtx): void => {
  heads.forEach(({ element, head }, i) => {
    if (head && heads.findIndex((other) => other.head && other.element === element) < i)
      context.addIssue({
        code: "custom",
        path: [i, "head"],
        message: `${element} has two assays marked as the head; only one can be`,
      });
  });
};

const feedFields = {
  name: text(120).min(1),
  description: text(2000),
  heads: z.array(headAssay).max(200).superRefine(headsAreUnique),
  minerals: z.array(feedMineral).max(100),
  /** carbonate of the gangue, as CaCO3 */
  carbonate: entryOf("share"),
  /** water in the feed as received, of the wet mass */
  moisture: entryOf("share"),
  p80: entryOf("size"),
  solidDensity: entryOf("density", "t/m3"),
};

export const feedCreate = z.object({
  projectId: z.string().min(1),
  ...feedFields,
  description: feedFields.description.default(""),
  heads: feedFields.heads.default([]),
  minerals: feedFields.minerals.default([]),
});
/** Only what is given changes; a list is replaced as a whole. */
export const feedUpdate = z
  .object({
    ...feedFields,
    carbonate: feedFields.carbonate.removeDefault(),
    moisture: feedFields.moisture.removeDefault(),
    p80: feedFields.p80.removeDefault(),
    solidDensity: feedFields.solidDensity.removeDefault(),
  })
  .partial();

export const feedsQuery = pageQuery.extend({
  projectId: z.string().min(1).optional(),
  deleted: z.enum(["true", "false", "all"]).default("false"),
  /** part of a name or the description */
  search: z.string().trim().max(80).optional(),
  sort: z.enum(["name", "updatedAt", "trialCount"]).default("name"),
  order: z.enum(["asc", "desc"]).default("asc"),
});

export type FeedCreate = z.output<typeof feedCreate>;
export type HeadAssay = z.output<typeof headAssay>;
export type FeedMineral = z.output<typeof feedMineral>;

/** What accounts need of a feed. */
export type Feed = Omit<FeedCreate, "projectId">;

/** As the server answers. */
export interface FeedRow extends FeedCreate {
  id: string;
  projectName: string;
  invented: boolean;
  version: number;
  createdAt: string; // ISO 8601
  updatedAt: string;
  deletedAt: string | null;
  trialCount: number;
  /** trials whose figures still rest on what stood here before the last change: they are being worked out anew */
  figuresDue: number;
}
