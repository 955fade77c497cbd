import { GAS_CONSTANT, LN10, T_REFERENCE } from "../constants";
import { fail, ok, type Failure, type Outcome } from "../outcome";
import type { ChemicalTables, SpeciesRow } from "../schemas/chemistry";
import type { ChemicalData, Extrapolation, Species } from "./chemicalData";
import { parseCounts, speciesFrom, type Composing } from "./checkSpecies";
import { parseReaction } from "./reaction";

export { tablesFromRows } from "./tables";

class Bad extends Error {
  constructor(readonly failure: Failure) {
    super(failure.message);
  }
}
function must<T>(outcome: Outcome<T>): T {
  if (!outcome.ok) throw new Bad(outcome.error);
  return outcome.value;
}
function refuse(path: string, message: string): never {
  throw new Bad({ code: "BAD_DATA", path, message });
}

const composingOf = (tables: ChemicalTables, components: ChemicalData["components"]): Composing => ({
  components,
  elementEntropy: new Map(
    tables.elements.flatMap((e) => (e.S_element_J_mol_K === null ? [] : [[e.symbol, e.S_element_J_mol_K] as const])),
  ),
});

function componentsOf(tables: ChemicalTables): ChemicalData["components"] {
  const known = new Set(tables.elements.map((e) => e.symbol));
  const components = new Map<
    string,
    { kind: "element" | "ligand_group"; elements: Record<string, number>; note: string }
  >();
  for (const row of tables.components) {
    const path = `components/${row.component}`;
    const elements = parseCounts(row.elements);
    if (elements === null) refuse(path, `component ${row.component}: "${row.elements}" cannot be read`);
    for (const symbol of Object.keys(elements))
      if (!known.has(symbol)) refuse(path, `component ${row.component}: no element "${symbol}" in elements.csv`);
    if (components.has(row.component)) refuse(path, `component ${row.component} stands twice`);
    components.set(row.component, { kind: row.kind, elements, note: row.note });
  }
  return components;
}

function molarMasses(tables: ChemicalTables, components: ChemicalData["components"]): Map<string, number> {
  const ofElement = new Map(tables.elements.map((e) => [e.symbol, e.molar_mass_g_mol]));
  return new Map(
    [...components].map(([component, { elements }]) => [
      component,
      Object.entries(elements).reduce((sum, [symbol, n]) => sum + n * (ofElement.get(symbol) ?? Number.NaN), 0),
    ]),
  );
}

/** Several sources of one row may be separated by a semicolon, a comma or a stroke. */
const codesOf = (source: string): string[] => source.split(/[;,/]\s*/).filter((code) => code !== "");

function checkSources(tables: ChemicalTables): void {
  const codes = new Set(tables.references.map((r) => r.code));
  const check = (table: string, id: string, source: string) => {
    if (codesOf(source).length === 0) refuse(`${table}/${id}/source`, `${id}: no source`);
    for (const code of codesOf(source))
      if (!codes.has(code)) refuse(`${table}/${id}/source`, `${id}: source "${code}" is not in references.csv`);
  };
  for (const row of tables.species) check("species", row.id, row.source);
  for (const row of tables.elements) check("elements", row.symbol, row.source);
  for (const row of tables.electrodes) check("electrodes", row.id, row.source);
  for (const row of tables.correspondence) check("correspondence", `${row.ion_class} ${row.T_C}`, row.source);
}

/** Atoms of every component and the charge must be the same on both sides. */
function checkBalance(id: string, extrapolation: Extrapolation, species: ReadonlyMap<string, Species>): void {
  if (extrapolation.reaction === null) return;
  const path = `extrapolation/${id}/reaction`;
  const totals = new Map<string, number>();
  for (const [partner, n] of extrapolation.reaction.terms) {
    const known = species.get(partner);
    if (known === undefined) refuse(path, `${id}: its reaction names ${partner}, which is no species`);
    totals.set("charge", (totals.get("charge") ?? 0) + n * known.charge);
    for (const [component, m] of Object.entries(known.composition))
      totals.set(component, (totals.get(component) ?? 0) + n * m);
  }
  for (const [what, sum] of totals)
    if (Math.abs(sum) > 1e-9) refuse(path, `${id}: its reaction is out of balance in ${what} by ${sum}`);
  if (extrapolation.reaction.terms.get(id) !== 1)
    refuse(path, `${id}: its reaction must make one ${id}, it makes ${extrapolation.reaction.terms.get(id) ?? 0}`);
}

/** The log K printed beside the reaction must be that of the energies, or one of the two was changed alone. */
function checkLogK(
  id: string,
  printed: number | null,
  { reaction }: Extrapolation,
  species: ReadonlyMap<string, Species>,
): void {
  if (reaction === null) return;
  let G = 0;
  for (const [partner, n] of reaction.terms) G += n * (species.get(partner)?.row.dGf_kJ ?? Number.NaN) * 1000;
  const logK = -G / (LN10 * GAS_CONSTANT * T_REFERENCE);
  if (printed === null || !(Math.abs(logK - printed) <= 0.02))
    refuse(
      `extrapolation/${id}/logK_25`,
      `${id}: log K ${printed ?? "missing"}, but the energies give ${logK.toFixed(2)}`,
    );
}

