import { useId, type ReactNode, type SubmitEvent } from "react";
import { Button } from "./Button";
import { Dialog, type DialogProps } from "./Dialog";

/** A dialog that is one form: its button sends it, as Enter does, and Cancel leaves it. */
export function FormDialog({
  action,
  disabled = false,
  onSubmit,
  came,
  children,
  ...dialog
}: Omit<DialogProps, "footer" | "toRead" | "fixed"> & {
  /** the verb on the button: "Duplicate" */
  action: string;
  /** on its way, or nothing to send yet */
  disabled?: boolean;
  onSubmit: (event: SubmitEvent<HTMLFormElement>) => void;
  /** what came of it, in place of the form; the dialog stays the same one, so that focus goes back to where it was opened */
  came?: ReactNode;
}) {
  const id = useId();
  const close = () => dialog.onOpenChange(false);
  const done = came !== undefined;
  return (
    <Dialog
      {...dialog}
      footer={
        done ? (
          <Button kind="primary" onClick={close}>
            Done
          </Button>
        ) : (
          <>
            <Button onClick={close}>Cancel</Button>
            <Button type="submit" form={id} kind="primary" disabled={disabled}>
              {action}
            </Button>
          </>
        )
      }
    >
      {done ? (
        came
      ) : (
        <form id={id} onSubmit={onSubmit} noValidate className="space-y-4">
          {children}
        </form>
      )}
    </Dialog>
  );
}
