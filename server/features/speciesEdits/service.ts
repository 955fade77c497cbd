import { count, eq } from "drizzle-orm";
import type { z } from "zod";
import { libraryFrom } from "../../../shared/species/library";
import type { Failure } from "../../../shared/outcome";
import type { speciesEditCreate, SpeciesEditRow } from "../../../shared/schemas/speciesEdit";
import type { Db } from "../../db/open";
import { Refusal } from "../../http/refusal";
import type { Chemistry } from "../chemistry/library";
import { differenceBetween } from "../history/difference";
import type { Author } from "../history/service";
import { mergedTables } from "./merge";
import { editOf, editsInForce } from "./rows";
import { speciesEdits } from "./schema";

type Values = z.output<typeof speciesEditCreate>;

/** H^+(aq) is the zero of every Gibbs energy here. */
const zero = "H^+(aq)";

/** Times a species was edited and an edit of it taken back. */
function speciesVersion(db: Db, speciesId: string): number {
  const found = db
    .select({ edits: count(), reverted: count(speciesEdits.revertedAt) })
    .from(speciesEdits)
    .where(eq(speciesEdits.speciesId, speciesId))
    .get();
  return (found?.edits ?? 0) + (found?.reverted ?? 0);
}

function requireUnchanged(db: Db, chemistry: Chemistry, { row: yours }: Values, seen: number): void {
  const version = speciesVersion(db, yours.id);
  if (version === seen) return;
  const theirs = chemistry.data.species.get(yours.id)?.row ?? null;
  const base = chemistry.curated.species.find(({ id }) => id === yours.id) ?? null;
  const message = `${yours.id} was edited meanwhile: it is at version ${version}, you saw version ${seen}.`;
  const difference = theirs ? differenceBetween(base, yours, theirs) : [];
  throw new Refusal("STALE", "If-Match", message, { current: { row: theirs, version }, difference });
}

/** Says where in the body the fault lies, if it lies in the row that was sent. */
function refusalFor({ code, path, message }: Failure, speciesId: string): Refusal {
  for (const [table, field] of [
    ["species", "row"],
    ["extrapolation", "extrapolation"],
  ] as const) {
    const start = `${table}/${speciesId}`;
    if (path.startsWith(start))
      return new Refusal(code, `${field}${path.slice(start.length).replaceAll("/", ".")}`, message);
  }
  return new Refusal(code, path, message);
}

/** The whole library must stand with the edits as they are now.
 *  @throws Refusal with the failure of `libraryFrom`: it names row and column */
function requireSound(db: Db, { curated, unfit }: Chemistry, speciesId: string): void {
  // What a newly shipped library left out must not stand in the way of every other edit.
  const leftOut = new Set(unfit.map(({ edit }) => edit.number));
  const edits = editsInForce(db).filter(({ number }) => !leftOut.has(number));
  const library = libraryFrom(mergedTables(curated, edits));
  if (!library.ok) throw refusalFor(library.error, speciesId);
}

/** Adds a species or puts other numbers in the place of one.
 *  @param seen  version of the species the writer saw, 0 for one never edited
 *  @throws Refusal STALE; what `libraryFrom` says, with a path into the body */
export function addEdit(
  db: Db,
  chemistry: Chemistry,
  seen: number,
  values: Values,
  { authorId, now }: Author,
): SpeciesEditRow {
  const { row, citation, extrapolation, reason } = values;
  if (row.id === zero)
    throw new Refusal("INVALID_INPUT", "row.id", `${zero} is the zero of the scale and stays as it is.`);
  if (row.source === "" && citation === "")
    throw new Refusal(
      "INVALID_INPUT",
      "citation",
      "Name the source: a code of the library's references, or a citation.",
    );
  const number = db.transaction((tx) => {
    requireUnchanged(tx, chemistry, values, seen);
    const stored = { speciesId: row.id, row, citation, extrapolation, reason, authorId, createdAt: now.toISOString() };
    const { number: made } = tx.insert(speciesEdits).values(stored).returning({ number: speciesEdits.number }).get();
    requireSound(tx, chemistry, row.id);
    return made;
  });
  chemistry.refresh(now);
  return editOf(db, chemistry, String(number));
}

/** Takes an edit back; the row before it is in force again. The edit stays on record.
 *  @throws Refusal NOT_FOUND, STALE; CONFLICT when it was taken back; what `libraryFrom` says when something leans on it */
export function revertEdit(
  db: Db,
  chemistry: Chemistry,
  id: string,
  seen: number,
  reason: string,
  { authorId, now }: Author,
): SpeciesEditRow {
  db.transaction((tx) => {
    const current = editOf(tx, chemistry, id);
    const what = `The edit of ${current.speciesId}`;
    if (current.version !== seen) {
      const by = current.revertedBy === null ? "" : ` by ${current.revertedBy}`;
      const message = `${what} is at version ${current.version}${by}, you saw version ${seen}.`;
      throw new Refusal("STALE", "If-Match", message, { current, difference: [] });
    }
    if (current.revertedAt !== null) throw new Refusal("CONFLICT", "id", `${what} was taken back already.`);
    tx.update(speciesEdits)
      .set({ revertedAt: now.toISOString(), revertedBy: authorId, revertReason: reason, version: 2 })
      .where(eq(speciesEdits.number, Number(id)))
      .run();
    requireSound(tx, chemistry, current.speciesId);
  });
  chemistry.refresh(now);
  return editOf(db, chemistry, id);
}
