import type { PlanInputs, PlanRow } from "../../../../shared/schemas/plan";
import { Button } from "../../../components/Button";
import { FormulaText } from "../../../components/FormulaText";
import { counted } from "../../../lib/format";
import { planChanges } from "../../../lib/planChanges";
import { useMay } from "../../../lib/session";

/** Over settings that a link brought: what they are and what differs, and the two ways on. Nothing changes until they are kept. */
export function ProposalBanner({
  plan,
  mine,
  unsaved,
  settings,
  onKeep,
  onLeave,
}: {
  plan: PlanRow;
  /** the plan as it stands here */
  mine: PlanInputs;
  /** it stands here with changes of one's own */
  unsaved: boolean;
  settings: PlanInputs;
  onKeep: () => void;
  onLeave: () => void;
}) {
  const changes = planChanges(mine, settings);
  const mayWrite = useMay("writePlans");
  return (
    <div className="shrink-0 border-b border-ink bg-sheet px-5 py-1.5" role="region" aria-label="Settings from a link">
      <div className="flex min-h-8 flex-wrap items-center gap-x-3 gap-y-1">
        <h1 className="text-lg">{plan.name}</h1>
        <p className="min-w-0 flex-1 text-sm">
          <b>Settings from a link</b>, a proposal: {counted(changes.length, "difference")} from{" "}
          {unsaved ? "your unsaved draft" : `revision ${plan.latest.number}`}. Nothing of the plan changes until{" "}
          {mayWrite ? "you keep them" : "a metallurgist saves them"}.
        </p>
        <span className="no-print flex gap-2">
          <Button kind="primary" onClick={onKeep}>
            {mayWrite ? "Keep as my draft" : "Try them here"}
          </Button>
          <Button onClick={onLeave}>Leave them</Button>
        </span>
      </div>
      <ul className="flex flex-wrap gap-x-5 pb-1 text-sm">
        {changes.map(({ what, from, to }) => (
          <li key={what}>
            <b>
              <FormulaText text={what} />
            </b>{" "}
            <span className="text-muted">
              <FormulaText text={from ?? "not there"} /> →
            </span>{" "}
            <FormulaText text={to ?? "taken out"} />
          </li>
        ))}
      </ul>
      {unsaved && (
        <p className="text-sm text-muted">Kept, they are one change of your draft: Undo brings your own back.</p>
      )}
    </div>
  );
}

/** What of an address could not be taken. */
export function IgnoredBanner({ ignored, onClose }: { ignored: readonly string[]; onClose: () => void }) {
  return (
    <div
      role="alert"
      className="flex shrink-0 items-baseline gap-3 border-b border-rule border-l-4 border-l-ink bg-sheet px-4 py-1.5 text-sm"
    >
      <p className="min-w-0 flex-1">
        <b>The address was not taken whole.</b> Left out: <span className="font-mono">{ignored.join("; ")}</span>.
      </p>
      <Button kind="quiet" className="h-auto!" onClick={onClose}>
        Close
      </Button>
    </div>
  );
}
