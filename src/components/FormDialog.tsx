import { useId, type SubmitEvent } from "react";
import { Button } from "./Button";
import { Dialog, type DialogProps } from "./Dialog";

/** A dialog that is one form: its button sends it, as Enter does, and Cancel leaves it. */
export function FormDialog({
  action,
  disabled = false,
  onSubmit,
  children,
  ...dialog
}: Omit<DialogProps, "footer" | "toRead" | "fixed"> & {
  /** the verb on the button: "Duplicate" */
  action: string;
  /** on its way, or nothing to send yet */
  disabled?: boolean;
  onSubmit: (event: SubmitEvent<HTMLFormElement>) => void;
}) {
  const id = useId();
  return (
    <Dialog
      {...dialog}
      footer={
        <>
          <Button onClick={() => dialog.onOpenChange(false)}>Cancel</Button>
          <Button type="submit" form={id} kind="primary" disabled={disabled}>
            {action}
          </Button>
        </>
      }
    >
      <form id={id} onSubmit={onSubmit} noValidate className="space-y-4">
        {children}
      </form>
    </Dialog>
  );
}
