import { celsius, significant } from "../words/numbers";
import type { CoupleOver, Robust } from "./robust";

/** What was looked at for a window over ranges, so that nobody takes it for more.
 *  @param robust  of `robustWindow`     @param metalName  "zinc" for Zn     @returns  sentences     @source  docs/method.md, section 7 */
export function checkedWords(
  { windows, checked: { temperatures, rules, settled, activities } }: Robust,
  metalName: (element: string) => string,
): string {
  const [first, last] = [temperatures[0] ?? 0, temperatures.at(-1) ?? 0];
  const heat =
    temperatures.length === 1
      ? `Solved at ${celsius(first, 1)}.`
      : `Solved at ${temperatures.length} temperatures from ${celsius(first, 1)} to ${celsius(last, 1)}; ${
          windows.length === 0
            ? "nothing holds at all of these, so no more were tried."
            : settled
              ? "more between them moved no edge by 0.001 pH or 1 mV."
              : "its edges still moved when that was the most to be tried: take it with care."
        }${rules.length === 0 ? "" : ` The solids that count change at ${rules.map((t) => celsius(t)).join(" and ")}: solved on both sides.`}`;
  const each = activities.map(({ metal, at, why }) => `${metalName(metal)} at ${significant(at)} (${why})`);
  return each.length === 0
    ? heat
    : `${heat} Of each activity range the worse end alone is solved, since the ground shrinks all the way to it: ${each.join("; ")}.`;
}

/** What sets Eh over the range, temperature by temperature where it is not the same couple throughout.
 *  @param couples  of a window over ranges     @returns  a sentence with ids of species; null where Eh is a mixed potential
 *  @source  docs/method.md, section 7 */
export function coupleOverWords(couples: readonly CoupleOver[]): string | null {
  const over = ({ couple: [reduced, oxidised] }: CoupleOver) => `${oxidised} over ${reduced}`;
  const [first, ...rest] = couples;
  if (first === undefined) return null;
  if (rest.length === 0)
    return `Eh is set by ${over(first)}${first.from === first.to ? "" : " at every temperature solved"}.`;
  const span = ({ from, to }: CoupleOver) =>
    from === to ? `at ${celsius(from, 1)}` : `from ${celsius(from, 1)} to ${celsius(to, 1)}`;
  return `Eh is set by ${couples.map((c) => `${over(c)} ${span(c)}`).join(", by ")}, of the temperatures solved.`;
}
