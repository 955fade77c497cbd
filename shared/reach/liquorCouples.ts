import { analyse, type Analysis } from "../analysis";
import type { MetalFields } from "../fields/fields";
import { valueAt } from "../geometry/line";
import { ok, type Outcome } from "../outcome";
import { asLine, STEPS_PER_JOULE } from "../planes/grid";
import type { Problem } from "../schemas/problem";
import { crosscut } from "../setpoint/crosscut";
import { solve } from "../solve";
import type { ChemicalData } from "../species/chemicalData";

/** What a couple of the liquor itself can hold, by the ratio of its forms. */
export interface LiquorCouple {
  readonly metal: string;
  /** dissolved species that rule either side at the middle */
  readonly reduced: string;
  readonly oxidised: string;
  /** V vs SHE at T where both forms are equal */
  readonly middle: number;
  /** from oxidised : reduced = 1 : 100 to 100 : 1 */
  readonly range: readonly [number, number];
  /** the part of it where the metal stays dissolved; null where a solid rules all of it */
  readonly held: readonly [number, number] | null;
  /** solids of the metal that rule inside the range */
  readonly shutBy: readonly { readonly species: string; readonly from: number; readonly to: number }[];
  /** of the scarcer form at either end, mg/L: below about 10 it sets no potential */
  readonly scarcerMgPerL: number;
}

/** Oxidised to reduced form at the ends of the range. */
const RATIO = 100;
const SPAN: [number, number] = [-2, 2.5];

/** Height of each oxidation state at a point: that of its lowest dissolved species, J per mole of metal. */
function states(analysis: Analysis, metal: MetalFields, pH: number, Eh: number): Map<number, { id: string; height: number }> {
  const found = new Map<number, { id: string; height: number }>();
  const c = analysis.cells.findIndex((cell) => cell.piece.lines.every((l) => valueAt(l, pH, Eh) >= 0));
  const planes = metal.cells[c]?.planes ?? [];
  planes.forEach((plane, i) => {
    if (metal.states[i] !== "dissolved") return;
    // Twelfths: polynuclear and mixed ligands give no finer oxidation number.
    const state = Math.round((-12 * plane.y) / plane.atoms / analysis.basis.electron) / 12;
    const height = valueAt(asLine(plane), pH, Eh) / plane.atoms / STEPS_PER_JOULE;
    const id = metal.formations[i]?.species.id ?? "";
    const before = found.get(state);
    if (before === undefined || height < before.height) found.set(state, { id, height });
  });
  return found;
} // prettier-ignore

/** Where a rising function crosses zero, to 1e-9 V; null outside the span. */
function rootOf(f: (Eh: number) => number): number | null {
  let [lo, hi] = SPAN;
  if (f(lo) > 0 || f(hi) < 0) return null;
  while (hi - lo > 1e-9) {
    const mid = (lo + hi) / 2;
    if (f(mid) < 0) lo = mid;
    else hi = mid;
  }
  return (lo + hi) / 2;
}

function couplesOf(analysis: Analysis, metal: MetalFields, pH: number): Omit<LiquorCouple, "held" | "shutBy">[] {
  const RT = analysis.basis.thermal;
  /** ln of oxidised over reduced at Eh, both as if they held the metal alone */
  const lnRatio = (low: number, high: number, Eh: number): number => {
    const here = states(analysis, metal, pH, Eh);
    return ((here.get(low)?.height ?? Infinity) - (here.get(high)?.height ?? Infinity)) / RT;
  };
  const known = [...states(analysis, metal, pH, 0).keys()].sort((a, b) => a - b);
  const couples: Omit<LiquorCouple, "held" | "shutBy">[] = [];
  // The states that rule among the dissolved as Eh rises: from each to the one that overtakes it first; what disproportionates is passed over.
  let low = known[0];
  while (low !== undefined) {
    const from = low;
    const next = known
      .filter((s) => s > from)
      .map((high) => ({ high, middle: rootOf((Eh) => lnRatio(from, high, Eh)) }))
      .filter((c): c is { high: number; middle: number } => c.middle !== null)
      .sort((a, b) => a.middle - b.middle)[0];
    if (next === undefined) break;
    const { high, middle } = next;
    const bottom = rootOf((Eh) => lnRatio(from, high, Eh) + Math.log(RATIO));
    const top = rootOf((Eh) => lnRatio(from, high, Eh) - Math.log(RATIO));
    const here = states(analysis, metal, pH, middle);
    if (bottom !== null && top !== null)
      couples.push({
        metal: metal.metal.element,
        reduced: here.get(from)?.id ?? "",
        oxidised: here.get(high)?.id ?? "",
        middle,
        range: [bottom, top],
        scarcerMgPerL:
          (1000 * metal.metal.activity * (analysis.prepared.data.molarMass.get(metal.metal.element) ?? 0)) /
          (1 + RATIO),
      });
    low = high;
  }
  return couples;
}

/** What the liquor's own couples can hold at one pH: for every metal of the plan with two or more dissolved oxidation states, the potentials
 *  from a ratio of 1:100 to one of 100:1 at its total activity, and where a solid of the metal ends that. A species disproportionates out of
 *  sight where it never rules among the dissolved, as U(V) in acid.
 *  @param problem  a plan's question     @param data  the library     @param pH  of the set point
 *  @returns  couples by metal, low Eh first; failures as `solve`
 *  @source  Nernst equation on the solver's own planes; roots by bisection to 1e-9 V. Polynuclear forms count as if alone at the total */
export function liquorCouples(problem: Problem, data: ChemicalData, pH: number): Outcome<LiquorCouple[]> {
  const onLine: Problem = { ...problem, frame: { pH: [pH - 0.01, pH + 0.01], Eh: SPAN } };
  const analysis = analyse(onLine, data);
  if (!analysis.ok) return analysis;
  const solution = solve(onLine, data);
  if (!solution.ok) return solution;
  const couples = analysis.value.metals.flatMap((m) => couplesOf(analysis.value, m, pH));
  return ok(
    couples.map((couple) => {
      const [lo, hi] = couple.range;
      const parts = crosscut(solution.value, couple.metal, "Eh", [pH, 0])
        .map((p) => ({ ...p, from: Math.max(p.from, lo), to: Math.min(p.to, hi) }))
        .filter((p) => p.to > p.from);
      const shutBy = parts.filter((p) => p.state !== "dissolved").map(({ species, from, to }) => ({ species, from, to }));
      const wet = parts.filter((p) => p.state === "dissolved");
      const first = wet[0];
      const last = wet.at(-1);
      return { ...couple, shutBy, held: first && last ? [first.from, last.to] : null };
    }),
  );
} // prettier-ignore
