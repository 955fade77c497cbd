import type { ExcludedGas } from "../solution";

/** pH at and above which a cyanide liquor keeps most of its cyanide from leaving as HCN. */
export const HCN_PH = 10.5;

/** One ppm by volume at one atmosphere, bar. */
export const PPM = 1.01325e-6;

/** A pressure as one reads it off a gas monitor: ppm at one atmosphere, from a tenth of a bar on in bar.
 *  @param bar  above zero     @returns  three figures with the unit
 *  @example pressureWords(1.5).length // => 7 */
export function pressureWords(bar: number): string {
  const three = (x: number): string => String(Number(x.toPrecision(3)));
  return bar < 0.1 ? `${three(bar / PPM)} ppm` : `${three(bar)} bar`;
}

/** What is kept, in words: "HCN below 50 ppm over the liquor", "pH at or above 10.5 against HCN".
 *  @param asked  an exclusion     @returns  a phrase */
export const keptWords = ({ gas, bar, pHAtLeast }: ExcludedGas): string =>
  bar === undefined
    ? `pH at or above ${pHAtLeast} against ${gas}`
    : `${gas} below ${pressureWords(bar)} over the liquor`;

/** What happens beyond the edge: "HCN reaches 50 ppm over the liquor", "HCN: pH falls below 10.5".
 *  @param asked  an exclusion     @returns  a phrase */
export const beyondWords = ({ gas, bar, pHAtLeast }: ExcludedGas): string =>
  bar === undefined ? `${gas}: pH falls below ${pHAtLeast}` : `${gas} reaches ${pressureWords(bar)} over the liquor`;
