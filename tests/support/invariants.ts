import { expect } from "vitest";
import type { Problem } from "../../shared/schemas/problem";
import type { Limit, Point, Solution, Window } from "../../shared/solution";
import type { ChemicalData } from "../../shared/species/chemicalData";
import { oracleFor, type Oracle } from "./oracle";
import { piecesOf, polygonOf } from "./pieces";
import { seeded } from "./random";
import { insideOutline } from "./read";
import { edgesOf, loopsOf, marginAt, signedArea, unansweredBorder, widthAlongPH } from "./shapes";
import { library as tables } from "./solver";

/** What must hold of every solution, whatever the question. Each complaint says where. */
export function expectInvariants(problem: Problem, solution: Solution, library: ChemicalData = tables): void {
  const complaints = [
    ...fieldComplaints(problem, solution),
    ...pieceComplaints(problem, solution, library),
    ...solution.windows.flatMap((w, i) => windowComplaints(problem, w).map((c) => `window ${i}: ${c}`)),
    ...limitComplaints(oracleFor(problem, library), solution),
    ...choiceComplaints(solution, groundOf(problem, library)),
  ];
  expect(complaints).toEqual([]);
}

/** Whether frame and water lines leave any ground at all. */
function groundOf(problem: Problem, library: ChemicalData): boolean {
  const bound = problem.metals.some((m) => m.requirement === "metal") ? ("upper" as const) : ("both" as const);
  const metals = problem.metals.map((m) => ({ ...m, requirement: "free" as const }));
  return piecesOf({ ...problem, excludedHazards: [], metals, water: problem.water ?? { bound } }, library).length > 0;
}

const near = (a: Point, b: Point): boolean => Math.abs(a[0] - b[0]) < 1e-8 && Math.abs(a[1] - b[1]) < 1e-8;
const show = (p: Point): string => `(pH ${p[0]}, ${p[1]} V)`;

/** Fields of each metal are convex, counter-clockwise, fill the frame once, and neighbours agree on what they share. */
function fieldComplaints({ frame, metals }: Problem, solution: Solution): string[] {
  const out: string[] = [];
  const [width, height] = [frame.pH[1] - frame.pH[0], frame.Eh[1] - frame.Eh[0]];
  const onFrame = (a: Point, b: Point): boolean =>
    ([0, 1] as const).some((axis) =>
      [frame.pH, frame.Eh][axis]!.some((v) => Math.abs(a[axis] - v) < 1e-10 && Math.abs(b[axis] - v) < 1e-10),
    );
  for (const { element } of metals) {
    const polygons = solution.fields.filter((f) => f.metal === element).map((f) => f.polygon);
    const area = polygons.reduce((sum, p) => sum + signedArea(p), 0);
    if (!(Math.abs(area - width * height) <= 1e-9 * Math.max(1, width * height)))
      out.push(`fields of ${element} cover ${area} of ${width * height}`);
    for (const polygon of polygons) {
      if (polygon.length < 3 || !(signedArea(polygon) > 0)) out.push(`a field of ${element} is not counter-clockwise`);
      edgesOf(polygon).forEach(([a, b], i) => {
        const c = polygon[(i + 2) % polygon.length]!;
        if ((b[0] - a[0]) * (c[1] - b[1]) - (b[1] - a[1]) * (c[0] - b[0]) < -1e-12)
          out.push(`a field of ${element} turns right at ${show(b)}`);
        if (!(
          a[0] >= frame.pH[0] - 1e-9 &&
          a[0] <= frame.pH[1] + 1e-9 &&
          a[1] >= frame.Eh[0] - 1e-9 &&
          a[1] <= frame.Eh[1] + 1e-9
        ))
          out.push(`a field of ${element} leaves the frame at ${show(a)}`);
      });
    }
    const unanswered = unansweredBorder(polygons, onFrame);
    if (!(unanswered < 1e-7)) out.push(`fields of ${element}: ${unanswered} of border without a neighbour`);
  }
  return out;
}

/** No piece is a sliver, and the pieces add up to the windows. */
function pieceComplaints(problem: Problem, solution: Solution, library: ChemicalData): string[] {
  const pieces = piecesOf(problem, library).map(polygonOf);
  const out = pieces
    .filter((p) => !(widthAlongPH(p) >= 1e-9))
    .map((p) => `a window piece at ${show(p[0]!)} is ${widthAlongPH(p)} pH wide`);
  const sum = pieces.reduce((s, p) => s + signedArea(p), 0);
  const areas = solution.windows.reduce((s, w) => s + w.area, 0);
  if (!(Math.abs(sum - areas) <= 1e-9 * Math.max(1, sum))) out.push(`windows have area ${areas}, their pieces ${sum}`);
  return out;
}

