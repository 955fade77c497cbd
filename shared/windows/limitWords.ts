import { beyondWords } from "../hazards/words";
import type { Limit, SetPoint, Solution, State, Window } from "../solution";
import type { ChemicalData } from "../species/chemicalData";

export type Side = "low pH" | "high pH" | "low Eh" | "high Eh";

export interface LimitSentence {
  side: Side;
  /** "iron dissolves": what happens beyond */
  what: string;
  /** along the side's own axis where the line through the set point meets the limit; V or pH */
  distance: number | null;
  axis: "pH" | "Eh";
  /** counted in control bands */
  bands: number;
  limit: Limit;
  /** further stretches of the same side and verb, with reactions of their own */
  others: Limit[];
}

/** Which side of the window a limit closes: its outward normal. Lines that slope less than 1 V a pH unit transfer electrons and are
 *  held by potential; what is steeper is held by pH. */
export function sideOf({ line: [, x, y] }: Pick<Limit, "line">): Side {
  // k + x pH + y Eh is positive inside, so the way out is (-x, -y).
  if (Math.abs(x) > Math.abs(y)) return x < 0 ? "high pH" : "low pH";
  return y < 0 ? "high Eh" : "low Eh";
}

const electrons = (limit: Limit): number =>
  limit.reactionTerms?.find((t) => t.species === "e^-" || t.formula === "e^-")?.coefficient ?? 0;

/** What the metal does when the limit is passed; electrons on the left mean that it is reduced. */
function verb(inside: State | undefined, outside: State | undefined, limit: Limit): string {
  const e = electrons(limit);
  const turns = e < 0 ? "is reduced" : e > 0 ? "is oxidised" : null;
  if (outside === "dissolved") {
    if (inside === "dissolved") return turns ?? "changes its complex";
    return turns === null ? "dissolves" : `${turns} and dissolves`;
  }
  if (outside === "metal") return "goes to metal";
  if (inside === "dissolved") return turns === null ? "precipitates" : `${turns} and precipitates`;
  return turns === null ? "changes its compound" : `${turns} to a compound`;
}

export interface Naming {
  /** element → its name in words: "zinc" */
  metalName: (element: string) => string;
  stateOf: (metal: string, species: string) => State | undefined;
}

/** Names of elements and states of fields, for the sentences.
 *  @param data  library     @param solution  whose fields say the state of each species     @returns  both as functions */
export const namingOf = (data: ChemicalData, solution: Pick<Solution, "fields">): Naming => {
  const states = new Map(solution.fields.map((f) => [`${f.metal} ${f.species}`, f.state]));
  return {
    metalName: (element) => data.tables.elements.find((e) => e.symbol === element)?.name ?? element,
    stateOf: (metal, species) => states.get(`${metal} ${species}`),
  };
};

/** What stands beyond a hazard's limit: "HCN reaches 50 ppm over the liquor (kept out)".
 *  @param limit  of kind hazard     @returns  a phrase */
export function hazardWords({ gas, bar, pHAtLeast }: Pick<Limit, "gas" | "bar" | "pHAtLeast">): string {
  if (gas === undefined) return "a hazard is kept out";
  const beyond = pHAtLeast === undefined ? beyondWords({ gas, bar: bar ?? 0 }) : beyondWords({ gas, pHAtLeast });
  return `${beyond} (kept out)`;
}

function what(limit: Limit, { metalName, stateOf }: Naming): string {
  switch (limit.kind) {
    case "water":
      return limit.side === "hydrogen" ? "water gives hydrogen" : "water gives oxygen";
    case "frame":
      return "the frame ends here, not the window";
    case "hazard":
      return hazardWords(limit);
    case "metal": {
      const metal = limit.metal ?? "";
      const state = (species: string | undefined) => (species === undefined ? undefined : stateOf(metal, species));
      return `${metalName(metal)} ${verb(state(limit.inside), state(limit.outside), limit)}`;
    }
  }
}

/** What shuts a window, one sentence a side and verb, nearest first; the frame comes last, since it shuts nothing. */
export function limitSentences(window: Window, naming: Naming): LimitSentence[] {
  const bySentence = new Map<string, LimitSentence>();
  const near = [...window.limits].sort((a, b) => a.distance - b.distance);
  for (const limit of near) {
    const side = sideOf(limit);
    const words = what(limit, naming);
    const known = bySentence.get(`${side} ${words}`);
    if (known) {
      known.others.push(limit);
      continue;
    }
    const axis = side.endsWith("pH") ? "pH" : "Eh";
    bySentence.set(`${side} ${words}`, {
      side,
      what: words,
      axis,
      distance: along(window.limits, side, words, axis, naming, limit),
      bands: limit.distance,
      limit,
      others: [],
    });
  }
  const all = [...bySentence.values()];
  return [...all.filter((s) => s.limit.kind !== "frame"), ...all.filter((s) => s.limit.kind === "frame")];
}

/** The way along the axis to the nearest stretch of this sentence that lies straight ahead. */
function along(
  limits: readonly Limit[],
  side: Side,
  words: string,
  axis: "pH" | "Eh",
  naming: Naming,
  first: Limit,
): number | null {
  const ahead = limits
    .filter((l) => l === first || (sideOf(l) === side && what(l, naming) === words))
    .map((l) => (axis === "pH" ? l.distancePH : l.distanceEh))
    .filter((d) => d !== null)
    .map(Math.abs);
  return ahead.length > 0 ? Math.min(...ahead) : null;
}

/** How the margin reads: bands of pH alone where Eh is a mixed potential. */
export const marginWords = (setPoint: SetPoint): string => (setPoint.mixedPotential ? "bands of pH" : "control bands");

/** Windows are called A, B, C ... in the order of the solution. */
export const windowName = (index: number): string => String.fromCharCode(65 + (index % 26));
