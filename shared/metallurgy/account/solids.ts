import type { Interval } from "../../entry/interval";
import { readEntry } from "../../entry/readEntry";
import type { Feed, HeadAssay } from "../../schemas/feed";
import type { Trial } from "../../schemas/trial";
import { dryMass, waterWithFeed } from "../moisture";
import type { Ledger } from "./ledger";

const isBlank = (text: string): boolean => readEntry(text).kind === "blank";

export interface Charged {
  /** g */
  readonly dry: number;
  /** g of water that came with it */
  readonly water: number;
}

/** Dry solids in the vessel: as weighed dry, else wet mass less moisture (of the charge, else of the feed).
 *  @param trial, feed  records     @param ledger  notes what is used and missing     @returns  g; null while something is missing
 *  @source  metallurgy/moisture.ts */
export function chargedSolids({ charge }: Trial, feed: Feed, ledger: Ledger): Charged | null {
  if (!isBlank(charge.dryMass.text)) {
    const dry = ledger.takeNumber("charge.dryMass", "dry mass charged", charge.dryMass, "mass");
    if (dry === null) return null;
    if (isBlank(charge.wetMass.text)) return { dry, water: 0 };
    const wet = ledger.takeNumber("charge.wetMass", "wet mass charged", charge.wetMass, "mass");
    if (wet === null) return null;
    if (wet < dry)
      return ledger.miss("charge.wetMass", "wet mass charged", `${wet} g is less than the dry mass ${dry} g`);
    return { dry, water: wet - dry };
  }
  const wet = ledger.takeNumber("charge.wetMass", "mass charged, dry or wet", charge.wetMass, "mass");
  const moisture = isBlank(charge.moisture.text)
    ? ledger.takeNumber("feed.moisture", "moisture of the charge or of the feed", feed.moisture, "share")
    : ledger.takeNumber("charge.moisture", "moisture of the charge", charge.moisture, "share");
  return wet === null || moisture === null
    ? null
    : { dry: dryMass(wet, moisture), water: waterWithFeed(wet, moisture) };
}

/** The head assay accounts use: the marked one, else the only one.
 *  @param assays  of one element     @returns  undefined where none can be told */
export const headOf = <Assay extends Pick<HeadAssay, "head">>(assays: readonly Assay[]): Assay | undefined =>
  assays.find(({ head }) => head) ?? (assays.length === 1 ? assays[0] : undefined);

/** Measured head of a metal: the assay marked as the head, or the only one there is.
 *  @param feed  record     @param metal  element     @param ledger  notes     @returns  g/g; null while missing, with the reason */
export function measuredHead(feed: Feed, metal: string, ledger: Ledger): Interval | null {
  const label = `head assay, ${metal}`;
  const of = feed.heads.map((head, i) => ({ ...head, i })).filter(({ element }) => element === metal);
  const chosen = headOf(of);
  if (chosen !== undefined) return ledger.take(`feed.heads.${chosen.i}`, label, chosen.value, "solidAssay");
  return ledger.miss(
    "feed.heads",
    label,
    of.length === 0
      ? `the feed has no head assay of ${metal}`
      : `${of.length} assays stand there and none is marked as the head`,
  );
}

/** Metal in the residue (or cement), with the solids of slurry samples.
 *  @param trial  record     @param metal  element     @param ledger  notes     @returns  g; null while missing */
export function metalInSolids({ products, samples }: Trial, metal: string, ledger: Ledger): Interval | null {
  const name = metal;
  const mass = ledger.takeNumber("products.residueDryMass", "dry mass of the residue", products.residueDryMass, "mass");
  const assay = products.residueAssays.find(({ analyte }) => analyte === metal);
  const grade = ledger.take(`products.residueAssays.${metal}`, `residue assay, ${name}`, assay?.value, "solidAssay");
  let [lo, hi] = [0, 0];
  let whole = mass !== null && grade !== null;
  samples.forEach((sample, i) => {
    if (isBlank(sample.drySolids.text)) return;
    const solids = ledger.takeNumber(`samples.${i}.drySolids`, `solids of sample ${i + 1}`, sample.drySolids, "mass");
    const found = sample.solidsAssays.find(({ analyte }) => analyte === metal)?.value;
    const a = ledger.take(
      `samples.${i}.solidsAssays.${metal}`,
      `solids of sample ${i + 1}, ${name}`,
      found,
      "solidAssay",
    );
    if (solids === null || a === null) whole = false;
    else [lo, hi] = [lo + solids * a.lo, hi + solids * a.hi];
  });
  return whole ? { lo: lo + mass! * grade!.lo, hi: hi + mass! * grade!.hi } : null;
}
