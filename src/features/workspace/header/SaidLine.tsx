import { Button } from "../../../components/Button";
import { classes } from "../../../lib/classes";
import type { Said } from "./WorkspaceHeader";

/** How a command of the header goes, under its right end: however long, it moves nothing and hides no name. */
export function SaidLine({ said, onClose }: { said: Said | null; onClose: () => void }) {
  return (
    <div role="status" className="no-print pointer-events-none absolute top-full right-5 left-5 z-30 flex justify-end">
      {said && (
        <p
          className={classes(
            "pointer-events-auto flex max-w-[68ch] items-baseline gap-4 border bg-sheet px-3 py-1 text-sm",
            said.bad ? "border-signal text-signal" : "border-ink",
          )}
        >
          <span className="min-w-0 wrap-anywhere">{said.text}</span>
          <Button kind="quiet" className="h-auto!" onClick={onClose}>
            Close
          </Button>
        </p>
      )}
    </div>
  );
}
