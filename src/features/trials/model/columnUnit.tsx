import type { ReactNode } from "react";
import type { Entry } from "../../../../shared/entry/readEntry";
import { unitText } from "../../../lib/units";

/** The unit most of a column was typed in; `usual` while nothing is typed. */
export function commonUnit(entries: readonly Entry[], usual: string): string {
  const counts = new Map<string, number>();
  for (const { text, unit } of entries) if (text.trim() !== "") counts.set(unit, (counts.get(unit) ?? 0) + 1);
  return [...counts].sort((a, b) => b[1] - a[1])[0]?.[0] ?? usual;
}

/** Behind a number typed in another unit than its column stands that unit: a column head must not speak for it. */
export const otherUnit = (entry: Entry | undefined, unit: string): ReactNode =>
  entry && entry.text.trim() !== "" && entry.unit !== unit ? (
    <span className="font-mono text-xs text-muted">{unitText(entry.unit)}</span>
  ) : undefined;

/** A number typed into a column: the column's unit, unless it had one of its own. */
export const typedIn = (before: Entry, text: string, unit: string): Entry => ({
  text,
  unit: before.text.trim() === "" ? unit : before.unit,
});

/** Another unit for a column: what was typed under the old head goes along, numbers as typed; what had a unit of its own keeps it. */
export const relabelled = (entry: Entry, from: string, to: string): Entry =>
  entry.text.trim() === "" || entry.unit === from ? { ...entry, unit: to } : entry;
