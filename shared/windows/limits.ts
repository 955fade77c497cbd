import { FRAME_SIDES, type LigandCell } from "../fields/ligandCells";
import type { MetalFields } from "../fields/fields";
import { sameLine } from "../geometry/line";
import type { Region, Stretch } from "../geometry/region";
import type { HazardGround } from "../hazards/excluded";
import { balance, reactionText } from "../reactions/balance";
import { clearances, widest, type Segment } from "../setpoint/segments";
import type { Limit, Point } from "../solution";
import type { ChemicalData } from "../species/chemicalData";
import { acrossLigandEdge } from "./ligandEdge";
import { meaningOf, type EdgeMeaning, type WindowPiece } from "./pieces";

export interface Ground {
  readonly data: ChemicalData;
  readonly cells: readonly LigandCell[];
  readonly metals: readonly MetalFields[];
  readonly hazards: readonly HazardGround[];
  readonly pieces: readonly WindowPiece[];
}

type Shut = Exclude<EdgeMeaning, { kind: "ligand" }>;
interface RawLimit {
  readonly meaning: Shut;
  readonly piece: number;
  readonly edge: number;
  readonly from: Point;
  readonly to: Point;
}

/** The border of a region as limits, stretches of one line with one meaning joined. */
function rawLimits(ground: Ground, loop: readonly Stretch[]): RawLimit[] {
  const out: RawLimit[] = [];
  for (const s of loop) {
    for (const part of meant(ground, s)) {
      const last = out.at(-1);
      if (last && continues(ground, last, part)) out[out.length - 1] = { ...last, to: part.to };
      else out.push(part);
    }
  }
  const first = out[0];
  const last = out.at(-1);
  if (first && last && first !== last && continues(ground, last, first))
    return [{ ...last, to: first.to }, ...out.slice(1, -1)];
  return out;
}

function meant(ground: Ground, { piece, edge, from, to }: Stretch): RawLimit[] {
  const { lines, tags } = ground.pieces[piece]!.piece;
  const meaning = meaningOf(tags[edge]!);
  if (meaning.kind !== "ligand") return [{ meaning, piece, edge, from, to }];
  return acrossLigandEdge(ground.metals, lines[edge]!, from, to).map((part) => ({ ...part, piece, edge }));
}

function continues(ground: Ground, last: RawLimit, next: RawLimit): boolean {
  if (!sameMeaning(last.meaning, next.meaning)) return false;
  const lineOf = (l: RawLimit) => ground.pieces[l.piece]!.piece.lines[l.edge]!;
  return sameLine(lineOf(last), lineOf(next));
}

function sameMeaning(a: Shut, b: Shut): boolean {
  switch (a.kind) {
    case "frame":
      return b.kind === "frame" && a.side === b.side;
    case "water":
      return b.kind === "water" && a.side === b.side;
    case "hazard":
      return b.kind === "hazard" && a.hazard === b.hazard && a.plane === b.plane;
    case "metal":
      return b.kind === "metal" && a.metal === b.metal && a.inside === b.inside && a.outside === b.outside;
  }
}

export interface BorderLoops {
  readonly outer: RawLimit[];
  readonly holes: RawLimit[][];
}

export const loopsOf = (ground: Ground, region: Region): BorderLoops => ({
  outer: rawLimits(ground, region.outer),
  holes: region.holes.map((h) => rawLimits(ground, h)),
});

export const pointsOf = (loop: readonly RawLimit[]): Point[] => loop.map((l) => l.from);

export const segmentOf = (l: RawLimit, band: { pH: number; Eh: number }): Segment => ({
  ax: l.from[0] / band.pH,
  ay: l.from[1] / band.Eh,
  bx: l.to[0] / band.pH,
  by: l.to[1] / band.Eh,
});

/** Signed way from a point to the limit along one axis, or null when that line misses it. */
function wayAlong(l: RawLimit, p: Point, axis: 0 | 1): number | null {
  const other = axis === 0 ? 1 : 0;
  const [a, b] = [l.from, l.to];
  const span = b[other] - a[other];
  const t = span === 0 ? Number.NaN : (p[other] - a[other]) / span;
  return t >= 0 && t <= 1 ? a[axis] + t * (b[axis] - a[axis]) - p[axis] : null;
}

/** A border stretch in full: names, reaction, line, distances from the set point.
 *  @param ground  the solved plane     @param raw  border stretch     @param at  set point     @param band  control bands
 *  @returns  the limit as the solution prints it     @source  docs/method.md, section 5 */
