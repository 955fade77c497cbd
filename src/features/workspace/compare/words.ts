import type { GroundDifference } from "../../../../shared/compare/ground";
import type { LimitMove } from "../../../../shared/compare/limits";
import type { Limit, Window } from "../../../../shared/solution";
import { type Naming, limitSentences } from "../../../../shared/windows/limitWords";
import { fixed, percent, signed, withUnit } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";

/** Square measure of the map. */
export const area = (x: number): string => withUnit(fixed(x, 3), "pH·V");
const before = ({ kept, lost }: GroundDifference) => kept.area + lost.area;

/** What the two answers make of the ground, in one sentence. */
export function verdict(d: GroundDifference): string {
  const [was, is] = [before(d), d.kept.area + d.gained.area];
  if (d.frame === null) return "The two frames have no ground in common: there is nothing to compare.";
  if (was === 0 && is === 0) return "No window is open in either.";
  if (was === 0) return `B opens a window, ${area(is)}; A has none.`;
  if (is === 0) return `B shuts the window of A, ${area(was)}.`;
  const share = (x: number) => percent((100 * x) / was, 0);
  if (d.gained.area < 5e-7 && d.lost.area < 5e-7) return "The open ground is the same.";
  const net = is - was;
  const head =
    Math.abs(net) < 5e-4 * was
      ? "B has as much open ground as A, elsewhere"
      : `B has ${share(Math.abs(net))} ${net > 0 ? "more" : "less"} open ground than A`;
  if (d.gained.area < 5e-7) return `${head}: ground is only lost.`;
  if (d.lost.area < 5e-7) return `${head}: ground is only gained.`;
  return `${head}: ${share(d.gained.area)} gained, ${share(d.lost.area)} lost.`;
}

export interface MoveLine {
  key: string;
  side: string;
  what: string;
  /** "−0.33 pH" and where it was read */
  pH: string | null;
  Eh: string | null;
  /** shuts in one of the two only, or did not move by as much as is shown */
  note: string | null;
  /** the species beyond, where they are no longer the same */
  beyond: [string, string] | null;
}

const nameOf = (limits: readonly Limit[], window: Window | null, naming: Naming): string | undefined => {
  const [first] = limits;
  if (!first || !window) return undefined;
  const sentence = limitSentences({ ...window, limits: [first] }, naming)[0];
  return sentence?.what;
};

/** How the limits moved, in words; the frame's edges are no limits of the ground. */
export function moveLines(
  moves: readonly LimitMove[],
  a: { window: Window | null; naming: Naming },
  b: { window: Window | null; naming: Naming },
  scale: PotentialScale,
): MoveLine[] {
  return moves
    .filter((m) => m.kind !== "frame")
    .map((m) => {
      const what = nameOf(m.before, a.window, a.naming) ?? nameOf(m.after, b.window, b.naming) ?? "";
      const note = m.before.length === 0 ? "shuts in B only" : m.after.length === 0 ? "no longer shuts in B" : null;
      const stays =
        (m.pH !== null || m.Eh !== null) && Math.abs(m.pH?.by ?? 0) < 0.005 && Math.abs(m.Eh?.by ?? 0) < 0.0005;
      const [from, to] = [m.before[0]?.outside, m.after[0]?.outside];
      return {
        key: [m.kind, m.metal, m.side, what].join(),
        side: m.side,
        what,
        pH: m.pH && !stays ? `${signed(m.pH.by, 2)} pH at ${scale.format(m.pH.atEh)}` : null,
        Eh: m.Eh && !stays ? `${withUnit(signed(m.Eh.by * 1000, 0), "mV")} at pH ${fixed(m.Eh.atPH, 2)}` : null,
        note: note ?? (stays ? "stays" : null),
        beyond: from !== undefined && to !== undefined && from !== to ? [from, to] : null,
      };
    });
}
