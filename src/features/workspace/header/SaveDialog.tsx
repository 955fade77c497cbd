import { useQueryClient } from "@tanstack/react-query";
import type { PlanRow, RevisionRow } from "../../../../shared/schemas/plan";
import { Button } from "../../../components/Button";
import { Dialog } from "../../../components/Dialog";
import { PlainTable } from "../../../components/PlainTable";
import { ErrorNote } from "../../../components/status";
import { TextArea } from "../../../components/TextField";
import { Note } from "../../../components/text";
import { staleAnswer } from "../../../lib/failure";
import { planChanges } from "../../../lib/planChanges";
import { useSaveRevision } from "../../../lib/plans";
import { keys } from "../../../lib/queries";
import { sameInputs } from "../model/history";
import type { DraftInHand } from "../model/useDraft";

const LONGEST = 500;

export interface SaveDialogProps {
  plan: PlanRow;
  draft: DraftInHand;
  open: boolean;
  onOpenChange: (open: boolean) => void;
  /** kept by the caller, so that a dialog closed by a slip loses no words */
  note: string;
  onNote: (note: string) => void;
  /** cautions that ask for a procedure nobody has named */
  unconfirmed: readonly string[];
}

/** Asks for a note and shows what the revision will change, then saves the inputs in hand. */
export default function SaveDialog({ plan, draft, open, onOpenChange, note, onNote, unconfirmed }: SaveDialogProps) {
  const save = useSaveRevision();
  const { inputs, procedures } = draft;
  const changes = planChanges(plan.latest.inputs, inputs);
  const same = sameInputs(plan.latest.inputs, inputs);
  const named = Object.entries(procedures).filter(([, p]) => p.trim() !== "");
  const procedureNote = named.map(([code, p]) => `${code} under procedure ${p.trim()}.`).join(" ");
  const whole = [note.trim(), procedureNote].filter((part) => part !== "").join(" ");
  const client = useQueryClient();

  function run() {
    save.mutate(
      { planId: plan.id, note: whole, inputs, version: plan.version },
      {
        // A revision saved meanwhile puts the difference in place of this dialog; the note is kept.
        onError: (error) => {
          const stale = staleAnswer<PlanRow>(error);
          if (stale) client.setQueryData(keys.plan(plan.id), stale.current);
        },
        onSuccess: (revision: RevisionRow) => {
          draft.saved(revision);
          onNote("");
          onOpenChange(false);
        },
      },
    );
  }

  return (
    <Dialog
      open={open}
      onOpenChange={(next) => {
        if (!next) save.reset();
        onOpenChange(next);
      }}
      width={640}
      title={`Save revision ${plan.latest.number + 1}`}
      description="A revision freezes these inputs and the chemistry data they were solved with."
      footer={
        <>
          <Button onClick={() => onOpenChange(false)}>Cancel</Button>
          <Button
            kind="primary"
            type="submit"
            form="save-revision"
            disabled={save.isPending || same || whole.length > LONGEST}
          >
            {save.isPending ? "Saving …" : "Save revision"}
          </Button>
        </>
      }
    >
      <form
        id="save-revision"
        onSubmit={(event) => {
          event.preventDefault();
          run();
        }}
      >
        <TextArea
          label="Note"
          hint="Why: for whoever asks later. It may stay empty."
          value={note}
          onChange={(event) => onNote(event.target.value)}
          error={whole.length > LONGEST ? `${whole.length} characters; at most ${LONGEST}` : null}
        />
      </form>
      {procedureNote !== "" && <Note className="mt-1">The note will also say: {procedureNote}</Note>}
      {unconfirmed.length > 0 && (
        <p className="mt-1 text-sm text-signal">
          {unconfirmed.join(", ")}: no procedure is named for this set point. It can be saved; the caution stays.
        </p>
      )}
      <div className="mt-3">
        {same ? (
          <Note>Nothing to save: these are the settings of revision {plan.latest.number}.</Note>
        ) : changes.length === 0 ? (
          <Note>
            What differs from revision {plan.latest.number} has no words here: the order of entries, or less than the
            last figure shown. It can be saved.
          </Note>
        ) : (
          <PlainTable
            caption={`What changes from revision ${plan.latest.number}`}
            rowKey={(change) => change.what}
            rows={changes}
            columns={[
              { header: "what", cell: (c) => <b>{c.what}</b> },
              {
                header: `revision ${plan.latest.number}`,
                cell: (c) => <span className="text-muted">{c.from ?? "not there"}</span>,
              },
              { header: "now", cell: (c) => c.to ?? <span className="text-muted">taken out</span> },
            ]}
          />
        )}
      </div>
      {save.error && <ErrorNote className="mt-3" doing="Not saved; nothing is lost" error={save.error} />}
    </Dialog>
  );
}
