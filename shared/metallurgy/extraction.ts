/** Extraction by what stands in solution: X = 100 M / F.
 *  @param dissolved  g     @param feed  g of metal in the feed by its measured head     @returns  %     @source  definition; worked in practice-checks.json, F01
 *  @example extractionBySolution(3.2728, 3.8) // => 86.126 */
export const extractionBySolution = (dissolved: number, feed: number): number => (100 * dissolved) / feed;

/** Extraction by what is left: X = 100 (1 - T / F). Needs a washed residue: an unwashed cake carries liquor.
 *  @param residue  g of metal in the residue     @param feed  g of metal in the feed by its measured head     @returns  %
 *  @source  definition; practice-checks.json, F05
 *  @example extractionByResidue(0.5211, 3.8) // => 86.287 */
export const extractionByResidue = (residue: number, feed: number): number => 100 * (1 - residue / feed);

/** Extraction on the calculated head: X = 100 M / (M + T). No head assay in it, so no sampling error of the head.
 *  @param dissolved, residue  g     @returns  %; rises with M, falls with T     @source  definition; practice-checks.json, F06
 *  @example extractionOnCalculatedHead(3.2728, 0.5211) // => 86.265 */
export const extractionOnCalculatedHead = (dissolved: number, residue: number): number =>
  (100 * dissolved) / (dissolved + residue);

/** Head grade that products add up to: h = (M + T) / m.
 *  @param dissolved, residue  g     @param dryFeed  g     @returns  g/g     @source  definition; practice-checks.json, F06
 *  @example calculatedHead(3.2728, 0.5211, 250) // => 0.015176 */
export const calculatedHead = (dissolved: number, residue: number, dryFeed: number): number =>
  (dissolved + residue) / dryFeed;

/** Metal found again: 100 (M + T) / F.
 *  @param dissolved, residue, feed  g     @returns  %     @source  definition; practice-checks.json, F06; metal accounting codes call it closure
 *  @example accountability(3.2728, 0.5211, 3.8) // => 99.839 */
export const accountability = (dissolved: number, residue: number, feed: number): number =>
  (100 * (dissolved + residue)) / feed;
