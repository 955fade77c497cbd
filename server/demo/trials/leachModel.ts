/** The demo's own leach: it knows minerals, acid, time and temperature, and no diagram. Constants are invented, of the usual size. */
export interface DemoOre {
  readonly target: string;
  /** g/g */
  readonly targetHead: number;
  readonly ironHead: number;
  /** CaCO3, g/g */
  readonly carbonate: number;
  /** share of the target that dilute acid reaches, and the rest that only strong acid does, with the pH where that begins */
  readonly easy: number;
  readonly refractory: number;
  readonly refractoryBelow: number;
  /** 1/h at `rateAt` and pH 3 */
  readonly rate: number;
  readonly rateAt: number; // C
  readonly activation: number; // J/mol
  /** pH above which the target falls out again */
  readonly lostAbove: number;
  /** most of the iron that can dissolve, the pH below which it does, and what a reducing liquor keeps dissolved at any pH */
  readonly ironMost: number;
  readonly ironBelow: number;
  readonly ferrous: number;
  /** acid per gram of metal brought out of its oxide, g/g */
  readonly acidPerTarget: number;
  /** mass the solids lose per gram of target dissolved */
  readonly massPerTarget: number;
}

export interface LeachConditions {
  readonly temperatureC: number;
  readonly pH: number;
  /** V vs SHE */
  readonly Eh: number;
}

export interface Leached {
  /** shares of what was fed */
  readonly target: number;
  readonly iron: number;
  /** g H2SO4 per g dry solids */
  readonly acid: number;
}

/** 0 to 1 across an edge of the given width. */
const rising = (x: number, edge: number, width: number): number => 1 / (1 + Math.exp((edge - x) / width));

/** What has dissolved after so many hours. Target rises with acid and time and is lost above its own edge; iron rises below its own,
 *  and stays in solution where the liquor is reducing.
 *  @param ore, at  what and how     @param hours  h     @returns  shares and acid     @source  invented for the demo */
export function leached(ore: DemoOre, at: LeachConditions, hours: number): Leached {
  const T = at.temperatureC + 273.15;
  const arrhenius = Math.exp((-ore.activation / 8.314) * (1 / T - 1 / (ore.rateAt + 273.15)));
  const k = ore.rate * arrhenius * 10 ** (0.1 * (3 - at.pH));
  const reached = ore.easy + ore.refractory * rising(-at.pH, -ore.refractoryBelow, 0.35);
  const target = reached * (1 - Math.exp(-k * hours)) * (1 - 0.9 * rising(at.pH, ore.lostAbove, 0.13));
  const asFerrous = ore.ferrous * rising(-at.Eh, -0.4, 0.035);
  const iron =
    (0.0001 + ore.ironMost * rising(-at.pH, -ore.ironBelow, 0.27) + asFerrous) * (1 - Math.exp(-0.5 * k * hours));
  const carbonate = 0.98 * ore.carbonate * (1 - Math.exp(-2 * hours)) * rising(-at.pH, -6, 0.4);
  const gangue = 0.004 * 10 ** (0.3 * (2.5 - at.pH)) * (1 - Math.exp(-0.3 * hours));
  return {
    target,
    iron,
    acid: target * ore.targetHead * ore.acidPerTarget + 2.634 * iron * ore.ironHead + carbonate + gangue,
  };
}

/** Free acid of a sulfate liquor held at a pH, g/L H2SO4: rough, bisulfate counted by a factor. */
export const freeAcidAt = (pH: number): number => 49 * 1.3 * 10 ** -pH;
