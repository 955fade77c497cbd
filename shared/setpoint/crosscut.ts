import type { Field, Point, Solution, State } from "../solution";
import { fulfils } from "../windows/requirement";

export interface CrosscutPart {
  readonly species: string;
  readonly state: State;
  readonly fulfilled: boolean;
  readonly from: number;
  readonly to: number;
}

/** Where a line parallel to an axis enters and leaves a convex polygon, or null.
 *  @param polygon  convex, counter-clockwise     @param axis  0 along pH, 1 along Eh     @param level  value on the other axis */
function span(polygon: readonly Point[], axis: 0 | 1, level: number): [number, number] | null {
  const other = axis === 0 ? 1 : 0;
  let low = Infinity;
  let high = -Infinity;
  polygon.forEach((p, i) => {
    const q = polygon[i + 1 === polygon.length ? 0 : i + 1]!;
    if (p[other] === level) {
      low = Math.min(low, p[axis]);
      high = Math.max(high, p[axis]);
    }
    if (p[other] < level !== q[other] < level) {
      const t = (level - p[other]) / (q[other] - p[other]);
      const hit = p[axis] + t * (q[axis] - p[axis]);
      low = Math.min(low, hit);
      high = Math.max(high, hit);
    }
  });
  return high > low ? [low, high] : null;
}

/** The states of one metal along one line through a point: along pH at its Eh, or along Eh at its pH.
 *  @param solution  solved     @param metal  element     @param along  axis     @param through  pH, Eh (V vs SHE at T)
 *  @returns  parts from low to high, equal species joined     @source  exact fields of the solution, cut by a line */
export function crosscut(solution: Solution, metal: string, along: "pH" | "Eh", through: Point): CrosscutPart[] {
  const requirement = solution.metals.find((m) => m.metal === metal)?.requirement ?? "free";
  const axis = along === "pH" ? 0 : 1;
  const level = through[axis === 0 ? 1 : 0];
  const parts: CrosscutPart[] = [];
  for (const f of solution.fields) {
    if (f.metal !== metal) continue;
    const reach = span(f.polygon, axis, level);
    if (reach)
      parts.push({
        species: f.species,
        state: f.state,
        fulfilled: fulfils(requirement, f.state),
        from: reach[0],
        to: reach[1],
      });
  }
  parts.sort((a, b) => a.from - b.from || a.to - b.to);
  return parts.reduce<CrosscutPart[]>((out, p) => {
    const last = out.at(-1);
    if (last?.species === p.species) out[out.length - 1] = { ...last, to: Math.max(last.to, p.to) };
    else if (p.to > (last?.to ?? -Infinity)) out.push(p);
    return out;
  }, []);
}

export interface SpeciesHere {
  readonly metal: string;
  readonly species: string;
  readonly state: State;
  readonly fulfilled: boolean;
}

function holds({ polygon }: Field, pH: number, Eh: number): boolean {
  let p = polygon.at(-1);
  for (const q of polygon) {
    if (p !== undefined && !((q[0] - p[0]) * (Eh - p[1]) - (q[1] - p[1]) * (pH - p[0]) >= -1e-12)) return false;
    p = q;
  }
  return true;
}

/** Every metal's ruling species at a point of the frame, in the order of the problem.
 *  @param solution  solved     @param pH, Eh  V vs SHE at T     @returns  one entry a metal; none outside the frame */
export function speciesAt(solution: Pick<Solution, "metals" | "fields">, pH: number, Eh: number): SpeciesHere[] {
  return solution.metals.flatMap(({ metal, requirement }) => {
    const f = solution.fields.find((g) => g.metal === metal && holds(g, pH, Eh));
    return f ? [{ metal, species: f.species, state: f.state, fulfilled: fulfils(requirement, f.state) }] : [];
  });
}
