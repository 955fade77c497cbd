import { fail, ok, type Outcome } from "../outcome";
import type { ReactionTerm } from "../solution";
import type { ChemicalData, Species } from "../species/chemicalData";
import { isSulfate } from "../species/sulfur";
import { smallestWhole, solveWhole, wholeFactor } from "./wholeNumbers";

/** One unknown of the balance: how much of each component, and of charge, `scale` units of the species hold, in whole numbers. */
interface Partner {
  readonly id: string;
  readonly formula: string;
  readonly scale: number;
  readonly content: readonly (readonly [what: string, n: number])[];
}

const electron: Partner = { id: "e^-", formula: "e^-", scale: 1, content: [["charge", -1]] };
const cache = new WeakMap<Species, Partner>();

function partnerOf(species: Species): Partner {
  let partner = cache.get(species);
  if (partner !== undefined) return partner;
  const { id, formula, composition, charge } = species;
  const counts = Object.entries(composition);
  const scale = wholeFactor(counts.map(([, n]) => n));
  const content = counts.map(([what, n]) => [what, Math.round(n * scale)] as const);
  if (charge !== 0) content.push(["charge", charge * scale]);
  cache.set(species, (partner = { id, formula, scale, content }));
  return partner;
}

/** One equation a component: partners' contents, the content of `left` last. Sulfate sulfur may be a component of its own. */
function equations(partners: readonly Partner[], left: Partner, twoSulfurs: boolean) {
  const kept: string[] = [];
  const rows: number[][] = [];
  for (const [i, { content, formula }] of [...partners, left].entries())
    for (const [what, n] of content) {
      const name = twoSulfurs && what === "S" && isSulfate(formula) ? "sulfate S" : what;
      let at = kept.indexOf(name);
      if (at < 0) {
        at = kept.push(name) - 1;
        rows.push(new Array<number>(partners.length + 1).fill(0));
      }
      const row = rows[at];
      if (row !== undefined) row[i] = n;
    }
  return { kept, rows };
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

  const [left, ...others] = species.map(partnerOf);
  if (left === undefined) return fail("UNKNOWN_SPECIES", "reaction", "no species given");
  const partners = [...others, electron];
  const { kept, rows } = equations(partners, left, twoSulfurs);
  const solved = solveWhole(rows);
  if ("unmet" in solved)
    return fail("LIGAND_MISSING", "reaction", `${inside} to ${outside}: no partner for ${kept[solved.unmet]}`);
  const amounts = solved.values.map(([n, d], i) => [n * (partners[i]?.scale ?? 1), d] as const);
  const [first = 1, ...rest] = smallestWhole([[left.scale, 1], ...amounts]);
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
 *  @example reactionText(valueOf(balance(chemistry(), "CuO(s)", "Cu^2+(aq)", [], "Cu"))).length // => 25 */
export function reactionText(terms: readonly ReactionTerm[]): string {
  const side = (sign: number) =>
    terms
      .filter((t) => Math.sign(t.coefficient) === sign)
      .map((t) => `${Math.abs(t.coefficient) === 1 ? "" : `${Math.abs(t.coefficient)} `}${nameOf(t, terms)}`)
      .join(" + ");
  return `${side(-1)} = ${side(1)}`;
}
