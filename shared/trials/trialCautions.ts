import type { ElectrodeSeries } from "../electrodes/series";
import { numberIn } from "../entry/measure";
import { readEntry } from "../entry/readEntry";
import { cautionsFor, type Caution } from "../hazards/rules";
import type { Feed } from "../schemas/feed";
import type { Trial } from "../schemas/trial";
import { measuredPoint } from "./measuredPoint";

/** Reagents that bring a component of the hazard rules into the vessel. */
const brings: Readonly<Record<string, string>> = {
  NaCN: "CN",
  KCN: "CN",
  NH3: "NH3",
  NH4OH: "NH3",
  HCl: "Cl",
  NaCl: "Cl",
};
const oxidants = new Set(["NaClO3", "H2O2", "KMnO4", "MnO2", "Cl2", "NaOCl", "O3"]);

/** Where the trial stands at its worst: the lowest pH met, which frees gas, and the highest potential; else as planned. */
function standsAt(trial: Trial, electrodes: readonly ElectrodeSeries[]): { pH: number; Eh: number } | null {
  const { measured, planned } = trial;
  const read = measured.readings.flatMap((r) => numberIn(r.pH.value, "pH") ?? []);
  const pH = read.length > 0 ? Math.min(...read) : numberIn(planned.pH, "pH");
  if (pH === null) return null;
  const intended = planned.orp.electrode === "SHE" ? (numberIn(planned.orp.value, "potential") ?? 0) : 0;
  return { pH, Eh: Math.max(intended, measuredPoint(trial, electrodes).point?.range.Eh[1] ?? 0) };
}

/** The usual cautions of what a trial has in its vessel: cyanide and acid, a cementing metal in acid with arsenic or antimony about,
 *  sulfides, chloride, hot ammonia. Beside the number, never instead of a hazard study, the safety data sheets, local law and
 *  exposure limits, or licensed practice.
 *  @param trial, feed  records, complete or not     @param electrodes  of `electrodeSeries`     @returns  as `cautionsFor`     @source  shared/hazards/rules.ts */
export function trialCautions(trial: Trial, feed: Feed, electrodes: readonly ElectrodeSeries[]): Caution[] {
  const { planned, measured, charge, products } = trial;
  const assayed = [...charge.liquorAssays, ...products.finalAssays, ...products.residueAssays].filter(
    ({ value }) => readEntry(value.text).kind !== "blank",
  );
  const names = [...assayed.map((a) => a.analyte), ...[...planned.doses, ...measured.doses].map((d) => d.reagent)];
  const ligands = [...planned.ligands, ...measured.ligands].map((l) => l.component);
  const hydrides = ["As", "Sb"].filter((e) => names.includes(e) || feed.heads.some((h) => h.element === e));
  const cementing = measured.cementingMetal?.metal ?? planned.cementingMetal?.metal;
  const won = { element: "Cu", requirement: "metal" };
  return cautionsFor({
    temperatureC: Math.max(
      ...[...measured.readings.map((r) => r.temperature), planned.temperature].map(
        (t) => numberIn(t, "temperature") ?? 25,
      ),
    ),
    components: [...new Set([...ligands, ...names.flatMap((n) => brings[n] ?? [])])],
    metals: [
      ...(cementing === undefined ? [] : [{ element: cementing, requirement: "dissolved" }, won]),
      ...hydrides.map((element) => ({ element, requirement: "free" })),
    ],
    feedMinerals: feed.minerals.map((m) => m.mineral),
    dosed: names
      .filter((n) => oxidants.has(n))
      .map((n) => (n === "NaClO3" ? "chlorate" : n === "H2O2" ? "peroxide" : n)),
    sulfideSulfur: false,
    circuit: {},
    setPoint: standsAt(trial, electrodes),
  });
}
