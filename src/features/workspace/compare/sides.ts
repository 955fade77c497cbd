import { useQuery } from "@tanstack/react-query";
import { useMemo, useState } from "react";
import type { PlanInputs, PlanRow, RevisionRow } from "../../../../shared/schemas/plan";
import { api } from "../../../lib/api";
import { useChemistry } from "../../../lib/chemistry";
import type { PotentialScale } from "../../../lib/potential";
import { keys } from "../../../lib/queries";
import type { ThemeColours } from "../../../lib/theme";
import type { Layers } from "../../../map/view";
import { baseOf, decodeSettings } from "../address/settings";
import { readDraft } from "../model/draftShelf";
import { sameInputs } from "../model/history";
import { useMapModel } from "../model/useMapModel";
import { useHeld } from "../model/usePoint";
import { wholeSight } from "../model/useSight";
import { useSolved } from "../model/useSolved";
import type { ChemicalData } from "../../../../shared/species/chemicalData";

/** What an address names as one side: a revision "3", "draft", or settings "3~temperatureC:85". */
export interface Side {
  name: string;
  inputs: PlanInputs;
  data: ChemicalData;
}

export const MY_DRAFT = "my draft";

type Found = { state: "reading" } | { state: "wrong"; why: string } | { state: "there"; side: Side };

/** One side of the comparison, with the chemistry it is solved with: a revision's own, else what is in force. */
export function useSide(plan: PlanRow, text: string): Found {
  const number = text === "draft" ? null : (baseOf(text) ?? (/^\d{1,6}$/.test(text) ? Number(text) : null));
  const isRevision = /^\d+$/.test(text);
  const revision = useQuery({
    queryKey: keys.revision(plan.id, number ?? 0),
    queryFn: ({ signal }) =>
      api.get<RevisionRow>(`/plans/${encodeURIComponent(plan.id)}/revisions/${number}`, { signal }),
    enabled: number !== null && number !== plan.latest.number,
    staleTime: Infinity,
  });
  const base = number === plan.latest.number ? plan.latest : revision.data;
  const [draft] = useState(() => readDraft(plan.id));
  const chemistry = useChemistry(isRevision ? base?.dataVersion : undefined, !isRevision || base !== undefined);
  const inputs = useMemo(() => {
    if (text === "draft") return { inputs: draft?.inputs ?? plan.latest.inputs };
    if (number === null) return { wrong: `“${text}” names no revision, draft or settings` };
    if (!base) return null;
    return isRevision ? { inputs: base.inputs } : decodeSettings(base.inputs, text);
  }, [text, number, isRevision, base, draft, plan.latest]);
  // Settings in an address that are this browser's draft are called so.
  const drafted =
    text === "draft" ||
    (!isRevision && draft !== null && inputs !== null && "inputs" in inputs && sameInputs(inputs.inputs, draft.inputs));
  const name = drafted
    ? draft
      ? MY_DRAFT
      : `${MY_DRAFT}, as revision ${plan.latest.number}`
    : isRevision
      ? `revision ${number}`
      : `settings from revision ${number}`;
  return useMemo((): Found => {
    if (revision.error)
      return { state: "wrong", why: `Revision ${number} could not be read: ${revision.error.message}` };
    if (chemistry.error) return { state: "wrong", why: `The chemistry could not be read: ${chemistry.error.message}` };
    if (inputs && "wrong" in inputs) return { state: "wrong", why: inputs.wrong };
    if (!inputs || !chemistry.data) return { state: "reading" };
    return { state: "there", side: { name, inputs: inputs.inputs, data: chemistry.data } };
  }, [revision.error, chemistry.error, chemistry.data, inputs, number, name]);
}

const NOTHING: readonly never[] = [];
/** What both maps show: the ground and its limits, nothing that belongs to one reading alone. */
const shown: Layers = {
  boundaries: true,
  labels: true,
  water: true,
  setPoint: true,
  crosscuts: false,
  reach: false,
  equilibriumLines: false,
  otherBasis: false,
  hazard: false,
  practice: false,
  trials: false,
};

/** One side solved, and its map. */
export function useSolvedSide({ inputs, data }: Side, scale: PotentialScale, colours: ThemeColours, plain: boolean) {
  const { problem, solution: solved, analysis, failure } = useSolved(inputs, data);
  const { solution, held } = useHeld(inputs, solved, analysis);
  const chosen = held?.index ?? 0;
  const model = useMapModel({
    inputs,
    problem,
    solution,
    data,
    scale,
    colours,
    layers: shown,
    plain,
    sight: wholeSight,
    chosen,
    reagents: NOTHING,
    robust: NOTHING,
    gases: NOTHING,
    freeAcid: null,
  });
  return { failure, analysis, solution, window: solution?.windows[chosen] ?? null, model };
}
export type SolvedSide = ReturnType<typeof useSolvedSide>;
