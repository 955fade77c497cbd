import { Link } from "react-router-dom";
import type { PlanRow } from "../../../../shared/schemas/plan";
import { Button } from "../../../components/Button";
import { savedAt } from "../../../lib/format";
import { useMay } from "../../../lib/session";
import { SaidLine } from "./SaidLine";
import { CommentsButton, type Said } from "./WorkspaceHeader";

/** Over a frozen revision: what it is, and the two ways on. */
export function FrozenBanner({
  plan,
  number,
  author,
  createdAt,
  note,
  dataVersion,
  said,
  onUnsay,
  onSheet,
  onComments,
  onRestore,
  onCopyLink,
}: {
  plan: PlanRow;
  number: number;
  author: string;
  createdAt: string;
  note: string;
  dataVersion: string;
  said: Said | null;
  onUnsay: () => void;
  onSheet: () => void;
  onComments: () => void;
  onRestore: () => void;
  onCopyLink: () => void;
}) {
  const mayWrite = useMay("writePlans");
  return (
    <div className="relative flex min-h-11 shrink-0 flex-wrap items-center gap-x-3 gap-y-1 border-b border-ink bg-sheet px-5 py-1.5">
      <h1 className="text-lg">{plan.name}</h1>
      <p className="min-w-0 flex-1 text-sm">
        <b>Revision {number} as it was saved</b>, {savedAt(createdAt)} by {author}, solved with chemistry data{" "}
        <span className="font-mono">{dataVersion.slice(0, 12)}</span>. Nothing changes here.
        {note !== "" && <span className="text-muted"> {note}</span>}
      </p>
      <span className="no-print flex gap-2">
        <Button onClick={onCopyLink} title="l">
          Copy link
        </Button>
        <CommentsButton count={plan.commentCount} onClick={onComments} />
        <Button onClick={onSheet}>Window sheet</Button>
        <Button onClick={onRestore}>{mayWrite ? "Restore as draft" : "Try it in the plan"}</Button>
        <Link to={`/plans/${plan.id}`} className="self-center text-sm underline underline-offset-4">
          Back to the plan
        </Link>
      </span>
      <SaidLine said={said} onClose={onUnsay} />
    </div>
  );
}
