/** Dry mass of a wet charge. A mass is wet or dry by its field, never by its column name.
 *  @param wet  g     @param moisture  g water per g wet mass, 0 to 1     @returns  g     @source  definition
 *  @example dryMass(500, 0.064) // => 468 */
export const dryMass = (wet: number, moisture: number): number => wet * (1 - moisture);

/** Water that comes with a wet charge and thins the liquor.
 *  @param wet  g     @param moisture  g water per g wet mass     @returns  g     @source  definition
 *  @example waterWithFeed(500, 0.064) // => 32 */
export const waterWithFeed = (wet: number, moisture: number): number => wet * moisture;
