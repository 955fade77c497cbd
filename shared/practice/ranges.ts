import type { PresetName } from "../schemas/plan";
import { RANGE_MARGIN } from "./box";
import { copperRanges } from "./copper";
import { goldRanges } from "./gold";
import { otherRanges } from "./others";
import { zincRanges } from "./zinc";

/** An operating range as published. Potentials are on the SHE scale; one quoted on an unknown electrode is no number here. */
export interface PublishedRange {
  readonly id: string;
  readonly step: string;
  /** metals the step is about */
  readonly elements: readonly string[];
  /** lixiviants it was run in */
  readonly presets: readonly PresetName[];
  readonly pH: readonly [lo: number, hi: number] | null;
  /** V vs SHE */
  readonly Eh: readonly [lo: number, hi: number] | null;
  readonly temperatureC: readonly [lo: number, hi: number] | null;
  readonly conditions: string;
  /** %, as published */
  readonly recovery: string | null;
  /** the published text was seen when this was compiled; else from memory: a sanity range, never a hard limit */
  readonly seen: boolean;
  /** fields of a seen row that are from memory all the same */
  readonly approximate?: readonly ("pH" | "Eh" | "T")[];
  /** what sets the range where equilibrium does not */
  readonly notEquilibrium?: string;
  readonly source: string;
  readonly note: string;
}

/** Published operating ranges, in the order of their ids.
 *  @source  each row; compiled from trade literature, December 2026 */
export const publishedRanges: readonly PublishedRange[] = [
  ...copperRanges,
  ...zincRanges,
  ...goldRanges,
  ...otherRanges,
].sort((a, b) => (a.id < b.id ? -1 : 1));

/** Ranges that can be drawn on a plan's map: a pH or an Eh is stated, the lixiviant is the plan's, one of its metals is in the plan.
 *  Whether the temperature fits is said, not decided.
 *  @param plan  preset, elements and T of the plan     @returns  ranges with `atTemperature` true where the plan's T lies within 5 C of the range
 *  @source  publishedRanges */
export function rangesFor(plan: {
  readonly preset: PresetName;
  readonly elements: readonly string[];
  readonly temperatureC: number;
}): { range: PublishedRange; atTemperature: boolean }[] {
  return publishedRanges
    .filter((r) => (r.pH ?? r.Eh) !== null)
    .filter((r) => r.presets.includes(plan.preset) && r.elements.some((e) => plan.elements.includes(e)))
    .map((range) => {
      const [lo, hi] = range.temperatureC ?? [-Infinity, Infinity];
      const slack = RANGE_MARGIN.temperatureC;
      return { range, atTemperature: plan.temperatureC >= lo - slack && plan.temperatureC <= hi + slack };
    });
}
