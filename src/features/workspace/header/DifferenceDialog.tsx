import { useQuery } from "@tanstack/react-query";
import { useMemo, useState } from "react";
import type { PlanInputs, PlanRow, RevisionRow } from "../../../../shared/schemas/plan";
import { Button } from "../../../components/Button";
import { ConflictTable } from "../../../components/ConflictTable";
import { Dialog } from "../../../components/Dialog";
import { FormulaText } from "../../../components/FormulaText";
import { PlainTable } from "../../../components/PlainTable";
import { ErrorNote, Loading } from "../../../components/status";
import { Note, SectionHead } from "../../../components/text";
import { counted, savedAt } from "../../../lib/format";
import { type Choices, mergePlans, type PlanMerge, type PlanTaken, whyNoPlan } from "../../../lib/planMerge/mergePlans";
import { revisionQuery } from "../../../lib/plans";
import type { DraftInHand } from "../model/useDraft";

export interface DifferenceDialogProps {
  plan: PlanRow;
  draft: DraftInHand;
  open: boolean;
  onOpenChange: (open: boolean) => void;
  /** it was opened by the wish to save: what is put together is saved next */
  saving: boolean;
}

/** What somebody saved meanwhile beside one's own changes: put together, and what both changed decided one by one. */
export default function DifferenceDialog({ plan, draft, open, onOpenChange, saving }: DifferenceDialogProps) {
  // A revision saved while this stands open does not change what is being decided; it is told of afterwards.
  const [latest] = useState(plan.latest);
  const { basedOn, baseInputs, inputs } = draft;
  const base = useQuery({ ...revisionQuery(plan.id, basedOn), enabled: baseInputs === null });
  const was = baseInputs ?? base.data?.inputs;
  const frame = {
    open,
    onOpenChange,
    width: 900,
    title: `Revision ${latest.number} beside your ${draft.changed ? "changes" : "plan"}`,
  };
  if (was) return <Difference {...{ frame, was, latest, draft, inputs, saving }} />;
  return (
    <Dialog {...frame}>
      {base.error ? (
        <ErrorNote
          doing={`Revision ${basedOn}, from which your changes are, could not be read; your draft is untouched`}
          error={base.error}
          retry={() => void base.refetch()}
        />
      ) : (
        <Loading label={`Reading revision ${basedOn}`} />
      )}
    </Dialog>
  );
}

function Difference({
  frame,
  was,
  latest,
  draft,
  inputs,
  saving,
}: {
  frame: Pick<Parameters<typeof Dialog>[0], "open" | "onOpenChange" | "width" | "title">;
  was: PlanInputs;
  latest: RevisionRow;
  draft: DraftInHand;
  inputs: PlanInputs;
  saving: boolean;
}) {
  const [choices, setChoices] = useState<Choices>({});
  const merged = useMemo(() => mergePlans(was, inputs, latest.inputs), [was, inputs, latest]);
  const { conflicts } = merged;
  const undecided = conflicts.filter(({ path }) => choices[path] === undefined).length;
  const result = merged.settle(choices);
  const refused = undecided === 0 ? whyNoPlan(result) : null;
  const all = (whose: "yours" | "theirs") => setChoices(Object.fromEntries(conflicts.map(({ path }) => [path, whose])));
  return (
    <Dialog
      {...frame}
      description={
        <>
          {latest.author} saved revision {latest.number} ({savedAt(latest.createdAt)})
          {latest.note === "" ? ", without a note." : `: “${latest.note}”${/[.!?]$/.test(latest.note) ? "" : "."}`}{" "}
          {draft.changed
            ? `Your changes are from revision ${draft.basedOn}. Cancel leaves them as they are; put together, they are one step that Undo takes back.`
            : `You changed nothing since revision ${draft.basedOn}.`}
        </>
      }
      footer={
        <>
          <Button onClick={() => frame.onOpenChange(false)}>Cancel</Button>
          {conflicts.length > 0 && (
            <>
              <Button onClick={() => all("theirs")}>All theirs</Button>
              <Button onClick={() => all("yours")}>All mine</Button>
            </>
          )}
          <Button
            kind="primary"
            disabled={undecided > 0 || refused !== null}
            onClick={() => {
              draft.moveTo(latest, result);
              if (!saving) frame.onOpenChange(false);
            }}
          >
            {undecided > 0
              ? `${undecided} to decide`
              : draft.changed
                ? `Put together${saving ? " and go on to save" : ""}`
                : `Go to revision ${latest.number}`}
          </Button>
        </>
      }
    >
      {conflicts.length > 0 && (
        <section aria-label="Changed by both" className="mb-4">
          <SectionHead level={3} aside="each can stand only one way">
            {counted(conflicts.length, "setting")} changed by both
          </SectionHead>
          <ConflictTable
            headers={["setting", `revision ${draft.basedOn}`, "mine", "theirs"]}
            rows={conflicts}
            choices={choices}
            show={(text) => <FormulaText text={text} />}
            onChoose={(path, whose) => setChoices((old) => ({ ...old, [path]: whose }))}
          />
        </section>
      )}
      <Taken merged={merged} basedOn={draft.basedOn} author={latest.author} />
      {refused !== null && (
        <p role="alert" className="mt-3 text-sm text-signal">
          {refused}
        </p>
      )}
    </Dialog>
  );
}

function Taken({
  merged: { taken, conflicts },
  basedOn,
  author,
}: {
  merged: PlanMerge;
  basedOn: number;
  author: string;
}) {
  const whose: Record<PlanTaken["whose"], string> = { yours: "you", theirs: author, both: "both, alike" };
  if (taken.length === 0)
    return conflicts.length > 0 ? null : <Note>No setting differs: only the revision is new.</Note>;
  return (
    <section aria-label="Taken as they are">
      <SectionHead level={3} aside={conflicts.length > 0 ? "nothing to decide" : "nothing contradicts"}>
        {counted(taken.length, "setting")} changed by one, or alike
      </SectionHead>
      <PlainTable
        caption="Settings taken as they are"
        rowKey={(t) => t.path}
        rows={taken}
        columns={[
          { header: "setting", width: "22%", cell: (t) => <FormulaText text={t.what} /> },
          {
            header: `revision ${basedOn}`,
            cell: (t) => (
              <span className="font-mono text-muted">
                <FormulaText text={t.from} />
              </span>
            ),
          },
          {
            header: "taken",
            cell: (t) => (
              <span className="font-mono">
                <FormulaText text={t.to} />
              </span>
            ),
          },
          { header: "changed by", width: "138px", cell: (t) => whose[t.whose] },
        ]}
      />
    </section>
  );
}
