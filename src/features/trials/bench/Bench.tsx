import { useMemo, useState } from "react";
import { Link } from "react-router-dom";
import type { CampaignRow } from "../../../../shared/schemas/campaign";
import type { TrialRow } from "../../../../shared/schemas/trial";
import type { TrialReading } from "../../../../shared/schemas/trialRecord";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { ButtonLink } from "../../../components/Button";
import { ConflictDialog } from "../../../components/ConflictDialog";
import { Confirm } from "../../../components/Dialog";
import { DraftStatus } from "../../../components/DraftStatus";
import { ErrorNote } from "../../../components/status";
import { Remark } from "../../../components/text";
import { useFeed } from "../../../lib/feeds";
import { useProjectOf } from "../../../lib/project";
import { useMay } from "../../../lib/session";
import { useSolvedRevision } from "../../../lib/solvedRevision";
import { electrodesOf } from "../model/electrodes";
import { statusWords, stepped } from "../model/flow";
import { trialWords } from "../model/trialWords";
import { nextReading, type TrialValues } from "../model/trialValues";
import { useTrialDraft } from "../model/useTrialDraft";
import { RecordingContext, type Recording } from "../record/context";
import { BenchBand } from "./BenchBand";
import { BigButton } from "./BigField";
import { readingIn } from "./benchModel";
import { emptyForm, useBenchForm } from "./benchShelf";
import { minutesSince, timeEntry } from "./elapsed";
import { EntryLog } from "./EntryLog";
import { ReadingPanel } from "./ReadingPanel";
import { DosePanel, NotePanel, SamplePanel } from "./TaskPanels";
import { useNow } from "./useNow";

type Task = "reading" | "dose" | "sample" | "note";

