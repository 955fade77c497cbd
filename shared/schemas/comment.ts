import { z } from "./z";
import { pageQuery } from "./api";

const text = z.string().trim().min(1, "a comment needs words").max(4000);

/** What a comment points at beside its plan: a revision, a point of the map, a limit of a window in words. None, one or several. */
export const commentAnchor = z.object({
  revision: z.number().int().min(1).nullable().default(null),
  /** pH and V vs SHE */
  point: z
    .object({ pH: z.number().min(-10).max(30), Eh: z.number().min(-10).max(10) })
    .nullable()
    .default(null),
  /** "window A, high pH: zinc precipitates", as the screen said it at that moment */
  limit: z.string().trim().min(1).max(200).nullable().default(null),
});
export type CommentAnchor = z.infer<typeof commentAnchor>;

export const commentCreate = commentAnchor.extend({ text });
/** What it points at stays; its words may be put better. */
export const commentUpdate = z.object({ text: text.optional() });
export const commentsQuery = pageQuery.extend({ deleted: z.enum(["true", "false", "all"]).default("false") });

/** As the server answers. */
export interface CommentRow extends CommentAnchor {
  id: string;
  planId: string;
  text: string;
  authorId: string;
  author: string;
  /** above 1: reworded, removed or brought back since */
  version: number;
  createdAt: string; // ISO 8601
  updatedAt: string;
  deletedAt: string | null;
}
