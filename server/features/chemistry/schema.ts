import { index, integer, primaryKey, real, sqliteTable, text } from "drizzle-orm/sqlite-core";
import type { EditedSpecies } from "../../../shared/schemas/speciesEdit";
import { grades, ionClasses, phases, type TableName } from "../../../shared/schemas/chemistry";

/** One row a version of the library, never changed: revisions of plans point at it. */
export const chemistryVersions = sqliteTable("chemistry_versions", {
  /** content hash of the tables */
  id: text("id").primaryKey(),
  createdAt: text("created_at").notNull(),
  /** the library as shipped that it rests on; null: it is one */
  curatedVersion: text("curated_version"),
  /** rows that were not as shipped then */
  edited: text("edited", { mode: "json" }).$type<EditedSpecies[]>().notNull().default([]),
});

const version = () =>
  text("version")
    .notNull()
    .references(() => chemistryVersions.id);

/** The species of each version, in the columns of the data files; `position` keeps their order. */
export const speciesRows = sqliteTable(
  "species_rows",
  {
    version: version(),
    position: integer("position").notNull(),
    id: text("id").notNull(),
    formula: text("formula").notNull(),
    name: text("name").notNull(),
    phase: text("phase", { enum: phases }).notNull(),
    charge: integer("charge").notNull(),
    composition: text("composition").notNull(),
    dGf_kJ: real("dGf_kJ").notNull(),
    dHf_kJ: real("dHf_kJ"),
    S_J: real("S_J"),
    Cp_J: real("Cp_J"),
    Cp_a: real("Cp_a"),
    Cp_b: real("Cp_b"),
    Cp_c: real("Cp_c"),
    Cp_Tmax_K: real("Cp_Tmax_K"),
    ion_class: text("ion_class", { enum: ionClasses }),
    grade: text("grade", { enum: grades }).notNull(),
    source: text("source").notNull(),
    note: text("note").notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.version, table.id] }),
    index("species_rows_order").on(table.version, table.position),
  ],
);

/** Rows of the smaller tables (references, presets, electrodes ...), one JSON object each. */
export const libraryRows = sqliteTable(
  "library_rows",
  {
    version: version(),
    table: text("table_name").$type<Exclude<TableName, "species">>().notNull(),
    position: integer("position").notNull(),
    row: text("row", { mode: "json" }).$type<Record<string, unknown>>().notNull(),
  },
  (table) => [primaryKey({ columns: [table.version, table.table, table.position] })],
);
