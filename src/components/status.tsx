import { useEffect, useState, type ReactNode } from "react";
import { messageOf } from "../lib/failure";
import { classes } from "../lib/classes";
import { Button } from "./Button";

/** What went wrong, in a sentence, with the way out beside it. */
export function ErrorNote({
  error,
  doing,
  retry,
  className,
}: {
  error: unknown;
  /** what was being tried: "The plans could not be read" */
  doing?: string;
  retry?: () => void;
  className?: string;
}) {
  return (
    <div role="alert" className={classes("border-l-4 border-signal bg-sheet px-3 py-2", className)}>
      <p>
        {doing !== undefined && <b>{doing}. </b>}
        {messageOf(error)}
      </p>
      {retry && (
        <Button kind="quiet" onClick={retry}>
          Try again
        </Button>
      )}
    </div>
  );
}

/** Says that work goes on; silent for the first 300 ms, so that quick answers do not flicker. */
export function Loading({ label = "Reading" }: { label?: string }) {
  const [shown, setShown] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setShown(true), 300);
    return () => clearTimeout(timer);
  }, []);
  return (
    <div role="status" className="py-6 text-muted">
      {shown && (
        <>
          <span>{label} …</span>
          <Progress />
        </>
      )}
    </div>
  );
}

/** In the place of a record's screen until it is read: that it is on its way, or why not and the way to ask again.
 *  @param what  the kind of record: "feed"     @param asked  all that the screen needs */
export function Opening({
  what,
  asked,
}: {
  what: string;
  asked: readonly { error: unknown; refetch: () => unknown }[];
}) {
  const error = asked.find((query) => query.error !== null)?.error;
  return (
    <div className="measure px-5 py-3">
      {error === undefined ? (
        <Loading label={`Opening the ${what}`} />
      ) : (
        <ErrorNote
          doing={`The ${what} could not be opened`}
          error={error}
          retry={() => asked.forEach((query) => void query.refetch())}
        />
      )}
    </div>
  );
}

/** A moving hairline while the end is unknown, a growing one when `share` (0 to 1) is given. */
export function Progress({ share, label }: { share?: number; label?: string }) {
  return (
    <div className="mt-2 h-px w-48 overflow-hidden bg-rule" aria-hidden={share === undefined}>
      <div
        className={classes("h-full bg-verdigris", share === undefined && "progress-unknown w-1/3")}
        style={share === undefined ? undefined : { width: `${Math.round(share * 100)}%` }}
        {...(share === undefined
          ? {}
          : {
              role: "progressbar",
              "aria-label": label,
              "aria-valuenow": Math.round(share * 100),
              "aria-valuemin": 0,
              "aria-valuemax": 100,
            })}
      />
    </div>
  );
}

/** A short word beside the control that caused it: "saved 09:42", "not saved". Announced politely. */
export function Status({ children, tone = "quiet" }: { children: ReactNode; tone?: "quiet" | "good" | "bad" }) {
  const colour = { quiet: "text-muted", good: "text-verdigris", bad: "text-signal" }[tone];
  return (
    <span role="status" className={classes("text-sm", colour)}>
      {children}
    </span>
  );
}
