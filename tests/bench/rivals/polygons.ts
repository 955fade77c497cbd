import { intersection, setPrecision, union } from "polyclip-ts";
import type { Analysis } from "../../../shared/analysis";
import { cornersOf } from "../../../shared/geometry/convex";
import { difference, type Plane } from "../../../shared/geometry/envelope";
import type { Line } from "../../../shared/geometry/line";
import { fulfils } from "../../../shared/windows/requirement";

setPrecision(1e-12); // its own snapping; without it touching fields make it fail

/** The same fields and windows by a general polygon package: every half-plane a polygon, every field an intersection of
 *  half-planes, every window an intersection of unions. Ligand cells and planes are taken as given. */

type Ring = [number, number][];
type Polygon = Ring[];
type MultiPolygon = Polygon[];
type Box = { pH: [number, number]; Eh: [number, number] };

/** The part of a box where a line is >= 0, as a polygon; null when nothing of the box is. */
function halfPlane([k, x, y]: Line, box: Box): Polygon | null {
  const corners: [number, number][] = [
    [box.pH[0], box.Eh[0]],
    [box.pH[1], box.Eh[0]],
    [box.pH[1], box.Eh[1]],
    [box.pH[0], box.Eh[1]],
  ];
  const ring: Ring = [];
  corners.forEach((p, i) => {
    const q = corners[(i + 1) % 4]!;
    const a = k + x * p[0] + y * p[1];
    const b = k + x * q[0] + y * q[1];
    if (a >= 0) ring.push(p);
    if (a >= 0 !== b >= 0) {
      const t = a / (a - b);
      ring.push([p[0] + t * (q[0] - p[0]), p[1] + t * (q[1] - p[1])]);
    }
  });
  return ring.length < 3 ? null : [ring];
}

/** One half-plane after the other, giving up as soon as nothing is left: faster for the package than all at once. */
function fieldOf(i: number, planes: readonly Plane[], cell: Polygon, box: Box): MultiPolygon {
  let field: MultiPolygon = [cell];
  for (let j = 0; j < planes.length; j++) {
    if (j === i) continue;
    const half = halfPlane(difference(planes[i]!, planes[j]!), box);
    if (half === null) return [];
    field = intersection(field, half);
    if (field.length === 0) return [];
  }
  return field;
}

export const areaOfMulti = (m: MultiPolygon): number =>
  m.reduce((sum, polygon) => sum + polygon.reduce((s, ring) => s + ringArea(ring), 0), 0);

function ringArea(ring: Ring): number {
  const [ox, oy] = ring[0]!;
  let twice = 0;
  ring.forEach((p, i) => {
    const q = ring[(i + 1) % ring.length]!;
    twice += (p[0] - ox) * (q[1] - oy) - (q[0] - ox) * (p[1] - oy);
  });
  return twice / 2;
}

/** Fields and windows of an analysed problem.
 *  @returns  the windows, and the areas of all fields by metal and species */
export function byPolygons(analysis: Analysis): { windows: MultiPolygon; fields: Map<string, number> } {
  const { problem } = analysis.prepared;
  const box: Box = {
    pH: [problem.frame.pH[0] - 1, problem.frame.pH[1] + 1],
    Eh: [problem.frame.Eh[0] - 1, problem.frame.Eh[1] + 1],
  };
  const fields = new Map<string, number>();
  const asked: MultiPolygon[] = [];
  for (const m of analysis.metals) {
    const good: MultiPolygon[] = [];
    analysis.cells.forEach((cell, c) => {
      const ground: Polygon = [cornersOf(cell.piece)];
      const { planes } = m.cells[c]!;
      planes.forEach((_, i) => {
        const field = fieldOf(i, planes, ground, box);
        if (field.length === 0) return;
        const key = `${m.metal.element} ${m.formations[i]!.species.id}`;
        fields.set(key, (fields.get(key) ?? 0) + areaOfMulti(field));
        if (fulfils(m.metal.requirement, m.states[i]!)) good.push(field);
      });
    });
    if (m.metal.requirement !== "free") asked.push(union([], ...good));
  }
  const water = analysis.bounds.map((b) => halfPlane(b.line, box)).filter((p) => p !== null);
  const windows = intersection(asked[0]!, ...asked.slice(1), ...water);
  return { windows, fields };
}
