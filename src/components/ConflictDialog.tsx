import { useState } from "react";
import type { Conflict } from "../lib/merge";
import { Button } from "./Button";
import { ConflictTable, type Whose } from "./ConflictTable";
import { Dialog } from "./Dialog";
import { valueText } from "./valueText";

/** Fields that two people changed to different things: each is decided, nothing is lost on the way. */
export function ConflictDialog({
  conflicts,
  what,
  words,
  onResolve,
}: {
  conflicts: readonly Conflict[];
  /** "trial NL-07" */
  what: string;
  words: (path: string) => string;
  onResolve: (choices: Readonly<Record<string, Whose>>) => void;
}) {
  const [choices, setChoices] = useState<Record<string, Whose>>({});
  const [aside, setAside] = useState<readonly Conflict[] | null>(null);
  const all = (choice: Whose) => setChoices(Object.fromEntries(conflicts.map(({ path }) => [path, choice])));
  const open = conflicts.length > 0;
  const undecided = conflicts.filter(({ path }) => choices[path] === undefined).length;
  if (open && aside === conflicts)
    return (
      <div role="alert" className="flex items-baseline gap-4 border-b border-signal bg-sheet px-5 py-1.5 text-sm">
        <span>
          {conflicts.length} {conflicts.length === 1 ? "field" : "fields"} of {what} were changed by somebody else too.
          Nothing is saved until that is decided.
        </span>
        <Button kind="quiet" className="h-auto!" onClick={() => setAside(null)}>
          Decide
        </Button>
      </div>
    );
  return (
    <Dialog
      open={open}
      onOpenChange={(next) => !next && setAside(conflicts)}
      title={`Two versions of ${what}`}
      width={820}
      description="Somebody saved while you were writing. Everything else was put together; these fields differ, and each can stand only one way."
      footer={
        <>
          <Button onClick={() => all("theirs")}>All theirs</Button>
          <Button onClick={() => all("yours")}>All mine</Button>
          <Button
            kind="primary"
            disabled={undecided > 0}
            onClick={() => {
              onResolve(choices);
              setChoices({});
            }}
          >
            {undecided > 0 ? `${undecided} to decide` : "Save with these"}
          </Button>
        </>
      }
    >
      <ConflictTable
        headers={["field", "you both found", "yours", "theirs"]}
        rows={conflicts.map(({ path, base, yours, theirs }) => ({
          path,
          what: words(path),
          base: valueText(base),
          yours: valueText(yours),
          theirs: valueText(theirs),
        }))}
        choices={choices}
        onChoose={(path, choice) => setChoices((old) => ({ ...old, [path]: choice }))}
      />
    </Dialog>
  );
}
