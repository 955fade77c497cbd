import { sql } from "drizzle-orm";
import { foreignKey, index, integer, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { CampaignStage } from "../../../shared/schemas/campaign";
import { planRevisions } from "../plans/schema";
import { projects } from "../projects/schema";

export const campaigns = sqliteTable(
  "campaigns",
  {
    id: text("id").primaryKey(),
    projectId: text("project_id")
      .notNull()
      .references(() => projects.id),
    code: text("code").notNull(),
    title: text("title").notNull(),
    question: text("question").notNull(),
    planId: text("plan_id").notNull(),
    planRevision: integer("plan_revision").notNull(),
    notes: text("notes").notNull(),
    stages: text("stages", { mode: "json" }).$type<CampaignStage[]>().notNull(),
    invented: integer("invented", { mode: "boolean" }).notNull().default(false),
    version: integer("version").notNull().default(1),
    createdAt: text("created_at").notNull(),
    updatedAt: text("updated_at").notNull(),
    deletedAt: text("deleted_at"),
  },
  (table) => [
    foreignKey({
      columns: [table.planId, table.planRevision],
      foreignColumns: [planRevisions.planId, planRevisions.number],
    }),
    index("campaigns_plan").on(table.planId),
    uniqueIndex("campaigns_code")
      .on(table.projectId, table.code)
      .where(sql`deleted_at is null`),
  ],
);
