import type { MetalFields } from "../fields/fields";
import { connect, type Region, type Stretch } from "../geometry/region";
import { sameLine } from "../geometry/line";
import { clip, type Convex } from "../geometry/convex";
import type { LigandCell } from "../fields/ligandCells";
import type { HazardGround } from "../hazards/excluded";
import type { Outline, Point, Solution } from "../solution";
import { sideOfLoop } from "../geometry/loop";
import { fulfils } from "./requirement";

/** Corners of a loop, those in the middle of a straight line left out.
 *  @param pieces  the convex pieces the stretches speak of     @param loop  closed walk     @returns  its true corners */
export function cornersOfLoop(pieces: readonly Convex[], loop: readonly Stretch[]): Point[] {
  return loop.flatMap((s, i) => {
    const before = loop[i === 0 ? loop.length - 1 : i - 1]!;
    const straight = sameLine(pieces[before.piece]!.lines[before.edge]!, pieces[s.piece]!.lines[s.edge]!);
    return straight ? [] : [s.from];
  });
}

/** The outlines of connected regions.
 *  @param pieces  convex pieces     @param regions  from `connect`     @returns  outer loops counter-clockwise, holes clockwise */
export const outlinesOf = (pieces: readonly Convex[], regions: readonly Region[]): Outline[] =>
  regions.map((r) => ({
    outer: cornersOfLoop(pieces, r.outer),
    holes: r.holes.map((h) => cornersOfLoop(pieces, h)),
  }));

/** The ground one metal shuts: the union of its fields that are not as required.
 *  @param fields  of the metal     @returns  outlines; none for a metal that is free
 *  @source  union of exact convex pieces (geometry/region.ts) */
export function shutGroundOf({ metal, states, cells }: MetalFields): Outline[] {
  const shut = cells.flatMap((c) =>
    c.pieces.filter((f) => !fulfils(metal.requirement, states[f.plane]!)).map((f) => f.piece),
  );
  return outlinesOf(shut, connect(shut));
}

const HAZARD_EDGE = 2 ** 40;

/** The ground of a hazard kept out: the union of its parts where it stands.
 *  @param hazard  of `excludedGround`     @param cells  ligand cells     @returns  outlines
 *  @source  union of exact convex pieces (geometry/region.ts) */
export function keptGroundOf(hazard: HazardGround, cells: readonly LigandCell[]): Outline[] {
  const shut = hazard.cells.flatMap((parts, c) =>
    parts.flatMap(({ field, height }) => {
      const whole = field ?? cells[c]!.piece;
      if (height[1] === 0 && height[2] === 0) return height[0] >= 0 ? [whole] : [];
      return clip(whole, height, HAZARD_EDGE) ?? [];
    }),
  );
  return outlinesOf(shut, connect(shut));
}

/** Hazards kept out whose ground holds a point, its edge left out.
 *  @param solution  solved with the shut ground outlined     @param at  pH, Eh (V vs SHE at T)     @returns  their entries */
export const keptAt = ({ kept = [] }: Pick<Solution, "kept">, [pH, Eh]: Point): NonNullable<Solution["kept"]> =>
  kept.filter(({ polygons }) =>
    polygons.some(
      ({ outer, holes }) => sideOfLoop(outer, pH, Eh) > 0 && holes.every((hole) => sideOfLoop(hole, pH, Eh) <= 0),
    ),
  );
