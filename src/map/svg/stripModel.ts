import { FREE_ACID_BELOW, type FreeAcidCurve } from "../../../shared/activity/freeAcid";
import type { CrosscutPart } from "../../../shared/setpoint/crosscut";
import type { Limit, Window } from "../../../shared/solution";
import { fixed, signed, withUnit } from "../../../shared/words/numbers";
import type { MapMetal } from "../view";

/** What one metal is along both lines through a point, from low to high. */
export interface Crosscut {
  metal: MapMetal;
  alongPH: readonly CrosscutPart[];
  alongEh: readonly CrosscutPart[];
}

export type Direction = "pH" | "Eh";

/** Where the line through the set point leaves its window, on one side. */
export interface LimitMark {
  /** pH, or V vs SHE */
  at: number;
  /** from the set point, negative below it */
  distance: number;
  /** the metal that shuts there; null for water and the frame */
  metal: string | null;
  kind: Limit["kind"];
  /** "−1.03 pH", "+272 mV" */
  text: string;
}

/** The nearest limit on either side of the set point along one of its lines, with the way there.
 *  @param window  with its set point     @param freeAcid  of a sulfate liquor: a limit below pH 1.5 tells its g/L as well
 *  @returns  none, one or two marks, low side first */
export function limitMarks(
  { setPoint, limits }: Pick<Window, "setPoint" | "limits">,
  direction: Direction,
  freeAcid: FreeAcidCurve | null = null,
): LimitMark[] {
  const along = limits.flatMap((limit) => {
    const distance = direction === "pH" ? limit.distancePH : limit.distanceEh;
    return distance === null ? [] : [{ limit, distance }];
  });
  return [-1, 1].flatMap((side): LimitMark[] => {
    const [nearest] = along
      .filter(({ distance }) => distance * side > 0)
      .sort((a, b) => Math.abs(a.distance) - Math.abs(b.distance));
    if (!nearest) return [];
    const { limit, distance } = nearest;
    const at = (direction === "pH" ? setPoint.pH : setPoint.Eh) + distance;
    return [
      {
        at,
        distance,
        metal: limit.metal ?? null,
        kind: limit.kind,
        text:
          direction === "pH"
            ? withUnit(signed(distance, 2), "pH") + acidThere(freeAcid, at)
            : withUnit(signed(1000 * distance, 0), "mV"),
      },
    ];
  });
}

/** ", 25 g/L" where pH is no more than an index and the sulfate balances so much. */
function acidThere(curve: FreeAcidCurve | null, pH: number): string {
  if (curve === null || pH >= FREE_ACID_BELOW) return "";
  const { gPerL, withinSulfate } = curve.at(pH);
  return withinSulfate ? `, ${withUnit(fixed(gPerL, gPerL < 9.95 ? 1 : 0), "g/L")}` : "";
}

/** Where a metal is one thing along one line and another along the line beside it. */
export function differingStretches(a: readonly CrosscutPart[], b: readonly CrosscutPart[]): [number, number][] {
  const found: [number, number][] = [];
  for (const p of a)
    for (const q of b) {
      const [from, to] = [Math.max(p.from, q.from), Math.min(p.to, q.to)];
      if (p.species !== q.species && to - from > 1e-9) found.push([from, to]);
    }
  found.sort((x, y) => x[0] - y[0]);
  return found.reduce<[number, number][]>((out, next) => {
    const last = out.at(-1);
    if (last && next[0] - last[1] < 1e-9) last[1] = Math.max(last[1], next[1]);
    else out.push([...next]);
    return out;
  }, []);
}
