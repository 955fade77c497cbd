import { askedOf } from "../../shared/hazards/excluded";
import { keptWords } from "../../shared/hazards/words";
import type { OverallChoice, PlanInputs, PlanMetal, PlanTotal } from "../../shared/schemas/plan";
import { tenorText } from "../../shared/words/tenor";
import { fixed, MINUS, significant, withUnit } from "./format";
import { amountWord, lixiviantName, requirementWord, solidsBasisWord, waterBoundWord } from "./planWords";

/** One change between two states of a plan, in words: what, from, to. A missing side is something added or taken out. */
export interface PlanChange {
  what: string;
  from: string | null;
  to: string | null;
}

/** How numbers are written: rounded as everywhere, or in full where rounding would hide what changed. */
interface Figures {
  sig: (x: number, figures?: number) => string;
  fix: (x: number, digits: number) => string;
  /** g/L */
  tenor: (x: number) => string;
}
const rounded: Figures = { sig: significant, fix: fixed, tenor: tenorText };
const inFull = (x: number) => String(Number(x.toPrecision(15))).replaceAll("-", MINUS);
const full: Figures = { sig: inFull, fix: inFull, tenor: (x) => withUnit(inFull(x), "g/L") };

export const metalText = (m: PlanMetal, { sig, tenor } = rounded): string => {
  const amount = m.entry === "gPerL" ? tenor(m.value) : sig(m.value);
  const gamma = m.gammaFrom === "typed" && m.gamma !== null ? `, gamma ${sig(m.gamma)}` : "";
  const davies = m.gammaFrom === "davies" ? ", gamma by Davies" : "";
  return `${m.role}, ${requirementWord[m.requirement]}, ${amountWord(m)} ${amount}${gamma}${davies}`;
};

export const rangeText = ([lo, hi]: readonly [number, number], digits: number, { fix } = rounded) =>
  `${fix(lo, digits)} to ${fix(hi, digits)}`;
export const listText = (ids: readonly string[]) => (ids.length === 0 ? "none" : ids.join(", "));
export const onOff = (on: boolean) => (on ? "on" : "off");

export const totalText = (c: PlanTotal, { sig } = rounded) =>
  withUnit(sig(c.activity, 3), "mol/L") + (c.unit === "g/L" ? ", typed in g/L" : "");
export const ionicText = (mol: number | null, { sig } = rounded) =>
  mol === null ? "not given" : withUnit(sig(mol), "mol/kg");
export const acidBandText = ({ freeAcidBand: b }: Pick<PlanInputs, "freeAcidBand">, { sig, fix } = rounded) =>
  b ? ` (free acid ±${withUnit(sig(b.gPerL), "g/L")} at pH ${fix(b.atPH, 2)})` : "";
export const heldText = (at: PlanInputs["heldSetPoint"], { fix } = rounded) =>
  at ? `pH ${fix(at.pH, 2)}, ${fix(at.Eh, 3)} V vs SHE, by hand` : "deepest point";
export const waterText = (water: PlanInputs["water"], { fix } = rounded) =>
  waterBoundWord[water.bound] +
  (water.oxygenV ? `, oxygen +${fix(water.oxygenV, 2)} V` : "") +
  (water.hydrogenV ? `, hydrogen ${MINUS}${fix(water.hydrogenV, 2)} V` : "");
/** What stands around the leach, for the cautions. */
export const circuitText = (
  { sxOrganic, oxygenKPa, reagents = [] }: NonNullable<PlanInputs["circuit"]>,
  { sig } = rounded,
) =>
  [
    ...(sxOrganic === undefined ? [] : [`extraction organic ${sxOrganic ? "met" : "not met"}`]),
    ...(oxygenKPa === undefined ? [] : [`oxygen at ${withUnit(sig(oxygenKPa), "kPa")}`]),
    ...(reagents.length > 0 ? [`reagents ${listText(reagents)}`] : []),
  ].join(", ") || "nothing said";

/** The metals that both know, in the order of `one`. */
const orderOf = (one: PlanInputs, other: PlanInputs) =>
  one.metals
    .map((m) => m.element)
    .filter((e) => other.metals.some((m) => m.element === e))
    .join(", ");

type Text = (figures: Figures) => string | null;

