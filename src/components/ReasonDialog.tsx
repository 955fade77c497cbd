import { useState, type ReactNode } from "react";
import { Confirm } from "./Dialog";
import { ErrorNote } from "./status";
import { TextArea } from "./TextField";

export interface ReasonDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  description?: ReactNode;
  /** the verb on the button */
  action: string;
  danger?: boolean;
  /** true: it does not go without a reason */
  required?: boolean;
  busy?: boolean;
  error?: unknown;
  onConfirm: (reason: string) => void;
}

/** Asks before something others will want to understand later, and takes the reason for the record. */
export function ReasonDialog(props: ReasonDialogProps) {
  return props.open ? <Ask {...props} /> : null;
}

function Ask({ required = false, error, onConfirm, busy = false, ...dialog }: ReasonDialogProps) {
  const [reason, setReason] = useState("");
  const [pressed, setPressed] = useState(false);
  const missing = required && reason.trim().length < 3;
  return (
    <Confirm
      {...dialog}
      busy={busy}
      onConfirm={() => {
        setPressed(true);
        if (!missing) onConfirm(reason.trim());
      }}
    >
      <TextArea
        label={required ? "Why" : "Why, for the record"}
        rows={2}
        maxLength={500}
        autoFocus
        value={reason}
        error={pressed && missing ? "Say why, in a few words" : null}
        onChange={(event) => setReason(event.target.value)}
      />
      {error !== undefined && error !== null && <ErrorNote className="mt-3" doing="Not done" error={error} />}
    </Confirm>
  );
}
