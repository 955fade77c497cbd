import type { Outcome } from "../outcome";
import type { PlanInputs, PresetName } from "../schemas/plan";
import type { Problem } from "../schemas/problem";
import type { Solution } from "../solution";
import type { ChemicalData } from "../species/chemicalData";
import { type OverallAtSetPoint, overallReaction } from "./atSetPoint";

/** What a plan's overall reactions may start from: the feed's minerals, what is to be won as metal as it stands in the liquor, and the
 *  metals that no mineral brings, as metals.
 *  @param inputs, solution, data  of the plan     @returns  species ids, each once     @source  a choice */
export function startsOf(
  { metals, feedMinerals }: Pick<PlanInputs, "metals" | "feedMinerals">,
  { fields }: Pick<Solution, "fields">,
  data: ChemicalData,
): string[] {
  const ions = metals
    .filter((m) => m.requirement === "metal")
    .flatMap((m) => fields.filter((f) => f.metal === m.element && f.state === "dissolved"))
    .map((f) => f.species);
  const brought = new Set(feedMinerals.flatMap((id) => Object.keys(data.species.get(id)?.composition ?? {})));
  const elements = metals
    .filter((m) => !brought.has(m.element))
    .map((m) => `${m.element}(s)`)
    .filter((id) => data.species.has(id));
  return [...new Set([...feedMinerals, ...ions, ...elements])];
}

const usualOxidant: Partial<Record<PresetName, string>> = { chloride: "cupric-chloride" };

/** The usual reagent for so many electrons: air, or the first cementing metal that the liquor can take.
 *  @param electrons  that the start gives up; below zero it takes them     @param preset, elements  of the plan
 *  @returns  id of a redox reagent; null where no electrons move     @source  common practice, no source */
export function usualRedox(electrons: number, preset: PresetName, elements: readonly string[]): string | null {
  if (electrons === 0) return null;
  if (electrons > 0) return usualOxidant[preset] ?? "air";
  return elements.includes("Zn") || preset === "cyanide" ? "zinc-dust" : "iron-scrap";
}

export interface PlanReaction {
  readonly from: string;
  /** electrons the start gives up with its products; 0 where it cannot be written */
  readonly electrons: number;
  /** id of the redox reagent in force, "open" where electrons stay, null where none move */
  readonly redox: string | null;
  /** products chosen by hand, by component */
  readonly chosen: Readonly<Record<string, string>>;
  /** what each part would become without a choice of hand, by component */
  readonly rules: ReadonlyMap<string, string>;
  readonly outcome: Outcome<OverallAtSetPoint>;
}

/** One overall reaction of a plan as its choices have it: products and redox reagent kept with the plan, the usual ones where it has none.
 *  @param problem, data, inputs  of the plan     @param at  pH and Eh of the set point, V vs SHE at T     @param from  species id of the start
 *  @returns  the choices in force, what would rule without them, and the reaction or why it cannot be written
 *  @source  docs/method.md, section 8 */
export function planReaction(
  problem: Problem,
  data: ChemicalData,
  inputs: Pick<PlanInputs, "overall" | "preset" | "metals">,
  at: { readonly pH: number; readonly Eh: number },
  from: string,
): PlanReaction {
  const { products: chosen = {}, redox: ownRedox } = inputs.overall?.[from] ?? {};
  const ask = (more: { redox?: string; products?: Readonly<Record<string, string>> }) =>
    overallReaction(problem, data, { from, at, ...more });
  const standing = ask({});
  const byHand = Object.keys(chosen).length > 0;
  const bare = byHand ? ask({ products: chosen }) : standing;
  const electrons = bare.ok ? bare.value.electrons : 0;
  const elements = inputs.metals.map((m) => m.element);
  const redox = electrons === 0 ? null : (ownRedox ?? usualRedox(electrons, inputs.preset, elements));
  const closed = redox !== null && redox !== "open";
  const outcome = closed ? ask({ redox, ...(byHand ? { products: chosen } : {}) }) : bare;
  const unchosen = !closed ? standing : byHand ? ask({ redox }) : outcome;
  const rules = new Map([standing, unchosen].flatMap((o) => (o.ok ? [...o.value.products] : [])));
  return { from, electrons, redox, chosen, rules, outcome };
}

/** Whether a start is its own product: nothing reacts, and that is no error.
 *  @param outcome  of `planReaction`     @source  docs/method.md, section 8 */
export const staysAsItIs = (outcome: PlanReaction["outcome"]): boolean =>
  !outcome.ok && outcome.error.code === "INVALID_INPUT" && outcome.error.path === "from";

/** The sentence for such a start, after its name.
 *  @param from  species id     @param data  library     @returns  words without a full stop
 *  @example staysWords("Cu(s)", chemistry()).length // => 59 */
export function staysWords(from: string, data: ChemicalData): string {
  const species = data.species.get(from);
  if (species?.phase === "aq") return "stays dissolved as it is: this species rules at the set point";
  const element = species !== undefined && species.charge === 0 && Object.keys(species.composition).length === 1;
  return `stays as it is: the ${element ? "metal" : "mineral"} itself is stable at the set point`;
}

/** Every overall reaction of a plan at its set point, in the order of its starts; a start that already stands as its own product is left
 *  out.
 *  @param problem, data, inputs, solution  of the plan     @param at  set point     @returns  as `planReaction`     @source  as `planReaction` */
export function planReactions(
  problem: Problem,
  data: ChemicalData,
  inputs: Pick<PlanInputs, "overall" | "preset" | "metals" | "feedMinerals">,
  solution: Pick<Solution, "fields">,
  at: { readonly pH: number; readonly Eh: number },
): PlanReaction[] {
  return startsOf(inputs, solution, data)
    .map((from) => planReaction(problem, data, inputs, at, from))
    .filter(({ outcome }) => !staysAsItIs(outcome));
}