const borderOf = (w: Window): [Point, Point][] => w.polygons.flatMap(loopsOf).flatMap(edgesOf);

function windowComplaints({ controlBand }: Problem, w: Window): string[] {
  const out: string[] = [];
  const loops = w.polygons.flatMap(loopsOf);
  for (const { outer, holes } of w.polygons) {
    if (!(signedArea(outer) > 0)) out.push("the outer loop is not counter-clockwise");
    if (!holes.every((h) => signedArea(h) < 0)) out.push("a hole is not clockwise");
  }
  const area = loops.reduce((s, l) => s + signedArea(l), 0);
  if (!(Math.abs(area - w.area) <= 1e-9 * Math.max(1, area))) out.push(`area ${w.area}, outlines ${area}`);
  const corners = w.polygons.flatMap((p) => p.outer);
  for (const [axis, [lo, hi]] of [
    [0, w.pH],
    [1, w.Eh],
  ] as const)
    // prettier-ignore
    if (Math.min(...corners.map((p) => p[axis])) !== lo || Math.max(...corners.map((p) => p[axis])) !== hi)
      out.push(`extent ${lo} to ${hi} is not that of the outline`);
  if (w.controllable !== w.setPoint.margin >= 1) out.push("controllable does not follow from the margin");
  out.push(...loopComplaints(w, loops), ...setPointComplaints(w, controlBand));
  return out;
}

/** Limits run along the outline: outer loop first, then the holes, each closed, each line zero on it and positive inside. */
function loopComplaints(w: Window, loops: Point[][]): string[] {
  const out: string[] = [];
  if (w.limits.length !== loops.flat().length) return [`${w.limits.length} limits, ${loops.flat().length} corners`];
  let at = 0;
  for (const loop of loops)
    loop.forEach((corner, i) => {
      const { from, to, line } = w.limits[at++]!;
      if (!near(from, corner) || !near(to, loop[(i + 1) % loop.length]!))
        out.push(`limit from ${show(from)} breaks the loop`);
      const [k, x, y] = line;
      const size = Math.hypot(x, y);
      for (const p of [from, to])
        if (!(Math.abs(k + x * p[0] + y * p[1]) < 1e-8 * size)) out.push(`limit at ${show(p)} is off its line`);
      const left = [-(to[1] - from[1]), to[0] - from[0]] as const;
      const length = Math.hypot(...left);
      if (length > 1e-7 && !(x * left[0] + y * left[1] > 0))
        out.push(`the line of the limit from ${show(from)} is negative inside`);
    });
  return out;
}

/** The set point lies in its window, its margin is what a box can grow to there, and no other point does better. */
function setPointComplaints(w: Window, band: Problem["controlBand"]): string[] {
  const out: string[] = [];
  const { pH, Eh, margin, mixedPotential, EhRange } = w.setPoint;
  const inside = (p: Point): boolean => w.polygons.some((o) => insideOutline(o, p[0], p[1]));
  const border = borderOf(w);
  const at: Point = [pH, Eh];
  if (margin > 1e-7 && !inside(at)) out.push(`the set point ${show(at)} is outside`);
  const growth = mixedPotential ? alongPH(border, at, band.pH) : marginAt(at, border, band);
  if (!(Math.abs(growth - margin) < 1e-6 * Math.max(1, margin)))
    out.push(`margin ${margin} at ${show(at)}, by hand ${growth}`);
  const nearest = Math.min(...w.limits.map((l) => l.distance));
  const box = marginAt(at, border, band);
  if (!(Math.abs(nearest - box) < 1e-6 * Math.max(1, box))) out.push(`nearest limit at ${nearest}, by hand ${box}`);
  if (mixedPotential) {
    if (!EhRange || !(EhRange[0] <= Eh && Eh <= EhRange[1])) out.push("Eh is not in its range");
  } else {
    const random = seeded(7);
    for (let i = 0; i < 200; i++) {
      const p: Point = [random.between(...w.pH), random.between(...w.Eh)];
      if (inside(p) && marginAt(p, border, band) > margin + 1e-6 * Math.max(1, margin))
        out.push(`${show(p)} is deeper than the set point`);
    }
  }
  return out;
}

