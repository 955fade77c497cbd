import { createHash } from "node:crypto";
import { GAS_CONSTANT, LN10, T_REFERENCE } from "../../../shared/constants";
import type { ChemicalTables, SpeciesRow } from "../../../shared/schemas/chemistry";
import type { SpeciesEditRow } from "../../../shared/schemas/speciesEdit";
import { parseReaction } from "../../../shared/species/reaction";

/** What an edit puts into the tables. */
export interface Edit {
  number: number;
  speciesId: string;
  row: SpeciesRow;
  citation: string;
  extrapolation: SpeciesEditRow["extrapolation"];
}

const referenceCode = ({ number }: Edit) => `EDIT${number}`;

/** An edit's own source stands beside the codes it names. */
const sourcesOf = (edit: Edit): string =>
  [edit.row.source, ...(edit.citation === "" ? [] : [referenceCode(edit)])].filter((code) => code !== "").join("; ");

type ExtrapolationRow = ChemicalTables["extrapolation"][number];

/** The temperature rule of an edit: its own, else that of the row it replaces, else (without an entropy) held as it is. */
function ruleOf({ row, extrapolation }: Edit, shipped: ExtrapolationRow | undefined): ExtrapolationRow | undefined {
  if (extrapolation) return { id: row.id, ...extrapolation };
  if (shipped || row.S_J !== null) return shipped;
  return { id: row.id, hold: "none", reaction: "", logK_25: null, note: "own row without an entropy" };
}

/** log10 K at 25 C by the energies, to the two digits the tables carry; null where the reaction cannot be read or names no species. */
function logKOf(text: string, energies: ReadonlyMap<string, number>): number | null {
  const reaction = parseReaction(text, "");
  if (!reaction.ok) return null;
  let G = 0;
  for (const [id, n] of reaction.value.terms) G += n * (energies.get(id) ?? Number.NaN) * 1000;
  const logK = -G / (LN10 * GAS_CONSTANT * T_REFERENCE);
  return Number.isFinite(logK) ? Number(logK.toFixed(2)) : null;
}

/** Where a species of a rule's reaction has a value of the site's own, the log K beside the reaction is no longer the one
 *  shipped; both are named. A log K that came with an edit stays as it was typed, to be checked. */
function withLogK(
  rule: ExtrapolationRow,
  edits: readonly Edit[],
  energies: ReadonlyMap<string, number>,
): ExtrapolationRow {
  const own = edits.find(({ speciesId }) => speciesId === rule.id)?.extrapolation;
  if (rule.hold === "none" || (own && own.logK_25 !== null)) return rule;
  const logK = logKOf(rule.reaction, energies);
  if (logK === null || (rule.logK_25 !== null && Math.abs(logK - rule.logK_25) <= 0.02)) return rule;
  const shipped = rule.logK_25 === null ? "" : `, ${rule.logK_25} as shipped`;
  const note = [rule.note, `log K ${logK} by the site's own values${shipped}`].filter((part) => part !== "").join("; ");
  return { ...rule, logK_25: logK, note };
}

/** Rows put in the place of those with the same name, new ones at the end. */
function placed<Row>(rows: readonly Row[], own: ReadonlyMap<string, Row>, nameOf: (row: Row) => string): Row[] {
  const known = new Set(rows.map(nameOf));
  const added = [...own].filter(([name]) => !known.has(name)).map(([, row]) => row);
  return [...rows.map((row) => own.get(nameOf(row)) ?? row), ...added];
}

function versionOf(curated: ChemicalTables, edits: readonly Edit[]): string {
  if (edits.length === 0) return curated.version;
  const content = edits.map(({ number, row, citation, extrapolation }) => [number, row, citation, extrapolation]);
  return createHash("sha256")
    .update(JSON.stringify([curated.version, content]))
    .digest("hex")
    .slice(0, 12);
}

/** The library as shipped with the edits in force, one a species. Its version is a hash of both, that of the library as
 *  shipped where there are none. Nothing is checked here: `libraryFrom` does. */
export function mergedTables(curated: ChemicalTables, edits: readonly Edit[]): ChemicalTables {
  const species = new Map(edits.map((edit) => [edit.speciesId, { ...edit.row, source: sourcesOf(edit) }]));
  const shipped = new Map(curated.extrapolation.map((row) => [row.id, row]));
  const rules = new Map(
    edits.flatMap((edit) => {
      const rule = ruleOf(edit, shipped.get(edit.speciesId));
      return rule ? [[edit.speciesId, rule] as const] : [];
    }),
  );
  const allSpecies = placed(curated.species, species, ({ id }) => id);
  const energies = new Map(allSpecies.map(({ id, dGf_kJ }) => [id, dGf_kJ]));
  const allRules = placed(curated.extrapolation, rules, ({ id }) => id);
  const cited = edits.filter(({ citation }) => citation !== "");
  return {
    ...curated,
    version: versionOf(curated, edits),
    species: allSpecies,
    extrapolation: edits.length === 0 ? allRules : allRules.map((rule) => withLogK(rule, edits, energies)),
    references: [
      ...curated.references,
      ...cited.map((edit) => ({ code: referenceCode(edit), citation: edit.citation })),
    ],
  };
}
