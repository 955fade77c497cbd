import type { ReactNode } from "react";
import { classes } from "../lib/classes";

/** A field with its label: on one hairline with it, or under it. Below stands what is wrong with it and what helps. */
export function FieldFrame({
  id,
  label,
  layout,
  below,
  className,
  children,
}: {
  /** of the field */
  id: string;
  label: ReactNode;
  layout: "row" | "stacked";
  below: ReactNode;
  className: string | undefined;
  children: ReactNode;
}) {
  const stacked = layout === "stacked";
  const name = (
    <label htmlFor={id} className={stacked ? "mb-1 block text-sm" : "min-w-0"}>
      {label}
    </label>
  );
  return (
    <div className={stacked ? className : classes("hairline py-1", className)}>
      {stacked ? (
        <>
          {name}
          {children}
        </>
      ) : (
        <div className="flex items-baseline justify-between gap-3">
          {name}
          {children}
        </div>
      )}
      {below}
    </div>
  );
}
