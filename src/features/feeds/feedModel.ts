import { isExact } from "../../../shared/entry/interval";
import { measure, numberIn } from "../../../shared/entry/measure";
import {
  feedUpdate,
  type FeedCreate,
  type FeedMineral,
  type FeedRow,
  type HeadAssay,
} from "../../../shared/schemas/feed";
import { significant } from "../../lib/format";
import type { Problem } from "../../lib/recordDraft";

/** What an editor changes of a feed. */
export type FeedValues = Omit<FeedCreate, "projectId">;

export const feedValues = ({
  name,
  description,
  heads,
  minerals,
  carbonate,
  moisture,
  p80,
  solidDensity,
}: FeedRow): FeedValues => ({ name, description, heads, minerals, carbonate, moisture, p80, solidDensity });

export function feedProblems(changed: Partial<FeedValues>): Problem[] {
  const parsed = feedUpdate.safeParse(changed);
  if (parsed.success) return [];
  return parsed.error.issues.map(({ path, message }) => ({ path: path.join("."), message: sentence(path, message) }));
}

const sentence = (path: readonly PropertyKey[], message: string) =>
  path[0] === "name" ? "A name of 1 to 120 characters" : path.at(-1) === "element" ? "the element is missing" : message;

/** Elements with a head assay, in the order they first came. */
const elementsOf = (heads: readonly HeadAssay[]) => [
  ...new Set(heads.map(({ element }) => element.trim()).filter((element) => element !== "")),
];

export interface HeadOfElement {
  element: string;
  /** the assay accounts use: the one marked, or the only one */
  head: HeadAssay | null;
  count: number;
  /** what to know of the others: their range, or that none is marked */
  remark: string | null;
  /** accounts cannot be closed */
  open: boolean;
}

/** Which assay is the head of each element, and how far the others lie apart. */
export function headsOf(heads: readonly HeadAssay[]): HeadOfElement[] {
  return elementsOf(heads).map((element) => {
    const of = heads.filter((h) => h.element.trim() === element);
    const head = of.find((h) => h.head) ?? (of.length === 1 ? of[0]! : null);
    const values = of.flatMap(({ value }) => {
      const found = measure(value, "solidAssay");
      return found.kind === "value" && isExact(found.value) ? [100 * found.value.lo] : [];
    });
    const [lo, hi] = [Math.min(...values), Math.max(...values)];
    const spread =
      values.length > 1 && lo !== hi ? `${of.length} assays, ${significant(lo, 4)} to ${significant(hi, 4)} %` : null;
    const unmarked = head === null ? `${of.length} assays and none is marked as the head: accounts stay open` : null;
    return { element, head, count: of.length, remark: unmarked ?? spread, open: head === null };
  });
}

/** Marks one assay as the head of its element, and takes the mark off the others of that element. */
export function markHead(heads: readonly HeadAssay[], index: number, on: boolean): HeadAssay[] {
  const element = heads[index]?.element;
  return heads.map((h, i) =>
    i === index ? { ...h, head: on } : on && h.element === element ? { ...h, head: false } : h,
  );
}

/** "Zn 100 %, Fe 93 %": how much of each metal the minerals account for. */
export function placedShares(minerals: readonly FeedMineral[]): { element: string; sum: number; over: boolean }[] {
  const sums = new Map<string, number>();
  for (const { element, share } of minerals) {
    const value = numberIn(share, "share");
    if (element.trim() !== "" && value !== null) sums.set(element, (sums.get(element) ?? 0) + 100 * value);
  }
  return [...sums].map(([element, sum]) => ({
    element,
    sum: Math.round(10 * sum) / 10,
    over: sum > 100.5,
  }));
}
