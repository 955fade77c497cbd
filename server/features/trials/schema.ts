import { sql } from "drizzle-orm";
import { index, integer, real, sqliteTable, text, uniqueIndex, type AnySQLiteColumn } from "drizzle-orm/sqlite-core";
import { trialKinds, trialStatuses } from "../../../shared/schemas/trial";
import type { ComparedTrial } from "../../../shared/schemas/trialRows";
import type { Charge, Measured, Planned, Products, Sample } from "../../../shared/schemas/trialRecord";
import { campaigns } from "../campaigns/schema";
import { feeds } from "../feeds/schema";
import { projects } from "../projects/schema";

/** One light row a trial: what lists sort and filter by and maps draw. Its record stands in `trial_records`. Everything from
 *  `recovery_pct` on is worked out from the record, by the formulas named in `formula_version`. */
export const trials = sqliteTable(
  "trials",
  {
    id: text("id").primaryKey(),
    /** that of its campaign */
    projectId: text("project_id")
      .notNull()
      .references(() => projects.id),
    campaignId: text("campaign_id")
      .notNull()
      .references(() => campaigns.id),
    feedId: text("feed_id")
      .notNull()
      .references(() => feeds.id),
    code: text("code").notNull(),
    /** so that NL-2 stands before NL-10 */
    codeKey: text("code_key").notNull(),
    kind: text("kind", { enum: trialKinds }).notNull(),
    stage: text("stage").notNull(),
    status: text("status", { enum: trialStatuses }).notNull(),
    statusReason: text("status_reason").notNull(),
    operator: text("operator").notNull(),
    startedAt: text("started_at"),
    /** the instant, whatever the offset it was typed with */
    startedMs: integer("started_ms"),
    endedAt: text("ended_at"),
    replicateOf: text("replicate_of").references((): AnySQLiteColumn => trials.id),
    notes: text("notes").notNull(),
    invented: integer("invented", { mode: "boolean" }).notNull().default(false),
    version: integer("version").notNull().default(1),
    createdAt: text("created_at").notNull(),
    updatedAt: text("updated_at").notNull(),
    deletedAt: text("deleted_at"),

    recoveryPct: real("recovery_pct"),
    recoveryLow: real("recovery_low"),
    recoveryHigh: real("recovery_high"),
    recoveryBasis: text("recovery_basis"),
    gangueDissolvedPct: real("gangue_dissolved_pct"),
    selectivityPct: real("selectivity_pct"),
    accountabilityPct: real("accountability_pct"),
    acidPerTonne: real("acid_per_tonne"),
    reagentPerKg: real("reagent_per_kg"),
    pH: real("ph"),
    pHCooled: integer("ph_cooled", { mode: "boolean" }).notNull(),
    Eh: real("eh"),
    EhUncertainty: real("eh_uncertainty"),
    temperatureC: real("temperature_c"),
    flags: text("flags", { mode: "json" }).$type<string[]>().notNull(),
    electrode: text("electrode"),
    compared: text("compared", { mode: "json" }).$type<ComparedTrial>().notNull(),
    formulaVersion: text("formula_version").notNull(),
  },
  (table) => [
    uniqueIndex("trials_code")
      .on(table.campaignId, table.code)
      .where(sql`deleted_at is null`),
    index("trials_campaign").on(table.campaignId),
    index("trials_project").on(table.projectId),
    index("trials_feed").on(table.feedId),
    index("trials_listed").on(table.deletedAt, table.campaignId),
    // With what the usual filters ask for: a list walks the index to its page and never touches the rows before it.
    ...sortedColumns(table).map((column) =>
      index(`trials_by_${column.name}`).on(column, table.id, table.deletedAt, table.campaignId),
    ),
  ],
);

/** Each can be asked for as the order of a list. */
function sortedColumns(table: Record<SortedColumn, AnySQLiteColumn>): AnySQLiteColumn[] {
  return [
    table.codeKey,
    table.status,
    table.stage,
    table.operator,
    table.startedMs,
    table.updatedAt,
    table.recoveryPct,
    table.gangueDissolvedPct,
    table.selectivityPct,
    table.accountabilityPct,
    table.acidPerTonne,
    table.reagentPerKg,
    table.pH,
    table.Eh,
    table.temperatureC,
  ];
}
type SortedColumn =
  | "codeKey"
  | "status"
  | "stage"
  | "operator"
  | "startedMs"
  | "updatedAt"
  | "recoveryPct"
  | "gangueDissolvedPct"
  | "selectivityPct"
  | "accountabilityPct"
  | "acidPerTonne"
  | "reagentPerKg"
  | "pH"
  | "Eh"
  | "temperatureC";

/** What was planned and measured, as it was typed. */
export const trialRecords = sqliteTable("trial_records", {
  trialId: text("trial_id")
    .primaryKey()
    .references(() => trials.id, { onDelete: "cascade" }),
  planned: text("planned", { mode: "json" }).$type<Planned>().notNull(),
  measured: text("measured", { mode: "json" }).$type<Measured>().notNull(),
  charge: text("charge", { mode: "json" }).$type<Charge>().notNull(),
  samples: text("samples", { mode: "json" }).$type<Sample[]>().notNull(),
  products: text("products", { mode: "json" }).$type<Products>().notNull(),
});
