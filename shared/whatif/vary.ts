import type { PlanInputs } from "../schemas/plan";
import { TEMPERATURE_RANGE_C } from "../schemas/problem";

/** The one setting of a plan that is varied: its temperature (C), a metal's amount (activity or g/L, as the plan has it), or the total
 *  activity of a ligand or other component. */
export type Varied =
  | { readonly kind: "temperature" }
  | { readonly kind: "amount"; readonly of: string }
  | { readonly kind: "total"; readonly of: string };

/** Temperatures go in even steps, amounts and totals in even steps of their logarithm. */
export const isLogarithmic = ({ kind }: Varied): boolean => kind !== "temperature";

/** What a plan has to vary. A watched metal asks for nothing, so its amount moves no window.
 *  @param inputs  of a plan     @returns  temperature, metals that ask for something, totals, in the order of the plan */
export const variedOf = (inputs: PlanInputs): Varied[] => [
  { kind: "temperature" },
  ...inputs.metals.filter((m) => m.requirement !== "free").map((m): Varied => ({ kind: "amount", of: m.element })),
  ...[...inputs.ligands, ...inputs.others].map((c): Varied => ({ kind: "total", of: c.component })),
];

/** @param inputs  of a plan     @param varied  which setting     @returns  where it stands; null where the plan has no such thing */
export function settingOf(inputs: PlanInputs, varied: Varied): number | null {
  switch (varied.kind) {
    case "temperature":
      return inputs.temperatureC;
    case "amount":
      return inputs.metals.find((m) => m.element === varied.of)?.value ?? null;
    case "total":
      return [...inputs.ligands, ...inputs.others].find((c) => c.component === varied.of)?.activity ?? null;
  }
}

/** The plan with one setting changed, nothing else.
 *  @param inputs  of a plan     @param varied  which setting     @param to  C, activity or g/L     @returns  other inputs */
export function withSetting(inputs: PlanInputs, varied: Varied, to: number): PlanInputs {
  switch (varied.kind) {
    case "temperature":
      return { ...inputs, temperatureC: to };
    case "amount":
      return { ...inputs, metals: inputs.metals.map((m) => (m.element === varied.of ? { ...m, value: to } : m)) };
    case "total": {
      const list = (totals: PlanInputs["ligands"]) =>
        totals.map((c) => (c.component === varied.of ? { ...c, activity: to } : c));
      return { ...inputs, ligands: list(inputs.ligands), others: list(inputs.others) };
    }
  }
}

/** Ends within which a setting can be varied: those of the models, those of the plan's own schema.
 *  @param inputs  of a plan     @param varied  which setting     @returns  lowest and highest, C, activity or g/L */
export function settingBounds(inputs: PlanInputs, varied: Varied): readonly [number, number] {
  if (varied.kind === "temperature") return [TEMPERATURE_RANGE_C.min, TEMPERATURE_RANGE_C.max];
  const inGrams = varied.kind === "amount" && inputs.metals.find((m) => m.element === varied.of)?.entry === "gPerL";
  return [1e-12, inGrams ? 1000 : 100];
}

/** A range round the plan's own setting: what an open tank can be heated to (or 60 K either way of an autoclave), or a decade and a
 *  half either way.
 *  @param inputs  of a plan     @param varied  which setting     @returns  ends, rounded     @source  common practice, no source */
export function usualRange(inputs: PlanInputs, varied: Varied): readonly [number, number] {
  const at = settingOf(inputs, varied) ?? 1;
  const [low, high] = settingBounds(inputs, varied);
  const inside = (x: number) => Math.min(high, Math.max(low, x));
  if (varied.kind !== "temperature")
    return [inside(Number((at / 30).toPrecision(1))), inside(Number((at * 30).toPrecision(1)))];
  return at <= 100 ? [inside(Math.min(20, at - 10)), inside(Math.max(95, at))] : [inside(at - 60), inside(at + 60)];
}

/** Settings from one end to the other in even steps, logarithmic where the setting is; both ends exact.
 *  @param varied  which setting     @param range  ends     @param count  2 or more     @returns  that many settings, rising */
export function steps(varied: Varied, [from, to]: readonly [number, number], count: number): number[] {
  return Array.from({ length: count }, (_, i) => {
    if (i === 0) return from;
    if (i === count - 1) return to;
    const t = i / (count - 1);
    return isLogarithmic(varied) ? from * (to / from) ** t : from + (to - from) * t;
  });
}
