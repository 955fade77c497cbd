import { FARADAY, GAS_CONSTANT, LN10 } from "../constants";
import { energiesAt, supported } from "../gibbs/energies";
import { fail, ok, type Outcome } from "../outcome";
import { reactionInput } from "../schemas/reaction";
import { failureOf } from "../selection/prepare";
import type { ChemicalData, EnergiesAtT, Species } from "../species/chemicalData";
import type { SpeciesRow } from "../schemas/chemistry";
import { kelvin, type Kelvin } from "../units";
import type { ReactionTerm } from "../solution";
import { reactionText } from "./balance";
import { imbalance } from "./elements";
import { unknownSpecies } from "./names";

type Grade = SpeciesRow["grade"];

/** Where the number of one species comes from. H^+ and e^- are conventions and have none. */
export interface TermGrade {
  readonly species: string;
  readonly grade: Grade;
  readonly source: string;
  /** temperature model in a few words, and where it is trusted, C */
  readonly model: string;
  readonly trusted: readonly [lo: number, hi: number];
}

/** One reaction at one temperature, as written (products less reactants). */
export interface ReactionValues {
  readonly dG_kJ: number;
  readonly logK: number;
  /** -dG / (n F), n electrons taken up as written: the reduction potential of the couple; null without electrons, V vs SHE at T */
  readonly E0_V: number | null;
  readonly dH_kJ: number;
  /** J/K */
  readonly dS_J: number;
  readonly temperatureC: number;
}

export interface ReactionAtT extends ReactionValues {
  /** reactants first; formulas, ids where two species share one */
  readonly reaction: string;
  readonly terms: readonly ReactionTerm[];
  /** the worst grade among the species, null where all is convention */
  readonly grade: Grade | null;
  readonly grades: readonly TermGrade[];
  readonly warnings: readonly string[];
}

export interface Equation {
  readonly terms: readonly (readonly [Species | "e^-", number])[];
  readonly electrons: number;
}

const idOf = (s: Species | "e^-"): string => (s === "e^-" ? s : s.id);

/** Species and their numbers, checked for atoms and charge.
 *  @param data  library     @param coefficients  by species id     @returns  the equation; UNKNOWN_SPECIES or UNBALANCED */
export function equationOf(data: ChemicalData, coefficients: Readonly<Record<string, number>>): Outcome<Equation> {
  const terms: [Species | "e^-", number][] = [];
  for (const [id, n] of Object.entries(coefficients)) {
    const species = id === "e^-" ? id : data.species.get(id);
    if (species === undefined) return unknownSpecies(data, id, `species.${id}`);
    terms.push([species, n]);
  }
  const off = imbalance(data, terms);
  if (off.length > 0) {
    const words = off.map(({ what, by }) => `${what} by ${by > 0 ? "+" : ""}${by}`).join(", ");
    return fail("UNBALANCED", "species", `the right-hand side is off in ${words}`);
  }
  return ok({ terms, electrons: coefficients["e^-"] ?? 0 });
}

const gibbs = ({ terms }: Equation, at: EnergiesAtT): number =>
  terms.reduce((sum, [s, n]) => sum + n * at.of(idOf(s)).G, 0);

/** dS = -d(dG)/dT by a central difference, one-sided at the ends of the range. The step keeps rounding and curvature both below 1e-4 J/K. */
function entropy(data: ChemicalData, equation: Equation, T: Kelvin, here: number): number {
  const step = 0.05; // K
  const at = (shift: number): number => gibbs(equation, energiesAt(data, (T + shift) as Kelvin));
  if (T - step < supported.lo) return (3 * here - 4 * at(step) + at(2 * step)) / (2 * step);
  if (T + step > supported.hi) return (4 * at(-step) - 3 * here - at(-2 * step)) / (2 * step);
  return (at(-step) - at(step)) / (2 * step);
}

/** The numbers of a checked equation at one temperature; see `reactionAtT`.
 *  @param data  library     @param equation  checked     @param energies  at that temperature     @param temperatureC  the same, C */
