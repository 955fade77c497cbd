import { libraryFrom } from "../../../shared/species/library";
import { ok, valueOf, type Outcome } from "../../../shared/outcome";
import type { ChemicalTables } from "../../../shared/schemas/chemistry";
import type { EditedSpecies } from "../../../shared/schemas/speciesEdit";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import type { Db } from "../../db/open";
import { mergedTables, type Edit } from "../speciesEdits/merge";
import { editedSpecies, editsInForce } from "../speciesEdits/rows";
import { keepVersion, keptVersion } from "./service";

/** The chemistry this server works with: as shipped, with the site's own edits. */
export interface Chemistry {
  /** as shipped */
  readonly curated: ChemicalTables;
  /** as shipped with the edits in force */
  readonly current: ChemicalTables;
  /** `current`, indexed */
  readonly data: ChemicalData;
  readonly edited: readonly EditedSpecies[];
  readonly inForce: readonly Edit[];
  /** edits that no longer fit the library as shipped and were left out, with the reason */
  readonly unfit: readonly { edit: Edit; why: string }[];
  /** the library of a version some revision froze; a failure where rules have become stricter since
   *  @throws Refusal NOT_FOUND */
  libraryOf: (version: string) => Outcome<ChemicalData>;
  /** to be called after the edits have changed */
  refresh: (now: Date) => void;
}

interface Fitted {
  data: ChemicalData;
  inForce: Edit[];
  unfit: { edit: Edit; why: string }[];
}

const built = (curated: ChemicalTables, edits: readonly Edit[]): Outcome<ChemicalData> =>
  libraryFrom(mergedTables(curated, edits));

/** All edits, or, where a newly shipped library no longer takes them together, as many as it takes, oldest first. */
function fitted(curated: ChemicalTables, edits: Edit[]): Fitted {
  const all = built(curated, edits);
  if (all.ok) return { data: all.value, inForce: edits, unfit: [] };
  let data = valueOf(libraryFrom(curated));
  const inForce: Edit[] = [];
  const unfit: Fitted["unfit"] = [];
  for (const edit of edits) {
    const next = built(curated, [...inForce, edit]);
    if (next.ok) {
      data = next.value;
      inForce.push(edit);
    } else unfit.push({ edit, why: next.error.message });
  }
  return { data, inForce, unfit };
}

const remembered = 8;

/** @param curated  the library as shipped, as the database keeps it */
export function createChemistry(db: Db, curated: ChemicalTables, now: Date): Chemistry {
  let standing: Fitted;
  let edited: EditedSpecies[];
  const older = new Map<string, Outcome<ChemicalData>>();
  const refresh = (at: Date): void => {
    standing = fitted(curated, editsInForce(db));
    edited = editedSpecies(db, curated, standing.inForce);
    keepVersion(db, standing.data.tables, at, { curatedVersion: curated.version, edited });
  };
  refresh(now);
  return {
    curated,
    get current() {
      return standing.data.tables;
    },
    get data() {
      return standing.data;
    },
    get edited() {
      return edited;
    },
    get inForce() {
      return standing.inForce;
    },
    get unfit() {
      return standing.unfit;
    },
    libraryOf(version) {
      if (version === standing.data.version) return ok(standing.data);
      const known = older.get(version);
      if (known) return known;
      const library = libraryFrom(keptVersion(db, version));
      if (older.size >= remembered) older.delete(older.keys().next().value ?? "");
      older.set(version, library);
      return library;
    },
    refresh,
  };
}
