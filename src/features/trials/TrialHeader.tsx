import { Link } from "react-router-dom";
import type { FeedRow } from "../../../shared/schemas/feed";
import type { TrialRow } from "../../../shared/schemas/trial";
import { Button, ButtonLink } from "../../components/Button";
import { DraftStatus } from "../../components/DraftStatus";
import { Menu, MenuItem, MenuSeparator } from "../../components/Menu";
import { useMay } from "../../lib/session";
import type { DraftInHand } from "../../lib/useRecordDraft";
import { statusWords, stepped, stepsFrom, type Step } from "./model/flow";
import type { TrialValues } from "./model/trialValues";
import { useRecording } from "./record/context";
import type { TrialDialog } from "./TrialDialogs";

interface TrialHeaderProps {
  trial: TrialRow;
  draft: DraftInHand<TrialValues, TrialRow>;
  feed: FeedRow | null;
  readOnly: boolean;
  onDialog: (dialog: TrialDialog) => void;
}

/** Which trial, how far it has come, where its draft is, and what can be done with it. */
export function TrialHeader({ trial, draft, feed, readOnly, onDialog }: TrialHeaderProps) {
  const { campaign, stage } = useRecording();
  const mayReview = useMay("review");
  const mayWrite = useMay("writeBench");
  const { values, status } = draft;
  const busy = status === "saving" || status === "conflict";
  const steps = readOnly ? [] : stepsFrom[values.status].filter((step) => mayReview || !step.review);
  const take = (step: Step) => {
    if (step.reason) return onDialog({ kind: "step", step });
    draft.edit((t) => stepped(t, step, "", new Date()));
    void draft.save();
  };
  const primary = draft.changed.length > 0;
  return (
    <div className="flex flex-wrap items-center gap-x-3 gap-y-2 border-b border-rule px-5 py-2 lg:flex-nowrap">
      <h1 className="text-lg whitespace-nowrap">{values.code || "no code"}</h1>
      <span className="min-w-0 truncate text-sm text-muted">
        {stage?.name ?? values.stage}, {feed?.name ?? trial.feedName}, campaign{" "}
        <Link to={`/campaigns/${campaign.id}`}>{campaign.code}</Link>.{" "}
        <b className="text-ink">{statusWords[values.status]}</b>
      </span>
      <span className="min-w-0 flex-1 truncate">
        <DraftStatus draft={draft} />
      </span>
      <span className="ml-auto flex flex-wrap justify-end gap-x-3 gap-y-2 lg:flex-nowrap">
        {steps.map((step) => (
          <Button
            key={step.label}
            kind={step.primary && !primary ? "primary" : "plain"}
            disabled={busy}
            onClick={() => take(step)}
          >
            {step.label}
          </Button>
        ))}
        {trial.status === "approved" && mayReview && trial.deletedAt === null && (
          <Button onClick={() => onDialog({ kind: "reopen" })}>Open again</Button>
        )}
        {trial.deletedAt !== null && mayWrite && (
          <Button kind="primary" onClick={() => onDialog({ kind: "restore" })}>
            Restore
          </Button>
        )}
        {!readOnly && (
          <>
            <ButtonLink to={`/bench/${trial.id}`}>Bench</ButtonLink>
            <Button disabled={!draft.canUndo} onClick={draft.undo} title="Ctrl+Z">
              Undo
            </Button>
          </>
        )}
        <Menu trigger={<Button>More</Button>}>
          {!readOnly && (
            <>
              <MenuItem disabled={!draft.canRedo} onSelect={draft.redo} note="Ctrl+Shift+Z">
                Redo
              </MenuItem>
              <MenuItem disabled={!primary} onSelect={draft.discard}>
                Back to what is saved
              </MenuItem>
              <MenuSeparator />
            </>
          )}
          <MenuItem onSelect={() => onDialog({ kind: "history" })}>History …</MenuItem>
          <MenuItem onSelect={() => window.print()}>Print …</MenuItem>
          {!readOnly && (
            <>
              <MenuSeparator />
              <MenuItem danger onSelect={() => onDialog({ kind: "delete" })}>
                Delete …
              </MenuItem>
            </>
          )}
        </Menu>
        {!readOnly && (
          <Button
            kind={primary ? "primary" : "plain"}
            disabled={!primary || busy}
            title="Ctrl+S"
            onClick={() => void draft.save()}
          >
            {status === "waiting" ? "Try again" : "Save"}
          </Button>
        )}
      </span>
    </div>
  );
}
