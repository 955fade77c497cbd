import { index, integer, primaryKey, sqliteTable, text } from "drizzle-orm/sqlite-core";
import type { PlanInputs } from "../../../shared/schemas/plan";
import { chemistryVersions } from "../chemistry/schema";
import { users } from "../members/schema";
import { projects } from "../projects/schema";

export const plans = sqliteTable(
  "plans",
  {
    id: text("id").primaryKey(),
    projectId: text("project_id")
      .notNull()
      .references(() => projects.id),
    name: text("name").notNull(),
    description: text("description").notNull(),
    archived: integer("archived", { mode: "boolean" }).notNull().default(false),
    invented: integer("invented", { mode: "boolean" }).notNull().default(false),
    /** raised by every change, of the row or of its revisions */
    version: integer("version").notNull().default(1),
    createdAt: text("created_at").notNull(),
    updatedAt: text("updated_at").notNull(),
  },
  (table) => [index("plans_project").on(table.projectId)],
);

/** Frozen: a revision is written once and never changed. Numbers run 1, 2, 3 ... within a plan. */
export const planRevisions = sqliteTable(
  "plan_revisions",
  {
    planId: text("plan_id")
      .notNull()
      .references(() => plans.id, { onDelete: "cascade" }),
    number: integer("number").notNull(),
    note: text("note").notNull(),
    authorId: text("author_id")
      .notNull()
      .references(() => users.id),
    createdAt: text("created_at").notNull(),
    dataVersion: text("data_version")
      .notNull()
      .references(() => chemistryVersions.id),
    inputs: text("inputs", { mode: "json" }).$type<PlanInputs>().notNull(),
  },
  (table) => [primaryKey({ columns: [table.planId, table.number] })],
);
