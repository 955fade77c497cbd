import { planInputs, type PlanInputs } from "../../../shared/schemas/plan";
import { same } from "../merge";
import { type Entry, type Kind, ORDERED } from "./kind";
import { planKinds } from "./kinds";

export type Whose = "yours" | "theirs";
export type Choices = Readonly<Record<string, Whose>>;

/** A setting that two people changed to different things, in words. */
export interface PlanConflict {
  path: string;
  what: string;
  base: string;
  yours: string;
  theirs: string;
}
/** A setting that stands as one of the two left it: the other did not touch it, or did the same. */
export interface PlanTaken {
  path: string;
  what: string;
  from: string;
  to: string;
  whose: Whose | "both";
}
export interface PlanMerge {
  conflicts: readonly PlanConflict[];
  taken: readonly PlanTaken[];
  /** the plan with the conflicts decided, by their paths; what is not decided stands as yours */
  settle: (choices: Choices) => PlanInputs;
}

/** Two plans that started from one, put together setting by setting: what only one of them changed is taken; what both changed
 *  differently is a conflict. Metals are joined line by line, totals by component; species, minerals, reagents and gases one by one.
 *  Where lines that only one of them added or took out would together leave no metal, or more than a plan holds, they are conflicts too.
 *  @param base  what both started from     @param yours, theirs  what became of it
 *  @returns  equal to `yours` where theirs is the base, and the other way round; a list that may be absent is left away when empty */
export function mergePlans(base: PlanInputs, yours: PlanInputs, theirs: PlanInputs): PlanMerge {
  const parts = planKinds.map((kind) => joinKind(kind, kind.of(base), kind.of(yours), kind.of(theirs)));
  return {
    conflicts: parts.flatMap((part) => part.conflicts),
    taken: parts.flatMap((part) => part.taken),
    settle: (choices) => parts.reduce((sum, part) => part.put(sum, choices), yours),
  };
}

type Entries = readonly Entry<unknown>[];
/** Who decides: null where both changed it, to different things; "nobody" where nothing changed. */
type Verdict = Whose | "both" | "nobody" | null;

function joinKind(kind: Kind<unknown>, base: Entries, yours: Entries, theirs: Entries) {
  const [b, y, t] = [new Map(base), new Map(yours), new Map(theirs)];
  const keys = [...new Set([...b.keys(), ...t.keys(), ...y.keys()])];
  const pathOf = (key: string) => `${kind.name}/${key}`;
  const first = firstOrder([...b.keys()], [...y.keys()], [...t.keys()]);
  const orderPath = pathOf(ORDERED);

  const verdicts = new Map(keys.map((key) => [key, verdictOn(b.get(key), y.get(key), t.get(key))]));
  const values = (choices: Choices) => {
    const side = (key: string) => ((verdicts.get(key) ?? choices[pathOf(key)]) === "theirs" ? t : y);
    const order = first ?? choices[orderPath] ?? "yours";
    const sequence = new Set(order === "yours" ? [...y.keys(), ...t.keys()] : [...t.keys(), ...y.keys()]);
    return [...sequence].flatMap((key): Entries => (side(key).has(key) ? [[key, side(key).get(key)]] : []));
  };
  const put = (inputs: PlanInputs, choices: Choices) => kind.put(inputs, values(choices));
  if (kind.fits && !kind.fits(values({})))
    for (const key of keys) if (y.has(key) !== t.has(key)) verdicts.set(key, null);

  const conflicts: PlanConflict[] = [];
  const taken: PlanTaken[] = [];
  for (const key of keys) {
    const verdict = verdicts.get(key) ?? null;
    const words = { path: pathOf(key), what: kind.what(key) };
    const [was, mine, other] = [b.get(key), y.get(key), t.get(key)];
    if (verdict === null) {
      const [one, two] = textsOf(kind, mine, other);
      conflicts.push({ ...words, base: textsOf(kind, was, was)[0], yours: one, theirs: two });
    } else if (verdict !== "nobody") {
      const [from, to] = textsOf(kind, was, verdict === "theirs" ? other : mine);
      taken.push({ ...words, from, to, whose: verdict });
    }
  }
  if (kind.order !== undefined) {
    const [wasOrder, mine, other] = [b, y, t].map((side) => [...side.keys()].join(", ")) as [string, string, string];
    const words = { path: orderPath, what: kind.order };
    if (first === null) conflicts.push({ ...words, base: wasOrder, yours: mine, theirs: other });
    else if (reordered([...b.keys()], [...(first === "yours" ? y : t).keys()]))
      taken.push({ ...words, from: wasOrder, to: first === "yours" ? mine : other, whose: first });
  }
  return { conflicts, taken, put };
}

function verdictOn(base: unknown, yours: unknown, theirs: unknown): Verdict {
  if (same(yours, theirs)) return same(base, yours) ? "nobody" : "both";
  if (same(base, theirs)) return "yours";
  return same(base, yours) ? "theirs" : null;
}

/** Whether the keys that both hold follow one another differently. */
function reordered(one: readonly string[], other: readonly string[]): boolean {
  const common = other.filter((key) => one.includes(key));
  return one.filter((key) => other.includes(key)).some((key, i) => key !== common[i]);
}

/** Whose order leads; the other's additions follow. Null where both brought in orders that contradict each other. */
function firstOrder(base: readonly string[], yours: readonly string[], theirs: readonly string[]): Whose | null {
  if (!reordered(yours, theirs)) return same(base, theirs) ? "yours" : "theirs";
  if (!reordered(base, theirs)) return "yours";
  return reordered(base, yours) ? null : "theirs";
}

/** Two values in words; where the words are the same and the values are not, with every digit. */
function textsOf(kind: Kind<unknown>, one: unknown, other: unknown): [string, string] {
  const text = (value: unknown) => (value === undefined ? (kind.absent ?? "taken out") : kind.text(value));
  const [a, b] = [text(one), text(other)];
  if (a !== b || same(one, other)) return [a, b];
  return [`${a} (${numbersIn(one)})`, `${b} (${numbersIn(other)})`];
}
const numbersIn = (value: unknown): string =>
  (JSON.stringify(value).match(/-?\d+(?:\.\d+)?(?:e[+-]?\d+)?/g) ?? []).join(", ");

/** What forbids these inputs to be a plan, in a sentence, or null. */
export function whyNoPlan(inputs: PlanInputs): string | null {
  const parsed = planInputs.safeParse(inputs);
  if (parsed.success) return null;
  const [issue] = parsed.error.issues;
  if (issue?.path[0] === "metals" && inputs.metals.length === 0) return "No metal would be left: keep at least one.";
  if (issue?.path[0] === "metals" && inputs.metals.length > 16)
    return `${inputs.metals.length} metals together; a plan holds at most 16.`;
  return `${issue?.path.join(".") ?? "The plan"}: ${issue?.message ?? "cannot stand"}.`;
}
