import { askedOf } from "../../shared/hazards/excluded";
import type { HazardGas } from "../../shared/hazards/gases";
import type { Problem } from "../../shared/schemas/problem";
import type { Limit } from "../../shared/solution";
import type { Oracle } from "./oracle";

/** The slow plain twin of excluded hazards: the chemical potential of what the gas is made of, by a reaction balanced by hand. */
const carriers: Readonly<Record<HazardGas, readonly string[]>> = {
  HCN: ["CN"],
  H2S: ["S(sulfide)", "S"],
  AsH3: ["As"],
  SbH3: ["Sb"],
  Cl2: ["Cl"],
  NH3: ["NH3"],
  H2: [],
};

const R = 8.31446261815324;

/** ln of the equilibrium pressure in bar, or null where the problem holds nothing that gives it off. Every species of the carrier is tried:
 *  the pressure is what the cheapest of them gives. */
export function lnPressure(oracle: Oracle, gas: HazardGas, pH: number, Eh: number): number | null {
  const { problem } = oracle;
  const RT = R * (problem.temperatureC + 273.15);
  const ofGas = oracle.potential(`${gas}(g)`, "", pH, Eh); // at 1 bar
  if (gas === "H2") return (2 * oracle.potential("H^+(aq)", "", pH, Eh) + 2 * oracle.potential("e^-", "", pH, Eh) - ofGas) / RT;
  const carrier = carriers[gas].find((c) => holds(problem, c));
  if (carrier === undefined) return null;
  const metal = problem.metals.find((m) => m.element === carrier);
  const held = metal ? oracle.cheapest(carrier, pH, Eh).species : oracle.holders(pH, Eh).get(carrier)!;
  const element = carrier.startsWith("S(") ? "S" : carrier;
  const [own, wanted] = [contentOf(held.composition, held.charge, element), gasContent(gas)];
  const n = wanted.atoms / own.atoms;
  const others = Object.entries(held.composition).filter(([c]) => c !== element && c !== "H" && c !== "O");
  let [H, O, z] = [wanted.H - n * own.H, -n * own.O, -n * own.z];
  let sum = n * oracle.potential(held.id, metal ? carrier : "", pH, Eh);
  for (const [component, l] of others) {
    const holder = oracle.holders(pH, Eh).get(component)!; // what the carrier's species lets go of
    const h = contentOf(holder.composition, holder.charge, component);
    const m = (n * l) / h.atoms;
    sum -= m * oracle.potential(holder.id, "", pH, Eh);
    [H, O, z] = [H + m * h.H, O + m * h.O, z + m * h.z];
  }
  // the rest in water, protons and electrons: O as water, H as protons, charge by electrons
  const protons = H - 2 * O;
  sum += O * oracle.potential("H2O(l)", "", pH, Eh) + protons * oracle.potential("H^+(aq)", "", pH, Eh);
  sum += (protons - z) * oracle.potential("e^-", "", pH, Eh);
  return (sum - ofGas) / RT;
} // prettier-ignore

function holds(problem: Problem, carrier: string): boolean {
  const totals = [...problem.ligands, ...(problem.others ?? [])].map((c) => c.component);
  if (carrier === "S")
    return (problem.sulfateReduction ?? problem.temperatureC >= 150) && totals.includes("S");
  return totals.includes(carrier) || problem.metals.some((m) => m.element === carrier);
} // prettier-ignore

const contentOf = (composition: Readonly<Record<string, number>>, z: number, main: string) => ({
  atoms: composition[main]!,
  H: composition["H"] ?? 0,
  O: composition["O"] ?? 0,
  z,
});

/** Atoms of the carrier and hydrogen in the gas; groups count whole. */
const gasContent = (gas: HazardGas): { atoms: number; H: number } =>
  ({
    HCN: { atoms: 1, H: 1 },
    H2S: { atoms: 1, H: 2 },
    AsH3: { atoms: 1, H: 3 },
    SbH3: { atoms: 1, H: 3 },
    Cl2: { atoms: 2, H: 0 },
    NH3: { atoms: 1, H: 0 },
    H2: { atoms: 0, H: 2 },
  })[gas];

/** Whether a point is clear of every hazard the problem keeps out; null where one is too near to call. */
export function isClear(oracle: Oracle, pH: number, Eh: number): boolean | null {
  let clear = true;
  for (const hazard of oracle.problem.excludedHazards ?? []) {
    const ln = lnPressure(oracle, hazard.gas, pH, Eh);
    if (ln === null) continue;
    const { bar, pHAtLeast } = askedOf(hazard);
    const excess = bar === undefined ? pHAtLeast - pH : ln - Math.log(bar);
    if (Math.abs(excess) < 1e-4) return null;
    if (excess > 0) clear = false;
  }
  return clear;
}

/** On a hazard's limit the pressure is the threshold (or the pH the rule), and the reaction named costs what freeing the gas at that
 *  pressure costs: nothing. */
export function hazardLimitComplaints(oracle: Oracle, l: Limit): string[] {
  const [pH, Eh] = [(l.from[0] + l.to[0]) / 2, (l.from[1] + l.to[1]) / 2];
  if (l.gas === undefined) return ["a hazard's limit names no gas"];
  if (l.pHAtLeast !== undefined) return Math.abs(pH - l.pHAtLeast) < 1e-9 ? [] : [`${l.gas}'s rule stands at pH ${pH}`];
  const out: string[] = [];
  const [ln, wanted] = [lnPressure(oracle, l.gas, pH, Eh), Math.log(l.bar!)];
  if (ln === null || !(Math.abs(ln - wanted) < 1e-4)) out.push(`ln p of ${l.gas} is ${ln} on its limit, not ${wanted}`);
  if (!l.reactionTerms) return [...out, `no reaction frees ${l.gas}`];
  const RT = R * (oracle.problem.temperatureC + 273.15);
  const metal = l.gas.slice(0, 2);
  const price = l.reactionTerms.reduce((sum, { species, coefficient }) => {
    const own = species === l.outside ? RT * wanted : 0;
    return sum + coefficient * (oracle.potential(species, metal, pH, Eh) + own);
  }, 0);
  const size = l.reactionTerms.reduce((sum, t) => sum + Math.abs(t.coefficient), 0);
  return Math.abs(price) < 0.05 * size ? out : [...out, `${l.reaction} costs ${price} J on its own limit`];
}
