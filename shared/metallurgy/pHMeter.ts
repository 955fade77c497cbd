/** What a meter shows when its slope stands at another temperature than the liquor's: the cell gives its true EMF about
 *  pH 7, the meter reads it on the wrong slope.
 *  @param pH  of the liquor     @param T  K of the liquor     @param meterT  K the meter is set to     @returns  pH shown
 *  @source  Nernst slope of the glass electrode, isopotential point at pH 7 (practice-checks.json, F44)
 *  @example pHShown(2, 333.15, 298.15) // => 1.413 */
export const pHShown = (pH: number, T: number, meterT: number): number => 7 - ((7 - pH) * T) / meterT;
