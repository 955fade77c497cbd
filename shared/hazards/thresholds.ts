import { exposureOf } from "./exposure";
import { hazardGases, type HazardGas } from "./gases";

/** One ppm by volume at one atmosphere, bar. */
export const PPM = 1.01325e-6;

export interface Threshold {
  readonly bar: number;
  /** "50 ppm, immediately dangerous (IDLH)" */
  readonly words: string;
}

/** Thresholds of the map and of excluded hazards unless the user names others: what NIOSH calls immediately dangerous to life or health, as
 *  a partial pressure at one atmosphere; for hydrogen the lower flammable limit.
 *  @source  hazards/exposure.ts */
export const usualThreshold: Readonly<Record<HazardGas, Threshold>> = Object.fromEntries(
  hazardGases.map((gas): [HazardGas, Threshold] => {
    const row = exposureOf.get(gas);
    if (row?.flammable) {
      const [low] = row.flammable;
      return [gas, { bar: low * 1e4 * PPM, words: `${low} % by volume, lower flammable limit` }];
    }
    const ppm = row?.limits.find((l) => l.authority === "IDLH" && l.unit === "ppm")?.value ?? 1;
    return [gas, { bar: ppm * PPM, words: `${ppm} ppm, immediately dangerous to life or health (IDLH)` }];
  }),
) as Record<HazardGas, Threshold>;

/** A pressure as one reads it off a gas monitor: ppm at one atmosphere, from a tenth of a bar on in bar.
 *  @param bar  above zero     @returns  three figures with the unit
 *  @example pressureWords(50 * 1.01325e-6) // => "50 ppm"
 *  @example pressureWords(1.5) // => "1.5 bar" */
export function pressureWords(bar: number): string {
  const three = (x: number): string => String(Number(x.toPrecision(3)));
  return bar < 0.1 ? `${three(bar / PPM)} ppm` : `${three(bar)} bar`;
}
