import type { PresetName } from "../schemas/plan";
import type { Outline, Window } from "../solution";
import type { ChemicalData } from "../species/chemicalData";
import { equilibriumLine } from "./equilibrium";
import { type Reagent, reagents } from "./reagents";

/** reachable: practice spans the set point, or lies in its range where no couple sets Eh; partly: it enters the window but not the set point,
 *  or may go past its range; not reachable: it does not get there. */
export type ReachWord = "reachable" | "partly" | "not reachable" | "not on record";

export interface ReachAnswer {
  readonly reagent: Reagent;
  readonly verdict: ReachWord;
  /** mV by which practice misses: the set point where it is partly reachable, the window where it is not; 0 where it is, null off record */
  readonly shortMV: number | null;
  /** practical range stands below or above what is asked; null where it spans it */
  readonly side: "below" | "above" | null;
  /** V vs SHE; null where no range is on record for the liquor */
  readonly practical: readonly [lo: number, hi: number | null] | null;
  /** where practice and window share ground at the set point's pH, V vs SHE */
  readonly overlap: readonly [number, number] | null;
  /** second, and only an equilibrium: V vs SHE at the set point's pH with its label */
  readonly equilibrium: { readonly Eh: number; readonly label: string } | null;
  readonly sideHazard: string;
  /** the verdict in a sentence, potentials in mV vs SHE */
  readonly text: string;
}

/** Potentials that a window allows at one pH: intervals from low to high, holes left out.
 *  @param window  of a solution     @param pH  at T     @returns  V vs SHE at T; none where the window does not reach
 *  @source  crossings of the exact outline with the line of that pH */
export function allowedAt(window: Pick<Window, "polygons">, pH: number): [number, number][] {
  const spans: [number, number][] = [];
  for (const { outer, holes } of window.polygons) {
    const hits = crossings(outer, pH)
      .concat(holes.flatMap((h) => crossings(h, pH)))
      .sort((a, b) => a - b);
    for (let i = 0; i + 1 < hits.length; i += 2) spans.push([hits[i] ?? 0, hits[i + 1] ?? 0]);
  }
  return spans.sort((a, b) => a[0] - b[0]);
}

function crossings(loop: Outline["outer"], pH: number): number[] {
  return loop.flatMap((p, i) => {
    const q = loop[i + 1 === loop.length ? 0 : i + 1] ?? p;
    if (p[0] <= pH === q[0] <= pH) return [];
    return [p[1] + ((pH - p[0]) / (q[0] - p[0])) * (q[1] - p[1])];
  });
}

const mV = (volt: number): string => `${Math.round(1000 * volt)}`;
const spanText = ([lo, hi]: readonly [number, number | null]): string =>
  hi === null ? `${mV(lo)} mV and more` : `${mV(lo)} to ${mV(hi)} mV`;

function equilibriumAt(data: ChemicalData, reagent: Reagent, pH: number, temperatureC: number): ReachAnswer["equilibrium"] {
  const line = equilibriumLine(data, reagent, temperatureC);
  if (line === null) return null;
  const Eh = line.intercept + line.slope * pH;
  const couple = reagent.couple ? `${reagent.couple.oxidised}/${reagent.couple.reduced}` : reagent.name;
  const basis = line.from === "library" ? `E0 at ${temperatureC} C` : "E0 of 25 C";
  return { Eh, label: `equilibrium of ${couple} with every activity one, ${basis}: not what a slurry shows` };
} // prettier-ignore

/** What one reagent can do for a window, from its practical range; the equilibrium of its couple stands second.
 *  @param data  the library     @param reagent  of the table
 *  @param window  with its set point; a mixed potential counts by its range of Eh     @param liquor  preset and T, C
 *  @returns  the verdict, the miss in mV, the overlap     @source  practice: range on platinum as the reagent's row says */
