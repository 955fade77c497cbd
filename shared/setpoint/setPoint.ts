import type { Point, SetPoint } from "../solution";
import { deepestPoint } from "./deepestPoint";
import { clearances, widest, type Segment } from "./segments";
import { chordAt, widestChord } from "./widestChord";

export interface BorderSegment extends Segment {
  readonly frame: boolean;
}

/** The set point of one window. Where a couple of the liquor sets Eh, the middle of the largest box of control bands;
 *  else Eh is a mixed potential: the margin counts pH alone, Eh is a range and keeps one band from its ends where it can.
 *  @param border  in control bands, region on the left     @param band  pH and V     @param coupleAt  couple at a point, or null
 *  @returns  set point in pH and V; null for an empty border     @source  docs/method.md, step 6 */
export function setPointOf(
  border: readonly BorderSegment[],
  band: { pH: number; Eh: number },
  coupleAt: (at: Point) => [string, string] | null,
): SetPoint | null {
  const deepest = deepestPoint(border);
  if (!deepest) return null;
  const couple = coupleAt([deepest.u * band.pH, deepest.v * band.Eh]);
  if (couple) {
    return {
      pH: deepest.u * band.pH,
      Eh: deepest.v * band.Eh,
      margin: deepest.margin,
      mixedPotential: false,
      couple,
      cutByFrame: border.some((s) => s.frame && widest(clearances(s), deepest.u, deepest.v)[1] < deepest.margin + 1e-6),
    };
  }
  const chord = widestChord(border) ?? deepest;
  const range = chordAt(border, chord.u).find(([lo, hi]) => chord.v >= lo - 1e-9 && chord.v <= hi + 1e-9) ?? [
    chord.v,
    chord.v,
  ];
  const v =
    range[1] - range[0] > 2 ? Math.min(Math.max(chord.v, range[0] + 1), range[1] - 1) : (range[0] + range[1]) / 2;
  const [left, right] = pHReach(border, chord.u, v);
  return {
    pH: chord.u * band.pH,
    Eh: v * band.Eh,
    margin: Math.min(left.way, right.way),
    mixedPotential: true,
    EhRange: [range[0] * band.Eh, range[1] * band.Eh],
    cutByFrame: (left.way <= right.way + 1e-6 && left.frame) || (right.way <= left.way + 1e-6 && right.frame),
  };
}

/** Nearest border to the left and right of a point at its v. */
function pHReach(border: readonly BorderSegment[], u: number, v: number): [Hit, Hit] {
  let left: Hit = { way: Infinity, frame: false };
  let right: Hit = { way: Infinity, frame: false };
  for (const s of border) {
    if (s.ay <= v === s.by <= v) continue;
    const way = s.ax + ((v - s.ay) / (s.by - s.ay)) * (s.bx - s.ax) - u;
    if (way <= 0 && -way < left.way) left = { way: -way, frame: s.frame };
    if (way >= 0 && way < right.way) right = { way, frame: s.frame };
  }
  return [left, right];
}

interface Hit {
  readonly way: number;
  readonly frame: boolean;
}
