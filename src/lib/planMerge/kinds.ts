import type { PlanInputs } from "../../../shared/schemas/plan";
import { celsius, fixed, withUnit } from "../format";
import { acidBandText, ionicText, onOff, rangeText, waterText } from "../planChanges";
import { lixiviantName, solidsBasisWord } from "../planWords";
import type { Kind } from "./kind";
import { circuit, hazards, held, listed, metals, overall, ranges, standing, totals } from "./lists";

/** A setting that every plan has. */
const single = <Value>(
  what: string,
  get: (i: PlanInputs) => Value,
  set: (i: PlanInputs, value: Value) => PlanInputs,
  text: (value: Value) => string,
): Kind<Value> => ({
  name: what,
  of: (i) => [["", get(i)]],
  put: (i, entries) => entries.reduce((sum, [, value]) => set(sum, value), i),
  what: () => what,
  text,
});

/** The pH band and the free acid it was typed as are one thing. */
const bandOfPH = single<{ pH: number; freeAcidBand?: PlanInputs["freeAcidBand"] }>(
  "Control band of pH",
  ({ controlBand: { pH }, freeAcidBand }) => ({ pH, ...(freeAcidBand ? { freeAcidBand } : {}) }),
  ({ freeAcidBand: _old, ...i }, { pH, freeAcidBand }) => ({
    ...i,
    controlBand: { ...i.controlBand, pH },
    ...(freeAcidBand ? { freeAcidBand } : {}),
  }),
  ({ pH, freeAcidBand }) => `±${fixed(pH, 2)}${acidBandText({ freeAcidBand })}`,
);

/** All settings of a plan, in the order of the workspace's panels. Methods take their values in, so the kinds stand in one list. */
export const planKinds: readonly Kind<unknown>[] = [
  metals,
  single(
    "Lixiviant",
    (i) => i.preset,
    (i, preset) => ({ ...i, preset }),
    (v) => lixiviantName[v],
  ),
  totals("ligands", "Ligands"),
  totals("others", "Other components"),
  single(
    "Ionic strength",
    (i) => i.ionicStrength,
    (i, ionicStrength) => ({ ...i, ionicStrength }),
    ionicText,
  ),
  single(
    "Sulfate reduction",
    (i) => i.sulfateReduction,
    (i, sulfateReduction) => ({ ...i, sulfateReduction }),
    onOff,
  ),
  single(
    "Temperature",
    (i) => i.temperatureC,
    (i, temperatureC) => ({ ...i, temperatureC }),
    (v) => celsius(v, 1),
  ),
  single(
    "Solids basis",
    (i) => i.solidsBasis,
    (i, solidsBasis) => ({ ...i, solidsBasis }),
    (v) => solidsBasisWord[v],
  ),
  listed("feedMinerals", "Feed minerals"),
  listed("dosed", "Dosed"),
  standing,
  single(
    "Frame, pH",
    (i) => i.frame.pH,
    (i, pH) => ({ ...i, frame: { ...i.frame, pH } }),
    (v) => rangeText(v, 1),
  ),
  single(
    "Frame, Eh",
    (i) => i.frame.Eh,
    (i, Eh) => ({ ...i, frame: { ...i.frame, Eh } }),
    (v) => `${rangeText(v, 2)} V vs SHE`,
  ),
  single(
    "Bounded by",
    (i) => i.water,
    (i, water) => ({ ...i, water }),
    waterText,
  ),
  bandOfPH,
  single(
    "Control band of Eh",
    (i) => i.controlBand.Eh,
    (i, Eh) => ({ ...i, controlBand: { ...i.controlBand, Eh } }),
    (v) => `±${withUnit(fixed(v, 3), "V")}`,
  ),
  hazards,
  ranges,
  held,
  overall,
  circuit,
];