function extrapolationsOf(tables: ChemicalTables, species: ReadonlyMap<string, Species>): Map<string, Extrapolation> {
  const found = new Map<string, Extrapolation>();
  for (const row of tables.extrapolation) {
    const path = `extrapolation/${row.id}`;
    if (!species.has(row.id)) refuse(path, `extrapolation.csv names ${row.id}, which is no species`);
    if (found.has(row.id)) refuse(path, `extrapolation.csv names ${row.id} twice`);
    const reaction = row.hold === "none" ? null : must(parseReaction(row.reaction, `${path}/reaction`));
    const extrapolation = { hold: row.hold, reaction };
    checkBalance(row.id, extrapolation, species);
    checkLogK(row.id, row.logK_25, extrapolation, species);
    found.set(row.id, extrapolation);
  }
  for (const { id, row } of species.values())
    if (row.S_J === null && !found.has(id))
      refuse(`species/${id}/S_J`, `${id} has no entropy and no row in extrapolation.csv`);
  checkAcyclic(found, species);
  return found;
}

/** A row without entropy may lean on another such row, but not on itself in the end. */
function checkAcyclic(found: ReadonlyMap<string, Extrapolation>, species: ReadonlyMap<string, Species>): void {
  const done = new Set<string>();
  const visit = (id: string, behind: readonly string[]): void => {
    if (done.has(id) || species.get(id)?.row.S_J !== null) return;
    if (behind.includes(id))
      refuse(`extrapolation/${id}`, `${[...behind, id].join(" leans on ")}: a circle, none of them has an entropy`);
    for (const partner of found.get(id)?.reaction?.terms.keys() ?? [])
      if (partner !== id) visit(partner, [...behind, id]);
    done.add(id);
  };
  for (const id of found.keys()) visit(id, []);
}

function checkLists(
  tables: ChemicalTables,
  species: ReadonlyMap<string, Species>,
  data: Pick<ChemicalData, "components">,
): void {
  const known = (table: string, id: string) => {
    if (!species.has(id)) refuse(`${table}/${id}`, `${table} names ${id}, which is no species`);
  };
  for (const { id } of tables.defaults) if (!id.startsWith("rule:")) known("defaults", id);
  for (const { id } of tables.solidsBasis) known("solidsBasis", id);
  for (const row of tables.presets) {
    for (const id of row.exclude_ids.split(";").filter((s) => s !== "")) known("presets", id);
    if (row.component !== "" && !data.components.has(row.component))
      refuse(`presets/${row.preset}`, `preset ${row.preset} names component "${row.component}", which is unknown`);
    if (row.component !== "" && !((row.total_activity ?? 0) > 0))
      refuse(`presets/${row.preset}`, `preset ${row.preset}, ${row.component}: a total activity above zero is needed`);
  }
}

function attempt<T>(build: () => T): Outcome<T> {
  try {
    return ok(build());
  } catch (error) {
    if (error instanceof Bad) return fail(error.failure.code, error.failure.path, error.failure.message);
    throw error;
  }
}

/** The library indexed and checked: formula, charge and composition of every species agree, G, H and S agree within 1 kJ/mol, every
 *  source resolves, every id named in a list exists, every row without an entropy has its way to T, and none leans on itself.
 *  @param tables  as `tablesFromRows` or the database gives them
 *  @returns  the library; BAD_DATA, BAD_FORMULA or UNKNOWN_COMPONENT with table, row and what is wrong
 *  @source  docs/data.md */
export function libraryFrom(tables: ChemicalTables): Outcome<ChemicalData> {
  return attempt(() => {
    const components = componentsOf(tables);
    const against = composingOf(tables, components);
    const species = new Map<string, Species>();
    for (const row of tables.species) {
      if (species.has(row.id)) refuse(`species/${row.id}`, `species ${row.id} stands twice`);
      species.set(row.id, must(speciesFrom(row, against, `species/${row.id}`)));
    }
    checkSources(tables);
    checkLists(tables, species, { components });
    const extrapolation = extrapolationsOf(tables, species);
    return {
      version: tables.version,
      tables,
      species,
      components,
      molarMass: molarMasses(tables, components),
      extrapolation,
    };
  });
}

/** The library with rows added or, where the id is known, put in the place of its own. A row without an entropy keeps the temperature rule
 *  of the row it replaces; a new one has none and is held (see gibbs/energies). Sources of such rows are free text.
 *  @param data  the library, left as it is     @param rows  in the columns of the tables
 *  @returns  a new library, or `data` itself where there are no rows; failures as of `libraryFrom`, path `species.<index>.<column>`
 *  @source  docs/data.md, section on own rows */
export function withSpecies(data: ChemicalData, rows: readonly SpeciesRow[]): Outcome<ChemicalData> {
  if (rows.length === 0) return ok(data);
  return attempt(() => {
    const against = composingOf(data.tables, data.components);
    const species = new Map(data.species);
    const extrapolation = new Map(data.extrapolation);
    const given = new Set<string>();
    for (const [i, row] of rows.entries()) {
      const made = speciesFrom(row, against, `species.${i}`);
      if (!made.ok) throw new Bad({ ...made.error, path: made.error.path.replaceAll("/", ".") });
      if (given.has(row.id)) refuse(`species.${i}.id`, `${row.id} is given twice`);
      given.add(row.id);
      species.set(row.id, made.value);
      if (row.S_J === null && !extrapolation.has(row.id)) extrapolation.set(row.id, { hold: "none", reaction: null });
    }
    checkAcyclic(extrapolation, species);
    const kept = data.tables.species.filter((row) => !given.has(row.id));
    return { ...data, tables: { ...data.tables, species: [...kept, ...rows] }, species, extrapolation };
  });
}
