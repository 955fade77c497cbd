import { useState, type ReactNode } from "react";
import { classes } from "../../../lib/classes";

/** A part that is opened when it is wanted; closed, it costs nothing while the plan moves under the hand. */
export function Fold({ title, children, className }: { title: ReactNode; children: ReactNode; className?: string }) {
  const [open, setOpen] = useState(false);
  return (
    <details
      className={classes("text-sm", className)}
      open={open}
      onToggle={(event) => setOpen(event.currentTarget.open)}
    >
      <summary className="w-fit">{title}</summary>
      {open && children}
    </details>
  );
}
