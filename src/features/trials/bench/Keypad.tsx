import { classes } from "../../../lib/classes";

const keys = ["7", "8", "9", "4", "5", "6", "1", "2", "3", "-", "0", "."] as const;
const face =
  "flex min-h-[64px] items-center justify-center rounded-sm border border-ink bg-sheet font-mono text-[32px] leading-none select-none active:bg-tint";

/** Big keys for gloved hands. They type into the field in hand and never take the focus from it. */
export function Keypad({
  onKey,
  onNext,
  className,
}: {
  onKey: (key: string) => void;
  onNext: () => void;
  className?: string;
}) {
  const press = (run: () => void) => ({
    type: "button" as const,
    // The field keeps the focus, so that a keyboard goes on typing where one was.
    onPointerDown: (event: { preventDefault: () => void }) => event.preventDefault(),
    onClick: run,
  });
  return (
    <div role="group" aria-label="Keypad" className={classes("grid grid-cols-3 gap-2", className)}>
      {keys.map((key) => (
        <button
          key={key}
          {...press(() => onKey(key))}
          className={face}
          aria-label={key === "-" ? "minus" : key === "." ? "point" : key}
        >
          {key === "-" ? "\u2212" : key}
        </button>
      ))}
      <button {...press(() => onKey("delete"))} className={`${face} font-sans! text-lg!`}>
        Delete
      </button>
      <button {...press(onNext)} className={`${face} col-span-2 font-sans! text-lg!`}>
        Next field
      </button>
    </div>
  );
}
