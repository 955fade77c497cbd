import { measure } from "../entry/measure";
import { readEntry } from "../entry/readEntry";
import type { Feed } from "../schemas/feed";
import type { PlanMetal, PresetName } from "../schemas/plan";
import { componentKind } from "../selection/components";
import type { ChemicalData } from "../species/chemicalData";

export type SuggestedRole = PlanMetal["role"];

/** How much of a metal is taken to dissolve, by its role: what the target is to give, the most of the gangue that may go, and for what is
 *  only watched something between. Common practice, no source; the user sees and changes every one. */
export const SUGGESTED_EXTRACTION: Readonly<Record<SuggestedRole, number>> = {
  target: 0.9,
  gangue: 0.001,
  watched: 0.5,
};

/** Metals that are seldom what a leach is run for: common practice, no source. */
const seldomTarget: ReadonlySet<string> = new Set([
  "Fe",
  "Al",
  "Mg",
  "Mn",
  "Ca",
  "Cr",
  "Ti",
  "Si",
  "K",
  "Na",
  "As",
  "Sb",
]);
const precious: ReadonlySet<string> = new Set(["Au", "Ag"]);
const forPrecious: ReadonlySet<PresetName> = new Set<PresetName>(["cyanide", "thiosulfate_ammonia"]);
/** Watched metals drawn unless asked: more make a map hard to read. */
const MOST_WATCHED = 3;

export interface HeadOf {
  readonly element: string;
  /** g/g of dry feed */
  readonly head: number;
  /** as typed, and how it was chosen where that needs saying */
  readonly typed: string;
  readonly remark: string | null;
}

export interface FeedHeads {
  /** metals the library knows, largest first */
  readonly heads: readonly HeadOf[];
  /** what the plan cannot use, with the reason */
  readonly skipped: readonly { readonly element: string; readonly why: string }[];
}

/** The head of every metal of a feed: the assay marked as the head, else the only one, else the mean of all of them, and it says so.
 *  @param feed  with its assays     @param data  library     @returns  heads, g/g of dry feed, and what is skipped
 *  @source  a "<" counts at its limit, which overstates it: common practice, no source */
export function headsOfFeed(feed: Pick<Feed, "heads">, data: ChemicalData): FeedHeads {
  const heads: HeadOf[] = [];
  const skipped: { element: string; why: string }[] = [];
  for (const element of new Set(feed.heads.map((h) => h.element))) {
    if (componentKind(data, element) !== "metal") {
      skipped.push({ element, why: "not a metal of the chemistry library" });
      continue;
    }
    const all = feed.heads.filter((h) => h.element === element);
    const marked = all.filter((h) => h.head);
    const values = (marked.length > 0 ? marked : all).flatMap((assay) => {
      const found = measure(assay.value, "solidAssay");
      return found.kind === "value" ? [{ assay, at: found.value.hi }] : [];
    });
    const [first] = values;
    if (first === undefined) {
      skipped.push({ element, why: "its assay is blank or cannot be read" });
      continue;
    }
    const less = readEntry(first.assay.value.text).kind === "less";
    const remark =
      values.length > 1
        ? `mean of ${values.length} assays, none marked as the head`
        : less
          ? "taken at its limit"
          : null;
    const head = values.reduce((sum, v) => sum + v.at, 0) / values.length;
    if (!(head > 0)) skipped.push({ element, why: "its head is zero" });
    else heads.push({ element, head, typed: `${first.assay.value.text.trim()} ${first.assay.value.unit}`, remark });
  }
  return { heads: heads.sort((a, b) => b.head - a.head), skipped };
}

/** What a liquor carries when a share of a metal dissolves, a litre of liquor taken as a kilogram.
 *  @param head  g/g of dry feed     @param solids  g of dry solids a g of pulp, 0 to below 1     @param extraction  share that dissolves
 *  @returns  g/L     @source  mass balance
 *  @example tenorFromHead(0.1, 0.2, 0.9) // => 22.5 */
export const tenorFromHead = (head: number, solids: number, extraction: number): number =>
  head * (solids / (1 - solids)) * 1000 * extraction;

export interface SuggestedLine {
  readonly element: string;
  readonly role: SuggestedRole;
  /** share that dissolves */
  readonly extraction: number;
  /** drawn unless the user leaves it out */
  readonly drawn: boolean;
}

/** The metal a leach of this feed is most likely run for.
 *  @param heads  largest first     @param preset  lixiviant     @returns  element; null without heads
 *  @source  common practice, no source: gold before silver in a cyanide or thiosulfate liquor, else the largest head that is
 *           not usually gangue */
export function likelyTarget(heads: readonly HeadOf[], preset: PresetName): string | null {
  if (forPrecious.has(preset)) {
    const found = ["Au", "Ag"].find((element) => heads.some((h) => h.element === element));
    if (found !== undefined) return found;
  }
  const base = heads.find(({ element }) => !seldomTarget.has(element) && !precious.has(element));
  return (base ?? heads[0])?.element ?? null;
}

/** A line of a plan for every metal of a feed: the target, iron as gangue, the rest watched, of which the largest are drawn.
 *  @param heads  largest first     @param target  element     @returns  lines in that order     @source  common practice, no source */
export function suggestedLines(heads: readonly HeadOf[], target: string): SuggestedLine[] {
  const roleOf = (element: string): SuggestedRole =>
    element === target ? "target" : element === "Fe" ? "gangue" : "watched";
  const order: readonly SuggestedRole[] = ["target", "gangue", "watched"];
  const watched = heads.filter(({ element }) => roleOf(element) === "watched").map(({ element }) => element);
  return heads
    .map(({ element }): SuggestedLine => {
      const role = roleOf(element);
      const drawn = role !== "watched" || watched.indexOf(element) < MOST_WATCHED;
      return { element, role, extraction: SUGGESTED_EXTRACTION[role], drawn };
    })
    .sort((a, b) => order.indexOf(a.role) - order.indexOf(b.role));
}

/** The minerals of a feed that the library knows as solids; others are names only.
 *  @param feed  with its mineralogy     @param data  library     @returns  ids without repeats, and the names it does not know */
export function mineralsOfFeed(
  feed: Pick<Feed, "minerals">,
  data: ChemicalData,
): { readonly known: readonly string[]; readonly unknown: readonly string[] } {
  const ids = [...new Set(feed.minerals.map(({ mineral }) => mineral))];
  const solid = (id: string) => data.species.get(id)?.phase === "s";
  return { known: ids.filter(solid), unknown: ids.filter((id) => !solid(id)) };
}
