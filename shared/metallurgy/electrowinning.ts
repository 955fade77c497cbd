import { FARADAY } from "../constants";
import { massOf, type MolarMasses } from "./molarMass";

/** Metal that a current deposits by Faraday's law: m = I t M / (n F).
 *  @param current  A     @param hours  h     @param metal  element     @param electrons  per atom     @param masses  g/mol     @returns  kg
 *  @source  Faraday's law
 *  @example theoreticalDeposit(250, 24, "Cu", 2, chemistry().molarMass) // => 7.113 */
export const theoreticalDeposit = (
  current: number,
  hours: number,
  metal: string,
  electrons: number,
  masses: MolarMasses,
): number => (current * hours * 3600 * massOf(metal, masses)) / (1000 * electrons * FARADAY);

/** @param deposit, theoretical  kg     @returns  %     @source  definition
 *  @example currentEfficiency(6.72, 7.11297) // => 94.475 */
export const currentEfficiency = (deposit: number, theoretical: number): number => (100 * deposit) / theoretical;

/** Energy per tonne of deposit: V I t / m.
 *  @param volts  V of a cell     @param current  A     @param hours  h     @param deposit  kg     @returns  kWh/t     @source  definition
 *  @example specificEnergy(2.05, 250, 24, 6.72) // => 1830.36 */
export const specificEnergy = (volts: number, current: number, hours: number, deposit: number): number =>
  (volts * current * hours) / deposit;
