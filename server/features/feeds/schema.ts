import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import type { FeedMineral, HeadAssay } from "../../../shared/schemas/feed";
import type { Entry } from "../../../shared/entry/readEntry";
import { projects } from "../projects/schema";

const entry = (name: string) => text(name, { mode: "json" }).$type<Entry>().notNull();

/** Numbers stand as they were typed. */
export const feeds = sqliteTable(
  "feeds",
  {
    id: text("id").primaryKey(),
    projectId: text("project_id")
      .notNull()
      .references(() => projects.id),
    name: text("name").notNull(),
    description: text("description").notNull(),
    heads: text("heads", { mode: "json" }).$type<HeadAssay[]>().notNull(),
    minerals: text("minerals", { mode: "json" }).$type<FeedMineral[]>().notNull(),
    carbonate: entry("carbonate"),
    moisture: entry("moisture"),
    p80: entry("p80"),
    solidDensity: entry("solid_density"),
    invented: integer("invented", { mode: "boolean" }).notNull().default(false),
    version: integer("version").notNull().default(1),
    createdAt: text("created_at").notNull(),
    updatedAt: text("updated_at").notNull(),
    deletedAt: text("deleted_at"),
  },
  (table) => [index("feeds_project").on(table.projectId)],
);
