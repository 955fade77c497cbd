import { fieldsOf } from "../fields/fields";
import { frameTag, ligandCells } from "../fields/ligandCells";
import { rectangle, type Convex } from "../geometry/convex";
import { valueAt } from "../geometry/line";
import { energiesAt } from "../gibbs/energies";
import { fail, ok, type Outcome } from "../outcome";
import { basisAt } from "../planes/grid";
import type { Problem } from "../schemas/problem";
import { componentKind, SULFIDE_SULFUR } from "../selection/components";
import { leavesOut } from "../selection/leftOut";
import { prepare } from "../selection/prepare";
import type { ChemicalData } from "../species/chemicalData";
import { kelvin } from "../units";

/** Activities taken for what a plan says nothing of, so that a product can be named; they stand beside the answer. */
export const ASSUMED = { metal: 0.01, ligand: 0.1 } as const;

/** What every component of a plan is at one point. */
export interface Standing {
  /** metal or component -> species id that rules there */
  readonly species: ReadonlyMap<string, string>;
  /** components the plan gives no activity for, with the one taken */
  readonly assumed: readonly { readonly component: string; readonly activity: number }[];
  readonly sulfateReduction: boolean;
}

/** Sulfide sulfur that a plan leaves out comes back as sulfur and dissolved sulfide, what does not form in a leach stays out. */
function sulfideBack(problem: Problem, data: ChemicalData): string[] {
  const usual = leavesOut({ ...problem, solidsBasis: "aged", leftOut: [] }, data);
  const plain = [...data.species.values()].filter(
    (s) => "S" in s.composition && Object.keys(s.composition).every((c) => ["S", "H", "O"].includes(c)),
  );
  const wanted = (id: string): boolean => /^(S\(|H2S|HS\^-)/.test(id) && usual(id) === null;
  const kept = (problem.leftOut ?? []).filter((id) => !wanted(id));
  return [...kept, ...plain.filter((s) => usual(s.id) !== null).map((s) => s.id)];
}

/** The question with activities for everything asked about. */
function extended(problem: Problem, data: ChemicalData, asked: readonly string[]) {
  const ligands = [...problem.ligands];
  const metals = [...problem.metals];
  const assumed: Standing["assumed"][number][] = [];
  let leftOut = problem.leftOut;
  const known = new Set([...ligands, ...(problem.others ?? [])].map((c) => c.component));
  for (const m of metals) known.add(m.element);
  for (const component of new Set(asked)) {
    if (known.has(component)) continue;
    const isLigand = componentKind(data, component) === "ligand";
    const activity = isLigand ? ASSUMED.ligand : ASSUMED.metal;
    if (isLigand) ligands.push({ component, activity });
    else metals.push({ element: component, requirement: "free", activity });
    assumed.push({ component, activity });
    if (component === SULFIDE_SULFUR) leftOut = sulfideBack(problem, data);
  }
  return { problem: { ...problem, ligands, metals, ...(leftOut === undefined ? {} : { leftOut }) }, assumed };
}

const holds = (piece: Convex, pH: number, Eh: number): boolean => piece.lines.every((l) => valueAt(l, pH, Eh) >= 0);

/** The species that rules for every metal and ligand at one point, and for components the plan says nothing of at an assumed activity:
 *  the solver's own cells and fields around the point.
 *  @param problem  a plan's question     @param data  the library     @param at  pH and Eh, V vs SHE at T
 *  @param asked  components wanted beside the plan's own     @returns  ids by component; failures as `prepare`
 *  @source  docs/method.md, sections 3 and 4 */
export function standingAt(
  problem: Problem,
  data: ChemicalData,
  at: { readonly pH: number; readonly Eh: number },
  asked: readonly string[] = [],
): Outcome<Standing> {
  const more = extended(problem, data, asked);
  const prepared = prepare(more.problem, data);
  if (!prepared.ok) return prepared;
  const { components, metals, sulfateReduction } = prepared.value;
  const basis = basisAt(energiesAt(prepared.value.data, kelvin(problem.temperatureC)));
  const { pH, Eh } = at;
  if (!Number.isFinite(pH) || !Number.isFinite(Eh)) return fail("INVALID_INPUT", "at", `pH ${pH}, Eh ${Eh}: no point`);
  const around = rectangle(
    [pH - 1e-6, pH + 1e-6],
    [Eh - 1e-7, Eh + 1e-7],
    [frameTag(0), frameTag(1), frameTag(2), frameTag(3)],
  );
  const cells = ligandCells(components, around, basis);
  const cell = cells.find((c) => holds(c.piece, pH, Eh)) ?? cells[0];
  if (cell === undefined) return fail("INVALID_INPUT", "at", `pH ${pH}, Eh ${Eh} lies nowhere`);
  const species = new Map([...cell.holders].map(([component, holder]) => [component, holder.species.id]));
  for (const metal of metals) {
    const fields = fieldsOf(metal, [cell], basis, sulfateReduction);
    const pieces = fields.cells[0]?.pieces ?? [];
    const ruling = pieces.find((p) => holds(p.piece, pH, Eh)) ?? pieces[0];
    const id = ruling && fields.formations[ruling.plane]?.species.id;
    if (id !== undefined) species.set(metal.element, id);
  }
  return ok({ species, assumed: more.assumed, sulfateReduction });
}
