import { exposureOf } from "./exposure";
import { hazardGases, type HazardGas } from "./gases";
import { PPM } from "./words";

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