export function reachOf(
  data: ChemicalData,
  reagent: Reagent,
  window: Pick<Window, "polygons" | "setPoint" | "Eh">,
  liquor: { readonly preset: PresetName; readonly temperatureC: number },
): ReachAnswer {
  const { pH, Eh, mixedPotential, EhRange } = window.setPoint;
  const equilibrium = equilibriumAt(data, reagent, pH, liquor.temperatureC);
  const practical = reagent.reached && reagent.reachedIn.includes(liquor.preset) ? reagent.reached : null;
  const base = { reagent, equilibrium, practical, sideHazard: reagent.hazard };
  if (practical === null) {
    const text = `No practical range on record for ${reagent.name} in this liquor.`;
    return { ...base, verdict: "not on record", shortMV: null, side: null, overlap: null, text };
  }
  return { ...base, ...judge(reagent.name, practical, window, mixedPotential && EhRange ? EhRange : [Eh, Eh]) };
}

/** The verdict on a practical range: what the set point asks for is one potential, or any of a range where no couple sets it. */
function judge(
  name: string,
  practical: readonly [number, number | null],
  window: Pick<Window, "polygons" | "setPoint" | "Eh">,
  target: readonly [number, number],
): Pick<ReachAnswer, "verdict" | "shortMV" | "side" | "overlap" | "text"> {
  const { pH, Eh } = window.setPoint;
  const [lo, hi] = [practical[0], practical[1] ?? Number.POSITIVE_INFINITY];
  const allowed = allowedAt(window, pH).find(([a, b]) => Eh >= a && Eh <= b) ?? window.Eh;
  const shared: readonly [number, number] = [Math.max(lo, allowed[0]), Math.min(hi, allowed[1])];
  const overlap = shared[0] <= shared[1] ? shared : null;
  const miss = (to: readonly [number, number]): number => Math.max(0, to[0] - hi, lo - to[1]);
  const side = (to: readonly [number, number]): "below" | "above" => (hi < to[0] ? "below" : "above");
  const says = `${name} commonly shows ${spanText(practical)}`;
  const at = `at pH ${Number(pH.toFixed(2))}`;
  const isRange = target[1] > target[0];
  if (overlap === null) {
    const text = `${says}: it stays ${mV(miss(allowed))} mV ${side(allowed)} the window, which is open ${at} from ${spanText(allowed)}.`;
    return { verdict: "not reachable", shortMV: 1000 * miss(allowed), side: side(allowed), overlap, text };
  }
  if (miss(target) > 0) {
    const text = `${says}: it enters the window ${at} from ${spanText(overlap)} and stays ${mV(miss(target))} mV ${side(target)} the set point.`;
    return { verdict: "partly", shortMV: 1000 * miss(target), side: side(target), overlap, text };
  }
  if (!isRange)
    return { verdict: "reachable", shortMV: 0, side: null, overlap, text: `${says}: it spans the set point ${at}.` };
  const past = hi > target[1] ? ("above" as const) : lo < target[0] ? ("below" as const) : null;
  const asks = `the set point, any potential ${at} from ${spanText(target)}`;
  return past === null
    ? { verdict: "reachable", shortMV: 0, side: null, overlap, text: `${says}: all of it serves ${asks}.` }
    : { verdict: "partly", shortMV: 0, side: past, overlap, text: `${says}: it serves ${asks}, but may go past it.` };
}

/** The verdict of every reagent of the table that is considered in the liquor, or of those named.
 *  @param data, window, liquor  as `reachOf`     @param ids  reagents; those used in the liquor unless given
 *  @returns  in the order of the table     @source  as `reachOf` */
export const reachAnswers = (
  data: ChemicalData,
  window: Pick<Window, "polygons" | "setPoint" | "Eh">,
  liquor: { readonly preset: PresetName; readonly temperatureC: number },
  ids?: readonly string[],
): ReachAnswer[] =>
  reagents
    .filter((r) => (ids ? ids.includes(r.id) : r.usedIn.includes(liquor.preset)))
    .map((r) => reachOf(data, r, window, liquor));
