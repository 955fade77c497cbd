import { times, type Interval } from "../../entry/interval";
import type { Feed } from "../../schemas/feed";
import type { Trial } from "../../schemas/trial";
import type { MolarMasses } from "../molarMass";
import { Ledger, onceEach } from "./ledger";
import {
  dissolvedInFiltrateRange,
  dissolvedRange,
  filtrateAndWash,
  finalAssay,
  finalVolume,
  recordedVessel,
  type RecordedVessel,
} from "./liquor";
import { chargedSolids, measuredHead, metalInSolids } from "./solids";
import { inProduct, say } from "./words";

/** Grams of metal with what they were made of, as text and as inputs. */
export interface Part {
  readonly value: Interval | null;
  readonly ledger: Ledger;
  readonly worked: string;
}

export const percent = (x: Interval): Interval => times(x, 100);
/** There, and no number lost on the way. */
export const usable = (x: Interval | null): x is Interval => x !== null && !Number.isNaN(x.lo) && !Number.isNaN(x.hi);

/** Metal fed by the measured head: m h. */
export function fedPart(
  trial: Trial,
  feed: Feed,
  metal: string,
): Part & { dry: number | null; water: number; head: Interval | null } {
  const ledger = new Ledger();
  const charged = chargedSolids(trial, feed, ledger);
  const head = measuredHead(feed, metal, ledger);
  const value = charged && head ? times(head, charged.dry) : null;
  const worked = charged && head ? `${say(charged.dry)} × ${inProduct(percent(head))} %` : "";
  return { value, ledger, worked, head, dry: charged?.dry ?? null, water: charged?.water ?? 0 };
}

const sampleTerm = (v: RecordedVessel): string => {
  const terms = v.taken.map(({ volume, assay }) => ` + ${say(volume)} × ${inProduct(assay)}`);
  return terms.join("");
};
const broughtTerm = (v: RecordedVessel): string => {
  const makeUps = v.taken.filter(({ makeUpVolume, makeUp }) => makeUpVolume > 0 && makeUp.hi > 0);
  const terms = makeUps.map(({ makeUpVolume, makeUp }) => ` − ${say(makeUpVolume)} × ${inProduct(makeUp)}`);
  return (v.start.hi > 0 ? ` − ${say(v.liquor)} × ${inProduct(v.start)}` : "") + terms.join("");
};

export interface DissolvedPart extends Part {
  readonly vessel: RecordedVessel | null;
  readonly withoutSamples: Interval | null;
}

/** Metal dissolved by the vessel: final liquor, samples and what was put back. */
export function bySolution(trial: Trial, metal: string, water: number, masses: MolarMasses): DissolvedPart {
  const ledger = new Ledger();
  const vessel = recordedVessel(trial, metal, water, masses, ledger);
  const volume = vessel && finalVolume(trial, vessel, ledger);
  const final = finalAssay(trial, metal, masses, ledger);
  if (!vessel || volume === null || !final) return { value: null, ledger, worked: "", vessel, withoutSamples: null };
  return {
    value: dissolvedRange(vessel, volume, final),
    ledger,
    worked: `${say(volume)} × ${inProduct(final)}${sampleTerm(vessel)}${broughtTerm(vessel)}`,
    vessel,
    withoutSamples: dissolvedRange({ ...vessel, taken: [] }, volume, final),
  };
}

/** Metal dissolved by what was filtered off and washed out. */
export function byFiltrate(trial: Trial, metal: string, water: number, masses: MolarMasses): Part {
  const ledger = new Ledger();
  const vessel = recordedVessel(trial, metal, water, masses, ledger);
  const split = filtrateAndWash(trial, metal, masses, ledger);
  const final = finalAssay(trial, metal, masses, ledger);
  if (!vessel || !split || !final) return { value: null, ledger, worked: "" };
  const { filtrate, wash, washed } = split;
  return {
    value: dissolvedInFiltrateRange(vessel, filtrate, final, wash, washed),
    ledger,
    worked: `${say(filtrate)} × ${inProduct(final)} + ${say(wash)} × ${inProduct(washed)}${sampleTerm(vessel)}${broughtTerm(vessel)}`,
  };
}

/** Metal left in the solids. */
export function residuePart(trial: Trial, metal: string): Part {
  const ledger = new Ledger();
  const value = metalInSolids(trial, metal, ledger);
  const terms = ledger.used.filter(({ unit }) => unit === "g");
  const grades = ledger.used.filter(({ unit }) => unit === "g/g");
  const worked = terms
    .map((m, i) => `${say(m.value.lo)} × ${grades[i] ? inProduct(percent(grades[i].value)) : ""} %`)
    .join(" + ");
  return { value, ledger, worked };
}

/** One ledger of what several parts used. */
export function joined(...parts: readonly Part[]): Ledger {
  const ledger = new Ledger();
  ledger.used.push(...onceEach(...parts.map((p) => p.ledger.used)));
  ledger.missing.push(...onceEach(...parts.map((p) => p.ledger.missing)));
  return ledger;
}
