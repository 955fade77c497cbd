import { and, asc, count, desc, eq, isNotNull, isNull } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import type { z } from "zod";
import type { ChemicalTables } from "../../../shared/schemas/chemistry";
import type { EditedSpecies, SpeciesEditRow, speciesEditsQuery } from "../../../shared/schemas/speciesEdit";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import { users } from "../members/schema";
import type { Edit } from "./merge";
import { speciesEdits } from "./schema";

/** The newest edit of each species that was not taken back, oldest first. */
export function editsInForce(db: Db): Edit[] {
  const standing = db
    .select()
    .from(speciesEdits)
    .where(isNull(speciesEdits.revertedAt))
    .orderBy(asc(speciesEdits.number));
  const newest = new Map(standing.all().map((edit) => [edit.speciesId, edit]));
  return [...newest.values()].sort((p, q) => p.number - q.number);
}

/** Every species that was ever edited. */
export function editedSpecies(db: Db, curated: ChemicalTables, inForce: readonly Edit[]): EditedSpecies[] {
  const shipped = new Set(curated.species.map(({ id }) => id));
  const standing = new Map(inForce.map((edit) => [edit.speciesId, edit]));
  const counted = db
    .select({ id: speciesEdits.speciesId, edits: count(), reverted: count(speciesEdits.revertedAt) })
    .from(speciesEdits)
    .groupBy(speciesEdits.speciesId)
    .orderBy(asc(speciesEdits.speciesId))
    .all();
  return counted.map(({ id, edits, reverted }) => {
    const edit = standing.get(id);
    const state = edit ? (shipped.has(id) ? "overridden" : "added") : shipped.has(id) ? "as shipped" : "taken back";
    return { id, state, editId: edit ? String(edit.number) : null, version: edits + reverted };
  });
}

const reverters = alias(users, "reverters");

const selectEdits = (db: Db) =>
  db
    .select({ edit: speciesEdits, author: users.name, revertedBy: reverters.name })
    .from(speciesEdits)
    .innerJoin(users, eq(users.id, speciesEdits.authorId))
    .leftJoin(reverters, eq(reverters.id, speciesEdits.revertedBy));
type Selected = NonNullable<ReturnType<ReturnType<typeof selectEdits>["get"]>>;

/** What tells a stored edit from an edit in force, and both from the library as shipped. */
export interface Standing {
  curated: ChemicalTables;
  inForce: readonly Edit[];
  unfit: readonly { edit: Edit; why: string }[];
}

function asRow({ edit, author, revertedBy }: Selected, { curated, inForce, unfit }: Standing): SpeciesEditRow {
  const { number, authorId: _, ...rest } = edit;
  const shipped = curated.species.find(({ id }) => id === edit.speciesId) ?? null;
  return {
    ...rest,
    id: String(number),
    kind: shipped ? "overridden" : "added",
    curated: shipped,
    author,
    revertedBy,
    inForce: inForce.some((standing) => standing.number === number),
    unfit: unfit.find((left) => left.edit.number === number)?.why ?? null,
  };
}

/** Newest first. */
export function listEdits(db: Db, standing: Standing, query: z.output<typeof speciesEditsQuery>) {
  const { species, active, limit, offset } = query;
  const filter = and(
    species === undefined ? undefined : eq(speciesEdits.speciesId, species),
    active === "all"
      ? undefined
      : active === "true"
        ? isNull(speciesEdits.revertedAt)
        : isNotNull(speciesEdits.revertedAt),
  );
  const rows = selectEdits(db).where(filter).orderBy(desc(speciesEdits.number)).limit(limit).offset(offset).all();
  const total = db.select({ n: count() }).from(speciesEdits).where(filter).get()?.n ?? 0;
  return { rows: rows.map((row) => asRow(row, standing)), total };
}

/** @throws Refusal NOT_FOUND */
export function editOf(db: Db, standing: Standing, id: string): SpeciesEditRow {
  const found =
    /^\d{1,9}$/.test(id) &&
    selectEdits(db)
      .where(eq(speciesEdits.number, Number(id)))
      .get();
  if (!found) throw new Refusal("NOT_FOUND", "id", `There is no edit ${id} of the library.`);
  return asRow(found, standing);
}
