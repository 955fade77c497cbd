import { clip, type Convex } from "./convex";
import { flipped } from "./line";

/** Tag of the edges an overlay makes: they bound nothing of the chemistry. */
const CUT = -1000;

/** Ground two convex pieces have in common.
 *  @param a, b  convex pieces     @returns  a convex piece; null where they share no area     @source  half-plane clipping, signs exact */
export function meet(a: Convex, b: Convex): Convex | null {
  let part: Convex | null = a;
  for (const line of b.lines) {
    part = clip(part, line, CUT);
    if (part === null) return null;
  }
  return part;
}

/** Ground two sets of pieces have in common.
 *  @param a, b  convex pieces, disjoint within each set     @returns  disjoint convex pieces     @source  pairwise meet */
export const common = (a: readonly Convex[], b: readonly Convex[]): Convex[] =>
  a.flatMap((p) => b.flatMap((q) => meet(p, q) ?? []));

/** What is left of a convex piece outside another: a fan of convex pieces, one at most for each edge of the other. */
function outside(piece: Convex, other: Convex): readonly Convex[] {
  if (meet(piece, other) === null) return [piece];
  const out: Convex[] = [];
  let rest: Convex | null = piece;
  for (const line of other.lines) {
    if (rest === null) break;
    const beyond = clip(rest, flipped(line), CUT);
    if (beyond) out.push(beyond);
    rest = clip(rest, line, CUT);
  }
  return out;
}

/** Ground of the first set that no piece of the second covers.
 *  @param a, b  convex pieces, disjoint within each set     @returns  disjoint convex pieces
 *  @source  each piece cut along the edges of what is taken away, signs exact */
export const without = (a: readonly Convex[], b: readonly Convex[]): Convex[] =>
  b.reduce<readonly Convex[]>((left, other) => left.flatMap((p) => outside(p, other)), a).slice();
