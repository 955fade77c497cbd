import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import type { SpeciesRow } from "../../../shared/schemas/chemistry";
import type { SpeciesEditRow } from "../../../shared/schemas/speciesEdit";
import { users } from "../members/schema";

/** Rows of the site's own, kept apart from the library as shipped. A row is written once; taking it back closes it and keeps it. */
export const speciesEdits = sqliteTable(
  "species_edits",
  {
    number: integer("number").primaryKey({ autoIncrement: true }),
    speciesId: text("species_id").notNull(),
    row: text("row", { mode: "json" }).$type<SpeciesRow>().notNull(),
    citation: text("citation").notNull(),
    extrapolation: text("extrapolation", { mode: "json" }).$type<SpeciesEditRow["extrapolation"]>(),
    reason: text("reason").notNull(),
    authorId: text("author_id")
      .notNull()
      .references(() => users.id),
    createdAt: text("created_at").notNull(),
    version: integer("version").notNull().default(1),
    revertedAt: text("reverted_at"),
    revertedBy: text("reverted_by").references(() => users.id),
    revertReason: text("revert_reason").notNull().default(""),
  },
  (table) => [index("species_edits_species").on(table.speciesId)],
);
