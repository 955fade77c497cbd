import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import { users } from "../members/schema";

/** In the shape the session library asks for; expiresAt in seconds. */
export const sessions = sqliteTable(
  "sessions",
  {
    id: text("id").primaryKey(),
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    expiresAt: integer("expires_at").notNull(),
  },
  (table) => [index("sessions_user").on(table.userId)],
);
