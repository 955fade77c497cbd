import { z } from "./z";
import { quantities, unitsOf, type QuantityInfo, type QuantityName } from "../entry/quantities";
import { readEntry, type Entry } from "../entry/readEntry";

/** Why a typed number cannot stand in a field of this quantity; null when it can.
 *  @param entry  text and unit     @param quantity  of quantities.ts     @returns  a sentence with value and bound, or null */
export function refusalOf({ text, unit }: Entry, quantity: QuantityName): string | null {
  const info: QuantityInfo = quantities[quantity];
  const factor = info.units[unit];
  if (factor === undefined) return `${info.name}: ${unit} is none of ${Object.keys(info.units).join(", ")}`;
  const reading = readEntry(text);
  if (reading.kind === "bad") return reading.why;
  if (reading.kind === "blank") return null;
  if (reading.kind !== "value" && !info.censored)
    return `${info.name}: "${text.trim()}" is a limit; write what was read`;
  const typed = reading.kind === "value" ? reading.value : reading.limit;
  if (typed < 0 && info.min >= 0) return `${info.name} ${text.trim()} ${unit} is below zero`;
  if (factor === null) return null;
  const value = typed * factor;
  if (value < info.min) return `${info.name} ${text.trim()} ${unit} is too low: the least is ${info.min} ${info.base}`;
  if (value > info.max * (1 + 1e-12))
    return `${info.name} ${text.trim()} ${unit} is too high: the most is ${info.max} ${info.base}`;
  return null;
}

/** A field of one quantity. Left away it is blank in the unit named first, or in the given one. */
export const entryOf = (quantity: QuantityName, unit: string = unitsOf(quantity)[0]!) =>
  z
    .object({ text: z.string().max(40), unit: z.string().max(12) })
    .superRefine((entry, context) => {
      const why = refusalOf(entry, quantity);
      if (why !== null) context.addIssue({ code: "custom", path: ["text"], message: why });
    })
    .default({ text: "", unit });

/** What was assayed: an element, a state of one as `Fe(III)`, or a reagent by formula, as `H2SO4`, `NaCN`. */
const analyte = z.string().trim().min(1).max(20);
const note = z.string().max(200).default("");

export const solutionAssay = z.object({ analyte, value: entryOf("solutionAssay"), method: note });
export const solidAssay = z.object({ analyte, value: entryOf("solidAssay"), method: note });
export type SolutionAssay = z.output<typeof solutionAssay>;
export type SolidAssay = z.output<typeof solidAssay>;

/** One assay an analyte: repeats are averaged by the laboratory or told apart by the feed's list of head assays. */
const oncePerAnalyte = (list: readonly { analyte: string }[], context: z.RefinementCtx): void => {
  list.forEach(({ analyte: name }, i) => {
    if (list.findIndex((other) => other.analyte === name) < i)
      context.addIssue({ code: "custom", path: [i, "analyte"], message: `${name} stands twice in one list of assays` });
  });
};
export const solutionAssays = z.array(solutionAssay).max(60).superRefine(oncePerAnalyte).default([]);
export const solidAssays = z.array(solidAssay).max(60).superRefine(oncePerAnalyte).default([]);
