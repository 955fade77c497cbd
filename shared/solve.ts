import { ok, type Outcome } from "./outcome";
import { type Analysis, analyse } from "./analysis";
import type { MetalFields } from "./fields/fields";
import { cornersOf } from "./geometry/convex";
import { connect, type Region } from "./geometry/region";
import { hydrogenLine, oxygenLine, type Basis } from "./planes/grid";
import type { Prepared } from "./selection/prepare";
import { coupleAt } from "./setpoint/couple";
import { setPointOf } from "./setpoint/setPoint";
import type { Field, Point, SetPoint, Solution, WaterLine, Window } from "./solution";
import type { ChemicalData } from "./species/chemicalData";
import { relevantTo } from "./warnings/relevant";
import { warningsOf } from "./warnings/warningsOf";
import { conflictsOf } from "./windows/conflicts";
import { limitOf, loopsOf, pointsOf, segmentOf, type Ground } from "./windows/limits";
import { isSliver } from "./windows/pieces";
import { keptGroundOf, shutGroundOf } from "./windows/shutGround";

export interface SolveOptions {
  /** also outline the ground each metal shuts, and that of each hazard kept out, for the map */
  readonly shutGround?: boolean;
}

/** The whole question of a plan: predominance fields of every metal, windows where all are as required, what shuts them,
 *  and the set point. Potentials in V vs SHE at T, activities dimensionless.
 *  @param input  a problem (schemas/problem.ts); anything else fails     @param library  chemistry
 *  @returns  the solution, or the first failure with code, path, bound and value. Valid 0 to 250 C.
 *  @source  docs/method.md, sections 1 to 6; interface in docs/solver.md */
export function solve(input: unknown, library: ChemicalData, options: SolveOptions = {}): Outcome<Solution> {
  const analysed = analyse(input, library); // 1 to 5: energies, planes, ligand cells, fields, window pieces
  return analysed.ok ? ok(solutionOf(analysed.value, options)) : analysed;
}

/** The last step of `solve`, where the exact pieces are wanted as well: windows, limits, set points, warnings.
 *  @param analysis  of the problem     @returns  the solution; it cannot fail     @source  docs/method.md, section 6 */
export function solutionOf(analysis: Analysis, options: SolveOptions = {}): Solution {
  const { prepared, basis, cells, metals, bounds, hazards, pieces } = analysis;
  const { problem, data } = prepared;
  const ground: Ground = { data, cells, metals, hazards, pieces };
  const regions = connect(pieces.map((p) => p.piece)).filter((r) => r.pieces.some((i) => !isSliver(pieces[i]!.piece)));
  const windows = regions.map((region) => windowOf(ground, region, prepared, basis)); // 6: limits, set point
  windows.sort((a, b) => b.setPoint.margin - a.setPoint.margin || b.area - a.area);

  const fields = drawnFields(metals);
  return {
    temperatureC: problem.temperatureC,
    fields,
    windows,
    setPoint: windows[0]?.setPoint ?? null,
    conflicts: windows.length === 0 ? conflictsOf(cells, metals, bounds, hazards) : [],
    leftOut: [...prepared.leftOut],
    warnings: warningsOf(prepared, metals, fields, basis, relevantTo(problem, fields, windows, cells, pieces)),
    waterLines: waterLines(basis),
    metals: prepared.metals.map(({ element, requirement, activity, gPerL, gamma }) => ({
      metal: element,
      requirement,
      activity,
      ...(gPerL === undefined ? {} : { gPerL, gamma: gamma ?? 1 }),
    })),
    ...(options.shutGround ? { shut: metals.map((m) => ({ metal: m.metal.element, polygons: shutGroundOf(m) })) } : {}),
    ...(options.shutGround && hazards.length > 0
      ? { kept: hazards.map((h) => ({ ...h.asked, polygons: keptGroundOf(h, cells) })) }
      : {}),
    frame: problem.frame,
  };
}

function waterLines(basis: Basis): WaterLine[] {
  return (["oxygen", "hydrogen"] as const).map((which) => {
    const [k, x, y] = which === "oxygen" ? oxygenLine(basis) : hydrogenLine(basis);
    return { which, intercept: -k / y + 0, slope: -x / y };
  });
}

function drawnFields(metals: readonly MetalFields[]): Field[] {
  const fields: Field[] = [];
  for (const { metal, formations, states, cells } of metals)
    for (const { pieces } of cells)
      for (const { plane, piece } of pieces)
        fields.push({
          metal: metal.element,
          species: formations[plane]!.species.id,
          state: states[plane]!,
          polygon: cornersOf(piece),
        });
  return fields;
}

function windowOf(ground: Ground, region: Region, { problem, data }: Prepared, basis: Basis): Window {
  const band = problem.controlBand;
  const loops = loopsOf(ground, region);
  const all = [loops.outer, ...loops.holes];
  const border = all.flatMap((loop) => loop.map((l) => ({ ...segmentOf(l, band), frame: l.meaning.kind === "frame" })));
  const setPoint = setPointOf(border, band, (at: Point) => coupleAt(data, ground.cells, ground.metals, basis, at));
  const outer = pointsOf(loops.outer);
  const pHs = outer.map((p) => p[0]);
  const Ehs = outer.map((p) => p[1]);
  const at: SetPoint = setPoint!;
  return {
    polygons: [{ outer, holes: loops.holes.map(pointsOf) }],
    area: region.area,
    pH: [Math.min(...pHs), Math.max(...pHs)],
    Eh: [Math.min(...Ehs), Math.max(...Ehs)],
    controllable: at.margin >= 1,
    setPoint: at,
    limits: all.flat().map((l) => limitOf(ground, l, [at.pH, at.Eh], band)),
  };
}
