import { energiesAt } from "../../shared/gibbs/energies";
import type { Requirement, Problem } from "../../shared/schemas/problem";
import type { ChemicalData, Species } from "../../shared/species/chemicalData";
import { withSpecies } from "../../shared/species/library";
import { valueOf } from "../../shared/outcome";
import { kelvin } from "../../shared/units";
import { isCoupled, poolOf, speciesOfComponent, speciesOfMetal, totalsOf } from "./oracleSpecies";

/** The slow plain twin of the solver: at one point it finds each ligand's holder by trying all of them, writes every
 *  species' formation from the metal, these holders, H2O, H^+ and e^-, and takes the cheapest. No planes, no cells. */

const R = 8.31446261815324;
const F = 96485.33212;

export interface Standing {
  readonly species: Species;
  readonly state: "dissolved" | "metal" | "compound";
  /** J per mole of the metal, less that of the metal at zero: what the lowest of decides */
  readonly energy: number;
  /** protons and electrons that this formation takes up or gives off, per mole of the metal */
  readonly moved: number;
}

export interface Oracle {
  readonly problem: Problem;
  /** the cheapest species of a metal, and what the next one costs more, J/mol */
  cheapest(metal: string, pH: number, Eh: number): Standing & { lead: number };
  /** every species of a metal, cheapest first */
  standings(metal: string, pH: number, Eh: number): Standing[];
  /** chemical potential of any term of a reaction at a point, J/mol: H^+, e^-, water, gases at 1 bar, holders and the metals' species
   *  at their activities */
  potential(id: string, metal: string, pH: number, Eh: number): number;
  /** the ligands' holders, by component */
  holders(pH: number, Eh: number): Map<string, Species>;
  /** V vs SHE at T */
  oxygen(pH: number): number;
  hydrogen(pH: number): number;
  requirementOf(metal: string): Requirement;
}

interface Counted {
  readonly species: Species;
  readonly G: number;
  readonly H: number;
  readonly O: number;
  readonly z: number;
  readonly atoms: number;
  readonly ligands: readonly (readonly [component: string, n: number])[];
}

const stateOf = (s: Species): Standing["state"] =>
  s.phase === "aq" ? "dissolved" : Object.keys(s.composition).length === 1 ? "metal" : "compound";

export const isAsRequired = (requirement: Requirement, state: Standing["state"]): boolean =>
  requirement === "free" || requirement === state || (requirement === "solid" && state !== "dissolved");

export function oracleFor(problem: Problem, library: ChemicalData): Oracle {
  const data = problem.species?.length ? valueOf(withSpecies(library, problem.species)) : library;
  const energies = energiesAt(data, kelvin(problem.temperatureC));
  const RT = R * (problem.temperatureC + 273.15);
  const water = energies.of("H2O(l)").G;
  const halfHydrogen = energies.of("H2(g)").G / 2;
  const proton = (pH: number): number => -RT * Math.LN10 * pH;
  const electron = (Eh: number): number => halfHydrogen - F * Eh;

  const counted = (species: Species, main: string, activity: number): Counted => {
    const atoms = species.composition[main]!;
    const others = Object.entries(species.composition).filter(([c]) => c !== main && c !== "H" && c !== "O");
    return {
      species,
      G: energies.of(species.id).G + (species.phase === "aq" ? RT * Math.log(activity / atoms) : 0),
      H: species.composition["H"] ?? 0,
      O: species.composition["O"] ?? 0,
      z: species.charge,
      atoms,
      ligands: others.map(([c, n]) => [poolOf(species, c, isCoupled(problem)), n] as const),
    };
  };
  const totals = totalsOf(problem);
  const pools = new Map(
    [...totals].map(([component, activity]) => [
      component,
      speciesOfComponent(component, problem, data).map((s) =>
        counted(s, component === "S(sulfide)" ? "S" : component, activity),
      ),
    ]),
  );
  const activityOf = new Map(
    problem.metals.map((m) => [m.element, m.activity ?? (m.gPerL! / data.molarMass.get(m.element)!) * (m.gamma ?? 1)]),
  );
  const ofMetal = new Map(
    problem.metals.map((m) => [
      m.element,
      speciesOfMetal(m.element, problem, data).map((s) => counted(s, m.element, activityOf.get(m.element)!)),
    ]),
  );

  /** What one atom of a ligand costs in a species, all O as water, all H as protons, all charge as electrons. */
  const perAtom = (c: Counted, pH: number, Eh: number): number => {
    const protons = c.H - 2 * c.O;
    return (c.G - c.O * water - protons * proton(pH) - (protons - c.z) * electron(Eh)) / c.atoms;
  };
  const holdersAt = (pH: number, Eh: number): Map<string, Counted> =>
    new Map(
      [...pools].map(([component, list]) => {
        let best = list[0]!;
        let least = Infinity;
        for (const c of list) {
          const cost = perAtom(c, pH, Eh);
          if (cost < least) [best, least] = [c, cost];
        }
        return [component, best];
      }),
    );

  /** nu M + sum of (l / n) holders + w H2O + h H^+ + e e^- = species, balanced in O, then H, then charge. */
  const formation = (
    c: Counted,
    holders: Map<string, Counted>,
    pH: number,
    Eh: number,
  ): Pick<Standing, "energy" | "moved"> => {
    let [O, H, z, G] = [c.O, c.H, c.z, c.G];
    for (const [component, l] of c.ligands) {
      const holder = holders.get(component)!;
      const n = l / holder.atoms;
      O -= n * holder.O;
      H -= n * holder.H;
      z -= n * holder.z;
      G -= n * holder.G;
    }
    const h = H - 2 * O;
    const energy = (G - O * water - h * proton(pH) - (h - z) * electron(Eh)) / c.atoms;
    return { energy, moved: (Math.abs(h) + Math.abs(h - z)) / c.atoms };
  };

  return {
    problem,
    cheapest(metal, pH, Eh) {
      const holders = holdersAt(pH, Eh);
      let best: Counted | null = null;
      let found = { energy: Infinity, moved: 0 };
      let next = Infinity;
      for (const c of ofMetal.get(metal)!) {
        const f = formation(c, holders, pH, Eh);
        if (f.energy < found.energy) {
          next = found.energy;
          [best, found] = [c, f];
        } else next = Math.min(next, f.energy);
      }
      return { species: best!.species, state: stateOf(best!.species), ...found, lead: next - found.energy };
    },
    standings(metal, pH, Eh) {
      const holders = holdersAt(pH, Eh);
      return ofMetal
        .get(metal)!
        .map((c) => ({ species: c.species, state: stateOf(c.species), ...formation(c, holders, pH, Eh) }))
        .sort((a, b) => a.energy - b.energy);
    },
    potential(id, metal, pH, Eh) {
      if (id === "e^-") return electron(Eh);
      if (id === "H^+(aq)") return proton(pH);
      const own = ofMetal.get(metal)?.find((c) => c.species.id === id);
      if (own) return own.G;
      for (const list of pools.values()) for (const c of list) if (c.species.id === id) return c.G;
      return energies.of(id).G;
    },
    holders: (pH, Eh) => new Map([...holdersAt(pH, Eh)].map(([c, h]) => [c, h.species])),
    // O2 + 4 H^+ + 4 e^- = 2 H2O and 2 H^+ + 2 e^- = H2 at 1 bar
    oxygen: (pH) => (energies.of("O2(g)").G + 4 * (halfHydrogen + proton(pH)) - 2 * water) / (4 * F),
    hydrogen: (pH) => proton(pH) / F,
    requirementOf: (metal) => problem.metals.find((m) => m.element === metal)!.requirement,
  };
}
