import { integer, sqliteTable, text } from "drizzle-orm/sqlite-core";

export const projects = sqliteTable("projects", {
  id: text("id").primaryKey(),
  siteName: text("site_name").notNull(),
  name: text("name").notNull(),
  /** demo data is invented and says so */
  invented: integer("invented", { mode: "boolean" }).notNull().default(false),
  createdAt: text("created_at").notNull(),
});
