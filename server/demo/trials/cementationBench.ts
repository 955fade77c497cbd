import { fromSHE } from "../../../shared/electrodes/convert";
import type { ElectrodeSeries } from "../../../shared/electrodes/series";
import { valueOf } from "../../../shared/outcome";
import type { TrialInput } from "../../../shared/schemas/trial";
import { cemented, type CementationConditions, type Tenors } from "./cementationModel";
import type { Random } from "./random";
import { labResult, reading, tenor, type Hand } from "./typing";

export interface CementationRun {
  readonly planned: CementationConditions;
  /** g/L at the start */
  readonly start: Tenors;
  readonly zinc: number;
  readonly volume: number; // L
  /** metal in the dust */
  readonly active: number;
  readonly target: keyof Tenors;
  readonly electrode: ElectrodeSeries;
  readonly hand: Hand;
}

const limits: Record<keyof Tenors, number> = { Cu: 0.1, Cd: 0.05, Co: 0.1, Ni: 0.1 }; // mg/L
/** Sulfate of such a liquor, mol/L: zinc, magnesium, manganese. */
const sulfate = 2.4;
const elements = ["Cu", "Cd", "Co", "Ni"] as const;

/** Runs one zinc-dust trial at the bench and writes down what a technician would.
 *  @param run  what was laid out     @param random  seeded     @returns  the record, without its names and dates */
export function cementationRecord(
  run: CementationRun,
  random: Random,
): Pick<TrialInput, "planned" | "measured" | "charge" | "samples" | "products"> {
  const { planned, hand, volume } = run;
  const held = {
    ...planned,
    temperatureC: planned.temperatureC + 0.5 * random.normal(),
    pH: planned.pH + 0.04 * random.normal(),
    dust: planned.dust * random.scattered(1, 0.03),
  };
  const end = cemented(run.start, held);
  const half = cemented(run.start, { ...held, minutes: held.minutes / 2 });
  const assay = (metal: keyof Tenors, gPerL: number) => ({
    analyte: metal,
    value: tenor(random.scattered(gPerL, 0.01), limits[metal], hand),
  });
  const taken = 0.01;
  const final = volume - taken;
  const acidStart = 49 * 1.3 * 10 ** -planned.pH + end.acid;
  const won = (metal: keyof Tenors) => volume * (run.start[metal] - end.left[metal]);
  const unreacted = end.unreacted * volume;
  // Basic salts and moisture stay with the cement after drying.
  const cement = elements.reduce((sum, m) => sum + won(m), unreacted) * random.scattered(1.06, 0.01);
  const inCement = (grams: number) => labResult((100 * random.scattered(grams, 0.015)) / cement, "%", 0.01, hand);
  const line = (minutes: number, Eh: number) => {
    const pulp = held.temperatureC + 0.3 * random.normal();
    return {
      at: reading(minutes, 0, "min", hand),
      temperature: reading(pulp, 1, "C", hand),
      pH: { value: reading(held.pH + 0.03 * random.normal(), 2, "pH", hand), temperature: reading(pulp, 1, "C", hand) },
      orp: {
        value: reading(1000 * valueOf(fromSHE(Eh + 0.012 * random.normal(), run.electrode, 25)), 0, "mV", hand),
        electrode: run.electrode.id,
        electrodeTemperature: reading(25, 0, "C", hand),
      },
    };
  };
  return {
    planned: {
      temperature: reading(planned.temperatureC, 0, "C", hand),
      pH: reading(planned.pH, 1, "pH", hand),
      tenor: reading(1000 * run.start[run.target], 0, "mg/L", hand),
      ligands: [{ component: "S", value: reading(sulfate, 1, "mol/L", hand) }],
      cementingMetal: { metal: "Zn", dosed: reading((planned.dust * volume) / run.active, 2, "g", hand) },
      duration: reading(planned.minutes, 0, "min", hand),
    },
    measured: {
      readings: [line(planned.minutes / 2, half.Eh), line(planned.minutes, end.Eh)],
      ligands: [{ component: "S", value: reading(random.scattered(sulfate, 0.04), 2, "mol/L", hand) }],
      cementingMetal: {
        metal: "Zn",
        dosed: reading((held.dust * volume) / run.active, 2, "g", hand),
        active: reading(100 * run.active, 0, "%", hand),
        unreacted: reading(random.scattered(unreacted, 0.03), 2, "g", hand),
      },
      duration: reading(planned.minutes, 0, "min", hand),
    },
    charge: {
      liquorVolume: reading(volume, 3, "L", hand),
      liquorAssays: [
        ...elements.map((m) => assay(m, run.start[m])),
        { analyte: "Zn", value: labResult(random.scattered(run.zinc, 0.008), "g/L", 0, hand) },
        { analyte: "H2SO4", value: labResult(random.scattered(acidStart, 0.03), "g/L", 0.01, hand) },
      ],
    },
    samples: [
      {
        at: reading(planned.minutes / 2, 0, "min", hand),
        volume: reading(10, 1, "mL", hand),
        assays: elements.map((m) => assay(m, half.left[m])),
        makeUpVolume: reading(0, 0, "mL", hand),
      },
    ],
    products: {
      vesselVolume: reading(random.scattered(final, 0.002), 3, "L", hand),
      finalAssays: [
        ...elements.map((m) => assay(m, end.left[m])),
        { analyte: "H2SO4", value: labResult(49 * 1.3 * 10 ** -held.pH, "g/L", 0.01, hand) },
      ],
      residueDryMass: reading(cement, 2, "g", hand),
      residueAssays: elements.map((m) => ({ analyte: m, value: inCement(won(m)) })),
    },
  };
}
