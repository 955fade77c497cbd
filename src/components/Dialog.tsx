import { Dialog as Radix } from "radix-ui";
import { useRef, type ReactNode } from "react";
import { Button } from "./Button";

export interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  /** one sentence: what happens here */
  description?: ReactNode;
  children?: ReactNode;
  /** buttons, right-aligned, the primary one last */
  footer?: ReactNode;
  /** pixels */
  width?: number;
  /** there is nothing in it to work, only to read: it has the focus itself, so that keys scroll it */
  toRead?: boolean;
  /** cannot be closed, only answered */
  fixed?: boolean;
}

/** A sheet laid over the page; Escape or a press outside closes it. */
export function Dialog({
  open,
  onOpenChange,
  title,
  description,
  children,
  footer,
  width = 520,
  toRead = false,
  fixed = false,
}: DialogProps) {
  const opener = useRef<Element | null>(null);
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-veil" />
        <Radix.Content
          className="fixed top-[8vh] left-1/2 z-50 flex max-h-[84vh] w-[calc(100vw-32px)] -translate-x-1/2 flex-col border border-ink bg-paper text-base text-ink"
          style={{ maxWidth: width }}
          // Opened from anywhere, not by a trigger of its own: whoever had the focus gets it back.
          onOpenAutoFocus={() => {
            opener.current = document.activeElement;
          }}
          onCloseAutoFocus={(event) => {
            event.preventDefault();
            if (opener.current instanceof HTMLElement) opener.current.focus();
          }}
          {...(description === undefined ? { "aria-describedby": undefined } : {})}
        >
          <div className="flex items-baseline justify-between gap-4 border-b border-ink px-5 pt-4 pb-2">
            <Radix.Title className="font-mono text-lg font-bold">{title}</Radix.Title>
            {!fixed && (
              <Radix.Close className="text-sm text-muted underline decoration-rule underline-offset-4 hover:text-ink">
                Close
              </Radix.Close>
            )}
          </div>
          <div className="min-h-0 overflow-y-auto px-5 py-4 -outline-offset-2" {...(toRead ? { tabIndex: 0 } : {})}>
            {description !== undefined && (
              <Radix.Description asChild>
                <div className="mb-4 text-muted">{description}</div>
              </Radix.Description>
            )}
            {children}
          </div>
          {footer !== undefined && (
            <div className="flex flex-wrap justify-end gap-3 border-t border-rule px-5 py-3">{footer}</div>
          )}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}

/** Asks before something that cannot be taken back with one press. */
export function Confirm({
  action,
  busy = false,
  onConfirm,
  danger = false,
  ...dialog
}: Omit<DialogProps, "footer"> & {
  /** the verb on the button: "Archive" */
  action: string;
  busy?: boolean;
  danger?: boolean;
  onConfirm: () => void;
}) {
  return (
    <Dialog
      {...dialog}
      footer={
        <>
          <Button onClick={() => dialog.onOpenChange(false)}>Cancel</Button>
          <Button kind={danger ? "danger" : "primary"} disabled={busy} onClick={onConfirm}>
            {action}
          </Button>
        </>
      }
    />
  );
}
