import { useState } from "react";
import { Button } from "../../components/Button";
import { Dialog } from "../../components/Dialog";
import { ErrorNote, Loading } from "../../components/status";
import { Note } from "../../components/text";
import { classes } from "../../lib/classes";
import { fullTime, savedAt } from "../../lib/format";
import { planChanges, type PlanChange } from "../../lib/planChanges";
import { useRevisions } from "../../lib/plans";
import type { RevisionsDialogProps } from "./RevisionsDialog";

/** Every saved state of a plan, newest first, and what each changed from the one before. `onTake` brings the inputs of an
 *  earlier one back into the plan that is open; `onLook` opens it as it was, with the data it froze. */
export default function Revisions({ plan, open, onOpenChange, onTake, onLook, onCompare }: RevisionsDialogProps) {
  const revisions = useRevisions(plan.id, open);
  const [number, setNumber] = useState<number>();
  const rows = revisions.data ?? [];
  const shown = rows.find((row) => row.number === number) ?? rows[0];
  const before = shown && rows.find((row) => row.number === shown.number - 1);
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title={`Revisions of ${plan.name}`}
      width={860}
      footer={
        shown &&
        (onLook ?? onTake) && (
          <>
            {onCompare && (
              <Button onClick={() => onCompare(shown)}>Compare revision {shown.number} with the plan</Button>
            )}
            {onLook && <Button onClick={() => onLook(shown)}>Open revision {shown.number} as it was</Button>}
            {onTake && (
              <Button
                kind="primary"
                onClick={() => {
                  onTake(shown);
                  onOpenChange(false);
                }}
              >
                Take the inputs of revision {shown.number}
              </Button>
            )}
          </>
        )
      }
    >
      {revisions.error ? (
        <ErrorNote
          doing="The revisions could not be read"
          error={revisions.error}
          retry={() => void revisions.refetch()}
        />
      ) : !revisions.data ? (
        <Loading label="Reading the revisions" />
      ) : (
        <div className="grid gap-6 md:grid-cols-[300px_1fr]">
          <ol aria-label="Revisions">
            {rows.map((row) => (
              <li key={row.number} className="hairline">
                <button
                  type="button"
                  aria-pressed={row === shown}
                  onClick={() => setNumber(row.number)}
                  className={classes(
                    "grid w-full grid-cols-[2.5em_1fr_auto] items-baseline gap-x-2 px-2 py-1 text-left text-sm hover:bg-tint/50",
                    row === shown && "bg-tint!",
                  )}
                >
                  <span className="font-mono font-bold">{row.number}</span>
                  <span className="truncate">{row.author}</span>
                  <time dateTime={row.createdAt} title={fullTime(row.createdAt)} className="text-muted">
                    {savedAt(row.createdAt)}
                  </time>
                </button>
              </li>
            ))}
          </ol>
          {shown && (
            <div>
              <p>{shown.note === "" ? <span className="text-muted">Saved without a note.</span> : shown.note}</p>
              <Note className="mt-1">
                Chemistry data <span className="font-mono">{shown.dataVersion.slice(0, 12)}</span>
                {before && before.dataVersion !== shown.dataVersion && ", newer than the revision before"}
              </Note>
              {before ? (
                <Changes changes={planChanges(before.inputs, shown.inputs)} from={before.number} to={shown.number} />
              ) : (
                <Note className="mt-3">The first revision: there is none before it to compare with.</Note>
              )}
            </div>
          )}
        </div>
      )}
    </Dialog>
  );
}

/** A table of what differs between two revisions. */
function Changes({ changes, from, to }: { changes: readonly PlanChange[]; from: number; to: number }) {
  if (changes.length === 0) return <Note className="mt-3">The inputs are those of revision {from}.</Note>;
  const cell = "border-b border-rule py-1 pr-4 align-top";
  const head = "border-b border-ink py-1 pr-4 text-left font-mono text-xs";
  return (
    <table className="mt-3 w-full text-sm">
      <thead>
        <tr>
          <th className={head}>what</th>
          <th className={head}>revision {from}</th>
          <th className={head}>revision {to}</th>
        </tr>
      </thead>
      <tbody>
        {changes.map((change) => (
          <tr key={change.what}>
            <td className={classes(cell, "font-bold")}>{change.what}</td>
            <td className={classes(cell, "text-muted")}>{change.from ?? "not there"}</td>
            <td className={cell}>{change.to ?? <span className="text-muted">taken out</span>}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