/** Way to the nearest border along pH alone, in bands. */
function alongPH(border: readonly [Point, Point][], [pH, Eh]: Point, band: number): number {
  let least = Infinity;
  for (const [a, b] of border)
    if (a[1] <= Eh !== b[1] <= Eh)
      least = Math.min(least, Math.abs(a[0] + ((Eh - a[1]) / (b[1] - a[1])) * (b[0] - a[0]) - pH));
  return least / band;
}

/** On a metal's limit both its species are the two cheapest and cost the same, and the reaction named balances there. */
function limitComplaints(oracle: Oracle, solution: Solution): string[] {
  const out: string[] = [];
  for (const l of solution.windows.flatMap((w) => w.limits)) {
    const middle: Point = [(l.from[0] + l.to[0]) / 2, (l.from[1] + l.to[1]) / 2];
    if (l.kind === "metal") out.push(...metalComplaints(oracle, l, middle));
    if (l.kind === "water") {
      const water = oracle.problem.water ?? { bound: "both" };
      const level =
        l.side === "oxygen"
          ? oracle.oxygen(middle[0]) + (water.oxygenV ?? 0)
          : oracle.hydrogen(middle[0]) - (water.hydrogenV ?? 0);
      if (!(Math.abs(level - middle[1]) < 1e-6))
        out.push(`the ${l.side} limit at ${show(middle)} should stand at ${level} V`);
    }
    if (l.kind === "frame") {
      const { pH, Eh } = oracle.problem.frame;
      const gap = {
        "low pH": middle[0] - pH[0],
        "high pH": middle[0] - pH[1],
        "low Eh": middle[1] - Eh[0],
        "high Eh": middle[1] - Eh[1],
      }[l.side!];
      if (!(Math.abs(gap!) < 1e-9)) out.push(`the frame limit at ${show(middle)} is not on its side, ${l.side}`);
    }
  }
  return out;
}

function metalComplaints(oracle: Oracle, l: Limit, p: Point): string[] {
  const out: string[] = [];
  const metal = l.metal!;
  const standings = oracle.standings(metal, p[0], p[1]);
  const inside = standings.find((s) => s.species.id === l.inside);
  const outside = standings.find((s) => s.species.id === l.outside);
  if (!inside || !outside) return [`limit of ${metal} at ${show(p)} names ${l.inside} and ${l.outside}`];
  const floor = standings[0]!.energy;
  // 0.01 J for each mole of protons and electrons that the formations move: the grid's prices of both are that near
  const slack = 0.01 * Math.max(1, inside.moved, outside.moved);
  for (const s of [inside, outside])
    if (!(s.energy - floor < slack))
      out.push(`${s.species.id} stands ${s.energy - floor} J/mol above the lowest at ${show(p)}`);
  const requirement = oracle.requirementOf(metal);
  if (requirement === "free") out.push(`${metal} is free and cannot shut ${show(p)}`);
  if (l.reactionTerms) {
    const price = l.reactionTerms.reduce(
      (sum, t) => sum + t.coefficient * oracle.potential(t.species, metal, p[0], p[1]),
      0,
    );
    const size = l.reactionTerms.reduce((sum, t) => sum + Math.abs(t.coefficient), 0);
    if (!(Math.abs(price) < 0.01 * size)) out.push(`${l.reaction} costs ${price} J on its own limit at ${show(p)}`);
  } else out.push(`no reaction from ${l.inside} to ${l.outside}`);
  return out;
}

/** Windows stand in the order of their margins; the set point of the solution is that of the first. Without a window there is a
 *  conflict, unless frame and water lines leave no ground at all. */
function choiceComplaints({ windows, setPoint, conflicts }: Solution, anyGround: boolean): string[] {
  const out: string[] = [];
  windows.forEach((w, i) => {
    if (i > 0 && w.setPoint.margin > windows[i - 1]!.setPoint.margin) out.push("windows are out of order");
  });
  if (setPoint !== (windows[0]?.setPoint ?? null)) out.push("the set point is not that of the best window");
  if (windows.length > 0 && conflicts.length > 0) out.push("conflicts beside a window");
  if (windows.length === 0 && conflicts.length > 0 !== anyGround) out.push("no window, and conflicts do not say why");
  return out;
}
