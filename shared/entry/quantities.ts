/** What can be typed, in which units, and what one unit is in the base unit of the quantity. Three units need more than a
 *  factor and are null here: ppm in a liquor needs its density, mol/L a molar mass, % w/v of solids the densities. */
export interface QuantityInfo {
  readonly name: string;
  readonly base: string;
  readonly units: Readonly<Record<string, number | null>>;
  /** bounds in the base unit */
  readonly min: number;
  readonly max: number;
  /** a laboratory may answer "<" or ">" */
  readonly censored: boolean;
}

const upTo = (max: number) => ({ min: 0, max, censored: false });

/** 1 oz/st = 31.1034768 g in 907.18474 kg. Source: troy ounce and short ton, NIST SP 811, appendix B. */
const OZ_PER_SHORT_TON = 31.1034768 / 907184.74;

export const quantities = {
  solidAssay: {
    name: "assay of a solid",
    base: "g/g",
    units: { "%": 0.01, "g/t": 1e-6, ppm: 1e-6, "mg/kg": 1e-6, "g/kg": 1e-3, "oz/st": OZ_PER_SHORT_TON },
    min: 0,
    max: 1,
    censored: true,
  },
  solutionAssay: {
    name: "assay of a solution",
    base: "g/L",
    units: { "g/L": 1, "mg/L": 1e-3, "ug/L": 1e-6, ppm: null, "mol/L": null },
    min: 0,
    max: 2000,
    censored: true,
  },
  mass: { name: "mass", base: "g", units: { g: 1, kg: 1000, mg: 1e-3, t: 1e6 }, ...upTo(1e9) },
  volume: { name: "volume", base: "L", units: { mL: 1e-3, L: 1, m3: 1000 }, ...upTo(1e6) },
  temperature: { name: "temperature", base: "C", units: { C: 1 }, min: -10, max: 300, censored: false },
  pH: { name: "pH", base: "pH", units: { pH: 1 }, min: -2, max: 16, censored: false },
  potential: { name: "potential", base: "V", units: { mV: 1e-3, V: 1 }, min: -3, max: 3, censored: false },
  time: { name: "time", base: "h", units: { min: 1 / 60, h: 1, d: 24 }, ...upTo(24 * 2000) },
  density: {
    name: "density",
    base: "kg/L",
    units: { "kg/L": 1, "g/mL": 1, "t/m3": 1, "kg/m3": 1e-3 },
    min: 0.3,
    max: 25,
    censored: false,
  },
  size: { name: "size", base: "um", units: { um: 1, mm: 1000 }, ...upTo(1e6) },
  share: { name: "share", base: "g/g", units: { "%": 0.01 }, ...upTo(1) },
  solids: { name: "solids in the pulp", base: "g/g", units: { "% w/w": 0.01, "% w/v": null }, ...upTo(1) },
  strength: { name: "strength", base: "g/g", units: { "% w/w": 0.01, "mol/L": null }, ...upTo(1) },
  amount: {
    name: "amount of a reagent",
    base: "g",
    units: { g: 1, kg: 1000, mg: 1e-3, mL: null, L: null },
    ...upTo(1e9),
  },
} as const satisfies Record<string, QuantityInfo>;

export type QuantityName = keyof typeof quantities;
export type UnitOf<Q extends QuantityName> = Extract<keyof (typeof quantities)[Q]["units"], string>;

/** Units of a quantity in the order a list offers them. */
export const unitsOf = <Q extends QuantityName>(quantity: Q): UnitOf<Q>[] =>
  Object.keys(quantities[quantity].units) as UnitOf<Q>[];
