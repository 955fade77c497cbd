import { numberIn } from "../entry/measure";
import { liquorContext } from "../metallurgy/account/liquor";
import { Ledger } from "../metallurgy/account/ledger";
import { chargedSolids, measuredHead } from "../metallurgy/account/solids";
import type { MolarMasses } from "../metallurgy/molarMass";
import type { Feed } from "../schemas/feed";
import type { Trial } from "../schemas/trial";

/** Tenor a leach liquor would reach had all of a metal dissolved: what it brought and what was charged, over its volume. It says
 *  what a trial was laid out for and does not fall with a poor recovery, as the final tenor does.
 *  @param trial, feed  records     @param metal  element     @param masses  g/mol
 *  @returns  g/L; null for a cementation and where charge or head are not known     @source  mass balance
 *  docs/decisions/0009-comparable-trials.md */
export function couldCarry(trial: Trial, feed: Feed, metal: string, masses: MolarMasses): number | null {
  if (trial.kind !== "leach") return null;
  const ledger = new Ledger();
  const charged = chargedSolids(trial, feed, ledger);
  const head = measuredHead(feed, metal, ledger);
  const liquor = numberIn(trial.charge.liquorVolume, "volume");
  if (!charged || !head || liquor === null || liquor <= 0) return null;
  const entry = trial.charge.liquorAssays.find(({ analyte }) => analyte === metal)?.value;
  const brought = entry ? numberIn(entry, "solutionAssay", liquorContext(trial, metal, masses, "start")) : 0;
  return (charged.dry * head.hi + (brought ?? 0) * liquor) / (liquor + charged.water / 1000);
}
