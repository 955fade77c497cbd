import { pKwater } from "../gibbs/water";
import { fail, ok, type Outcome } from "../outcome";
import { componentKind } from "../selection/components";
import type { ReactionTerm } from "../solution";
import type { ChemicalData, Species } from "../species/chemicalData";
import { kelvin } from "../units";
import { reactionText } from "./balance";
import { demandOf, madeBy, type Acid, type Amount, type Base, type Demand } from "./demand";
import { reactionAtT, type ReactionAtT } from "./atTemperature";
import { halfReaction, joined, withHydroxide, type Coefficients } from "./halfReaction";
import { unknownSpecies } from "./names";
import { redoxReagentById, type RedoxReagent } from "./redoxReagents";

export interface OverallQuestion {
  /** species id: mineral, metal, or ion of the liquor (cementation, precipitation) */
  readonly from: string;
  /** what its parts become, one id a component; the rest are ligands' holders */
  readonly products: readonly string[];
  /** species that hold the ligands of the products in the liquor, by component */
  readonly ligands?: ReadonlyMap<string, string>;
  /** id of redoxReagents that takes or gives the electrons; without one they stay in the reaction */
  readonly redox?: string;
  /** what the redox reagent becomes, in place of the usual */
  readonly redoxMade?: string;
  readonly acid?: Acid;
  readonly base?: Base;
  /** element whose kg are counted: the first metal of `from` unless named */
  readonly metal?: string;
  readonly temperatureC: number;
  /** of the set point; above pKw / 2 the reaction is written with OH^- */
  readonly pH: number;
  /** sulfate and sulfide sulfur turn into each other */
  readonly sulfateReduction?: boolean;
}

export interface OverallReaction {
  /** smallest whole coefficients: what is used negative, `from` first */
  readonly terms: readonly ReactionTerm[];
  readonly text: string;
  /** electrons one formula unit of `from` gives up; below zero it takes them */
  readonly electrons: number;
  readonly redox: RedoxReagent | null;
  /** no reagent closes the electrons: `e^-` stands in the reaction */
  readonly open: boolean;
  readonly metal: string | null;
  readonly demand: readonly Demand[];
  readonly made: readonly (Amount & { readonly species: string })[];
  /** dG, log K and grades at T; log K says how far, never how fast */
  readonly energetics: ReactionAtT;
}

/** What the reagent becomes: as the handbooks write it, or what a cementing metal's element is at the set point. */
function halfOf(data: ChemicalData, question: OverallQuestion, redox: RedoxReagent): Outcome<Coefficients> {
  const { redoxMade, pH, products, ligands } = question;
  if (redox.role !== "cementing metal" || redoxMade === undefined)
    return ok(pH > 4 ? (redox.halfInBase ?? redox.half) : redox.half);
  const own = (id: string): boolean => (redox.sold?.formula ?? "") in (data.species.get(id)?.composition ?? {});
  const partners = [...products, ...(ligands?.values() ?? [])].filter((id) => !own(id));
  return halfReaction(data, redox.used, [redoxMade, ...partners], false);
}

/** The half-reaction of the reagent that closes the electrons. */
function closing(data: ChemicalData, question: OverallQuestion, electrons: number): Outcome<RedoxHalf | null> {
  if (question.redox === undefined || electrons === 0) return ok(null);
  const redox = redoxReagentById.get(question.redox);
  if (redox === undefined)
    return fail("INVALID_INPUT", "redox", `no oxidant, reductant or cementing metal is called "${question.redox}"`);
  const half = halfOf(data, question, redox);
  if (!half.ok) return half;
  if ((half.value.get("e^-") ?? 0) * electrons >= 0) {
    const wanted = electrons > 0 ? "an oxidant" : "a reductant or a cementing metal";
    return fail("INVALID_INPUT", "redox", `${question.from} needs ${wanted} here; ${redox.used} is none`);
  }
  return ok({ redox, half: half.value });
}
interface RedoxHalf {
  readonly redox: RedoxReagent;
  readonly half: Coefficients;
}

