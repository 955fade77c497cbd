import { type Demand, demandName } from "../solution";
import { requirementWord } from "../words/planWords";

/** One way across a gap: how far, and along which line. */
export type Way = readonly [amount: string, along: "at one Eh" | "at one pH"];

/** "0.62 pH away at one Eh, and 0.21 V away at one pH".
 *  @param ways  at least one     @param word  stands behind each amount     @returns  a phrase     @source  a choice of words */
export const wayWords = (ways: readonly Way[], word: "apart" | "away"): string =>
  ways.map(([amount, along]) => `${amount} ${word} ${along}`).join(", and ");

/** How far the grounds of a set that cannot hold together stand apart, as a metallurgist would say it.
 *  @param set  two demands or more     @param nearest  the one that comes closest to the ground the others share; null where there is none
 *  @param ways  what lies between; at least one     @param metalName  element -> name
 *  @returns  a sentence     @source  gaps of `adviceGaps` */
export function gapSentence(
  set: readonly Demand[],
  nearest: string | null,
  ways: readonly Way[],
  metalName: (element: string) => string,
): string {
  const away = wayWords(ways, "away");
  const one = set.find((d) => demandName(d) === nearest);
  if (set.length > 2 && one)
    return one.gas === undefined
      ? `Where the others hold, ${metalName(one.metal)} is not ${requirementWord[one.requirement]}: the nearest ground where it is lies ${away}.`
      : `The others hold only on ground kept out for ${one.gas}: the nearest ground clear of ${one.gas} lies ${away}.`;
  const gas = set.find((d) => d.gas !== undefined);
  const metal = set.find((d) => d.gas === undefined);
  if (gas && metal)
    return `From where ${metalName(metal.metal)} is ${requirementWord[metal.requirement]}, the nearest ground clear of ${gas.gas} lies ${away}.`;
  return `Their grounds lie ${wayWords(ways, "apart")}.`;
}
