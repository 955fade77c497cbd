export interface Pulp {
  /** kg/L */
  readonly density: number;
  /** L solids per L pulp */
  readonly solidsByVolume: number;
  /** g solids per L pulp */
  readonly solidsPerLitre: number;
  /** kg liquor per kg solids */
  readonly liquidToSolid: number;
  /** L liquor per kg solids */
  readonly liquorPerKg: number;
}

/** Densities and ratios of a pulp: 1 / rho_p = S / rho_s + (1 - S) / rho_l.
 *  @param solids  g/g of pulp, 0 to 1     @param solidDensity, liquorDensity  kg/L     @returns  as named
 *  @source  volumes added up (practice-checks.json, F25)
 *  @example pulpOf(0.35, 2.72, 1.035).density // => 1.3215
 *  @example pulpOf(0.35, 2.72, 1.035).liquorPerKg // => 1.7943 */
export function pulpOf(solids: number, solidDensity: number, liquorDensity: number): Pulp {
  const density = 1 / (solids / solidDensity + (1 - solids) / liquorDensity);
  return {
    density,
    solidsByVolume: (density * solids) / solidDensity,
    solidsPerLitre: 1000 * density * solids,
    liquidToSolid: (1 - solids) / solids,
    liquorPerKg: (1 - solids) / solids / liquorDensity,
  };
}

/** Solids by mass from solids by volume of pulp: % w/v is not % w/w.
 *  @param gPerMl  g solids per mL pulp     @param solidDensity, liquorDensity  kg/L     @returns  g/g of pulp
 *  @source  the relation of `pulpOf`, solved for S
 *  @example solidsByMass(0.462537, 2.72, 1.035) // => 0.35 */
export const solidsByMass = (gPerMl: number, solidDensity: number, liquorDensity: number): number =>
  gPerMl / (gPerMl + liquorDensity * (1 - gPerMl / solidDensity));

/** Solids by mass of a charge.
 *  @param dry  g     @param liquor  L     @param liquorDensity  kg/L     @param water  g of water that came with the solids     @returns  g/g
 *  @source  definition
 *  @example solidsOfCharge(250, 0.8, 1, 0) // => 0.2381 */
export const solidsOfCharge = (dry: number, liquor: number, liquorDensity: number, water: number): number =>
  dry / (dry + 1000 * liquor * liquorDensity + water);
