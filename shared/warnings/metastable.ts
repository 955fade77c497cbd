import { formationOf, perAtom } from "../planes/formation";
import { STEPS_PER_JOULE, type Basis } from "../planes/grid";
import { ligandNumbers, speciesHolding } from "../selection/components";
import type { Prepared } from "../selection/prepare";
import type { SolutionWarning } from "../solution";
import type { ChemicalData, Species } from "../species/chemicalData";
import type { Relevant } from "./relevant";

/** Energy per atom of the metal, in steps of the grid. */
function standing(species: Species, metal: string, { sulfateReduction }: Prepared, basis: Basis): number {
  const ligands = ligandNumbers(species, metal, sulfateReduction);
  return perAtom(formationOf(species, metal, 1, ligands, basis)).k;
}

type Kinds = Map<string, ReadonlySet<string>>;
const onePool = new WeakMap<ChemicalData, Kinds>();
const twoPools = new WeakMap<ChemicalData, Kinds>();

/** H^+, e^- and ligands that a solid takes per atom of the metal: two solids alike in these never change places with pH or Eh. */
function kindOf(species: Species, metal: string, sulfateReduction: boolean): string {
  const { composition, charge } = species;
  const atoms = composition[metal] ?? 1;
  const protons = (composition["H"] ?? 0) - 2 * (composition["O"] ?? 0);
  const held = ligandNumbers(species, metal, sulfateReduction);
  const parts = held.map(([c, n]) => `${c} ${(n / atoms).toFixed(6)}`).sort();
  return [(protons / atoms).toFixed(6), ((protons - charge) / atoms).toFixed(6), ...parts].join();
}

/** Solids of the library of one kind with a solid, itself left out; found once a library. */
function alikeTo(own: Species, metal: string, { data, sulfateReduction }: Prepared): ReadonlySet<string> {
  const pools = sulfateReduction ? onePool : twoPools;
  let known = pools.get(data);
  if (known === undefined) pools.set(data, (known = new Map<string, ReadonlySet<string>>()));
  const key = `${metal} ${own.id}`;
  let alike = known.get(key);
  if (alike === undefined) {
    const kind = kindOf(own, metal, sulfateReduction);
    const solids = speciesHolding(data, metal).filter((s) => s.phase === "s" && s.id !== own.id);
    alike = new Set(solids.filter((s) => kindOf(s, metal, sulfateReduction) === kind).map((s) => s.id));
    known.set(key, alike);
  }
  return alike;
}

/** The words of a row's note about its standing: "metastable to magnetite". */
const clauseIn = (note: string, word: RegExp): string | null =>
  note
    .split(/;|,(?! log)|\[/)
    .find((part) => word.test(part))
    ?.trim() ?? null;

/** `clauseIn` a species' note, read once. */
export function noteOn(word: RegExp): (species: Species) => string | null {
  const read = new WeakMap<Species, { readonly clause: string | null }>();
  return (species) => {
    let known = read.get(species);
    if (known === undefined) read.set(species, (known = { clause: clauseIn(species.row.note, word) }));
    return known.clause;
  };
}

const onMetastability = noteOn(/metastable/i);

const kJ = (steps: number): string => (steps / STEPS_PER_JOULE / 1000).toPrecision(2);

/** Solids of the answer that a more stable one of the same kind would replace, were it not left out: with time the limit moves. Where no such
 *  solid is in the library, what the row itself says.
 *  @param prepared, basis  of the problem     @param relevant  what the answer rests on
 *  @returns  METASTABLE, one a species     @source  energies at T; notes of the tables */
export function metastableWarnings(prepared: Prepared, basis: Basis, { species }: Relevant): SolutionWarning[] {
  const { data, leftOut } = prepared;
  return species.flatMap(({ metal, id }): SolutionWarning[] => {
    const own = data.species.get(id);
    if (own === undefined || own.phase !== "s") return [];
    const alike = alikeTo(own, metal, prepared);
    const here = standing(own, metal, prepared, basis);
    let best: { id: string; k: number; reason: string } | null = null;
    for (const { species: other, reason } of alike.size > 0 ? leftOut : []) {
      const row = alike.has(other) ? data.species.get(other) : undefined;
      if (row === undefined) continue;
      const k = standing(row, metal, prepared, basis);
      if (k < (best?.k ?? here)) best = { id: other, k, reason };
    }
    if (best !== null)
      return [
        {
          code: "METASTABLE",
          species: id,
          metal,
          text: `${best.id} is ${kJ(here - best.k)} kJ a mole of ${metal} more stable and is left out (${best.reason}); with time a limit on ${id} moves`,
        },
      ];
    const clause = onMetastability(own);
    return clause === null ? [] : [{ code: "METASTABLE", species: id, metal, text: `${clause} (note of the library)` }];
  });
}
