import { exactly, minus, plus, times, type Interval } from "../../entry/interval";
import { measure, numberIn } from "../../entry/measure";
import { readEntry } from "../../entry/readEntry";
import type { Trial } from "../../schemas/trial";
import type { Dose } from "../../schemas/trialRecord";
import { molarMass, type MolarMasses } from "../molarMass";
import { Ledger, type Figure } from "./ledger";
import { finalAssay, finalVolume, liquorContext, recordedVessel } from "./liquor";
import { inProduct, say, sayRange } from "./words";

/** One reagent over one trial, in g as pure. */
export interface ReagentUse {
  readonly reagent: string;
  /** false where neither the liquors nor the doses name it */
  readonly listed: boolean;
  /** dosed during the trial, the starting liquor not counted */
  readonly dosed: Figure;
  /** brought by the starting liquor, dosed and made up: what there was to use */
  readonly available: Interval | null;
  readonly left: Interval | null;
  readonly inSamples: Interval | null;
  /** available less left less what went with the samples */
  readonly consumed: Figure;
}

const blank = (text: string) => readEntry(text).kind === "blank";

/** Pure reagent of one dose, in g: by mass times strength, or by volume times density times strength, or times mol/L. */
function pureIn(dose: Dose, path: string, masses: MolarMasses, ledger: Ledger): number | null {
  const label = `dose of ${dose.reagent}`;
  if (blank(dose.amount.text)) return ledger.miss(`${path}.amount`, label, "amount not measured");
  const byVolume = dose.amount.unit === "mL" || dose.amount.unit === "L";
  const strength = blank(dose.strength.text) ? null : readEntry(dose.strength.text);
  if (!byVolume) {
    const mass = ledger.takeNumber(`${path}.amount`, label, dose.amount, "amount");
    if (strength === null || mass === null) return mass;
    const share = ledger.takeNumber(`${path}.strength`, `strength of ${dose.reagent}`, dose.strength, "strength");
    return share === null ? null : mass * share;
  }
  const volume = ledger.takeNumber(`${path}.amount`, label, dose.amount, "volume");
  if (volume === null) return null;
  if (strength === null)
    return ledger.miss(`${path}.strength`, `strength of ${dose.reagent}`, "a volume needs a strength");
  if (dose.strength.unit === "mol/L") {
    const molar = molarMass(dose.reagent, masses);
    if (!molar.ok) return ledger.miss(`${path}.reagent`, label, `mol/L needs a formula: ${molar.error.message}`);
    const found = measure({ text: dose.strength.text, unit: "mol/L" }, "solutionAssay", { molarMass: molar.value });
    return found.kind === "value" ? volume * found.value.lo : ledger.miss(`${path}.strength`, label, "cannot be read");
  }
  const share = ledger.takeNumber(`${path}.strength`, `strength of ${dose.reagent}`, dose.strength, "strength");
  const density = ledger.takeNumber(`${path}.density`, `density of ${dose.reagent}`, dose.density, "density");
  return share === null || density === null ? null : 1000 * volume * density * share;
}

function dosedOf(trial: Trial, reagent: string, masses: MolarMasses): Figure {
  const ledger = new Ledger();
  const grams = trial.measured.doses.flatMap((dose, i) =>
    dose.reagent === reagent ? [pureIn(dose, `measured.doses.${i}`, masses, ledger)] : [],
  );
  const known = grams.flatMap((g) => g ?? []);
  const sum = known.reduce((a, b) => a + b, 0);
  const worked = known.length > 1 ? `${known.map((g) => say(g)).join(" + ")} = ${say(sum)} g` : `${say(sum)} g`;
  return ledger.figure("g", "Σ amount × strength", exactly(sum), worked);
}

/** What of a sample no one titrated: between none and all there could have been in that volume. */
const untitrated = (volume: number, available: number, vessel: number): Interval => ({
  lo: 0,
  hi: (volume * available) / vessel,
});

/** One reagent from what was put in to what was left: initial liquor, doses and make-up, less the final liquor and the samples.
 *  @param trial  record     @param reagent  as doses and assays name it     @param water  g that came with the solids
 *  @param masses  g/mol     @returns  g as pure     @source  docs/accounts.md; practice-checks.json, F10 and F18 */
export function reagentUse(trial: Trial, reagent: string, water: number, masses: MolarMasses): ReagentUse {
  const inStart = trial.charge.liquorAssays.some(({ analyte }) => analyte === reagent);
  const inDoses = trial.measured.doses.some((d) => d.reagent === reagent);
  const dosed = dosedOf(trial, reagent, masses);
  const ledger = new Ledger();
  ledger.used.push(...dosed.used);
  ledger.missing.push(...dosed.missing);
  // Free acid and the like are seldom titrated in every sample: those that were not are bounded, not missing.
  const titrated = { ...trial, samples: trial.samples.filter((s) => s.assays.some((a) => a.analyte === reagent)) };
  const others = trial.samples.filter((s) => !titrated.samples.includes(s));
  const vessel = recordedVessel(titrated, reagent, water, masses, ledger);
  const whole = vessel && volumesOf(trial, vessel.volume);
  const volume =
    vessel &&
    (blank(trial.products.vesselVolume.text) && whole !== null
      ? ledger.assume(
          "products.vesselVolume",
          "liquor in the vessel at the end",
          whole,
          "L",
          "not measured, start less samples plus make-up",
        )
      : finalVolume(trial, vessel, ledger));
  const final = finalAssay(trial, reagent, masses, ledger);
  const brought =
    vessel && plus(times(vessel.start, vessel.liquor), ...vessel.taken.map((t) => times(t.makeUp, t.makeUpVolume)));
  const madeUp = others.map((s) => {
    const entry = s.makeUpAssays.find((a) => a.analyte === reagent)?.value;
    const found = entry && measure(entry, "solutionAssay", liquorContext(trial, reagent, masses, "end"));
    return found?.kind === "value" ? times(found.value, numberIn(s.makeUpVolume, "volume") ?? 0) : exactly(0);
  });
  const available = brought && dosed.value ? plus(brought, dosed.value, ...madeUp) : null;
  const left = volume !== null && final ? times(final, volume) : null;
  const inSamples =
    vessel && available
      ? plus(
          ...vessel.taken.map((t) => times(t.assay, t.volume)),
          ...others.map((s) =>
            untitrated(
              numberIn(s.volume, "volume") ?? 0,
              available.hi,
              Math.min(vessel.volume, whole ?? vessel.volume),
            ),
          ),
        )
      : null;
  const consumed = available && left && inSamples ? minus(minus(available, left), inSamples) : null;
  const worked =
    consumed &&
    `${say(vessel!.liquor)} × ${inProduct(vessel!.start)} + ${sayRange(dosed.value!)} − ${say(volume!)} × ${inProduct(final!)} − ${inProduct(inSamples!)} = ${sayRange(consumed)} g`;
  return {
    reagent,
    listed: inStart || inDoses,
    dosed,
    available,
    left,
    inSamples,
    consumed: ledger.figure("g", "V₀ c₀ + dosed − V c − Σ v c", consumed, worked),
  };
}

/** L at the end by the volumes of all samples, titrated or not; null where one is not written. */
function volumesOf(trial: Trial, start: number): number | null {
  let left = start;
  for (const s of trial.samples) {
    const [out, back] = [numberIn(s.volume, "volume"), numberIn(s.makeUpVolume, "volume")];
    if (out === null || back === null) return null;
    left += back - out;
  }
  return left;
}
