import { fromSHE } from "../../../shared/electrodes/convert";
import type { ElectrodeSeries } from "../../../shared/electrodes/series";
import { valueOf } from "../../../shared/outcome";
import type { TrialInput } from "../../../shared/schemas/trial";
import { freeAcidAt, leached, type DemoOre, type LeachConditions } from "./leachModel";
import type { Random } from "./random";
import { labResult, reading, tenor, type Hand } from "./typing";

export interface LeachRun {
  readonly ore: DemoOre;
  readonly planned: LeachConditions;
  readonly hours: number;
  /** when liquor is sampled, h */
  readonly sampled: readonly number[];
  /** g and L */
  readonly dryMass: number;
  readonly volume: number;
  /** g/L of the target in the lixiviant, 0 for fresh acid */
  readonly brought: number;
  readonly sulfate: number; // mol/L
  /** g/L the trial was laid out on, where that differs from what it should give */
  readonly plannedTenor?: number;
  readonly electrode: ElectrodeSeries;
  /** electrode in the pulp rather than in a cooled bridge */
  readonly hotElectrode: boolean;
  readonly cooledSample: boolean;
  readonly moisture: number;
  readonly hand: Hand;
}

interface Vessel {
  volume: number; // L
  target: number; // g in solution
  iron: number;
}

/** Runs one leach at the bench and writes down what a technician would: a true course first, then instruments and a laboratory
 *  that scatter.
 *  @param run  what was laid out     @param random  seeded     @returns  the record, without its names and dates */
