/** Share of a base that stands as its acid: 1 / (1 + 10^(pH - pK)). For HCN over free cyanide, H2S over dissolved sulfide below pH 10.
 *  @param pH, pK  of the liquor and of the acid, same T and ionic strength     @returns  0 to 1     @source  mass action, ideal
 *  @example protonatedShare(10.5, 9.21) // => 0.0488
 *  @example protonatedShare(7, 7.05) // => 0.5288 */
export const protonatedShare = (pH: number, pK: number): number => 1 / (1 + 10 ** (pH - pK));
