import { useCallback, useEffect, useState } from "react";
import { useLocation, useNavigate } from "react-router-dom";
import type { PlanInputs, PlanRow, RevisionRow } from "../../../../shared/schemas/plan";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { takesSettings, type Opened } from "../address/useOpened";
import { dropDraft, keepDraft } from "./draftShelf";
import { sameInputs } from "./history";
import { type DraftInHand, useDraft } from "./useDraft";

/** What lies on the table: a plan, and whose settings of it are looked at. */
export interface Table {
  plan: PlanRow;
  /** a saved state that is looked at; null while the plan is worked on */
  frozen: RevisionRow | null;
  data: ChemicalData;
  draft: DraftInHand;
  /** settings that a link brought, until they are kept or left */
  proposal: PlanInputs | null;
  /** the settings looked at: those of the saved state, of the link, or the draft's */
  inputs: PlanInputs;
  /** they are only looked at */
  fixed: boolean;
  keepProposal: () => void;
  leaveProposal: () => void;
  /** goes on from a saved state as a draft */
  restore: (revision: RevisionRow) => void;
}

/** @param opened  what the address brought */
export function useTable(plan: PlanRow, frozen: RevisionRow | null, data: ChemicalData, opened: Opened): Table {
  const navigate = useNavigate();
  const draft = useDraft(plan.id, plan.latest, frozen === null);
  const taking = takesSettings(useLocation().state) ? opened.settings : null;
  const [proposal, setProposal] = useState(() =>
    opened.settings && !taking && !sameInputs(opened.settings, draft.inputs) ? opened.settings : null,
  );
  const { edit } = draft;
  useEffect(() => {
    if (taking) edit((now) => (sameInputs(now, taking) ? now : taking));
  }, [taking, edit]);
  const leaveProposal = useCallback(() => setProposal(null), []);
  return {
    plan,
    frozen,
    data,
    draft,
    proposal,
    inputs: frozen?.inputs ?? proposal ?? draft.inputs,
    fixed: frozen !== null || proposal !== null,
    keepProposal: () => {
      if (proposal) edit(() => proposal);
      leaveProposal();
    },
    leaveProposal,
    restore: (revision) => {
      dropDraft(plan.id);
      keepDraft(plan.id, { basedOn: plan.latest.number, inputs: revision.inputs, procedures: {} });
      void navigate(`/plans/${plan.id}`);
    },
  };
}
