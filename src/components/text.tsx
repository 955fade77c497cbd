import type { ReactNode } from "react";
import { classes } from "../lib/classes";

/** A heading over a hairline; groups what follows without a box. */
export function SectionHead({
  children,
  aside,
  level = 2,
  className,
}: {
  children: ReactNode;
  /** stands at the right end of the line */
  aside?: ReactNode;
  level?: 2 | 3;
  className?: string;
}) {
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <div className={classes("flex items-baseline justify-between gap-3 border-b border-ink pb-1", className)}>
      <Heading className="font-mono text-sm font-bold">{children}</Heading>
      {aside !== undefined && <span className="text-sm text-muted">{aside}</span>}
    </div>
  );
}

/** Label at the left, number at the right, a hairline under both. */
export function Row({
  label,
  children,
  below,
  muted = false,
  className,
}: {
  label: ReactNode;
  children?: ReactNode;
  /** a second, quieter line, for a reaction or a reason */
  below?: ReactNode;
  muted?: boolean;
  className?: string;
}) {
  return (
    <div className={classes("hairline py-1", muted && "text-muted", className)}>
      <div className="flex items-baseline justify-between gap-3">
        <span className="min-w-0 text-base">{label}</span>
        <span className="shrink-0 text-right font-mono text-base">{children}</span>
      </div>
      {below !== undefined && <div className="text-sm text-muted">{below}</div>}
    </div>
  );
}

/** Secondary prose. */
export function Note({ children, className }: { children: ReactNode; className?: string }) {
  return <p className={classes("text-sm text-muted", className)}>{children}</p>;
}

/** Nothing here yet: says what would be here and how it comes about. */
export function Empty({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <div className="measure py-10">
      <p className="font-mono text-lg font-bold">{title}</p>
      {children !== undefined && <div className="mt-1 text-muted">{children}</div>}
      {action !== undefined && <div className="mt-4">{action}</div>}
    </div>
  );
}

/** A caveat in sight of the verdict: a bar in ink, no alarm. Hazards are Cautions. */
export function Remark({ children, className }: { children: ReactNode; className?: string }) {
  return <div className={classes("border-l-4 border-ink bg-sheet px-3 py-1.5 text-sm", className)}>{children}</div>;
}
