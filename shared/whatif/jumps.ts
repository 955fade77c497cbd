import { areaOf } from "../geometry/convex";
import type { Problem } from "../schemas/problem";
import type { Solution } from "../solution";

/** What is other beyond a setting at which ground or margin jump. */
export interface Changes {
  /** species that count from here on, or no longer, with the reason they do not count on the other side */
  readonly comes: readonly Counted[];
  readonly goes: readonly Counted[];
  /** species that counted before and take ground only from here on, or lose all of theirs, at one stroke: a salt that comes out */
  readonly takes: readonly string[];
  readonly loses: readonly string[];
  /** a dissolved couple begins to set Eh, so that the margin counts both ways, or ceases to, so that it counts pH alone */
  readonly couple: "begins" | "ceases" | null;
}
export interface Counted {
  readonly species: string;
  /** metal it is a solid or an ion of */
  readonly metal: string;
  readonly reason: string;
}

/** In control bands: a smaller step of the margin is no jump. */
const MARGIN_STEP = 0.1;
/** Share of the larger ground. */
const GROUND_STEP = 0.02;

const groundOf = (s: Solution): number => s.windows.reduce((sum, w) => sum + w.area, 0);

/** Margin and open ground on both sides of a setting. */
export interface Stands {
  readonly margin: readonly [number, number];
  readonly area: readonly [number, number];
}

/** @param low, high  solutions at two settings     @returns  margins in control bands, open ground in pH x V */
export const stands = (low: Solution, high: Solution): Stands => ({
  margin: [low.setPoint?.margin ?? 0, high.setPoint?.margin ?? 0],
  area: [groundOf(low), groundOf(high)],
});

/** Whether margin or open ground are further apart than smooth lines would have them over the tolerance of a turn.
 *  @param stands  at two settings     @param band  control bands
 *  @source  thresholds are a choice: a tenth of a control band; 2 % of the ground, and no less than the box of the bands */
export function steps({ margin: [m, n], area: [a, b] }: Stands, band: Problem["controlBand"]): boolean {
  return Math.abs(n - m) > MARGIN_STEP || Math.abs(b - a) > Math.max(GROUND_STEP * Math.max(a, b), boxOf(band));
}

/** Ground a loop strays over, pH x V. */
const boxOf = ({ pH, Eh }: Problem["controlBand"]): number => 4 * pH * Eh;

/** What changed between two solutions a tolerance apart: species that rule somewhere on the side where they count, of metals that ask for
 *  something, and whether a couple sets Eh.
 *  @param low, high  solutions, low setting first     @returns  changes; all empty where only lines moved
 *  @source  candidates as the solver left them out (selection/leftOut.ts), couples as docs/method.md, section 6 */
export function changesBetween(low: Solution, high: Solution, band: Problem["controlBand"]): Changes {
  const sets = (s: Solution): boolean | null => s.setPoint && !s.setPoint.mixedPotential;
  const [before, after] = [sets(low), sets(high)];
  const couple = before === null || after === null || before === after ? null : after ? "begins" : "ceases";
  const [comes, goes] = [counted(low, high), counted(high, low)];
  return { comes, goes, takes: ruling(low, high, comes, band), loses: ruling(high, low, goes, band), couple };
}

/** Species that rule more than the box of the bands in one solution and nothing in the other, though they count in both. */
function ruling(
  without: Solution,
  withIt: Solution,
  counts: readonly Counted[],
  band: Problem["controlBand"],
): string[] {
  const asks = asking(withIt);
  const there = new Set([...without.fields.map((f) => f.species), ...counts.map((c) => c.species)]);
  const grounds = new Map<string, number>();
  for (const { metal, species, polygon } of withIt.fields)
    if (asks.has(metal) && !there.has(species))
      grounds.set(
        species,
        (grounds.get(species) ?? 0) + areaOf({ x: polygon.map((p) => p[0]), y: polygon.map((p) => p[1]) }),
      );
  return [...grounds].filter(([, area]) => area > boxOf(band)).map(([species]) => species);
}

const asking = (s: Solution) => new Set(s.metals.filter((m) => m.requirement !== "free").map((m) => m.metal));

/** Species left out of one solution that rule a field in the other. */
function counted(without: Solution, withIt: Solution): Counted[] {
  const asks = asking(withIt);
  const out = new Map(without.leftOut.map((l) => [l.species, l.reason]));
  const here = new Set(withIt.leftOut.map((l) => l.species));
  const found = withIt.fields.filter((f) => asks.has(f.metal) && out.has(f.species) && !here.has(f.species));
  return [...new Map(found.map((f) => [f.species, f.metal]))].map(([species, metal]) => ({
    species,
    metal,
    reason: out.get(species) ?? "",
  }));
}
