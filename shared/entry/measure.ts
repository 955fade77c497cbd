import { exactly, type Interval } from "./interval";
import { quantities, type QuantityInfo, type QuantityName } from "./quantities";
import { readEntry, type Entry } from "./readEntry";

/** What some units need besides their number. */
export interface MeasureContext {
  /** kg/L of the liquor, for ppm w/w */
  readonly density?: number | null;
  /** g/mol of what was assayed, for mol/L */
  readonly molarMass?: number | null;
}

export type Measure =
  | { readonly kind: "blank" }
  | { readonly kind: "value"; readonly value: Interval }
  | { readonly kind: "bad"; readonly why: string };

const given = (x: number | null | undefined): x is number => x !== null && x !== undefined;
const NEEDED: Readonly<Record<string, (context: MeasureContext) => number | string>> = {
  ppm: ({ density }) => (given(density) ? density / 1000 : "ppm by mass needs the density of the liquor"),
  "mol/L": ({ molarMass }) => (given(molarMass) ? molarMass : "mol/L needs a formula with a molar mass"),
};

function factorOf(entry: Entry, info: QuantityInfo, context: MeasureContext): number | string {
  const factor = info.units[entry.unit];
  if (factor === undefined) return `${info.name}: ${entry.unit} is none of ${Object.keys(info.units).join(", ")}`;
  return (
    factor ?? NEEDED[entry.unit]?.(context) ?? `${info.name} in ${entry.unit} cannot be turned into ${info.base} here`
  );
}

/** A typed number in the base unit of its quantity; the text itself stays as it is.
 *  @param entry  as typed     @param quantity  of quantities.ts     @param context  density in kg/L, molar mass in g/mol
 *  @returns  an interval (both ends the same unless "<" or ">"), blank, or why it cannot be used
 *  @source  factors of quantities.ts; "<" runs from zero to its limit, ">" from its limit up */
export function measure(entry: Entry, quantity: QuantityName, context: MeasureContext = {}): Measure {
  const info: QuantityInfo = quantities[quantity];
  const reading = readEntry(entry.text);
  if (reading.kind === "blank" || reading.kind === "bad") return reading;
  const factor = factorOf(entry, info, context);
  if (typeof factor === "string") return { kind: "bad", why: factor };
  if (reading.kind === "value") return { kind: "value", value: exactly(reading.value * factor) };
  const limit = reading.limit * factor;
  return {
    kind: "value",
    value: reading.kind === "less" ? { lo: 0, hi: limit } : { lo: limit, hi: info.base === "g/g" ? 1 : Infinity },
  };
}

/** A number that cannot be censored, in its base unit; null where it is blank or cannot be used.
 *  @param entry  as typed     @param quantity  of quantities.ts     @returns  base unit
 *  @example numberIn({ text: "90", unit: "min" }, "time") // => 1.5 */
export function numberIn(entry: Entry, quantity: QuantityName, context: MeasureContext = {}): number | null {
  const found = measure(entry, quantity, context);
  return found.kind === "value" && found.value.lo === found.value.hi ? found.value.lo : null;
}
