import { useEffect, useMemo, useState } from "react";
import { useLocation, useSearchParams } from "react-router-dom";
import type { CampaignRow } from "../../../shared/schemas/campaign";
import type { TrialRow } from "../../../shared/schemas/trial";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { ConflictDialog } from "../../components/ConflictDialog";
import { Tabs } from "../../components/choice";
import { useFeed } from "../../lib/feeds";
import { useProjectOf } from "../../lib/project";
import { useMay } from "../../lib/session";
import { useSolvedRevision } from "../../lib/solvedRevision";
import { useSaveKeys } from "../../lib/useSaveKeys";
import { AccountTab } from "./account/AccountTab";
import { electrodesOf } from "./model/electrodes";
import { trialWords } from "./model/trialWords";
import { useTrialDraft } from "./model/useTrialDraft";
import { RecordTab } from "./record/RecordTab";
import { RecordingContext, type Recording } from "./record/context";
import { TrialDialogs, type TrialDialog } from "./TrialDialogs";
import { TrialHeader } from "./TrialHeader";

interface TrialEditorProps {
  trial: TrialRow;
  campaign: CampaignRow;
  data: ChemicalData;
}

/** Record and accounts of one trial; what is typed is kept in this browser until the server has it. */
export function TrialEditor({ trial, campaign, data }: TrialEditorProps) {
  const mayWrite = useMay("writeBench");
  useProjectOf(campaign.projectId);
  const [search, setSearch] = useSearchParams();
  const [dialog, setDialog] = useState<TrialDialog | null>(null);
  const draft = useTrialDraft(trial);
  const { values, edit, problems } = draft;
  const feed = useFeed(values.feedId).data ?? null;
  const { solved } = useSolvedRevision(campaign.planId, campaign.planRevision);
  const readOnly = !mayWrite || trial.status === "approved" || trial.deletedAt !== null;
  const stage = campaign.stages.find(({ code }) => code === values.stage) ?? null;
  const electrodes = electrodesOf(data);
  useSaveKeys({ save: () => void draft.save(), undo: draft.undo, redo: draft.redo }, !readOnly);
  const recording = useMemo(
    (): Recording => ({ values, edit, problems, readOnly, campaign, stage, feed, data, electrodes, solved }),
    [values, edit, problems, readOnly, campaign, stage, feed, data, electrodes, solved],
  );
  const shown = search.get("show") === "accounts" ? "accounts" : "record";
  const { hash, key } = useLocation();
  // What is missing leads to where it is entered.
  useEffect(() => document.getElementById(hash.slice(1))?.scrollIntoView(), [hash, key, shown]);
  return (
    <RecordingContext value={recording}>
      <TrialHeader trial={trial} draft={draft} feed={feed} readOnly={readOnly} onDialog={setDialog} />
      <ConflictDialog
        conflicts={draft.conflicts}
        what={`trial ${trial.code}`}
        words={trialWords}
        onResolve={(choices) => {
          draft.resolve(choices);
          void draft.save();
        }}
      />
      <Tabs
        label="Parts of the trial"
        className="flex min-h-0 flex-1 flex-col px-5 pt-2"
        value={shown}
        onChange={(next) => setSearch(next === "record" ? {} : { show: next }, { replace: true })}
        panels={[
          { value: "record", label: "Record", content: <RecordTab trial={trial} error={draft.error} />, fill: true },
          { value: "accounts", label: "Accounts", content: <AccountTab />, fill: true },
        ]}
      />
      <TrialDialogs trial={trial} draft={draft} open={dialog} onOpen={setDialog} />
    </RecordingContext>
  );
}
