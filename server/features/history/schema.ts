import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import { historyActions, type FieldChange } from "../../../shared/schemas/history";
import { users } from "../members/schema";

export const historyEntities = ["feed", "campaign", "trial", "plan", "member", "comment"] as const;
export type HistoryEntity = (typeof historyEntities)[number];

/** Every write to an editable row: who, when, what stood there, what changed, why. Added to, never changed. */
export const history = sqliteTable(
  "history",
  {
    id: integer("id").primaryKey({ autoIncrement: true }),
    entity: text("entity", { enum: historyEntities }).notNull(),
    entityId: text("entity_id").notNull(),
    /** of the row after the write */
    version: integer("version").notNull(),
    action: text("action", { enum: historyActions }).notNull(),
    at: text("at").notNull(),
    authorId: text("author_id")
      .notNull()
      .references(() => users.id),
    reason: text("reason").notNull(),
    /** the whole row as it stood; null where it was made */
    before: text("before", { mode: "json" }).$type<Record<string, unknown>>(),
    changes: text("changes", { mode: "json" }).$type<FieldChange[]>().notNull(),
  },
  (table) => [index("history_row").on(table.entity, table.entityId, table.version)],
);
