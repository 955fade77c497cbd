import type { ReactNode } from "react";
import type { FieldChange, HistoryAction, HistoryRow } from "../../shared/schemas/history";
import { fullTime, savedAt } from "../lib/format";
import { useHistory } from "../lib/history";
import { Dialog } from "./Dialog";
import type { HistoryDialogProps } from "./HistoryDialog";
import { ErrorNote, Loading } from "./status";
import { Note } from "./text";
import { valueText } from "./valueText";

const did: Readonly<Record<HistoryAction, string>> = {
  create: "made it",
  change: "changed",
  delete: "deleted it",
  restore: "restored it",
  reopen: "opened it again",
  recalculate: "figures worked out anew",
};

export default function HistorySheet({ open, onOpenChange, title, path, words, show }: HistoryDialogProps) {
  const history = useHistory(path, open);
  return (
    <Dialog open={open} onOpenChange={onOpenChange} title={title} width={760}>
      {history.error ? (
        <ErrorNote doing="The history could not be read" error={history.error} retry={() => void history.refetch()} />
      ) : !history.data ? (
        <Loading label="Reading the history" />
      ) : history.data.length === 0 ? (
        <Note>Nothing was written to it since it was made.</Note>
      ) : (
        <ol>
          {history.data.map((row) => (
            <Write key={row.id} row={row} words={words} show={show} />
          ))}
        </ol>
      )}
    </Dialog>
  );
}

type Showing = Pick<HistoryDialogProps, "words" | "show">;

function Write({ row, words, show }: { row: HistoryRow } & Showing) {
  return (
    <li className="hairline py-2">
      <p className="flex items-baseline gap-3 text-sm">
        <span className="w-8 font-mono font-bold">{row.version}</span>
        <span className="min-w-0 flex-1">
          <b>{row.author}</b> {did[row.action]}
          {row.reason !== "" && <>: {row.reason}</>}
        </span>
        <time dateTime={row.at} title={fullTime(row.at)} className="text-muted">
          {savedAt(row.at)}
        </time>
      </p>
      {row.changes.length > 0 && (
        <table className="mt-1 ml-11 w-[calc(100%-44px)] table-fixed text-sm">
          <tbody>
            {row.changes.map((change) => (
              <Change key={change.path} change={change} words={words} show={show} />
            ))}
          </tbody>
        </table>
      )}
    </li>
  );
}

function Change({ change: { path, old, new: now }, words, show }: { change: FieldChange } & Showing) {
  const text = (value: unknown): ReactNode => show?.(path, value) ?? valueText(value);
  return (
    <tr className="align-baseline">
      <td className="w-[34%] py-0.5 pr-3 text-muted">{words(path)}</td>
      <td className="py-0.5 pr-3 font-mono break-words text-muted line-through decoration-muted">{text(old)}</td>
      <td className="py-0.5 font-mono break-words">{text(now)}</td>
    </tr>
  );
}