export function leachRecord(
  run: LeachRun,
  random: Random,
): Pick<TrialInput, "planned" | "measured" | "charge" | "samples" | "products"> {
  const { ore, planned, hand, volume, dryMass } = run;
  const held: LeachConditions = {
    temperatureC: planned.temperatureC + 0.5 * random.normal(),
    pH: planned.pH + 0.05 * random.normal(),
    Eh: planned.Eh + 0.012 * random.normal(),
  };
  // The charge is never quite the sample that was assayed.
  const target = dryMass * random.scattered(ore.targetHead, 0.01);
  const iron = dryMass * random.scattered(ore.ironHead, 0.01);
  const whim = random.scattered(1, 0.012);
  const at = (h: number) => {
    const x = leached(ore, held, h);
    return { target: Math.min(0.995, x.target * whim) * target, iron: x.iron * iron, acid: x.acid * dryMass };
  };
  const wet = dryMass / (1 - run.moisture);
  const vessel: Vessel = { volume: volume + (wet - dryMass) / 1000, target: run.brought * volume, iron: 0 };
  const evaporation = 0.0015 * Math.max(0, held.temperatureC - 30) * 0.1 * volume; // L/h
  const acidLeft = freeAcidAt(held.pH);
  const limits = { target: 0.5, iron: 1 };
  const assay = (value: number, limit: number) => tenor(random.scattered(value, 0.008), limit, hand);

  let before = at(0);
  let clock = 0;
  const goOn = (h: number) => {
    const now = at(h);
    vessel.target += now.target - before.target;
    vessel.iron += now.iron - before.iron;
    vessel.volume -= evaporation * (h - clock);
    [before, clock] = [now, h];
  };
  const samples = run.sampled.map((h) => {
    goOn(h);
    const taken = 0.01;
    const [cT, cF] = [vessel.target / vessel.volume, vessel.iron / vessel.volume];
    vessel.target -= taken * cT;
    vessel.iron -= taken * cF;
    return {
      at: reading(h, h < 1 ? 2 : 1, "h", hand),
      volume: reading(10, 1, "mL", hand),
      assays: [
        { analyte: ore.target, value: assay(cT, limits.target) },
        { analyte: "Fe", value: assay(cF, limits.iron) },
        { analyte: "H2SO4", value: labResult(random.scattered(acidLeft, 0.03), "g/L", 0.05, hand) },
      ],
      makeUpVolume: reading(10, 1, "mL", hand),
    };
  });
  goOn(run.hours);

  const [cT, cF] = [vessel.target / vessel.volume, vessel.iron / vessel.volume];
  const heldUp = 0.06 + (0.3 * dryMass) / 1000;
  const washVolume = 0.6;
  const inWash = (c: number) => (0.97 * heldUp * c) / washVolume;
  const residue = dryMass - before.target * ore.massPerTarget - before.iron * 1.43 - 0.3 * ore.carbonate * dryMass;
  const acidTotal = before.acid + acidLeft * (vessel.volume + 0.01 * samples.length);
  const acidStart = Math.round((0.6 * acidTotal) / volume);
  const dosed = Math.max(0, acidTotal - acidStart * volume) / 0.98;
  const solid = (grams: number, limit: number) =>
    labResult((100 * random.scattered(grams, 0.02)) / residue, "%", limit, hand);
  const S = random.scattered(run.sulfate, 0.04);

  return {
    planned: {
      temperature: reading(planned.temperatureC, 0, "C", hand),
      pH: reading(planned.pH, 1, "pH", hand),
      orp: { value: reading(planned.Eh * 1000, 0, "mV", hand), electrode: "SHE" },
      tenor: reading(run.plannedTenor ?? run.brought + (0.9 * dryMass * ore.targetHead) / volume, 1, "g/L", hand),
      ligands: [{ component: "S", value: reading(run.sulfate, 2, "mol/L", hand) }],
      duration: reading(run.hours, 1, "h", hand),
    },
    measured: {
      readings: readingsOf(run, held, random),
      ligands: [{ component: "S", value: reading(S, 2, "mol/L", hand) }],
      doses:
        dosed < 0.05
          ? []
          : [
              {
                role: "acid",
                reagent: "H2SO4",
                amount: reading(random.scattered(0.7 * dosed, 0.005), 2, "g", hand),
                strength: reading(98, 0, "% w/w", hand),
                at: reading(0, 0, "h", hand),
                reason: "initial",
              },
              {
                role: "acid",
                reagent: "H2SO4",
                amount: reading(random.scattered(0.3 * dosed, 0.005), 2, "g", hand),
                strength: reading(98, 0, "% w/w", hand),
                at: reading(run.hours / 4, 1, "h", hand),
                reason: "pH control",
              },
            ],
      duration: reading(run.hours, 1, "h", hand),
    },
    charge: {
      wetMass: reading(wet, 1, "g", hand),
      ...(run.moisture === 0
        ? { dryMass: reading(dryMass, 1, "g", hand) }
        : { moisture: reading(100 * run.moisture, 1, "%", hand) }),
      liquorVolume: reading(volume, 3, "L", hand),
      liquorAssays: [
        { analyte: "H2SO4", value: reading(acidStart, 1, "g/L", hand) },
        ...(run.brought > 0 ? [{ analyte: ore.target, value: assay(run.brought, limits.target) }] : []),
      ],
    },
    samples,
    products: {
      vesselVolume: reading(random.scattered(vessel.volume, 0.003), 3, "L", hand),
      filtrateVolume: reading(random.scattered(vessel.volume - heldUp, 0.003), 3, "L", hand),
      finalAssays: [
        { analyte: ore.target, value: assay(cT, limits.target) },
        { analyte: "Fe", value: assay(cF, limits.iron) },
        { analyte: "H2SO4", value: labResult(random.scattered(acidLeft, 0.03), "g/L", 0.05, hand) },
      ],
      washVolume: reading(washVolume, 3, "L", hand),
      washAssays: [
        { analyte: ore.target, value: assay(inWash(cT), limits.target) },
        { analyte: "Fe", value: assay(inWash(cF), limits.iron) },
      ],
      residueDryMass: reading(random.scattered(residue, 0.002), 1, "g", hand),
      residueAssays: [
        { analyte: ore.target, value: solid(target - before.target, 0.02) },
        { analyte: "Fe", value: solid(iron - before.iron, 0.02) },
      ],
    },
  };
}

/** pH and ORP settle from a start towards what was held. */
function readingsOf(run: LeachRun, held: LeachConditions, random: Random) {
  const { hand, electrode } = run;
  const times = [0.1, 0.35, 1].map((share) => share * run.hours);
  return times.map((h, i) => {
    const settling = Math.exp(-4 * (h / run.hours));
    const pH = held.pH - 0.35 * settling + 0.03 * random.normal();
    const Eh = held.Eh - 0.06 * settling + 0.004 * random.normal();
    const pulp = held.temperatureC + 0.3 * random.normal();
    const electrodeC = run.hotElectrode ? pulp : 25 + 0.4 * random.normal();
    const shown = valueOf(fromSHE(Eh, electrode, Math.round(electrodeC)));
    return {
      at: reading(h, 2, "h", hand),
      temperature: reading(pulp, 1, "C", hand),
      pH:
        run.cooledSample && i === times.length - 1
          ? { value: reading(pH + 0.06, 2, "pH", hand), temperature: reading(25, 0, "C", hand), cooledSample: true }
          : { value: reading(pH, 2, "pH", hand), temperature: reading(pulp, 1, "C", hand) },
      orp: {
        value: reading(shown * 1000, 0, "mV", hand),
        electrode: electrode.id,
        electrodeTemperature: reading(Math.round(electrodeC), 0, "C", hand),
      },
    };
  });
}
