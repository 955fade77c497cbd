import { kelvin } from "./units";
import { ok, type Outcome } from "./outcome";
import { fieldsOf, type MetalFields } from "./fields/fields";
import { frameTag, ligandCells, type LigandCell } from "./fields/ligandCells";
import { cornersOf, rectangle } from "./geometry/convex";
import { connect, type Region } from "./geometry/region";
import { energiesAt } from "./gibbs/energies";
import { basisAt, hydrogenLine, oxygenLine, type Basis } from "./planes/grid";
import { prepare, type Prepared } from "./selection/prepare";
import { coupleAt } from "./setpoint/couple";
import { setPointOf } from "./setpoint/setPoint";
import type { Field, Point, SetPoint, Solution, WaterLine, Window } from "./solution";
import type { ChemicalData } from "./species/chemicalData";
import { warningsOf } from "./warnings";
import { conflictsOf } from "./windows/conflicts";
import { limitOf, loopsOf, pointsOf, segmentOf, type Ground } from "./windows/limits";
import { HYDROGEN_TAG, OXYGEN_TAG, windowPieces, type Bound } from "./windows/pieces";
import { shutGroundOf } from "./windows/shutGround";

export interface SolveOptions {
  /** also outline the ground each metal shuts, for the map */
  readonly shutGround?: boolean;
}

/** The whole question of a plan: predominance fields of every metal, windows where all are as required, what shuts them,
 *  and the set point. Potentials in V vs SHE at T, activities dimensionless.
 *  @param input  a problem (schemas/problem.ts); anything else fails     @param library  chemistry
 *  @returns  the solution, or the first failure with code, path, bound and value. Valid 0 to 150 C.
 *  @source  docs/method.md, steps 1 to 6; interface in docs/solver.md */
export function solve(input: unknown, library: ChemicalData, options: SolveOptions = {}): Outcome<Solution> {
  const prepared = prepare(input, library);
  if (!prepared.ok) return prepared;
  const { problem, data, components, sulfateReduction } = prepared.value;

  const energies = energiesAt(data, kelvin(problem.temperatureC)); // 1 G of every species at T
  const basis = basisAt(energies); // 2 prices of H^+, e^-, water: planes on an exact grid
  const frame = rectangle(problem.frame.pH, problem.frame.Eh, [frameTag(0), frameTag(1), frameTag(2), frameTag(3)]);
  const cells = ligandCells(components, frame, basis); // 3 where every ligand's potential is linear
  const metals = prepared.value.metals.map((m) => fieldsOf(m, cells, basis, sulfateReduction)); // 4 fields
  const bounds = waterBounds(prepared.value, basis);
  const pieces = windowPieces(cells, metals, bounds); // 5 where all metals are as required
  const shapes = pieces.map((p) => p.piece);
  const ground: Ground = { data, cells, metals, pieces };
  const windows = connect(shapes).map((region) => windowOf(ground, region, prepared.value, basis)); // 6 limits, set point
  windows.sort((a, b) => b.setPoint.margin - a.setPoint.margin || b.area - a.area);

  const fields = drawnFields(metals);
  return ok({
    temperatureC: problem.temperatureC,
    fields,
    windows,
    setPoint: windows[0]?.setPoint ?? null,
    conflicts: windows.length === 0 ? conflictsOf(cells, metals, bounds) : [],
    leftOut: [...prepared.value.leftOut],
    warnings: warningsOf(prepared.value, metals, fields, energies),
    waterLines: waterLines(basis),
    metals: prepared.value.metals.map(({ element, requirement, activity, gPerL, gamma }) => ({
      metal: element,
      requirement,
      activity,
      ...(gPerL === undefined ? {} : { gPerL, gamma: gamma ?? 1 }),
    })),
    ...(options.shutGround ? { shut: metals.map((m) => ({ metal: m.metal.element, polygons: shutGroundOf(m) })) } : {}),
    frame: problem.frame,
  });
}

/** Which water lines bind: as asked, else both, but only oxygen's where a metal is to be won as metal (hydrogen is then a
 *  hazard and a loss, not a limit). */
function waterBounds({ problem }: Prepared, basis: Basis): Bound[] {
  const winsMetal = problem.metals.some((m) => m.requirement === "metal");
  const water = problem.water ?? { bound: winsMetal ? ("upper" as const) : ("both" as const) };
  const bounds: Bound[] = [];
  if (water.bound === "both" || water.bound === "upper")
    bounds.push({ line: oxygenLine(basis, water.oxygenV), tag: OXYGEN_TAG });
  if (water.bound === "both" || water.bound === "lower")
    bounds.push({ line: hydrogenLine(basis, water.hydrogenV), tag: HYDROGEN_TAG });
  return bounds;
}

function waterLines(basis: Basis): WaterLine[] {
  return (["oxygen", "hydrogen"] as const).map((which) => {
    const [k, x, y] = which === "oxygen" ? oxygenLine(basis) : hydrogenLine(basis);
    return { which, intercept: -k / y + 0, slope: -x / y };
  });
}

const drawnFields = (metals: readonly MetalFields[]): Field[] =>
  metals.flatMap((m) =>
    m.cells.flatMap((c) =>
      c.pieces.map(({ plane, piece }) => ({
        metal: m.metal.element,
        species: m.formations[plane]!.species.id,
        state: m.states[plane]!,
        polygon: cornersOf(piece),
      })),
    ),
  );

function windowOf(ground: Ground, region: Region, { problem, data }: Prepared, basis: Basis): Window {
  const band = problem.controlBand;
  const loops = loopsOf(ground, region);
  const all = [loops.outer, ...loops.holes];
  const border = all.flatMap((loop) => loop.map((l) => ({ ...segmentOf(l, band), frame: l.meaning.kind === "frame" })));
  const setPoint = setPointOf(border, band, (at: Point) =>
    coupleAt(data, ground.cells as LigandCell[], ground.metals, basis, at),
  );
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
