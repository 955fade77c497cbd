import type { Kelvin } from "../units";

const critical = { T: 647.096, p: 22.064e6, density: 322 }; // K, Pa, kg/m3

/** Vapour pressure of water.
 *  @param T  K, 273.16 to 647.096     @returns  Pa
 *  @source  IAPWS SR1-86 (1992), equation 1 (Wagner and Pruss 1993)
 *  @example saturationPressure(373.1243) // => 101325
 *  @example saturationPressure(kelvin(150)) / 1e5 // => 4.76 */
export function saturationPressure(T: Kelvin | number): number {
  const tau = 1 - T / critical.T;
  const sum =
    -7.85951783 * tau +
    1.84408259 * tau ** 1.5 -
    11.7866497 * tau ** 3 +
    22.6807411 * tau ** 3.5 -
    15.9618719 * tau ** 4 +
    1.80122502 * tau ** 7.5;
  return critical.p * Math.exp((critical.T / T) * sum);
}

/** Density of liquid water at its vapour pressure; within 0.01 % of that at 1 bar below 100 C.
 *  @param T  K, 273.16 to 647.096     @returns  kg/m3
 *  @source  IAPWS SR1-86 (1992), equation 2
 *  @example saturatedDensity(273.16) // => 999.789
 *  @example saturatedDensity(373.1243) // => 958.365 */
export function saturatedDensity(T: Kelvin | number): number {
  const tau = 1 - T / critical.T;
  return (
    critical.density *
    (1 +
      1.99274064 * tau ** (1 / 3) +
      1.09965342 * tau ** (2 / 3) -
      0.510839303 * tau ** (5 / 3) -
      1.75493479 * tau ** (16 / 3) -
      45.5170352 * tau ** (43 / 3) -
      6.74694450e5 * tau ** (110 / 3)) // prettier-ignore
  );
}

/** Ionisation constant of water as pKw (molal) along saturation.
 *  @param T  K, 273.15 to 523.15 here (the formulation reaches 1073 K)     @returns  -log10 Kw
 *  @source  IAPWS R11-07 (Bandura and Lvov 2006), equations 1 to 4
 *  @example pKwater(kelvin(100)) // => 12.252
 *  @example pKwater(kelvin(200)) // => 11.31 */
export function pKwater(T: Kelvin | number): number {
  const density = saturatedDensity(T) / 1000; // g/cm3
  const n = 6; // ion coordination number
  const molar = 18.015268e-3; // kg/mol
  const Q = density * Math.exp(-0.864671 + 8659.19 / T - (22786.2 / T ** 2) * density ** (2 / 3));
  const gas = 0.6141500 + 48251.33 / T - 67707.93 / T ** 2 + 1.01021e7 / T ** 3; // prettier-ignore
  const pair = (Q / (Q + 1)) * density * (0.642044 - 56.8534 / T - 0.375754 * density);
  return -2 * n * (Math.log10(1 + Q) - pair) + gas + 2 * Math.log10(molar);
}

/** The older ion product of water, for comparison: pKw (molal) along saturation.
 *  @param T  K, 273.15 to 573.15 here     @returns  -log10 Kw
 *  @source  W. L. Marshall and E. U. Franck, J. Phys. Chem. Ref. Data 10, 295 (1981)
 *  @example pKwaterMarshallFranck(kelvin(25)) // => 13.995 */
export function pKwaterMarshallFranck(T: Kelvin | number): number {
  const density = Math.log10(saturatedDensity(T) / 1000);
  const logKw =
    -4.098 - 3245.2 / T + 2.2362e5 / T ** 2 - 3.984e7 / T ** 3 + (13.957 - 1262.3 / T + 8.5641e5 / T ** 2) * density;
  return -logKw;
}
