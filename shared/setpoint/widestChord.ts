import type { Segment } from "./segments";
import type { Deepest } from "./deepestPoint";

/** Where only pH can be held: the point whose distance to the border along u alone is largest. Ties: the middle of the
 *  deepest stretch along v, then the lowest u.
 *  @param segments  all loops of one region, region on the left
 *  @returns  the point; margin in bands of pH
 *  @source  widths of horizontal chords are linear in v between corner levels, so the widest stands at a level or on a
 *           stretch between two levels of equal width */
export function widestChord(segments: readonly Segment[]): Deepest | null {
  const levels = [...new Set(segments.flatMap((s) => [s.ay, s.by]))].sort((a, b) => a - b);
  let best: { margin: number; u: number; low: number; high: number } | null = null;
  for (let i = 0; i + 1 < levels.length; i++) {
    const [low, high] = [levels[i]!, levels[i + 1]!];
    if (!(high > low)) continue;
    const crossing = segments.filter((s) => Math.min(s.ay, s.by) <= low && Math.max(s.ay, s.by) >= high);
    const ends = crossing.map((s) => ({ low: along(s, low), high: along(s, high) }));
    ends.sort((a, b) => a.low + a.high - b.low - b.high);
    for (let k = 0; k + 1 < ends.length; k += 2) {
      const [left, right] = [ends[k]!, ends[k + 1]!];
      const below = (right.low - left.low) / 2;
      const above = (right.high - left.high) / 2;
      const flat = Math.abs(below - above) < 1e-9;
      const margin = Math.max(below, above);
      const stretch = flat ? [low, high] : below > above ? [low, low] : [high, high];
      const place = flat
        ? (left.low + right.low + left.high + right.high) / 4
        : below > above
          ? (left.low + right.low) / 2
          : (left.high + right.high) / 2;
      if (
        best &&
        Math.abs(margin - best.margin) < 1e-9 &&
        Math.abs(place - best.u) < 1e-6 &&
        stretch[0]! <= best.high + 1e-9
      )
        best.high = Math.max(best.high, stretch[1]!);
      else if (!best || margin > best.margin + 1e-9 || (margin > best.margin - 1e-9 && place < best.u - 1e-6))
        best = { margin, u: place, low: stretch[0]!, high: stretch[1]! };
    }
  }
  return best && { u: best.u, v: (best.low + best.high) / 2, margin: best.margin };
}

const along = (s: Segment, v: number): number => s.ax + ((v - s.ay) / (s.by - s.ay)) * (s.bx - s.ax);

/** The stretches of v that the region covers at one u, low to high.
 *  @returns  pairs [low, high] */
export function chordAt(segments: readonly Segment[], u: number): [number, number][] {
  const hits = segments
    .filter((s) => s.ax <= u !== s.bx <= u)
    .map((s) => s.ay + ((u - s.ax) / (s.bx - s.ax)) * (s.by - s.ay))
    .sort((a, b) => a - b);
  const out: [number, number][] = [];
  for (let i = 0; i + 1 < hits.length; i += 2) out.push([hits[i]!, hits[i + 1]!]);
  return out;
}