/** Adds a change where the two texts differ: rounded, else in full, so that nothing is too small to be told. */
function compare(changes: PlanChange[], what: string, before: Text, after: Text): void {
  for (const figures of [rounded, full]) {
    const [from, to] = [before(figures), after(figures)];
    if (from === to) continue;
    changes.push({ what, from, to });
    return;
  }
}

function compareKeyed<Item>(
  changes: PlanChange[],
  before: readonly Item[],
  after: readonly Item[],
  key: (item: Item) => string,
  text: (item: Item, figures: Figures) => string,
  name: (key: string) => string = (k) => k,
): void {
  const old = new Map(before.map((item) => [key(item), item]));
  const now = new Map(after.map((item) => [key(item), item]));
  const of = (item: Item | undefined) => (figures: Figures) => (item === undefined ? null : text(item, figures));
  for (const k of new Set([...old.keys(), ...now.keys()])) compare(changes, name(k), of(old.get(k)), of(now.get(k)));
}

/** What differs between two states of a plan, in the order of the workspace's panels. */
export function planChanges(before: PlanInputs, after: PlanInputs): PlanChange[] {
  const changes: PlanChange[] = [];
  compareKeyed(changes, before.metals, after.metals, (m) => m.element, metalText);
  const both = (what: string, text: (inputs: PlanInputs, figures: Figures) => string) =>
    compare(
      changes,
      what,
      (figures) => text(before, figures),
      (figures) => text(after, figures),
    );
  both("Order of metals", (i) => orderOf(i, i === before ? after : before));
  both("Lixiviant", (i) => lixiviantName[i.preset]);
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
  both("Ionic strength", (i, f) => ionicText(i.ionicStrength, f));
  both("Sulfate reduction", (i) => onOff(i.sulfateReduction));
  both("Temperature", (i, { fix }) => withUnit(fix(i.temperatureC, 1), "°C"));
  both("Solids basis", (i) => solidsBasisWord[i.solidsBasis]);
  both("Feed minerals", (i) => listText(i.feedMinerals));
  both("Dosed", (i) => listText(i.dosed));
  compareKeyed(
    changes,
    before.leftOut,
    after.leftOut,
    (x) => x.species,
    (x) => x.reason,
    (k) => `Left out: ${k}`,
  );
  both("Put back", (i) => listText(i.putBack));
  both("Frame", (i, f) => `pH ${rangeText(i.frame.pH, 1, f)}, Eh ${rangeText(i.frame.Eh, 2, f)} V vs SHE`);
  both("Bounded by", (i, f) => waterText(i.water, f));
  both("Control bands", (i, f) => {
    const { pH, Eh } = i.controlBand;
    return `pH ±${f.fix(pH, 2)}${acidBandText(i, f)}, Eh ±${f.fix(Eh, 3)} V`;
  });
  compareKeyed(
    changes,
    before.excludedHazards ?? [],
    after.excludedHazards ?? [],
    (h) => h.gas,
    (h) => keptWords(askedOf(h)),
    (gas) => `Kept out of windows: ${gas}`,
  );
  both("Hold over", (i, f) => {
    const { temperatureC: t, activities = {} } = i.ranges ?? {};
    const each = Object.entries(activities).map(([e, [lo, hi]]) => `${e} ${f.sig(lo)} to ${f.sig(hi)}`);
    return [...(t ? [withUnit(rangeText(t, 1, f), "°C")] : []), ...each].join(", ") || "nothing";
  });
  both("Set point", (i, f) => heldText(i.heldSetPoint, f));
  compareKeyed(
    changes,
    Object.entries(before.overall ?? {}),
    Object.entries(after.overall ?? {}),
    ([from]) => from,
    ([, choice]) => overallText(choice),
    (from) => `Overall reaction of ${from}`,
  );
  both("Around the leach", (i, f) => circuitText(i.circuit ?? {}, f));
  return changes;
}

const overallText = ({ products = {}, redox }: OverallChoice): string =>
  [
    ...Object.entries(products).map(([component, id]) => `${component} to ${id}`),
    ...(redox === undefined ? [] : [redox === "open" ? "electrons left open" : `electrons by ${redox}`]),
  ].join(", ");
