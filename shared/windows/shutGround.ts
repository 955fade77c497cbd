import type { MetalFields } from "../fields/fields";
import { connect, type Region, type Stretch } from "../geometry/region";
import { sameLine } from "../geometry/line";
import type { Convex } from "../geometry/convex";
import type { Outline, Point } from "../solution";
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
