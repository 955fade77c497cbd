import { T_REFERENCE } from "../constants";
import { fail, ok, type Outcome } from "../outcome";
import type { SpeciesRow } from "../schemas/chemistry";
import type { Species } from "./chemicalData";
import { parseFormula } from "./formula";

/** What a species row is checked against. */
export interface Composing {
  readonly components: ReadonlyMap<string, { readonly elements: Readonly<Record<string, number>> }>;
  /** entropy of the reference state per mole of atoms, J/(mol K) */
  readonly elementEntropy: ReadonlyMap<string, number>;
}

/** G, H and S may differ by rounding; more than this is a slip. */
const closure = 1; // kJ/mol

/** Atoms (or groups) by symbol from `Cu:1 NH3:4`; null where a part cannot be read.
 *  @param text  parts joined by blanks     @returns  counts by symbol     @source  shared/data, column composition
 *  @example parseCounts("Cu:1 NH3:4").NH3 // => 4 */
export function parseCounts(text: string): Record<string, number> | null {
  const counts: Record<string, number> = {};
  for (const part of text.trim().split(/\s+/)) {
    const [, symbol, n] = /^([A-Za-z0-9]+):(\d+(?:\.\d+)?)$/.exec(part) ?? [];
    if (symbol === undefined || n === undefined || symbol in counts || Number(n) === 0) return null;
    counts[symbol] = Number(n);
  }
  return counts;
}

function expand(composition: Readonly<Record<string, number>>, { components }: Composing): Map<string, number> {
  const atoms = new Map<string, number>();
  for (const [component, n] of Object.entries(composition))
    for (const [element, m] of Object.entries(components.get(component)?.elements ?? {}))
      atoms.set(element, (atoms.get(element) ?? 0) + n * m);
  return atoms;
}

/** dG less dH - T dS of formation from the elements; the charge is made with H^+ and H2, whose entropy makes up for it. */
function closureError(row: SpeciesRow, atoms: ReadonlyMap<string, number>, against: Composing): number | null {
  if (row.dHf_kJ === null || row.S_J === null) return null;
  let dS = row.S_J + row.charge * (against.elementEntropy.get("H") ?? Number.NaN);
  for (const [element, n] of atoms) dS -= n * (against.elementEntropy.get(element) ?? Number.NaN);
  return row.dGf_kJ - (row.dHf_kJ - (T_REFERENCE * dS) / 1000);
}

const list = (atoms: Iterable<[string, number]>): string => [...atoms].map(([s, n]) => `${s} ${n}`).join(", ");

/** One row of the species tables as a species: formula, charge and composition must agree (groups expanded to their atoms), id must be
 *  formula and phase, and G, H and S must agree within 1 kJ/mol with the elements' entropies.
 *  @param row  as read     @param against  components and elements     @param path  where the row stands, for the failure
 *  @returns  the species; BAD_DATA, BAD_FORMULA or UNKNOWN_COMPONENT with id, column, found and expected
 *  @source  dG = dH - T dS at 298.15 K; entropies of the elements from shared/data/elements.csv */
export function speciesFrom(row: SpeciesRow, against: Composing, path: string): Outcome<Species> {
  const bad = (column: string, message: string) =>
    fail("BAD_DATA", `${path}/${column}`, `${row.id}, ${column}: ${message}`);
  const formula = parseFormula(row.formula, `${path}/formula`);
  if (!formula.ok) return formula;
  const idStart = `${row.formula}(${row.phase}`;
  const idEnd = row.id.slice(idStart.length);
  if (!row.id.startsWith(idStart) || !/^(?:,[^()]+)?\)$/.test(idEnd))
    return bad("id", `should be the formula and the phase, "${idStart})" or "${idStart},name)"`);
  if (formula.value.charge !== row.charge)
    return bad("charge", `${row.charge}, but the formula ${row.formula} says ${formula.value.charge}`);
  if (row.charge !== 0 && row.phase !== "aq") return bad("charge", `${row.charge} on a species that is not dissolved`);
  const composition = parseCounts(row.composition);
  if (composition === null) return bad("composition", `"${row.composition}" cannot be read: write "Cu:1 NH3:4"`);
  for (const component of Object.keys(composition))
    if (!against.components.has(component))
      return fail("UNKNOWN_COMPONENT", `${path}/composition`, `${row.id}, composition: no component "${component}"`);
  const atoms = expand(composition, against);
  const printed = new Map(Object.entries(formula.value.atoms));
  for (const element of new Set([...atoms.keys(), ...printed.keys()]))
    if (Math.abs((atoms.get(element) ?? 0) - (printed.get(element) ?? 0)) > 1e-9)
      return bad("composition", `holds ${list(atoms)}, but the formula ${row.formula} holds ${list(printed)}`);
  if (row.phase === "aq" && row.charge !== 0 && row.S_J !== null && row.ion_class === null)
    return bad("ion_class", "missing: an ion with an entropy needs the class of its entropy correspondence");
  const gap = closureError(row, atoms, against);
  if (gap !== null && !(Math.abs(gap) <= closure))
    return bad(
      "dGf_kJ",
      `${row.dGf_kJ} differs by ${gap.toFixed(2)} kJ/mol from dHf_kJ and S_J; at most ${closure} is allowed`,
    );
  const { id, name, phase, charge } = row;
  return ok({ id, formula: row.formula, name, phase, charge, composition, row });
}
