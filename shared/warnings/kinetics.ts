import type { Prepared } from "../selection/prepare";
import { isSulfideMineral } from "../hazards/rules";
import type { Limit, SolutionWarning, State } from "../solution";
import { noteOn } from "./metastable";
import type { Relevant } from "./relevant";

const NO_SOURCE = "common practice, no source";

const movesElectrons = (l: Limit): boolean => l.reactionTerms?.some((t) => t.species === "e^-") ?? false;

/** Redox steps that the tables' rules (rows `rule:` of defaults.csv) call slow, in words, each with the metal whose limit moves electrons. */
export const slowCouples: readonly { metal: string; rule: string; text: string; unlessDosed?: true }[] = [
  {
    metal: "As",
    rule: "rule:arsenate-arsenite",
    text: "arsenite oxidises slowly without a catalyst: As(III) may persist above its field",
  },
  {
    metal: "Mn",
    rule: "rule:manganese-oxygen",
    text: "air does not oxidise Mn(II) below about pH 8 in hours: a limit by a higher oxide warns rather than binds until a strong oxidant is dosed",
    unlessDosed: true,
  },
  {
    metal: "Co",
    rule: "rule:cobalt-oxygen",
    text: "Co(II) needs a strong oxidant below about pH 7 before CoOOH forms",
    unlessDosed: true,
  },
  { metal: "Cr", rule: "rule:chromate-chromic", text: "Cr(III) is inert to oxygen: chromate forms far above its line" },
];
/** as defaults.csv names what is dosed */
const strong: ReadonlySet<string> = new Set(["persulfate", "chlorate", "peroxide"]);

/** Ligands that last although they are not stable, by their holders. */
export const lasting: readonly { holder: RegExp; rule: string; text: string }[] = [
  {
    holder: /^H?CN(\^-)?\(aq\)$/,
    rule: "rule:cyanide-cyanate",
    text: "cyanide is held inert here: at leach potentials cyanate is the stable form, and cyanide is lost to it slowly",
  },
  {
    holder: /^S2O3\^2-\(aq\)$/,
    rule: "rule:thiosulfate-tetrathionate",
    text: "thiosulfate is held inert here: it is lost to tetrathionate and beyond, and that couple is not solved",
  },
];

/** Minerals whose attack practice knows to be slow. */
const refractory: readonly { id: RegExp; text: string }[] = [
  {
    id: /^CuFeS2\(/,
    text: "chalcopyrite passivates: its rate falls below about 0.54 V and again above 0.62 V (chloride, 35 C; Velasquez-Yevenes, Nicol and Miki 2010, Hydrometallurgy 103, 108-113)",
  },
  {
    id: /^(FeS2|FeAsS)\(/,
    text: `pyrite and arsenopyrite oxidise slowly below the temperatures of pressure oxidation, 190 to 230 C, or without bacteria (${NO_SOURCE})`,
  },
  {
    id: /./,
    text: `direct attack on a sulfide can be slow: grind, oxidant and temperature set its rate (${NO_SOURCE})`,
  },
];

const onKinetics = noteOn(/\binert\b|\bslow|kinetically/i);

/** What a limit's metal does there that practice knows to be slow. */
function ofLimit(l: Limit, states: readonly (State | undefined)[], requirement: string | undefined): string | null {
  const won = requirement === "metal" && states.includes("dissolved");
  if ((l.metal === "Co" || l.metal === "Ni") && won)
    return "nickel and cobalt cement slowly however large the constant: zinc dust needs 75 to 90 C and copper or antimony as activator (Lew 1994, UBC thesis: 86.6 kJ/mol)";
  const acid = (l.from[0] + l.to[0]) / 2 < 7;
  if (l.metal === "Fe" && acid && states.includes("dissolved") && states.includes("compound") && !movesElectrons(l))
    return `iron hydrolyses over hours and by way of colloids: what settles and filters is set by supersaturation and staged addition, not by this limit alone (${NO_SOURCE})`;
  return null;
}

/** What the answer takes for granted and time does not: steps that the tables or practice call slow, where a limit, a set point or the
 *  target's own minerals rest on them. Thermodynamics says what can happen, not how fast.
 *  @param prepared  of the problem     @param relevant  what the answer rests on     @param stateOf  state of a metal's species
 *  @returns  KINETICS, each once, with its source or "common practice, no source"
 *  @source  rows `rule:` and notes of the tables; published practice as named in each text */
export function kineticsWarnings(
  { data, problem }: Prepared,
  { species, limits, holders }: Relevant,
  stateOf: (metal: string, id: string) => State | undefined,
): SolutionWarning[] {
  const out: SolutionWarning[] = [];
  const say = (of: Pick<SolutionWarning, "species" | "metal">, text: string) => {
    if (!out.some((w) => w.text === text)) out.push({ code: "KINETICS", ...of, text });
  };
  const dosesStrong = (problem.dosed ?? []).some((d) => strong.has(d));
  for (const l of limits) {
    const metal = l.metal ?? "";
    const of = { metal, ...(l.outside === undefined ? {} : { species: l.outside }) };
    const slow = slowCouples.find((c) => c.metal === metal && movesElectrons(l) && !(c.unlessDosed && dosesStrong));
    const states = [l.inside, l.outside].map((id) => stateOf(metal, id ?? ""));
    if (slow && !states.includes("metal")) say(of, `${slow.text} (${NO_SOURCE})`);
    const known = ofLimit(l, states, problem.metals.find((m) => m.element === metal)?.requirement);
    if (known !== null) say(of, known);
  }
  for (const id of holders) {
    const text = lasting.find(({ holder }) => holder.test(id))?.text;
    if (text !== undefined) say({ species: id }, `${text} (${NO_SOURCE})`);
  }
  const wanted = new Set(problem.metals.filter((m) => m.role === "target").map((m) => m.element));
  for (const id of problem.feedMinerals ?? []) {
    const metal = Object.keys(data.species.get(id)?.composition ?? {}).find((e) => wanted.has(e));
    if (metal === undefined || !isSulfideMineral(id)) continue;
    say({ species: id, metal }, refractory.find((r) => r.id.test(id))?.text ?? "");
  }
  for (const { metal, id } of species) {
    const row = data.species.get(id);
    const clause = row === undefined ? null : onKinetics(row);
    if (clause !== null) say({ species: id, metal }, `${clause} (note of the library)`);
  }
  return out;
}
