/** Reagent per tonne of dry feed; always say added or consumed.
 *  @param reagent, dryFeed  g     @returns  kg/t     @source  definition
 *  @example perTonne(33.41, 1000) // => 33.41 */
export const perTonne = (reagent: number, dryFeed: number): number => (1000 * reagent) / dryFeed;

/** Reagent per kg of metal won or dissolved.
 *  @param reagent, metal  g     @returns  kg/kg     @source  definition
 *  @example perKg(28.138, 6.9) // => 4.078 */
export const perKg = (reagent: number, metal: number): number => reagent / metal;

/** Metal won from a stream of ore.
 *  @param throughput  t per unit of time     @param grade  g/t     @param recovery  %     @returns  g per that time
 *  @source  definition
 *  @example metalWon(1200, 2.35, 91.4) // => 2577.48 */
export const metalWon = (throughput: number, grade: number, recovery: number): number =>
  throughput * grade * (recovery / 100);
