import { useState } from "react";
import type { Conflict } from "../lib/merge";
import { Button } from "./Button";
import { Segmented } from "./choice";
import { Dialog } from "./Dialog";
import { valueText } from "./valueText";

type Choice = "yours" | "theirs";

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
  onResolve: (choices: Readonly<Record<string, Choice>>) => void;
}) {
  const [choices, setChoices] = useState<Record<string, Choice>>({});
  const [aside, setAside] = useState<readonly Conflict[] | null>(null);
  const all = (choice: Choice) => setChoices(Object.fromEntries(conflicts.map(({ path }) => [path, choice])));
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
      <table className="w-full table-fixed text-sm">
        <thead>
          <tr className="text-left font-mono text-xs">
            <th className="w-[26%] border-b border-ink py-1 pr-3">field</th>
            <th className="border-b border-ink py-1 pr-3">you both found</th>
            <th className="border-b border-ink py-1 pr-3">yours</th>
            <th className="border-b border-ink py-1 pr-3">theirs</th>
            <th className="w-[138px] border-b border-ink py-1">keep</th>
          </tr>
        </thead>
        <tbody>
          {conflicts.map(({ path, base, yours, theirs }) => (
            <tr key={path} className="border-b border-rule align-baseline">
              <td className="py-1.5 pr-3">{words(path)}</td>
              <td className="py-1.5 pr-3 font-mono break-words text-muted">{valueText(base)}</td>
              <td className="py-1.5 pr-3 font-mono break-words">{valueText(yours)}</td>
              <td className="py-1.5 pr-3 font-mono break-words">{valueText(theirs)}</td>
              <td className="py-1.5">
                <Segmented<Choice | "open">
                  label={`Keep for ${words(path)}`}
                  value={choices[path] ?? "open"}
                  onChange={(choice) => choice !== "open" && setChoices((old) => ({ ...old, [path]: choice }))}
                  options={[
                    { value: "yours", label: "mine" },
                    { value: "theirs", label: "theirs" },
                  ]}
                />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </Dialog>
  );
}