export function limitOf(ground: Ground, raw: RawLimit, at: Point, band: { pH: number; Eh: number }): Limit {
  const { piece, cell } = ground.pieces[raw.piece]!;
  const line = piece.lines[raw.edge]!;
  const size = Math.max(Math.abs(line[1]), Math.abs(line[2]));
  const u = at[0] / band.pH;
  const v = at[1] / band.Eh;
  const common = {
    line: [line[0] / size, line[1] / size, line[2] / size] as [number, number, number],
    from: raw.from,
    to: raw.to,
    distance: Math.max(0, widest(clearances(segmentOf(raw, band)), u, v)[1]),
    distancePH: wayAlong(raw, at, 0),
    distanceEh: wayAlong(raw, at, 1),
  };
  const { meaning } = raw;
  if (meaning.kind === "frame") return { kind: "frame", side: FRAME_SIDES[meaning.side]!, ...common };
  if (meaning.kind === "water") return { kind: "water", side: meaning.side, ...waterReaction(meaning.side), ...common };
  if (meaning.kind === "hazard") return { kind: "hazard", ...hazardOf(ground, meaning, cell), ...common };
  const metal = ground.metals[meaning.metal]!;
  const inside = metal.formations[meaning.inside]!.species.id;
  const outside = metal.formations[meaning.outside]!.species.id;
  const holders = [...ground.cells[cell]!.holders.values()].map((h) => h.species.id);
  return {
    kind: "metal",
    metal: metal.metal.element,
    inside,
    outside,
    ...metalReaction(ground.data, inside, outside, holders, metal.metal.element),
    ...common,
  };
}

type Shown = Pick<Limit, "reaction" | "reactionTerms">;
const shown = new WeakMap<ChemicalData, Map<string, Shown>>();

/** The balanced reaction across a limit; a moving slider asks for the same ones again. */
function metalReaction(data: ChemicalData, inside: string, outside: string, holders: string[], metal: string): Shown {
  const known = shown.get(data) ?? new Map<string, Shown>();
  shown.set(data, known);
  const key = [inside, outside, metal, ...holders].join("|");
  let reaction = known.get(key);
  if (!reaction) {
    const balanced = balance(data, inside, outside, holders, metal);
    reaction = balanced.ok ? { reaction: reactionText(balanced.value), reactionTerms: balanced.value } : {};
    known.set(key, reaction);
  }
  return reaction;
}

/** The gas kept out, what carries it there, and the reaction that frees it. */
function hazardOf(
  { data, cells, metals, hazards }: Ground,
  { hazard, plane }: Extract<EdgeMeaning, { kind: "hazard" }>,
  cell: number,
): Omit<Limit, "kind" | "line" | "from" | "to" | "distance" | "distancePH" | "distanceEh"> {
  const { gas, asked, carrier } = hazards[hazard]!;
  const outside = `${gas}(g)`;
  if (carrier === null) return { ...asked, outside, ...waterReaction("hydrogen") };
  const { holders } = cells[cell]!;
  const metal = metals.find((m) => m.metal.element === carrier);
  if (metal === undefined || plane === null) {
    const inside = holders.get(carrier)!.species.id;
    const main = carrier.startsWith("S(") ? "S" : carrier;
    return { ...asked, inside, outside, ...metalReaction(data, inside, outside, [], main) };
  }
  const inside = metal.formations[plane]!.species.id;
  const others = [...holders.values()].map((h) => h.species.id);
  return { ...asked, inside, outside, ...metalReaction(data, inside, outside, others, carrier) };
}

const WATER_TERMS = {
  oxygen: [
    { species: "H2O(l)", formula: "H2O", coefficient: -2 },
    { species: "O2(g)", formula: "O2", coefficient: 1 },
    { species: "H^+(aq)", formula: "H^+", coefficient: 4 },
    { species: "e^-", formula: "e^-", coefficient: 4 },
  ],
  hydrogen: [
    { species: "H^+(aq)", formula: "H^+", coefficient: -2 },
    { species: "e^-", formula: "e^-", coefficient: -2 },
    { species: "H2(g)", formula: "H2", coefficient: 1 },
  ],
};

const waterReaction = (side: "oxygen" | "hydrogen"): Pick<Limit, "reaction" | "reactionTerms"> => ({
  reactionTerms: WATER_TERMS[side],
  reaction: reactionText(WATER_TERMS[side]),
});
