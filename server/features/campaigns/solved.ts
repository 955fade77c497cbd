import type { Outcome } from "../../../shared/outcome";
import { toProblem } from "../../../shared/plan/toProblem";
import type { RevisionRow } from "../../../shared/schemas/plan";
import type { Solution } from "../../../shared/solution";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import type { Deps } from "../../deps";
import { revisionOf } from "../plans/rows";

export interface SolvedRevision {
  revision: RevisionRow;
  /** the library the revision froze */
  data: Outcome<ChemicalData>;
  solution: Outcome<Solution>;
}

const remembered = 32;

/** Revisions solved with the library each froze. Neither changes any more: an answer once worked out is kept. */
export function revisionSolver({ db, chemistry, solve }: Pick<Deps, "db" | "chemistry" | "solve">) {
  const known = new Map<string, SolvedRevision>();
  return (planId: string, number: number): SolvedRevision => {
    const key = `${planId} ${number}`;
    const before = known.get(key);
    if (before) return before;
    const revision = revisionOf(db, planId, number);
    const data = chemistry.libraryOf(revision.dataVersion);
    const solution = data.ok ? solve(toProblem(revision.inputs, data.value), data.value) : data;
    if (known.size >= remembered) known.delete(known.keys().next().value ?? "");
    const solved = { revision, data, solution };
    known.set(key, solved);
    return solved;
  };
}
export type RevisionSolver = ReturnType<typeof revisionSolver>;
