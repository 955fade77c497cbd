import type { Problem } from "../schemas/problem";
import type { ChemicalData } from "../species/chemicalData";

/** Why a species does not count, or null. Rules in order: the plan's own list; what the plan puts back or names for the
 *  feed stays; the fresh form in hours (solids-basis.csv); what a sensible plan leaves out (defaults.csv). Without a solids
 *  basis nothing is left out but the plan's own list. */
export type LeavesOut = (id: string) => string | null;

interface Rules {
  readonly defaults: ReadonlyMap<string, readonly { when: string; reason: string }[]>;
  readonly fresh: ReadonlyMap<string, { fresh: "in" | "out"; below: number; reason: string }>;
}

const rulesOf = new WeakMap<ChemicalData, Rules>();

function rules(data: ChemicalData): Rules {
  const known = rulesOf.get(data);
  if (known) return known;
  const defaults = new Map<string, { when: string; reason: string }[]>();
  for (const { id, when, reason } of data.tables.defaults) {
    const list = defaults.get(id);
    if (list) list.push({ when, reason });
    else defaults.set(id, [{ when, reason }]);
  }
  const fresh = new Map(
    data.tables.solidsBasis.map(
      (r) => [r.id, { fresh: r.fresh, below: r.below_C ?? Infinity, reason: r.reason }] as const,
    ),
  );
  const made = { defaults, fresh };
  rulesOf.set(data, made);
  return made;
}

/** Whether one `when` of defaults.csv holds. `sulfate_couple=off` never does here: with the couple off the sulfides wait for
 *  sulfide sulfur of their own, which decides.
 *  @throws Error on a condition this code does not know, so that a new one cannot pass unseen */
function holds(when: string, problem: Problem, isFeed: boolean): boolean {
  return when.split(",").every((condition) => {
    if (condition === "always") return true;
    if (condition === "sulfate_couple=off") return false;
    if (condition === "unless_feed" || condition === "as_product") return !isFeed;
    if (condition === "role:iron_gangue") return problem.metals.some((m) => m.element === "Fe" && m.role === "gangue");
    const dosed = /^unless_dosed:(\w+)$/.exec(condition);
    if (dosed) return !(problem.dosed ?? []).includes(dosed[1]!);
    const limit = /^T(<|>=)(-?[\d.]+)$/.exec(condition);
    if (limit) return limit[1] === "<" ? problem.temperatureC < +limit[2]! : problem.temperatureC >= +limit[2]!;
    throw new Error(`defaults.csv: unknown condition "${condition}"`);
  });
}

/** The rule of a problem.
 *  @param problem  validated     @param data  library     @returns  id -> reason or null
 *  @source  chemistry tables defaults.csv and solids-basis.csv (common practice, every line can be changed by the plan) */
export function leavesOut(problem: Problem, data: ChemicalData): LeavesOut {
  const own = new Set(problem.leftOut);
  const kept = new Set([...(problem.putBack ?? []), ...(problem.feedMinerals ?? [])]);
  const feed = new Set(problem.feedMinerals);
  const basis = problem.solidsBasis;
  const { defaults, fresh } = rules(data);
  return (id) => {
    if (own.has(id)) return "left out by the plan";
    if (basis === undefined || kept.has(id)) return null;
    const form = basis === "aged" ? undefined : fresh.get(id);
    if (form?.fresh === "in") return null;
    if (form && problem.temperatureC < form.below) return `fresh solids: ${form.reason}`;
    const row = defaults.get(id)?.find((r) => holds(r.when, problem, feed.has(id)));
    return row ? row.reason : null;
  };
}

const stagesOf = new WeakMap<ChemicalData, readonly number[]>();

/** Every temperature at which a rule of the tables sets in or ends.
 *  @param data  library     @returns  C, rising, each once     @source  defaults.csv and solids-basis.csv */
export function temperatureLimits(data: ChemicalData): readonly number[] {
  let stages = stagesOf.get(data);
  if (!stages) {
    const limits = data.tables.defaults.flatMap((r) => [...r.when.matchAll(/T(?:<|>=)(-?[\d.]+)/g)].map((m) => +m[1]!));
    const all = new Set([...limits, ...data.tables.solidsBasis.flatMap((r) => r.below_C ?? [])]);
    stages = [...all].sort((a, b) => a - b);
    stagesOf.set(data, stages);
  }
  return stages;
}

/** How many temperature limits of the rules lie at or below T: between two limits the rules do not change.
 *  @param data  library     @param temperatureC  C     @returns  a count */
export const temperatureStage = (data: ChemicalData, temperatureC: number): number =>
  temperatureLimits(data).filter((limit) => limit <= temperatureC).length;
