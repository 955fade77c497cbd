import { FARADAY, GAS_CONSTANT, LN10 } from "../constants";
import { energiesAt, supported } from "../gibbs/energies";
import { fail, ok, type Outcome } from "../outcome";
import { reactionInput, type TemperatureSeries } from "../schemas/reaction";
import { failureOf } from "../selection/prepare";
import type { ChemicalData, EnergiesAtT, Species } from "../species/chemicalData";
import type { SpeciesRow } from "../schemas/chemistry";
import { kelvin, type Kelvin } from "../units";
import type { ReactionTerm } from "../solution";
import { reactionText } from "./balance";
import { imbalance } from "./elements";
import { unknownSpecies } from "./names";
import { readReaction } from "./readReaction";

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

interface Equation {
  readonly terms: readonly (readonly [Species | "e^-", number])[];
  readonly electrons: number;
}

const idOf = (s: Species | "e^-"): string => (s === "e^-" ? s : s.id);

function equationOf(data: ChemicalData, coefficients: Readonly<Record<string, number>>): Outcome<Equation> {
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

function valuesAt(data: ChemicalData, equation: Equation, energies: EnergiesAtT, temperatureC: number): ReactionValues {
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

/** The same reaction over a range of temperatures.
 *  @param data  the library     @param species  coefficients by id     @param series  C, both ends included where the step fits
 *  @returns  one row a temperature, rising; failures as `reactionAtT`     @source  as `reactionAtT` */
export function reactionSeries(
  data: ChemicalData,
  species: Readonly<Record<string, number>>,
  series: TemperatureSeries,
): Outcome<ReactionValues[]> {
  const input = { species, temperatureC: series.fromC, series };
  const parsed = reactionInput.safeParse(input);
  if (!parsed.success) return failureOf(parsed.error, input);
  const equation = equationOf(data, species);
  if (!equation.ok) return equation;
  const count = Math.floor((series.toC - series.fromC) / series.stepC + 1e-9) + 1;
  return ok(
    Array.from({ length: count }, (_, i) => {
      const temperatureC = Math.min(series.toC, Number((series.fromC + i * series.stepC).toPrecision(12)));
      return valuesAt(data, equation.value, energiesAt(data, kelvin(temperatureC)), temperatureC);
    }),
  );
}

export interface DeskAnswer extends ReactionAtT {
  /** what the reading of a typed reaction chose: "O2 read as O2(g)" */
  readonly assumed: readonly string[];
  readonly series?: readonly ReactionValues[];
}

/** The reaction desk: a question as the command line, the API and the screen send it.
 *  @param data  the library     @param input  anything; must be a `reactionInput`: species or a typed reaction, T, perhaps a series
 *  @returns  numbers with dG_kJ, logK and E0_V first; failures of `readReaction` and `reactionAtT`     @source  as `reactionAtT` */
export function reactionDesk(data: ChemicalData, input: unknown): Outcome<DeskAnswer> {
  const parsed = reactionInput.safeParse(input);
  if (!parsed.success) return failureOf(parsed.error, input);
  const { species: given, reaction, temperatureC, series } = parsed.data;
  const read = given === undefined ? readReaction(data, reaction ?? "") : ok({ species: given, assumed: [] });
  if (!read.ok) return read;
  const { species, assumed } = read.value;
  const single = reactionAtT(data, { species, temperatureC });
  // What was typed as text is wrong in the text.
  if (!single.ok) return given === undefined ? fail(single.error.code, "reaction", single.error.message) : single;
  const rows = series === undefined ? ok(undefined) : reactionSeries(data, species, series);
  if (!rows.ok) return rows;
  return ok({ ...single.value, assumed, ...(rows.value === undefined ? {} : { series: rows.value }) });
}