export function valuesAt(
  data: ChemicalData,
  equation: Equation,
  energies: EnergiesAtT,
  temperatureC: number,
): ReactionValues {
  const T = energies.T as Kelvin;
  const dG = gibbs(equation, energies);
  const dS = entropy(data, equation, T, dG);
  return {
    dG_kJ: dG / 1000,
    logK: -dG / (GAS_CONSTANT * T * LN10),
    E0_V: equation.electrons === 0 ? null : dG / (equation.electrons * FARADAY),
    dH_kJ: (dG + T * dS) / 1000,
    dS_J: dS,
    temperatureC,
  };
}

/** What a reader must know before using the numbers. */
function cautions(data: ChemicalData, { terms }: Equation, energies: EnergiesAtT, temperatureC: number): string[] {
  const known = terms.flatMap(([s]) => (s === "e^-" ? [] : [s]));
  const found = known.flatMap((s) => energies.of(s.id).warning ?? []);
  if (temperatureC > 100 && known.some((s) => s.phase === "g"))
    found.push("Above 100 C the liquor is under its saturation pressure: gas pressures are absolute, in bar.");
  const groups = new Map<string, number>();
  for (const [s, n] of terms)
    if (s !== "e^-")
      for (const [component, m] of Object.entries(s.composition))
        if (data.components.get(component)?.kind === "ligand_group")
          groups.set(component, (groups.get(component) ?? 0) + n * m);
  for (const [group, sum] of groups)
    if (Math.abs(sum) > 1e-9)
      found.push(`This reaction makes or breaks the group ${group}, which the maps hold inert to redox.`);
  return found;
}

/** Gibbs energy, enthalpy, entropy, log K and standard potential of any reaction over species of the library and e^-, at T.
 *  dG = sum of n G(T); log10 K = -dG / (R T ln 10); dS = -d(dG)/dT and dH = dG + T dS (Gibbs-Helmholtz), taken from the same G(T);
 *  E0 = -dG / (n F). An electron is half of H2(g) less H^+ at the same T, so that potentials are versus SHE at T.
 *  @param data  the library
 *  @param question  coefficients by species id (products positive; `e^-` for electrons) and temperature, C, 0 to 250
 *  @returns  kJ, J/K, V; grades and sources of every species, warnings beyond a trusted range. UNKNOWN_SPECIES with near names, UNBALANCED
 *    saying in what and by how much, OUT_OF_RANGE, INVALID_INPUT
 *  @source  docs/method.md, section 1; signs of IUPAC Green Book 2007, 2.13
 *  @example valueOf(reactionAtT(chemistry(), { species: { "Cu^2+(aq)": -1, "e^-": -2, "Cu(s)": 1 }, temperatureC: 25 })).E0_V // => 0.34 */
export function reactionAtT(
  data: ChemicalData,
  question: { readonly species: Readonly<Record<string, number>>; readonly temperatureC: number },
): Outcome<ReactionAtT> {
  const parsed = reactionInput.safeParse(question);
  if (!parsed.success) return failureOf(parsed.error, question);
  const { temperatureC } = question;
  const equation = equationOf(data, question.species);
  if (!equation.ok) return equation;
  const energies = energiesAt(data, kelvin(temperatureC));
  const ordered = [...equation.value.terms].sort(([, a], [, b]) => Math.sign(a) - Math.sign(b));
  const terms = ordered.map(([s, coefficient]): ReactionTerm => {
    return { species: idOf(s), formula: s === "e^-" ? s : s.formula, coefficient };
  });
  const grades = ordered.flatMap(([s]): TermGrade[] => {
    if (s === "e^-" || s.id === "H^+(aq)") return [];
    const { model, trusted } = energies.of(s.id);
    return [{ species: s.id, grade: s.row.grade, source: s.row.source, model, trusted }];
  });
  return ok({
    ...valuesAt(data, equation.value, energies, temperatureC),
    reaction: reactionText(terms),
    terms,
    grade: grades
      .map((g) => g.grade)
      .reduce<Grade | null>((worst, g) => (worst === null || g > worst ? g : worst), null),
    grades,
    warnings: cautions(data, equation.value, energies, temperatureC),
  });
}