/** One trial at the bench, for gloved hands: one question at a time, kept at once, on this device until the server has it. */
export function Bench({ trial, campaign, data }: { trial: TrialRow; campaign: CampaignRow; data: ChemicalData }) {
  const mayWrite = useMay("writeBench");
  useProjectOf(campaign.projectId);
  const draft = useTrialDraft(trial);
  const { values, edit, problems } = draft;
  const feed = useFeed(values.feedId).data ?? null;
  const { solved } = useSolvedRevision(campaign.planId, campaign.planRevision);
  const stage = campaign.stages.find(({ code }) => code === values.stage) ?? null;
  const electrodes = electrodesOf(data);
  const { form, change } = useBenchForm(trial.id);
  const [task, setTask] = useState<Task>("reading");
  const [ending, setEnding] = useState(false);
  const minutes = minutesSince(values.startedAt, useNow());
  const readOnly = !mayWrite || trial.status === "approved" || trial.deletedAt !== null;
  const recording = useMemo(
    (): Recording => ({ values, edit, problems, readOnly, campaign, stage, feed, data, electrodes, solved }),
    [values, edit, problems, readOnly, campaign, stage, feed, data, electrodes, solved],
  );
  // A probe stays in its vessel: the electrode of the last reading stands until another is chosen.
  const last = values.measured.readings.at(-1);
  const probe = {
    ...form,
    electrode: form.electrode ?? last?.orp.electrode ?? null,
    electrodeTemperature: form.electrodeTemperature ?? last?.orp.electrodeTemperature.text ?? "",
  };
  const keep = (next: (t: TrialValues) => TrialValues, cleared: Partial<typeof form>) => {
    edit(next);
    change(cleared);
    void draft.save();
  };
  const withReading = (reading: TrialReading) => (t: TrialValues) => ({
    ...t,
    measured: { ...t.measured, readings: [...t.measured.readings, reading] },
  });
  const busy = draft.status === "conflict";
  const shared = { form: probe, change, minutes, busy };
  const tasks: readonly { value: Task; label: string }[] = [
    { value: "reading", label: "Read" },
    { value: "dose", label: "Dose" },
    { value: "sample", label: `Take sample ${values.samples.length + 1}` },
    { value: "note", label: "Note" },
  ];
  return (
    <RecordingContext value={recording}>
      <div className="flex items-center gap-5 border-b border-rule px-5 py-2">
        <div className="min-w-0 flex-1">
          <h1 className="flex items-baseline gap-4 text-[21px]">
            {values.code}
            <span className="truncate text-lg">
              {stage?.name ?? values.stage}, {feed?.name ?? trial.feedName}
            </span>
          </h1>
          <p className="text-base text-muted">
            Campaign <Link to={`/campaigns/${campaign.id}`}>{campaign.code}</Link>
            {values.charge.dryMass.text !== "" && `, ${values.charge.dryMass.text} ${values.charge.dryMass.unit} dry`}
            {values.charge.liquorVolume.text !== "" &&
              ` in ${values.charge.liquorVolume.text} ${values.charge.liquorVolume.unit}`}
            , {statusWords[values.status]}. <DraftStatus draft={draft} />
          </p>
        </div>
        <ButtonLink to={`/trials/${trial.id}`} className="h-14! text-lg!">
          Whole record
        </ButtonLink>
      </div>
      <ConflictDialog
        conflicts={draft.conflicts}
        what={`trial ${trial.code}`}
        words={trialWords}
        onResolve={(choices) => {
          draft.resolve(choices);
          void draft.save();
        }}
      />
      <BenchBand minutes={minutes} electrode={probe.electrode} electrodeTemperature={probe.electrodeTemperature} />
      {draft.status === "refused" && draft.error !== null && (
        <div className="px-5 pt-3">
          <ErrorNote doing="Not saved, kept on this device" error={draft.error} retry={() => void draft.save()} />
        </div>
      )}
      {problems.length > 0 && draft.error === null && (
        <div className="px-5 pt-3">
          <Remark className="border-signal! text-base!">
            Kept on this device, not saved:{" "}
            {problems.map(({ path, message }) => `${trialWords(path)}: ${message}`).join("; ")}.{" "}
            <Link to={`/trials/${trial.id}`}>Mend it in the whole record</Link>.
          </Remark>
        </div>
      )}
      {readOnly ? (
        <div className="measure px-5 py-6 text-lg">
          {trial.status === "approved"
            ? "Approved and locked: nothing is entered any more."
            : trial.deletedAt !== null
              ? "This trial was deleted."
              : "You may look, not write: a technician or a metallurgist records at the bench."}
        </div>
      ) : values.status === "planned" ? (
        <div className="px-5 py-5">
          <BigButton
            primary
            className="min-h-[88px] w-full text-[21px]!"
            onClick={() => keep((t) => stepped(t, { to: "running" }, "", new Date()), {})}
          >
            Start the trial
          </BigButton>
        </div>
      ) : (
        <>
          <div className="grid grid-cols-2 border-b border-ink sm:grid-cols-5">
            {tasks.map(({ value, label }) => (
              <button
                key={value}
                type="button"
                aria-pressed={task === value}
                onClick={() => setTask(value)}
                className={`min-h-16 border-r border-rule px-2 text-lg ${task === value ? "bg-ink font-bold text-paper" : "hover:bg-tint"}`}
              >
                {label}
              </button>
            ))}
            <button
              type="button"
              disabled={values.status !== "running"}
              onClick={() => setEnding(true)}
              className="min-h-16 px-2 text-lg font-bold hover:bg-tint disabled:opacity-50"
            >
              End the trial
            </button>
          </div>
          <div className="grid gap-5 px-5 py-4 sm:grid-cols-[minmax(0,1fr)_330px] sm:[&>:last-child]:sticky sm:[&>:last-child]:top-4 sm:[&>:last-child]:self-start">
            {task === "reading" && (
              <ReadingPanel
                {...shared}
                carried={form.electrodeTemperature === null}
                onKeep={() =>
                  keep(withReading(readingIn(probe, minutes, last?.at.unit)), {
                    ...emptyForm,
                    electrode: probe.electrode,
                    amount: form.amount,
                    volume: form.volume,
                    makeUp: form.makeUp,
                    note: form.note,
                  })
                }
              />
            )}
            {task === "dose" && (
              <DosePanel
                {...shared}
                onKeep={(dose) => {
                  keep((t) => ({ ...t, measured: { ...t.measured, doses: [...t.measured.doses, dose] } }), {
                    amount: "",
                    at: "",
                  });
                  setTask("reading");
                }}
              />
            )}
            {task === "sample" && (
              <SamplePanel
                {...shared}
                onKeep={(sample) => {
                  keep((t) => ({ ...t, samples: [...t.samples, sample] }), { volume: "", makeUp: "", at: "" });
                  setTask("reading");
                }}
              />
            )}
            {task === "note" && (
              <NotePanel
                {...shared}
                onKeep={(note) => {
                  keep(withReading({ ...nextReading([]), at: timeEntry("", minutes, last?.at.unit), note }), {
                    note: "",
                  });
                  setTask("reading");
                }}
              />
            )}
          </div>
        </>
      )}
      <div className="border-t border-ink px-5 pb-10">
        <EntryLog saved={trial} />
      </div>
      <Confirm
        open={ending}
        onOpenChange={setEnding}
        title={`End trial ${values.code}`}
        description="Its end is written now and it waits for assays. Readings can still be added."
        action="End the trial"
        onConfirm={() => {
          keep((t) => stepped(t, { to: "awaiting assay" }, "", new Date()), {});
          setEnding(false);
        }}
      />
    </RecordingContext>
  );
}
