import { deepestPoint } from "../setpoint/deepestPoint";
import { insideOf, type Segment } from "../setpoint/segments";
import { widestChord } from "../setpoint/widestChord";
import type { Limit, Window } from "../solution";
import { farthestAlong } from "./alongPH";
import { farthestPoint, settleTies } from "./farthest";
import { clearanceAt, inRoom, roomOf } from "./room";

/** A place that is taken. */
export interface Site {
  readonly pH: number;
  /** V vs SHE */
  readonly Eh: number;
  /** code of the trial, or the number of the proposal */
  readonly name: string;
  readonly kind: "tried" | "planned" | "proposed" | "set aside";
}

type Band = Readonly<Record<"pH" | "Eh", number>>;

/** How one condition stands to what was tried and to the window. */
export interface Standing {
  readonly pH: number;
  /** V vs SHE */
  readonly Eh: number;
  /** control bands to the nearest site: straight, or along pH alone; null without any */
  readonly gap: number | null;
  readonly nearest: Site | null;
  readonly inWindow: boolean;
  /** control bands to the nearest limit, counted as the margin is; 0 outside */
  readonly inside: number;
  /** the limit that is nearest; null where none is met */
  readonly limit: Limit | null;
}

export interface NextTrials {
  readonly points: readonly Standing[];
  /** pH: Eh is a mixed potential, the points are spread along pH at the set point's Eh */
  readonly along: "both" | "pH";
  /** every point stands at least so many control bands inside */
  readonly keepOff: number;
  /** fewer points than asked for: every other place lies closer than one control band to one that is taken */
  readonly full: boolean;
}

export const MOST_TRIALS = 8;
/** Trials closer than this are one to the loop: control bands. */
const LEAST_GAP = 1;
/** Wanted distance to every limit: the loop strays that far. Control bands. */
const KEEP_OFF = 1;
/** Distances closer than this count as equal, control bands. */
const SAME = 1e-6;

const borderOf = ({ limits }: Pick<Window, "limits">, band: Band): Segment[] =>
  limits.map(({ from, to }) => ({
    ax: from[0] / band.pH,
    ay: from[1] / band.Eh,
    bx: to[0] / band.pH,
    by: to[1] / band.Eh,
  }));

/** u of the border left and right of a point at its v. */
function chordThrough(border: readonly Segment[], u: number, v: number): readonly [number, number] {
  const hits = border.flatMap((s) =>
    s.ay <= v === s.by <= v ? [] : [s.ax + ((v - s.ay) / (s.by - s.ay)) * (s.bx - s.ax)],
  );
  return [Math.max(...hits.filter((x) => x <= u)), Math.min(...hits.filter((x) => x > u))];
}

const kinds: readonly Site["kind"][] = ["tried", "planned", "proposed", "set aside"];
/** Which of several equally near sites is named. */
const byWeight = (a: Site, b: Site): number =>
  kinds.indexOf(a.kind) - kinds.indexOf(b.kind) ||
  a.pH - b.pH ||
  a.Eh - b.Eh ||
  (a.name < b.name ? -1 : a.name > b.name ? 1 : 0);

const alongPH = (s: Segment, u: number, v: number): number =>
  s.ay <= v === s.by <= v ? Infinity : Math.abs(s.ax + ((v - s.ay) / (s.by - s.ay)) * (s.bx - s.ax) - u);

/** How a condition stands, proposed or moved by hand.
 *  @param at  pH, V vs SHE     @param window  solved     @param band  control bands     @param sites  what is taken
 *  @returns  gap, nearest site, distance inside and the limit faced     @source  distances of docs/method.md, section 6 */
export function standingAt(
  at: { readonly pH: number; readonly Eh: number },
  window: Pick<Window, "limits" | "setPoint">,
  band: Band,
  sites: readonly Site[],
): Standing {
  const pHOnly = window.setPoint.mixedPotential;
  const border = borderOf(window, band);
  const [u, v] = [at.pH / band.pH, at.Eh / band.Eh];
  const inWindow = insideOf(border, u, v);
  const ways = border.map((s) => (pHOnly ? alongPH(s, u, v) : clearanceAt([s], u, v)));
  const way = Math.min(...ways);
  const gapTo = (s: Site) =>
    pHOnly ? Math.abs(s.pH / band.pH - u) : Math.hypot(s.pH / band.pH - u, s.Eh / band.Eh - v);
  const gap = Math.min(...sites.map(gapTo));
  const nearest = sites.filter((s) => gapTo(s) <= gap + SAME).sort(byWeight)[0] ?? null;
  // Of limits equally near, a real one before the frame.
  const faced = ways.flatMap((w, i) => (w <= way + SAME && w < Infinity ? [window.limits[i]!] : []));
  return {
    pH: at.pH,
    Eh: at.Eh,
    gap: nearest && gap,
    nearest,
    inWindow,
    inside: inWindow && way < Infinity ? way : 0,
    limit: faced.find((l) => l.kind !== "frame") ?? faced[0] ?? null,
  };
}

