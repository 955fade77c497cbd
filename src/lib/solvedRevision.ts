import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import type { Failure } from "../../shared/outcome";
import { toProblem } from "../../shared/plan/toProblem";
import type { PlanInputs, RevisionRow } from "../../shared/schemas/plan";
import type { Solution } from "../../shared/solution";
import { solve } from "../../shared/solve";
import type { ChemicalData } from "../../shared/species/chemicalData";
import { api } from "./api";
import { useChemistry } from "./chemistry";
import { keys } from "./queries";

export interface SolvedRevision {
  inputs: PlanInputs;
  data: ChemicalData;
  /** null where it cannot be solved: nothing can be judged then */
  solution: Solution | null;
  failure: Failure | null;
}

/** A saved revision of a plan solved with the chemistry it froze: what a campaign's trials are judged against. */
export function useSolvedRevision(planId: string | undefined, number: number | undefined) {
  const revision = useQuery({
    queryKey: keys.revision(planId ?? "", number ?? 0),
    queryFn: ({ signal }) =>
      api.get<RevisionRow>(`/plans/${encodeURIComponent(planId ?? "")}/revisions/${number}`, { signal }),
    enabled: planId !== undefined && number !== undefined,
    staleTime: Infinity,
  });
  const chemistry = useChemistry(revision.data?.dataVersion, revision.data !== undefined);
  const inputs = revision.data?.inputs;
  const data = chemistry.data;
  const solved = useMemo((): SolvedRevision | undefined => {
    if (!inputs || !data) return undefined;
    const outcome = solve(toProblem(inputs, data), data);
    return outcome.ok
      ? { inputs, data, solution: outcome.value, failure: null }
      : { inputs, data, solution: null, failure: outcome.error };
  }, [inputs, data]);
  return { solved, error: revision.error ?? chemistry.error };
}
