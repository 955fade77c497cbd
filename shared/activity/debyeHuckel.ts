import { saturatedDensity } from "../gibbs/water";
import type { Kelvin } from "../units";

const permittivityOfVacuum = 8.8541878128e-12; // F/m, CODATA 2018
const boltzmann = 1.380649e-23; // J/K
const charge = 1.602176634e-19; // C
const avogadro = 6.02214076e23; // 1/mol

/** N_k, i_k and j_k of the release; its constants of 1986 go with them. */
const series: readonly (readonly [N: number, i: number, j: number])[] = [
  [0.978224486826, 1, 0.25],
  [-0.957771379375, 1, 1],
  [0.237511794148, 1, 2.5],
  [0.714692244396, 2, 1.5],
  [-0.298217036956, 3, 1.5],
  [-0.108863472196, 3, 2.5],
  [0.0949327488264, 4, 2],
  [-0.00980469816509, 5, 2],
  [1.6516763497e-5, 6, 5],
  [9.37359795772e-5, 7, 0.5],
  [-1.2317921872e-10, 10, 10],
];

/** Static dielectric constant of liquid water.
 *  @param T  K, 273.15 to 523.15 here     @param density  kg/m3; that of the saturated liquid when left out
 *  @returns  relative permittivity
 *  @source  IAPWS R8-97 (Fernandez and others 1997), equations 1 to 7
 *  @example dielectricConstant(298.15, 999.242866) // => 78.5907
 *  @example dielectricConstant(kelvin(100)) // => 55.53 */
export function dielectricConstant(T: Kelvin | number, density = saturatedDensity(T)): number {
  const rho = density / 0.018015268; // mol/m3
  const delta = density / 322;
  const tau = 647.096 / T;
  let g = 1 + 0.00196096504426 * delta * (T / 228 - 1) ** -1.2;
  for (const [N, i, j] of series) g += N * delta ** i * tau ** j;
  const vacuum = 1 / (4e-7 * Math.PI * 299792458 ** 2);
  const A = (6.0221367e23 * 6.138e-30 ** 2 * rho * g) / (vacuum * 1.380658e-23 * T);
  const B = (6.0221367e23 * 1.636e-40 * rho) / (3 * vacuum);
  return (1 + A + 5 * B + Math.sqrt(9 + 2 * A + 18 * B + A * A + 10 * A * B + 9 * B * B)) / (4 - 4 * B);
}

/** Debye-Hueckel limiting slope of log10 gamma, molal, along saturation.
 *  @param T  K, 273.15 to 523.15     @returns  kg^0.5 mol^-0.5
 *  @source  A = e^3 (2 N_A rho)^0.5 / (8 pi ln10 (eps0 eps k T)^1.5), with the density of SR1-86 and the dielectric constant of R8-97
 *  @example debyeHuckelA(kelvin(25)) // => 0.5098
 *  @example debyeHuckelA(kelvin(250)) // => 0.971 */
export function debyeHuckelA(T: Kelvin | number): number {
  const density = saturatedDensity(T);
  const field = permittivityOfVacuum * dielectricConstant(T, density) * boltzmann * T;
  return (charge ** 3 * Math.sqrt(2 * avogadro * density)) / (8 * Math.PI * Math.LN10 * field ** 1.5);
}

/** Debye-Hueckel B, the inverse thickness of the ion cloud at I = 1.
 *  @param T  K, 273.15 to 523.15     @returns  kg^0.5 mol^-0.5 per angstrom
 *  @source  B = (2 e^2 N_A rho / (eps0 eps k T))^0.5, as `debyeHuckelA`
 *  @example debyeHuckelB(kelvin(25)) // => 0.3284 */
export function debyeHuckelB(T: Kelvin | number): number {
  const density = saturatedDensity(T);
  const field = permittivityOfVacuum * dielectricConstant(T, density) * boltzmann * T;
  return Math.sqrt((2 * charge ** 2 * avogadro * density) / field) * 1e-10;
}

/** Activity coefficient of an ion by the extended Debye-Hueckel equation, log10 gamma = -A z^2 sqrt(I) / (1 + B a sqrt(I)).
 *  @param z  charge     @param ionicStrength  mol/kg, valid to 0.1     @param size  ion size a, angstrom     @param T  K, 298.15
 *  @returns  gamma, dimensionless     @source  J. Kielland, J. Am. Chem. Soc. 59, 1675 (1937)
 *  @example extendedDebyeHuckel(2, 0.1, 6) // => 0.40 */
export function extendedDebyeHuckel(
  z: number,
  ionicStrength: number,
  size: number,
  T: Kelvin | number = 298.15,
): number {
  const root = Math.sqrt(ionicStrength);
  return 10 ** ((-debyeHuckelA(T) * z * z * root) / (1 + debyeHuckelB(T) * size * root));
}
