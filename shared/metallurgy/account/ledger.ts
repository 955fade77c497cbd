import { isExact, type Interval } from "../../entry/interval";
import { measure, type MeasureContext } from "../../entry/measure";
import { quantities, type QuantityName } from "../../entry/quantities";
import type { Entry } from "../../entry/readEntry";

/** A number an account used: where it stands, what was typed, what it is in the base unit. */
export interface UsedInput {
  /** into the trial, or into the feed as `feed.heads.2`: `samples.0.assays.Cu` */
  readonly path: string;
  readonly label: string;
  /** as typed, with its unit; what was assumed says so in words */
  readonly typed: string;
  readonly value: Interval;
  readonly unit: string;
  readonly assumed: boolean;
}

/** A number an account still needs. */
export interface MissingInput {
  readonly path: string;
  readonly label: string;
  readonly why: string;
}

/** What every figure of an account shows: the value, how it was come by, and what it still needs. */
export interface Figure {
  /** null while something is missing; both ends the same unless an assay was censored */
  readonly value: Interval | null;
  readonly unit: string;
  readonly formula: string;
  /** the formula with the numbers in; null while something is missing */
  readonly worked: string | null;
  readonly used: readonly UsedInput[];
  readonly missing: readonly MissingInput[];
}

/** Collects what one figure uses and misses while it is worked out. */
export class Ledger {
  readonly used: UsedInput[] = [];
  readonly missing: MissingInput[] = [];

  /** @returns  the interval in the base unit, or null after noting what is missing */
  take(
    path: string,
    label: string,
    entry: Entry | undefined,
    quantity: QuantityName,
    context?: MeasureContext,
  ): Interval | null {
    const found = entry === undefined ? ({ kind: "blank" } as const) : measure(entry, quantity, context);
    if (entry === undefined || found.kind === "blank") return this.miss(path, label, "not measured");
    if (found.kind === "bad") return this.miss(path, label, found.why);
    this.used.push({
      path,
      label,
      typed: `${entry.text.trim()} ${entry.unit}`,
      value: found.value,
      unit: quantities[quantity].base,
      assumed: false,
    });
    return found.value;
  }

  /** As `take`, for what cannot be censored. */
  takeNumber(
    path: string,
    label: string,
    entry: Entry,
    quantity: QuantityName,
    context?: MeasureContext,
  ): number | null {
    return this.take(path, label, entry, quantity, context)?.lo ?? null;
  }

  assume(path: string, label: string, value: number, unit: string, typed: string): number {
    this.used.push({ path, label, typed, value: { lo: value, hi: value }, unit, assumed: true });
    return value;
  }

  miss(path: string, label: string, why: string): null {
    this.missing.push({ path, label, why });
    return null;
  }

  figure(unit: string, formula: string, value: Interval | null, worked: string | null): Figure {
    const sound = value !== null && !Number.isNaN(value.lo) && !Number.isNaN(value.hi) && this.missing.length === 0;
    return {
      value: sound ? value : null,
      unit,
      formula,
      worked: sound ? worked : null,
      used: this.used,
      missing: this.missing,
    };
  }
}

export const censoredInputs = (used: readonly UsedInput[]): UsedInput[] => used.filter((u) => !isExact(u.value));

/** Each once, in the order they first came. */
export function onceEach<Row extends { path: string }>(...lists: (readonly Row[])[]): Row[] {
  const seen = new Map<string, Row>();
  for (const row of lists.flat()) if (!seen.has(row.path)) seen.set(row.path, row);
  return [...seen.values()];
}
