import { z } from "./z";
import { pageQuery } from "./api";
import { extrapolationRow, speciesRow, type ChemicalTables, type SpeciesRow } from "./chemistry";
import { reason } from "./history";

const text = (max: number) => z.string().trim().max(max);

/** A species of the site's own, or other numbers for one of the library. */
export const speciesEditCreate = z.object({
  row: speciesRow.extend({
    id: text(120).min(1),
    name: text(200),
    note: text(1000),
    /** codes of references.csv, or left empty where `citation` names the source */
    source: text(200).default(""),
  }),
  /** the source in full: author, year, table or page; needed where `row.source` names no reference of the library */
  citation: text(500).default(""),
  /** how a row without an entropy goes to T; left away it is held and flagged */
  extrapolation: extrapolationRow.omit({ id: true }).nullable().default(null),
  reason,
});

export const speciesEditsQuery = pageQuery.extend({
  species: z.string().min(1).optional(),
  active: z.enum(["true", "false", "all"]).default("all"),
});

/** As the server answers. Edits of one species lie on one another: the newest one not taken back is in force. */
export interface SpeciesEditRow {
  id: string;
  speciesId: string;
  kind: "added" | "overridden";
  row: SpeciesRow;
  /** of the library as shipped; null for an added species */
  curated: SpeciesRow | null;
  citation: string;
  extrapolation: z.output<typeof speciesEditCreate>["extrapolation"];
  reason: string;
  author: string;
  createdAt: string; // ISO 8601
  inForce: boolean;
  /** why it is left out although nobody took it back: the library shipped since does not take it */
  unfit: string | null;
  /** 1, or 2 once it was taken back */
  version: number;
  revertedAt: string | null;
  revertedBy: string | null;
  revertReason: string;
}

/** A species whose row was ever edited. */
export interface EditedSpecies {
  id: string;
  /** what the row in force is */
  state: "added" | "overridden" | "as shipped" | "taken back";
  /** the edit in force */
  editId: string | null;
  /** raised by every edit and every taking back: If-Match of the next edit; a species not listed is at 0 */
  version: number;
}

/** GET /api/chemistry: the tables in force, and which rows are not as shipped. */
export interface ChemistryAnswer extends ChemicalTables {
  curatedVersion: string;
  edited: EditedSpecies[];
}
