import { fail, ok, type Outcome } from "../outcome";
import type { ReactionTerm } from "../solution";
import type { ChemicalData, Species } from "../species/chemicalData";
import { isSulfate } from "../species/sulfur";
import { fraction, gcd, minus, over, times, zero, type Fraction } from "./fraction";

/** What a reaction must keep: each component by name, sulfate and other sulfur apart where they never meet, and charge. */
type Content = ReadonlyMap<string, Fraction>;
interface Partner {
  readonly id: string;
  readonly formula: string;
  readonly content: Content;
}

const electron: Partner = { id: "e^-", formula: "e^-", content: new Map([["charge", [-1, 1] as const]]) };

function partnerOf(species: Species, twoSulfurs: boolean): Partner {
  const { id, formula, composition, charge } = species;
  const content = new Map<string, Fraction>();
  for (const [component, n] of Object.entries(composition))
    content.set(component === "S" && twoSulfurs && isSulfate(formula) ? "sulfate S" : component, fraction(n));
  if (charge !== 0) content.set("charge", [charge, 1]);
  return { id, formula, content };
}

/** Solves for how much of each partner makes up for one `left`; partners late in the list stay out where an earlier one will do. Exact. */
function solve(left: Partner, partners: readonly Partner[]): Fraction[] | { unmet: string } {
  const kept = [...new Set([left, ...partners].flatMap((p) => [...p.content.keys()]))];
  const width = partners.length;
  const rows = kept.map((what) => ({
    what,
    cells: [...partners.map((p) => p.content.get(what) ?? zero), left.content.get(what) ?? zero],
  }));
  const pivots: number[] = [];
  for (let column = 0; column < width; column += 1) {
    const at = pivots.length;
    const found = rows.findIndex((row, i) => i >= at && row.cells[column]?.[0] !== 0);
    const pivot = rows[found];
    const swapped = rows[at];
    if (pivot === undefined || swapped === undefined) continue;
    [rows[at], rows[found]] = [pivot, swapped];
    const scale = pivot.cells[column] ?? zero;
    pivot.cells = pivot.cells.map((c) => (c[0] === 0 ? c : over(c, scale)));
    for (const row of rows) {
      const factor = row.cells[column] ?? zero;
      if (row === pivot || factor[0] === 0) continue;
      row.cells = row.cells.map((c, i) => minus(c, times(factor, pivot.cells[i] ?? zero)));
    }
    pivots.push(column);
  }
  const unmet = rows.slice(pivots.length).find((row) => row.cells[width]?.[0] !== 0);
  if (unmet !== undefined) return { unmet: unmet.what };
  const amounts = partners.map(() => zero);
  pivots.forEach((column, i) => (amounts[column] = rows[i]?.cells[width] ?? zero));
  return amounts;
}

/** The smallest whole numbers in the same ratio. */
function wholeNumbers(amounts: readonly Fraction[]): number[] {
  const common = amounts.reduce((d, [, b]) => (d / gcd(d, b)) * b, 1);
  const whole = amounts.map(([a, b]) => (a * common) / b);
  const divisor = whole.reduce((g, n) => gcd(g, n), 0);
  return whole.map((n) => n / divisor);
}

/** The balanced reaction by which one species of a metal turns into another, with H2O, H^+, e^- and the ligands as they stand there.
 *  @param data  the library
 *  @param inside, outside  species ids of the metal: consumed, made
 *  @param ligands  ids of the species that hold the other components there, one for each (the dominant form of each ligand, of each
 *    companion metal, of K, Na ...); where both a sulfate and another sulfur species are among them, the two sulfurs do not mix
 *  @param metal  element both species hold
 *  @returns  terms with smallest whole coefficients, consumed negative: the species, ligands, H2O, H^+, e^-, the species made first on
 *    its side. LIGAND_MISSING where no ligand holds a component that differs, UNKNOWN_SPECIES, UNKNOWN_METAL
 *  @source  conservation of components and charge, solved exactly
 *  @example valueOf(balance(chemistry(), "CuO(s)", "Cu^2+(aq)", [], "Cu")).length // => 4
 *  @example valueOf(balance(chemistry(), "Fe4.5Ni4.5S8(s)", "Ni^2+(aq)", ["S(s,rhombic)", "Fe^2+(aq)"], "Ni"))[0].coefficient // => -2 */
export function balance(
  data: ChemicalData,
  inside: string,
  outside: string,
  ligands: readonly string[],
  metal: string,
): Outcome<ReactionTerm[]> {
  const ids = [inside, outside, ...ligands, "H2O(l)", "H^+(aq)"];
  const species: Species[] = [];
  for (const id of ids) {
    const found = data.species.get(id);
    if (found === undefined) return fail("UNKNOWN_SPECIES", "reaction", `no species ${id} in the library`);
    species.push(found);
  }
  for (const end of species.slice(0, 2))
    if (!(metal in end.composition)) return fail("UNKNOWN_METAL", "reaction", `${end.id} holds no ${metal}`);
  const ligandFormulas = species.slice(2).filter((s) => "S" in s.composition);
  const twoSulfurs =
    ligandFormulas.some((s) => isSulfate(s.formula)) && ligandFormulas.some((s) => !isSulfate(s.formula));

  const [left, ...others] = species.map((s) => partnerOf(s, twoSulfurs));
  if (left === undefined) return fail("UNKNOWN_SPECIES", "reaction", "no species given");
  const partners = [...others, electron];
  const amounts = solve(left, partners);
  if ("unmet" in amounts)
    return fail("LIGAND_MISSING", "reaction", `${inside} to ${outside}: no partner for ${amounts.unmet}`);
  const [first = 1, ...rest] = wholeNumbers([[1, 1], ...amounts]);
  const terms: ReactionTerm[] = [{ species: left.id, formula: left.formula, coefficient: -first }];
  for (const side of [-1, 1])
    for (const [i, { id, formula }] of partners.entries()) {
      const n = rest[i] ?? 0;
      if (Math.sign(n) === side) terms.push({ species: id, formula, coefficient: n });
    }
  return ok(terms);
}

/** Formula, or the id where two terms of a reaction share one: `FeOOH(s,goethite)`. */
const nameOf = (term: ReactionTerm, terms: readonly ReactionTerm[]): string =>
  terms.filter((t) => t.formula === term.formula).length > 1 ? term.species : term.formula;

/** A reaction as text: `Fe(OH)3 + 2 SO4^2- + 3 H^+ = Fe(SO4)2^- + 3 H2O`. Where two species share a formula their ids are printed.
 *  @param terms  as `balance` gives them     @returns  both sides, terms in their order
 *  @source  IUPAC Green Book 2007, 2.10.1 (equations)
 *  @example reactionText(valueOf(balance(chemistry(), "CuO(s)", "Cu^2+(aq)", [], "Cu"))).length // => 28 */
export function reactionText(terms: readonly ReactionTerm[]): string {
  const side = (sign: number) =>
    terms
      .filter((t) => Math.sign(t.coefficient) === sign)
      .map((t) => `${Math.abs(t.coefficient) === 1 ? "" : `${Math.abs(t.coefficient)} `}${nameOf(t, terms)}`)
      .join(" + ");
  return `${side(-1)} = ${side(1)}`;
}