/** Used before made; the start first, then the reagent, ligands, water and acid or base last. */
function termsOf(data: ChemicalData, reaction: Coefficients, first: readonly string[]): ReactionTerm[] {
  const last = ["H2O(l)", "H^+(aq)", "OH^-(aq)", "e^-"];
  const rank = (id: string): number => {
    if (last.includes(id)) return 1000 + last.indexOf(id);
    return first.includes(id) ? first.indexOf(id) : 500;
  };
  return [...reaction]
    .sort(([a, n], [b, m]) => Math.sign(n) - Math.sign(m) || rank(a) - rank(b))
    .map(([id, coefficient]) => ({ species: id, formula: data.species.get(id)?.formula ?? id, coefficient }));
}

const firstMetal = (data: ChemicalData, species: Species): string | null =>
  Object.keys(species.composition).find((c) => componentKind(data, c) === "metal") ?? null;

/** The balanced overall reaction of one mineral, metal or ion with named products, its electrons closed by a reagent, and the reagents it
 *  takes per mole, per kg of metal and per tonne. Both half-reactions come from the null space of the composition matrix; H^+ stands for
 *  acid below pKw / 2, OH^- above.
 *  @param data  the library     @param question  start, products, ligands, reagent, T, pH
 *  @returns  smallest whole coefficients, demand, masses made, dG and log K at T. UNKNOWN_SPECIES, LIGAND_MISSING, INVALID_INPUT where the
 *    start is its own product, the reagent works the wrong way, or products leave more than one reaction
 *  @source  docs/method.md, section 8; Smith and Missen 1982 for the matrix
 *  @example valueOf(overallOf(chemistry(), { from: "UO2(s,uraninite)", products: ["UO2^2+(aq)"], redox: "ferric", temperatureC: 25, pH: 1.5 })).demand[0].kgPerKgMetal // => 0.469 */
export function overallOf(data: ChemicalData, question: OverallQuestion): Outcome<OverallReaction> {
  const from = data.species.get(question.from);
  if (from === undefined) return unknownSpecies(data, question.from, "from");
  if (question.products.includes(from.id))
    return fail("INVALID_INPUT", "from", `${from.id} is itself what stands here: there is nothing to react`);
  const ligands = question.ligands ?? new Map<string, string>();
  const partners = [...question.products, ...ligands.values()].filter((id) => id !== from.id);
  const main = halfReaction(data, from.id, partners, question.sulfateReduction ?? false);
  if (!main.ok) return main;
  const units = -(main.value.get(from.id) ?? -1);
  const electrons = (main.value.get("e^-") ?? 0) / units;
  const close = closing(data, question, electrons);
  if (!close.ok) return close;
  const acidic = close.value === null ? main.value : joined(main.value, close.value.half);
  const basic = question.pH > pKwater(kelvin(question.temperatureC)) / 2;
  const reaction = basic ? withHydroxide(acidic) : acidic;
  const redox = close.value?.redox ?? null;
  const terms = termsOf(data, reaction, [
    from.id,
    ...(redox ? [redox.used] : []),
    ...[...ligands.values()].filter((id) => !question.products.includes(id)),
    ...question.products,
  ]);
  const energetics = reactionAtT(data, {
    species: Object.fromEntries(reaction),
    temperatureC: question.temperatureC,
  });
  if (!energetics.ok) return energetics;
  const metal = question.metal ?? firstMetal(data, from);
  const asked = {
    ...{ from, metal: metal ?? "", reaction, redox, ligands },
    ...{ acid: question.acid ?? "H2SO4", base: question.base ?? "CaO", basic },
  };
  return ok({
    terms,
    text: reactionText(terms),
    electrons,
    redox,
    open: electrons !== 0 && redox === null,
    metal,
    demand: demandOf(data, asked),
    made: madeBy(data, asked),
    energetics: energetics.value,
  });
}
