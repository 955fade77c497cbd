import { fail, ok, type Failure, type Outcome } from "../outcome";
import type { ChemicalData, Species } from "../species/chemicalData";

const superscripts = "⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻";
const subscripts = "₀₁₂₃₄₅₆₇₈₉";

/** Printed formulas as typed ones: `Cu²⁺` is `Cu^2+`, `H₂O` is `H2O`, a middle dot is a point, a true minus a hyphen.
 *  @param text  anything     @returns  the same in the notation of the tables     @source  notation of the tables */
export const asTyped = (text: string): string =>
  text
    .replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹]*[⁺⁻]/g, (run) => `^${[...run].map((c) => "0123456789+-"[superscripts.indexOf(c)]).join("")}`)
    .replace(/[₀-₉]/g, (c) => String(subscripts.indexOf(c)))
    .replaceAll("·", ".")
    .replaceAll("\u2212", "-")
    .trim();

/** What people leave out or vary: case, carets, brackets, spaces, the phase. */
const bare = (text: string): string =>
  text
    .toLowerCase()
    .replace(/\((aq|s|l|g)(,[^)]*)?\)$/, "")
    .replace(/[^a-z0-9+-]/g, "");

/** Edit distance of two short words (insert, delete, replace).
 *  @param a, b  words     @returns  number of edits     @source  Levenshtein 1966
 *  @example editDistance("hemtite", "hematite") // => 1 */
export function editDistance(a: string, b: string): number {
  let row = Array.from({ length: b.length + 1 }, (_, i) => i);
  for (let i = 1; i <= a.length; i += 1) {
    const next = [i];
    for (let j = 1; j <= b.length; j += 1) {
      const swap = (row[j - 1] ?? 0) + (a[i - 1] === b[j - 1] ? 0 : 1);
      next.push(Math.min(swap, (row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1));
    }
    row = next;
  }
  return row[b.length] ?? a.length;
}

/** Ids of the library that a mistyped id, formula or mineral name may have meant, nearest first.
 *  @param data  the library     @param text  as typed     @param most  how many at most     @returns  ids; none where nothing is near
 *  @source  edit distance over id, formula and name
 *  @example nearNames(chemistry(), "Cu2+(aq)").indexOf("Cu^2+(aq)") // => 0 */
export function nearNames(data: ChemicalData, text: string, most = 5): string[] {
  const wanted = bare(asTyped(text));
  const found: { id: string; edits: number }[] = [];
  for (const { id, formula, name } of data.species.values()) {
    const edits = Math.min(...[id, formula, name].map((n) => editDistance(wanted, bare(n))));
    if (edits <= Math.min(3, wanted.length / 3)) found.push({ id, edits });
  }
  found.sort((a, b) => a.edits - b.edits);
  return found.slice(0, most).map((f) => f.id);
}

/** The failure for an id that the library does not hold. */
export function unknownSpecies(data: ChemicalData, text: string, path: string): Outcome<never> & { error: Failure } {
  const near = nearNames(data, text);
  const hint = near.length > 0 ? `; near to it: ${near.join(", ")}` : "";
  return { ok: false, error: { code: "UNKNOWN_SPECIES", path, message: `"${text}" is not in the library${hint}` } };
}

const isReferenceState = ({ row, composition }: Species): boolean =>
  row.dGf_kJ === 0 && row.dHf_kJ === 0 && row.phase !== "aq" && Object.keys(composition).length === 1;

/** One species from what a person types: an id, else a formula with or without its phase, else a mineral's name. Where a formula has several
 *  phases, water is the liquid and an element its reference state; anything else is ambiguous.
 *  @param data  the library     @param text  `Cu^2+`, `CuO(s)`, `FeOOH(s,goethite)`, `goethite`, `Cu²⁺`, `e^-`     @param path  for the failure
 *  @returns  the id ("e^-" for electrons) and whether the phase was chosen for the user; UNKNOWN_SPECIES with near names, or
 *    AMBIGUOUS_SPECIES that lists the candidates
 *  @source  convention of half-reaction tables: elements in their reference state, water liquid */
export function findSpecies(
  data: ChemicalData,
  text: string,
  path = "reaction",
): Outcome<{ id: string; chosen: boolean }> {
  const typed = asTyped(text);
  if (/^e\^?-$/.test(typed)) return ok({ id: "e^-", chosen: false });
  if (data.species.has(typed)) return ok({ id: typed, chosen: false });
  const [, formula = typed, phase] = /^(.*)\((aq|s|l|g)\)$/.exec(typed) ?? [];
  const all = [...data.species.values()];
  let candidates = all.filter((s) => s.formula === formula && (phase === undefined || s.phase === phase));
  if (candidates.length === 0) candidates = all.filter((s) => s.name.toLowerCase() === typed.toLowerCase());
  const [only, ...more] = candidates;
  if (only === undefined) return unknownSpecies(data, text.trim(), path);
  if (more.length === 0) return ok({ id: only.id, chosen: false });
  const usual = candidates.find((s) => s.id === "H2O(l)") ?? candidates.find(isReferenceState);
  if (usual !== undefined) return ok({ id: usual.id, chosen: true });
  const ids = candidates.map((s) => s.id).join(", ");
  return fail("AMBIGUOUS_SPECIES", path, `"${text.trim()}" may be ${ids}: write one of these`);
}
