import { formationOf, perAtom } from "../planes/formation";
import { STEPS_PER_JOULE, type Basis } from "../planes/grid";
import { ligandNumbers } from "../selection/components";
import type { Prepared } from "../selection/prepare";
import type { SolutionWarning } from "../solution";
import type { Species } from "../species/chemicalData";
import type { Relevant } from "./relevant";

/** Energy per atom of the metal and what it takes in H^+, e^- and ligands: two solids alike in these never change places with pH or Eh. */
function standing(species: Species, metal: string, { sulfateReduction }: Prepared, basis: Basis) {
  const ligands = ligandNumbers(species, metal, sulfateReduction);
  const { k, x, y } = perAtom(formationOf(species, metal, 1, ligands, basis));
  const atoms = species.composition[metal] ?? 1;
  const held = ligands.map(([c, n]) => `${c} ${(n / atoms).toFixed(6)}`).sort();
  return { k, kind: [x, y, ...held].join() };
}

/** The words of a row's note about its standing: "metastable to magnetite". */
export const clauseOf = (note: string, word: RegExp): string | null =>
  note
    .split(/;|,(?! log)|\[/)
    .find((part) => word.test(part))
    ?.trim() ?? null;

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
    const here = standing(own, metal, prepared, basis);
    let best: { id: string; k: number; reason: string } | null = null;
    for (const { species: other, reason } of leftOut) {
      const row = data.species.get(other);
      if (row?.phase !== "s" || row.composition[metal] === undefined) continue;
      if (Object.keys(row.composition).some((c) => c !== "H" && c !== "O" && own.composition[c] === undefined))
        continue;
      const there = standing(row, metal, prepared, basis);
      if (there.kind === here.kind && there.k < (best?.k ?? here.k)) best = { id: other, k: there.k, reason };
    }
    if (best !== null)
      return [
        {
          code: "METASTABLE",
          species: id,
          metal,
          text: `${best.id} is ${kJ(here.k - best.k)} kJ a mole of ${metal} more stable and is left out (${best.reason}); with time a limit on ${id} moves`,
        },
      ];
    const clause = clauseOf(own.row.note, /metastable/i);
    return clause === null ? [] : [{ code: "METASTABLE", species: id, metal, text: `${clause} (note of the library)` }];
  });
}
