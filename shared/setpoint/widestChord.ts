import type { Deepest } from "./deepestPoint";
import type { Segment } from "./segments";

/** A stretch of v whose chords have one width: u of their middles at its ends, linear between. */
interface Stretch {
  readonly low: number;
  readonly high: number;
  readonly atLow: number;
  readonly atHigh: number;
}

const SAME = 1e-9;

/** Where only pH can be held: the point whose distance to the border along u alone is largest. Ties: the middle of the
 *  longest stretch of v that is equally wide, among equally long ones the lowest u.
 *  @param segments  all loops of one region, region on the left
 *  @returns  the point; margin in bands of pH; null for an empty border
 *  @source  widths of horizontal chords are linear in v between corner levels, so the widest stands at a level or on
 *           stretches between levels of equal width */
export function widestChord(segments: readonly Segment[]): Deepest | null {
  const chords = chordsBetweenLevels(segments);
  const margin = chords.reduce((most, c) => Math.max(most, c.below, c.above), -Infinity);
  const widest = chords.filter((c) => Math.max(c.below, c.above) > margin - SAME).map(widestPart);
  const ways = joined(widest);
  let best: { v: number; u: number; length: number } | null = null;
  for (const way of ways) {
    const length = way.at(-1)!.high - way[0]!.low;
    const v = (way.at(-1)!.high + way[0]!.low) / 2;
    const u = middleAt(way, v);
    if (best === null || length > best.length + 1e-6 || (length > best.length - 1e-6 && u < best.u - 1e-6))
      best = { u, v, length };
  }
  return best && { u: best.u, v: best.v, margin };
}

interface Chords {
  readonly low: number;
  readonly high: number;
  readonly atLow: number;
  readonly atHigh: number;
  readonly below: number;
  readonly above: number;
}

/** The region between two neighbouring levels of corners: trapezoids, by the half-widths of their ends. */
function chordsBetweenLevels(segments: readonly Segment[]): Chords[] {
  const out: Chords[] = [];
  const levels = [...new Set(segments.flatMap((s) => [s.ay, s.by]))].sort((a, b) => a - b);
  for (let i = 0; i + 1 < levels.length; i++) {
    const [low, high] = [levels[i]!, levels[i + 1]!];
    const sides = segments
      .filter((s) => Math.min(s.ay, s.by) <= low && Math.max(s.ay, s.by) >= high)
      .map((s) => ({ low: along(s, low), high: along(s, high) }))
      .sort((a, b) => a.low + a.high - b.low - b.high);
    for (let k = 0; k + 1 < sides.length; k += 2) {
      const [left, right] = [sides[k]!, sides[k + 1]!];
      out.push({
        low,
        high,
        atLow: (left.low + right.low) / 2,
        atHigh: (left.high + right.high) / 2,
        below: (right.low - left.low) / 2,
        above: (right.high - left.high) / 2,
      });
    }
  }
  return out;
}

/** All of it where the ends are equally wide, else the wider end. */
function widestPart({ low, high, atLow, atHigh, below, above }: Chords): Stretch {
  if (Math.abs(below - above) < SAME) return { low, high, atLow, atHigh };
  return below > above ? { low, high: low, atLow, atHigh: atLow } : { low: high, high, atLow: atHigh, atHigh };
}

/** Stretches that go on where another ends, in one list each. Given in the order of their levels. */
function joined(stretches: readonly Stretch[]): Stretch[][] {
  const ways: Stretch[][] = [];
  for (const s of stretches) {
    const way = ways.find(
      (w) => Math.abs(w.at(-1)!.high - s.low) < SAME && Math.abs(w.at(-1)!.atHigh - s.atLow) < 1e-6,
    );
    if (way) way.push(s);
    else ways.push([s]);
  }
  return ways;
}

function middleAt(way: readonly Stretch[], v: number): number {
  const s = way.find((w) => v <= w.high) ?? way.at(-1)!;
  return s.high > s.low ? s.atLow + ((v - s.low) / (s.high - s.low)) * (s.atHigh - s.atLow) : s.atLow;
}

const along = (s: Segment, v: number): number => s.ax + ((v - s.ay) / (s.by - s.ay)) * (s.bx - s.ax);

/** The stretches of v that the region covers at one u, low to high.
 *  @param segments  all loops of one region     @param u  in control bands     @returns  pairs [low, high] */
export function chordAt(segments: readonly Segment[], u: number): [number, number][] {
  const hits = segments
    .filter((s) => s.ax <= u !== s.bx <= u)
    .map((s) => s.ay + ((u - s.ax) / (s.bx - s.ax)) * (s.by - s.ay))
    .sort((a, b) => a - b);
  const out: [number, number][] = [];
  for (let i = 0; i + 1 < hits.length; i += 2) out.push([hits[i]!, hits[i + 1]!]);
  return out;
}
