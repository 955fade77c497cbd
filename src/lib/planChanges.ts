import { askedOf } from "../../shared/hazards/excluded";
import { keptWords } from "../../shared/hazards/words";
import type { OverallChoice, PlanInputs, PlanMetal, PlanTotal } from "../../shared/schemas/plan";
import { celsius, fixed, MINUS, significant, withUnit } from "./format";
import { amountWord, lixiviantName, requirementWord, solidsBasisWord, waterBoundWord } from "./planWords";

/** One change between two states of a plan, in words: what, from, to. A missing side is something added or taken out. */
export interface PlanChange {
  what: string;
  from: string | null;
  to: string | null;
}

export const metalText = (m: PlanMetal): string => {
  const amount = m.entry === "gPerL" ? withUnit(significant(m.value, 3), "g/L") : significant(m.value);
  const gamma = m.gammaFrom === "typed" && m.gamma !== null ? `, gamma ${significant(m.gamma)}` : "";
  const davies = m.gammaFrom === "davies" ? ", gamma by Davies" : "";
  return `${m.role}, ${requirementWord[m.requirement]}, ${amountWord(m)} ${amount}${gamma}${davies}`;
};

export const rangeText = ([lo, hi]: readonly [number, number], digits: number) =>
  `${fixed(lo, digits)} to ${fixed(hi, digits)}`;
export const listText = (ids: readonly string[]) => (ids.length === 0 ? "none" : ids.join(", "));
export const onOff = (on: boolean) => (on ? "on" : "off");

export const totalText = (c: PlanTotal) =>
  withUnit(significant(c.activity, 3), "mol/L") + (c.unit === "g/L" ? ", typed in g/L" : "");
export const ionicText = (mol: number | null) => (mol === null ? "not given" : withUnit(significant(mol), "mol/kg"));
export const acidBandText = ({ freeAcidBand: b }: Pick<PlanInputs, "freeAcidBand">) =>
  b ? ` (free acid ±${withUnit(significant(b.gPerL), "g/L")} at pH ${fixed(b.atPH, 2)})` : "";
export const heldText = (at: PlanInputs["heldSetPoint"]) =>
  at ? `pH ${fixed(at.pH, 2)}, ${fixed(at.Eh, 3)} V vs SHE, by hand` : "deepest point";
export const waterText = (water: PlanInputs["water"]) =>
  waterBoundWord[water.bound] +
  (water.oxygenV ? `, oxygen +${fixed(water.oxygenV, 2)} V` : "") +
  (water.hydrogenV ? `, hydrogen ${MINUS}${fixed(water.hydrogenV, 2)} V` : "");
/** What stands around the leach, for the cautions. */
export const circuitText = ({ sxOrganic, oxygenKPa, reagents = [] }: NonNullable<PlanInputs["circuit"]>) =>
  [
    ...(sxOrganic === undefined ? [] : [`extraction organic ${sxOrganic ? "met" : "not met"}`]),
    ...(oxygenKPa === undefined ? [] : [`oxygen at ${withUnit(significant(oxygenKPa), "kPa")}`]),
    ...(reagents.length > 0 ? [`reagents ${listText(reagents)}`] : []),
  ].join(", ") || "nothing said";

/** The metals that both know, in the order of `one`. */
const orderOf = (one: PlanInputs, other: PlanInputs) =>
  one.metals
    .map((m) => m.element)
    .filter((e) => other.metals.some((m) => m.element === e))
    .join(", ");

/** Adds a change where the two texts differ. */
function compare(changes: PlanChange[], what: string, from: string | null, to: string | null): void {
  if (from !== to) changes.push({ what, from, to });
}

function compareKeyed<Item>(
  changes: PlanChange[],
  before: readonly Item[],
  after: readonly Item[],
  key: (item: Item) => string,
  text: (item: Item) => string,
  name: (key: string) => string = (k) => k,
): void {
  const old = new Map(before.map((item) => [key(item), text(item)]));
  const now = new Map(after.map((item) => [key(item), text(item)]));
  for (const k of new Set([...old.keys(), ...now.keys()]))
    compare(changes, name(k), old.get(k) ?? null, now.get(k) ?? null);
}

