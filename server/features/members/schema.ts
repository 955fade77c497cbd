import { sqliteTable, text } from "drizzle-orm/sqlite-core";
import { memberRoles, type Preferences } from "../../../shared/schemas/member";

export const users = sqliteTable("users", {
  id: text("id").primaryKey(),
  /** lower case */
  email: text("email").notNull().unique(),
  name: text("name").notNull(),
  role: text("role", { enum: memberRoles }).notNull(),
  passwordHash: text("password_hash").notNull(),
  preferences: text("preferences", { mode: "json" }).$type<Preferences>().notNull(),
  createdAt: text("created_at").notNull(),
});
