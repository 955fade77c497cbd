import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import type { CommentAnchor } from "../../../shared/schemas/comment";
import { users } from "../members/schema";
import { plans } from "../plans/schema";

/** What members say of a plan, a revision of it, a point of its map or a limit of its window. */
export const comments = sqliteTable(
  "comments",
  {
    id: text("id").primaryKey(),
    planId: text("plan_id")
      .notNull()
      .references(() => plans.id),
    authorId: text("author_id")
      .notNull()
      .references(() => users.id),
    text: text("text").notNull(),
    /** null: the plan as a whole, or a point or limit of it whatever the revision */
    revision: integer("revision"),
    point: text("point", { mode: "json" }).$type<CommentAnchor["point"]>(),
    limit: text("limit_words"),
    version: integer("version").notNull().default(1),
    createdAt: text("created_at").notNull(),
    updatedAt: text("updated_at").notNull(),
    deletedAt: text("deleted_at"),
  },
  (table) => [index("comments_plan").on(table.planId, table.createdAt)],
);
