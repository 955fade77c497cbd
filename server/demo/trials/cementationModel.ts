/** The demo's own zinc dust: each metal decays by first order, none faster than the dust allows; acid and air eat dust; cadmium
 *  comes back when it is left too long in acid. Constants are invented, of the usual size. */
export interface CementationConditions {
  readonly temperatureC: number;
  readonly pH: number;
  /** g zinc metal per L of liquor */
  readonly dust: number;
  readonly minutes: number;
}
export type Tenors = Readonly<Record<"Cu" | "Cd" | "Co" | "Ni", number>>;

export interface Cemented {
  /** g/L still in solution */
  readonly left: Record<keyof Tenors, number>;
  /** g zinc per L still metal */
  readonly unreacted: number;
  /** g H2SO4 per L that made hydrogen */
  readonly acid: number;
  /** V vs SHE on platinum: a mixed potential */
  readonly Eh: number;
}

/** 1/min at 55 C, pH 4.5 and 2.5 g/L of dust; zinc taken per gram; J/mol */
const metals = {
  Cu: { rate: 0.24, zinc: 1.029, activation: 9000 },
  Cd: { rate: 0.12, zinc: 0.582, activation: 9000 },
  Co: { rate: 0.0016, zinc: 1.109, activation: 87000 },
  Ni: { rate: 0.003, zinc: 1.114, activation: 60000 },
} as const;

/** @param start  g/L     @param at  conditions     @returns  per L of liquor     @source  invented for the demo */
export function cemented(start: Tenors, at: CementationConditions): Cemented {
  const T = at.temperatureC + 273.15;
  const acid = 0.055 * (at.minutes / 30) * 10 ** (0.75 * (4.5 - at.pH)) * Math.sqrt(at.dust / 2.5);
  const air = 0.05 * (at.minutes / 30);
  let zinc = Math.max(0, at.dust - 0.667 * acid - air);
  const left = { ...start };
  for (const metal of ["Cu", "Cd", "Co", "Ni"] as const) {
    const { rate, zinc: perGram, activation } = metals[metal];
    const k = rate * (at.dust / 2.5) * Math.exp((-activation / 8.314) * (1 / T - 1 / 328.15));
    const wanted = start[metal] * (1 - Math.exp(-k * at.minutes));
    // The last of the dust is coated and works no more.
    const won = Math.min(wanted, (0.9 * zinc) / perGram);
    zinc -= won * perGram;
    left[metal] = start[metal] - won;
  }
  const back = 0.012 * Math.max(0, at.minutes - 35) * 10 ** (0.5 * (4.4 - at.pH));
  left.Cd += (start.Cd - left.Cd) * Math.min(0.6, back) * (zinc < 0.6 ? 1 : 0.15);
  const driven = Math.log10(start.Cd / Math.max(left.Cd, 1e-5));
  return { left, unreacted: Math.max(0.01, zinc), acid, Eh: -0.47 - (0.21 * zinc) / (zinc + 0.4) - 0.03 * driven };
}
