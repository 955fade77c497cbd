import { Popover } from "radix-ui";
import type { ReactNode, RefObject } from "react";

export interface PopoverSheetProps {
  /** the control that opened it, beside which it stands and which gets the focus back */
  anchor: RefObject<HTMLElement | null>;
  onClose: () => void;
  /** what it is, read aloud */
  label: string;
  align?: "center" | "end";
  className: string;
  children: ReactNode;
}

/** A small sheet beside the control that opened it; Escape, or a press outside, closes it. */
export default function PopoverSheet({
  anchor,
  onClose,
  label,
  align = "center",
  className,
  children,
}: PopoverSheetProps) {
  return (
    <Popover.Root open onOpenChange={(open) => !open && onClose()}>
      <Popover.Anchor virtualRef={anchor} />
      <Popover.Portal>
        <Popover.Content
          aria-label={label}
          align={align}
          sideOffset={6}
          collisionPadding={12}
          className={`z-50 border border-ink bg-paper text-base text-ink ${className}`}
          // The control itself opens and closes.
          onInteractOutside={(event) => {
            if (event.target instanceof Node && anchor.current?.contains(event.target)) event.preventDefault();
          }}
          onCloseAutoFocus={(event) => {
            event.preventDefault();
            anchor.current?.focus();
          }}
        >
          {children}
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}
