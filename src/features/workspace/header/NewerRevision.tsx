import type { RevisionRow } from "../../../../shared/schemas/plan";
import { Button } from "../../../components/Button";
import { fullTime, savedAt } from "../../../lib/format";

/** Under the header, where somebody saved while the plan was open here: who, when and why, and the way to the difference. */
export function NewerRevision({
  latest,
  basedOn,
  changed,
  onDifference,
}: {
  latest: RevisionRow;
  basedOn: number;
  /** there are changes of one's own */
  changed: boolean;
  onDifference: () => void;
}) {
  return (
    <div
      role="status"
      className="no-print flex shrink-0 flex-wrap items-center gap-x-4 gap-y-1 border-b border-rule border-l-4 border-l-ink bg-sheet py-1.5 pr-5 pl-4 text-sm"
    >
      <p className="min-w-0 flex-1">
        <b>
          Revision {latest.number} was saved <time title={fullTime(latest.createdAt)}>{savedAt(latest.createdAt)}</time>{" "}
          by {latest.author}
        </b>
        {latest.note === "" ? ", without a note. " : `: “${latest.note}” `}
        <span className="text-muted">
          {changed
            ? `Your changes are from revision ${basedOn} and are all still here.`
            : `Here still stands revision ${basedOn}.`}
        </span>
      </p>
      <Button onClick={onDifference}>Show the difference</Button>
    </div>
  );
}
