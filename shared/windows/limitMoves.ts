import type { Analysis } from "../analysis";
import type { LigandCell } from "../fields/ligandCells";
import { cornersOf } from "../geometry/convex";
import { energiesAt } from "../gibbs/energies";
import { formationOf, perAtom } from "../planes/formation";
import { basisAt, hydrogenLine, oxygenLine, type Basis } from "../planes/grid";
import { ligandNumbers } from "../selection/components";
import type { Limit, Point, SetPoint } from "../solution";
import { kelvin } from "../units";

/** What is changed: the activity of the limit's own metal, the total of a ligand, or the temperature. */
export type MoveBy =
  { kind: "metal" | "ligand"; component: string; factor: number } | { kind: "temperature"; kelvin: number };

/** How far a limit moves when one thing changes and all else stays. */
export interface LimitMove {
  readonly by: MoveBy;
  /** along pH at the Eh of the place; null where the limit lies level */
  readonly pH: number | null;
  /** V, along Eh at the pH of the place; null where it stands upright */
  readonly Eh: number | null;
}

/** k + x pH + y Eh, zero on the limit; any scale. */
type Line = readonly [k: number, x: number, y: number];
/** times which a total is taken, by component or metal */
type Factors = Readonly<Record<string, number>>;

const STEP_KELVIN = 10;
/** V: a line further than this from its limit is not the limit's */
const SAME = 1e-4;

/** The cell a point lies in, or lies least outside of. */
function cellAt(cells: readonly LigandCell[], [x, y]: Point): LigandCell | undefined {
  let best: LigandCell | undefined;
  let deepest = -Infinity;
  for (const cell of cells) {
    const corners = cornersOf(cell.piece);
    const depth = Math.min(
      ...corners.map(([ax, ay], i) => {
        const [bx, by] = corners[(i + 1) % corners.length]!;
        return ((bx - ax) * (y - ay) - (by - ay) * (x - ax)) / Math.hypot(bx - ax, by - ay);
      }),
    );
    if (depth > deepest) [best, deepest] = [cell, depth];
  }
  return best;
}

/** Where two species of a metal cost the same per mole of it, all planes made anew from the activities and the temperature given. */
function metalLine(
  { prepared }: Analysis,
  cell: LigandCell,
  limit: Limit,
  basis: Basis,
  factors: Factors,
): Line | null {
  const own = prepared.metals.find((m) => m.element === limit.metal);
  if (!own) return null;
  const cost = (id: string | undefined): Line | null => {
    const species = own.species.find((s) => s.id === id);
    if (!species) return null;
    const numbers = ligandNumbers(species, own.element, prepared.sulfateReduction);
    const { plane, ligands } = formationOf(
      species,
      own.element,
      own.activity * (factors[own.element] ?? 1),
      numbers,
      basis,
    );
    let { k, x, y } = plane;
    for (const [component, count] of ligands) {
      const holder = cell.holders.get(component)?.species;
      const total = prepared.components.find((c) => c.component === component)?.activity;
      if (!holder || total === undefined) return null;
      const main = component.startsWith("S(") ? "S" : component;
      const held = perAtom(formationOf(holder, main, total * (factors[component] ?? 1), [], basis));
      k -= count * held.k;
      x -= count * held.x;
      y -= count * held.y;
    }
    return [k / plane.atoms, x / plane.atoms, y / plane.atoms];
  };
  const [a, b] = [cost(limit.inside), cost(limit.outside)];
  return a && b && [b[0] - a[0], b[1] - a[1], b[2] - a[2]];
}

/** What would move a limit of a window, one thing at a time: its own metal ten times less, each ligand of its reaction ten times less,
 *  ten kelvin more. Planes are made anew and the line of the same two species is read again at the place where the limit is met from
 *  the set point (else at its middle), with the ligands held by what holds them there now.
 *  @param analysis  of the problem     @param limit  of a window of its solution     @param setPoint  pH, Eh (V vs SHE)
 *  @returns  moves in pH and V, exact for the line; none for the frame, hazards, and a limit that lies on the border of two ligand cells
 *  @source  docs/method.md, sections 2 to 5, solved again; nothing is differentiated */
export function limitMoves(analysis: Analysis, limit: Limit, setPoint: Pick<SetPoint, "pH" | "Eh">): LimitMove[] {
  const { prepared, basis, cells } = analysis;
  const { temperatureC, water } = prepared.problem;
  const middle: Point = [(limit.from[0] + limit.to[0]) / 2, (limit.from[1] + limit.to[1]) / 2];
  const [, gx, gy] = limit.line;
  const inward = 1e-7 / Math.hypot(gx, gy);
  const cell = cellAt(cells, [middle[0] + gx * inward, middle[1] + gy * inward]);
  const lineAt = (at: Basis, factors: Factors): Line | null => {
    if (limit.kind === "metal") return cell ? metalLine(analysis, cell, limit, at, factors) : null;
    if (limit.kind !== "water") return null;
    return limit.side === "oxygen" ? oxygenLine(at, water?.oxygenV) : hydrogenLine(at, water?.hydrogenV);
  };
  const now = lineAt(basis, {});
  if (!now || Math.abs(now[0] + now[1] * middle[0] + now[2] * middle[1]) > SAME * basis.electron) return [];

  const level: Point = limit.distancePH === null ? middle : [setPoint.pH + limit.distancePH, setPoint.Eh];
  const upright: Point = limit.distanceEh === null ? middle : [setPoint.pH, setPoint.Eh + limit.distanceEh];
  const move = (by: MoveBy, then: Line | null): LimitMove[] => {
    if (!then) return [];
    const flat = (n: number, [, x, y]: Line) => Math.abs(n) < 1e-9 * (Math.abs(x) + Math.abs(y));
    const pHOf = ([k, x, y]: Line) => -(k + y * level[1]) / x;
    const EhOf = ([k, x, y]: Line) => -(k + x * upright[0]) / y;
    const pH = flat(now[1], now) ? null : pHOf(then) - pHOf(now);
    const Eh = flat(now[2], now) ? null : EhOf(then) - EhOf(now);
    return [{ by, pH, Eh }];
  };

  const less = (kind: "metal" | "ligand", component: string) =>
    move({ kind, component, factor: 0.1 }, lineAt(basis, { [component]: 0.1 }));
  const rise = temperatureC + STEP_KELVIN <= 250 ? STEP_KELVIN : -STEP_KELVIN;
  const warmer = basisAt(energiesAt(prepared.data, kelvin(temperatureC + rise)));
  return [
    ...(limit.kind === "metal" && limit.metal !== undefined ? less("metal", limit.metal) : []),
    ...(limit.kind === "metal"
      ? [...(cell?.holders.keys() ?? [])].flatMap((component) => less("ligand", component))
      : []),
    ...move({ kind: "temperature", kelvin: rise }, lineAt(warmer, {})),
  ];
}
