import type { Point, SetPoint } from "../solution";
import { deepestPoint } from "./deepestPoint";
import { clearances, widest, type Segment } from "./segments";
import { chordAt, widestChord } from "./widestChord";

export interface BorderSegment extends Segment {
  readonly frame: boolean;
}

/** The set point of one window. Where a couple of the liquor sets Eh, the middle of the largest box of control bands;
 *  else Eh is a mixed potential: the margin counts pH alone, Eh is a range. Then the set point stands on the widest chord
 *  along pH, or as much higher or lower as keeps one band from the ends of that range, in the middle of the chord there.
 *  @param border  in control bands, region on the left     @param band  pH and V     @param coupleAt  couple at a point, or null
 *  @returns  set point in pH and V; null for an empty border     @source  docs/method.md, section 6 */
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
  const [low, high] = rangeThrough(border, chord.u, chord.v);
  const v = high - low > 2 ? Math.min(Math.max(chord.v, low + 1), high - 1) : (low + high) / 2;
  const [left, right] = pHReach(border, chord.u, v);
  const u = chord.u + (right.way - left.way) / 2; // the middle again, at the Eh just chosen
  const range = rangeThrough(border, u, v);
  return {
    pH: u * band.pH,
    Eh: v * band.Eh,
    margin: (left.way + right.way) / 2,
    mixedPotential: true,
    EhRange: [range[0] * band.Eh, range[1] * band.Eh],
    cutByFrame: left.frame || right.frame,
  };
}

/** The stretch of v that holds a point of the region, at its u. */
const rangeThrough = (border: readonly BorderSegment[], u: number, v: number): readonly [number, number] =>
  chordAt(border, u).find(([lo, hi]) => v >= lo - 1e-9 && v <= hi + 1e-9) ?? [v, v];

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
