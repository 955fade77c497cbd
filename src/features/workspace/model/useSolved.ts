import { useMemo, useState } from "react";
import { type Analysis, analyse } from "../../../../shared/analysis";
import type { Failure, Outcome } from "../../../../shared/outcome";
import { toProblem } from "../../../../shared/plan/toProblem";
import type { PlanInputs } from "../../../../shared/schemas/plan";
import type { Problem } from "../../../../shared/schemas/problem";
import type { Solution } from "../../../../shared/solution";
import { solutionOf, solve } from "../../../../shared/solve";
import type { ChemicalData } from "../../../../shared/species/chemicalData";

export interface Solved {
  problem: Problem;
  /** of these inputs, or the last that could be solved while these cannot; null before any could */
  solution: Solution | null;
  /** the exact pieces behind it, for what is read at a point; null while these inputs cannot be solved */
  analysis: Analysis | null;
  failure: Failure | null;
}

/** Keeps the last answer that was one, so that a slip of the hand does not empty the screen. */
class LastGood {
  private solution: Solution | null = null;
  take(analysed: Outcome<Analysis>): Solution | null {
    if (analysed.ok) this.solution = solutionOf(analysed.value, { shutGround: true });
    return this.solution;
  }
}

/** Solves the plan in hand, at once and here: some milliseconds, so there is nothing to wait for. */
export function useSolved(inputs: PlanInputs, data: ChemicalData): Solved {
  const [last] = useState(() => new LastGood());
  // Inputs that the solver does not see, such as a set point under the hand, leave the question the same object.
  const asked = useMemo(() => JSON.stringify(toProblem(inputs, data)), [inputs, data]);
  return useMemo(() => {
    const problem = JSON.parse(asked) as Problem;
    const analysed = analyse(problem, data);
    return {
      problem,
      solution: last.take(analysed),
      analysis: analysed.ok ? analysed.value : null,
      failure: analysed.ok ? null : analysed.error,
    };
  }, [asked, data, last]);
}

export type Basis = PlanInputs["solidsBasis"];
/** The basis whose edge is drawn thin beside the one in force. */
export const otherBasisOf = (basis: Basis): Basis => (basis === "aged" ? "fresh" : "aged");

/** The same question on the other solids basis; null where it has no answer. */
export function useOtherBasis(
  problem: Problem,
  data: ChemicalData,
  wanted: boolean,
): { basis: Basis; solution: Solution } | null {
  return useMemo(() => {
    if (!wanted) return null;
    const basis = otherBasisOf(problem.solidsBasis ?? "fresh");
    const outcome = solve({ ...problem, solidsBasis: basis }, data);
    return outcome.ok ? { basis, solution: outcome.value } : null;
  }, [problem, data, wanted]);
}
