import { useEffect, useState, type ReactNode } from "react";
import { Button } from "../../../components/Button";
import { Progress } from "../../../components/status";
import type { Steps } from "../../../workers/asker";
import type { Awaited } from "../model/useAsked";

/** Long enough that a quick answer needs no bar. */
const SOON = 1000;

/** What the worker is at: how far it has come, and a way to stop it, once it takes longer than a second. */
export function Working({
  awaited: { share, steps, stop },
  doing,
  words,
}: {
  awaited: Extract<Awaited<unknown>, { state: "waiting" }>;
  doing: string;
  words: (steps: Steps) => string;
}) {
  const [long, setLong] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setLong(true), SOON);
    return () => clearTimeout(timer);
  }, []);
  return (
    <div className="py-2 text-sm text-muted">
      <span role="status">{doing} …</span>
      {long && (
        <>
          <Progress {...(share === undefined ? {} : { share, label: doing })} />
          <span className="mt-1 flex items-baseline justify-between gap-3">
            <span className="font-mono">{steps ? words(steps) : "starting"}</span>
            {stop && (
              <Button kind="quiet" className="h-auto!" aria-label={`Stop: ${doing.toLowerCase()}`} onClick={stop}>
                stop
              </Button>
            )}
          </span>
        </>
      )}
    </div>
  );
}

/** Stopped by hand: what is missing, and the way to ask again. */
export function Stopped({ children, again }: { children: ReactNode; again: () => void }) {
  return (
    <p className="flex items-baseline justify-between gap-3 py-1 text-sm text-muted">
      <span role="status">{children}</span>
      <Button kind="quiet" className="h-auto!" onClick={again}>
        start again
      </Button>
    </p>
  );
}