/** What differs between two states of a plan, in the order of the workspace's panels. */
export function planChanges(before: PlanInputs, after: PlanInputs): PlanChange[] {
  const changes: PlanChange[] = [];
  compareKeyed(changes, before.metals, after.metals, (m) => m.element, metalText);
  compare(changes, "Order of metals", orderOf(before, after), orderOf(after, before));
  compare(changes, "Lixiviant", lixiviantName[before.preset], lixiviantName[after.preset]);
  compareKeyed(
    changes,
    before.ligands,
    after.ligands,
    (c) => c.component,
    totalText,
    (k) => `${k}, total`,
  );
  compareKeyed(
    changes,
    before.others,
    after.others,
    (c) => c.component,
    totalText,
    (k) => `${k}, total`,
  );
  compare(changes, "Ionic strength", ionicText(before.ionicStrength), ionicText(after.ionicStrength));
  compare(changes, "Sulfate reduction", onOff(before.sulfateReduction), onOff(after.sulfateReduction));
  compare(changes, "Temperature", celsius(before.temperatureC, 1), celsius(after.temperatureC, 1));
  compare(changes, "Solids basis", solidsBasisWord[before.solidsBasis], solidsBasisWord[after.solidsBasis]);
  compare(changes, "Feed minerals", listText(before.feedMinerals), listText(after.feedMinerals));
  compare(changes, "Dosed", listText(before.dosed), listText(after.dosed));
  compareKeyed(
    changes,
    before.leftOut,
    after.leftOut,
    (x) => x.species,
    (x) => x.reason,
    (k) => `Left out: ${k}`,
  );
  compare(changes, "Put back", listText(before.putBack), listText(after.putBack));
  const frame = (i: PlanInputs) => `pH ${rangeText(i.frame.pH, 1)}, Eh ${rangeText(i.frame.Eh, 2)} V vs SHE`;
  compare(changes, "Frame", frame(before), frame(after));
  compare(changes, "Bounded by", waterText(before.water), waterText(after.water));
  const band = (i: PlanInputs) =>
    `pH ±${fixed(i.controlBand.pH, 2)}${acidBandText(i)}, Eh ±${fixed(i.controlBand.Eh, 3)} V`;
  compare(changes, "Control bands", band(before), band(after));
  compareKeyed(
    changes,
    before.excludedHazards ?? [],
    after.excludedHazards ?? [],
    (h) => h.gas,
    (h) => keptWords(askedOf(h)),
    (gas) => `Kept out of windows: ${gas}`,
  );
  const hold = (i: PlanInputs) => {
    const { temperatureC: t, activities = {} } = i.ranges ?? {};
    const each = Object.entries(activities).map(([e, [lo, hi]]) => `${e} ${significant(lo)} to ${significant(hi)}`);
    return [...(t ? [withUnit(rangeText(t, 1), "°C")] : []), ...each].join(", ") || "nothing";
  };
  compare(changes, "Hold over", hold(before), hold(after));
  compare(changes, "Set point", heldText(before.heldSetPoint), heldText(after.heldSetPoint));
  compareKeyed(
    changes,
    Object.entries(before.overall ?? {}),
    Object.entries(after.overall ?? {}),
    ([from]) => from,
    ([, choice]) => overallText(choice),
    (from) => `Overall reaction of ${from}`,
  );
  compare(changes, "Around the leach", circuitText(before.circuit ?? {}), circuitText(after.circuit ?? {}));
  return changes;
}

const overallText = ({ products = {}, redox }: OverallChoice): string =>
  [
    ...Object.entries(products).map(([component, id]) => `${component} to ${id}`),
    ...(redox === undefined ? [] : [redox === "open" ? "electrons left open" : `electrons by ${redox}`]),
  ].join(", ");