type Spot = { readonly u: number; readonly v: number };

/** Where trials may stand: the first place without any trial, and the farthest from those there are. */
interface Ground {
  readonly keepOff: number;
  first(): Spot | null;
  farthest(taken: readonly Spot[]): (Spot & { readonly gap: number }) | null;
}

/** The window less a band along its limits, and between two potentials. */
function wholeGround(border: readonly Segment[], wanted: Spot, between: readonly [number, number]): Ground | null {
  const deepest = deepestPoint(border);
  if (deepest === null) return null;
  const keepOff = Math.min(KEEP_OFF, deepest.margin / 2);
  const room = roomOf(border, keepOff, between);
  return {
    keepOff,
    first: () => {
      // a set point held by hand may be no place for a trial
      const good = [wanted, deepest].find(({ u, v }) => inRoom(room, u, v));
      if (good || room.corners.length === 0) return good ?? null;
      const corners = room.corners.map(([u, v]) => ({ u, v, gap: 0 }));
      return settleTies(corners, ({ u, v }) => clearanceAt(border, u, v));
    },
    farthest: (taken) => {
      const spots = taken.map(({ u, v }) => [u, v] as const);
      return farthestPoint(room, spots);
    },
  };
}

/** The chord of the set point's Eh, less a band at either end. */
function chordGround(border: readonly Segment[], wanted: Spot): Ground | null {
  const widest = widestChord(border);
  if (widest === null) return null;
  const { u, v } = insideOf(border, wanted.u, wanted.v) ? wanted : widest;
  const [left, right] = chordThrough(border, u, v);
  const keepOff = Math.min(KEEP_OFF, (right - left) / 4);
  const [low, high] = [left + keepOff, right - keepOff];
  return {
    keepOff,
    first: () => ({ u: u >= low && u <= high ? u : (low + high) / 2, v }),
    farthest: (taken) => {
      const sites = taken.map((s) => s.u);
      return farthestAlong([low, high], v, sites, (at) => Math.min(at - left, right - at));
    },
  };
}

/** The next conditions to try: one after the other, each the point of the window farthest from every trial that was tried or planned and
 *  from every point proposed before it, in control bands. Points keep one control band from every limit, or half the window's
 *  margin where that is less; with `reach` they stay between two potentials. Without any trial the set point comes first. Where
 *  Eh is a mixed potential, distances count pH alone and the points lie on the chord of the set point's Eh. Ties: deepest
 *  inside, then lowest pH, then lowest Eh. It stops where every place left is closer than a control band to one that is taken.
 *  @param window  solved, V vs SHE     @param band  control bands, pH and V     @param sites  comparable trials tried, planned ones, points kept
 *  @param count  1 to 8     @param reach  lowest and highest Eh that can be set, V vs SHE; not used along pH alone
 *  @returns  at most `count` points in the order of their gaps; the same for the same sites in any order
 *  @source  maximin distance designs (Johnson, Moore and Ylvisaker 1990), one point at a time (Gonzalez 1985, from memory) */
export function nextTrials(
  window: Window,
  band: Band,
  sites: readonly Site[],
  count: number,
  reach: readonly [number, number] = [-Infinity, Infinity],
): NextTrials {
  const border = borderOf(window, band);
  const { pH, Eh, mixedPotential } = window.setPoint;
  const along = mixedPotential ? "pH" : "both";
  const wanted = { u: pH / band.pH, v: Eh / band.Eh };
  const ground = mixedPotential
    ? chordGround(border, wanted)
    : wholeGround(border, wanted, [reach[0] / band.Eh, reach[1] / band.Eh]);
  if (ground === null) return { points: [], along, keepOff: 0, full: true };
  const { keepOff } = ground;
  const taken = [...sites];
  const points: Standing[] = [];
  while (points.length < Math.min(count, MOST_TRIALS)) {
    const spots = taken.map((s) => ({ u: s.pH / band.pH, v: s.Eh / band.Eh }));
    const farthest = spots.length === 0 ? null : ground.farthest(spots);
    const found = spots.length === 0 ? ground.first() : farthest;
    if (found === null || (farthest !== null && farthest.gap < LEAST_GAP - SAME))
      return { points, along, keepOff, full: true };
    const spot = { pH: found.u * band.pH, Eh: found.v * band.Eh };
    points.push(standingAt(spot, window, band, taken));
    taken.push({ ...spot, name: String(points.length), kind: "proposed" });
  }
  return { points, along, keepOff, full: false };
}
