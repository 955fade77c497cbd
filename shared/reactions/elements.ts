import type { ChemicalData, Species } from "../species/chemicalData";

/** Charge and atoms of one unit of a species, ligand groups opened: HCN holds H, C and N. `e^-` holds one negative charge.
 *  @param data  the library, for what groups hold     @param species  of it, or "e^-"     @returns  counts by element symbol, "charge" last
 *  @source  composition of the tables; shared/data/components.csv
 *  @example elementsOf(chemistry(), chemistry().species.get("Cu(NH3)4^2+(aq)")).get("H") // => 12 */
export function elementsOf(data: ChemicalData, species: Species | "e^-"): Map<string, number> {
  if (species === "e^-") return new Map([["charge", -1]]);
  const counts = new Map<string, number>();
  for (const [component, n] of Object.entries(species.composition)) {
    const inside = data.components.get(component)?.elements ?? { [component]: 1 };
    for (const [element, m] of Object.entries(inside)) counts.set(element, (counts.get(element) ?? 0) + n * m);
  }
  return counts.set("charge", species.charge);
}

/** What a reaction makes from nothing or loses: right-hand side less left-hand side, zero within rounding left out.
 *  @param data  the library     @param terms  species (or "e^-") and coefficients, products positive
 *  @returns  by element, "charge" last; empty when balanced     @source  conservation of atoms and charge */
export function imbalance(
  data: ChemicalData,
  terms: Iterable<readonly [Species | "e^-", number]>,
): { what: string; by: number }[] {
  const sums = new Map<string, number>();
  const sizes = new Map<string, number>();
  for (const [species, n] of terms)
    for (const [what, m] of elementsOf(data, species)) {
      sums.set(what, (sums.get(what) ?? 0) + n * m);
      sizes.set(what, (sizes.get(what) ?? 0) + Math.abs(n * m));
    }
  const off = [...sums].filter(([what, sum]) => Math.abs(sum) > 1e-9 * (sizes.get(what) ?? 0));
  off.sort(([a], [b]) => Number(a === "charge") - Number(b === "charge"));
  return off.map(([what, by]) => ({ what, by: Number(by.toPrecision(12)) }));
}
