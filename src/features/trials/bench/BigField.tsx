import type { ReactNode } from "react";
import { classes } from "../../../lib/classes";
import type { Said } from "./benchModel";

const toneClass = { good: "text-verdigris", bad: "font-bold text-signal", quiet: "text-muted" } as const;

/** One number to read across the bench: label, big digits, and a sentence under it. The tablet's own keyboard stays away. */
export function BigField({
  name,
  label,
  aside,
  unit,
  value,
  onChange,
  onFocus,
  onEnter,
  active,
  said,
  error,
  placeholder,
  children,
}: {
  name: string;
  label: string;
  /** what it is read with: probe, temperature */
  aside?: ReactNode;
  unit?: string;
  value: string;
  onChange: (text: string) => void;
  onFocus: () => void;
  onEnter: () => void;
  active: boolean;
  said?: readonly (Said | null)[];
  error?: string | undefined;
  placeholder?: string;
  children?: ReactNode;
}) {
  return (
    <div
      className={classes(
        "border bg-sheet px-4 py-2",
        error !== undefined
          ? "border-signal"
          : active
            ? "border-verdigris outline-2 -outline-offset-2 outline-verdigris"
            : "border-rule",
      )}
    >
      <label className="block">
        <span className="flex items-baseline justify-between gap-3 text-base">
          <span>{label}</span>
          <span className="text-sm text-muted">{aside}</span>
        </span>
        <span className="flex items-baseline gap-2">
          <input
            data-bench={name}
            type="text"
            inputMode="none"
            autoComplete="off"
            spellCheck={false}
            aria-invalid={error !== undefined}
            placeholder={placeholder}
            value={value}
            onChange={(event) => onChange(event.target.value)}
            onFocus={onFocus}
            onKeyDown={(event) => {
              if (event.key !== "Enter") return;
              event.preventDefault();
              onEnter();
            }}
            className="h-[56px] w-full min-w-0 border-0 bg-transparent p-0 font-mono text-[38px] leading-none font-bold outline-none placeholder:font-normal placeholder:text-muted/60"
          />
          {unit !== undefined && <span className="font-mono text-lg text-muted">{unit}</span>}
        </span>
      </label>
      {error !== undefined && (
        <p role="alert" className="text-base font-bold text-signal">
          {error}
        </p>
      )}
      {said?.map(
        (sentence) =>
          sentence && (
            <p key={sentence.text} className={classes("text-base", toneClass[sentence.tone])}>
              {sentence.text}
            </p>
          ),
      )}
      {children}
    </div>
  );
}

/** A choice with a target for a gloved hand. */
export function BigButton({
  children,
  onClick,
  pressed,
  disabled,
  primary = false,
  className,
}: {
  children: ReactNode;
  onClick: () => void;
  pressed?: boolean;
  disabled?: boolean;
  primary?: boolean;
  className?: string;
}) {
  return (
    <button
      type="button"
      aria-pressed={pressed}
      disabled={disabled}
      onClick={onClick}
      className={classes(
        "min-h-14 rounded-sm border px-4 text-lg font-bold disabled:opacity-50",
        primary
          ? "border-verdigris bg-verdigris text-paper"
          : pressed
            ? "border-ink bg-ink text-paper"
            : "border-ink bg-transparent hover:bg-tint",
        className,
      )}
    >
      {children}
    </button>
  );
}
