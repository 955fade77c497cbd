import { useId, useRef, useState, type KeyboardEvent, type ReactNode } from "react";
import { classes } from "../lib/classes";
import { inputTextExact, outOfBounds, parseNumber, withUnit } from "../lib/format";
import { FieldFrame } from "./FieldFrame";

export interface NumberFieldProps {
  /** accessible name; also drawn unless `labelText` says otherwise */
  label: string;
  /** drawn instead of the label, for typeset formulas */
  labelText?: ReactNode;
  hideLabel?: boolean;
  value: number | null;
  /** called on Enter, on leaving the field and on arrow keys, with a number inside the bounds only */
  onCommit: (value: number) => void;
  /** allows the field to be empty */
  onClear?: () => void;
  unit?: string;
  /** what the number is, drawn where a number with a unit has that */
  noun?: string;
  min?: number;
  max?: number;
  /** a lower bound that is itself not allowed, such as 0 for an activity */
  above?: number;
  /** arrow keys add it; with Shift ten times as much */
  step?: number;
  /** arrow keys multiply by it instead, for quantities read on a log scale */
  factor?: number;
  /** how the number stands in the field */
  show?: (value: number) => string;
  /** explains the field; stands under it */
  hint?: ReactNode;
  /** a refusal that came from outside, such as the server's */
  error?: string | null;
  disabled?: boolean;
  /** the number as text, for those who may look but not change */
  readOnly?: boolean;
  /** "row": label left, number right (panels); "stacked": label above (forms); "bare": the input alone */
  layout?: "row" | "stacked" | "bare";
  /** width of the input in characters */
  width?: number;
  className?: string;
}

const tidy = (x: number) => Number(x.toPrecision(10));

/** A number with its unit. Takes decimal comma and point, 1e-5 and a true minus; keeps what was typed when it is wrong
 *  and says what is wrong with it; Escape brings the last good number back. */
export function NumberField(props: NumberFieldProps) {
  const { label, labelText, hideLabel, value, onCommit, onClear, unit, noun, min, max, above, hint, disabled } = props;
  const { step = 1, factor, show = inputTextExact, layout = "row", width = 9 } = props;
  const id = useId();
  const [draft, setDraft] = useState<string | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const input = useRef<HTMLInputElement>(null);
  const shown = value === null ? "" : show(value);
  const message = problem ?? props.error ?? null;

  if (props.readOnly) {
    return <ReadOnly {...props} text={value === null ? "none" : withUnit(show(value), unit)} />;
  }

  function settle() {
    setDraft(null);
    setProblem(null);
  }

  function commit(text: string) {
    if (text.trim() === "" && onClear) {
      settle();
      if (value !== null) onClear();
      return;
    }
    if (text === shown) return settle();
    const parsed = parseNumber(text);
    const wrong = parsed.ok ? outOfBounds(parsed.value, { min, max, above }, unit) : parsed.message;
    if (wrong !== null || !parsed.ok) return setProblem(wrong);
    settle();
    if (parsed.value !== value) onCommit(parsed.value);
  }

  function nudge(direction: 1 | -1, big: boolean) {
    const parsed = draft === null ? null : parseNumber(draft);
    const from = parsed?.ok ? parsed.value : (value ?? min ?? 0);
    const next = factor ? from * factor ** (direction * (big ? 10 : 1)) : from + direction * step * (big ? 10 : 1);
    const inside = tidy(Math.min(max ?? Infinity, Math.max(min ?? -Infinity, next)));
    if (above !== undefined && inside <= above) return;
    settle();
    if (inside !== value) onCommit(inside);
  }

  function onKeyDown(event: KeyboardEvent<HTMLInputElement>) {
    if (event.key === "Enter") {
      commit(event.currentTarget.value);
    } else if (event.key === "Escape" && draft !== null) {
      event.stopPropagation();
      settle();
    } else if (event.key === "ArrowUp" || event.key === "ArrowDown") {
      event.preventDefault();
      nudge(event.key === "ArrowUp" ? 1 : -1, event.shiftKey);
    }
  }

  const describedBy = [message && `${id}-wrong`, hint && `${id}-hint`].filter(Boolean).join(" ");
  const field = (
    <span className="inline-flex items-baseline gap-1 whitespace-nowrap">
      <input
        ref={input}
        id={id}
        type="text"
        inputMode="decimal"
        autoComplete="off"
        spellCheck={false}
        role="spinbutton"
        aria-label={label}
        aria-valuenow={value ?? undefined}
        aria-valuetext={value === null ? "empty" : withUnit(shown, unit)}
        aria-valuemin={min ?? above}
        aria-valuemax={max}
        aria-invalid={message !== null}
        aria-describedby={describedBy || undefined}
        disabled={disabled}
        value={draft ?? shown}
        data-typed={draft === null ? undefined : ""}
        onChange={(event) => setDraft(event.target.value)}
        onBlur={(event) => commit(event.target.value)}
        onFocus={(event) => event.target.select()}
        onKeyDown={onKeyDown}
        style={{ width: `${width}ch` }}
        className={classes(
          layout === "stacked" ? "h-8" : "h-6",
          "rounded-sm border bg-sheet px-1 text-right font-mono text-base disabled:opacity-60 pointer-coarse:min-h-11",
          message !== null ? "border-signal" : "border-rule hover:border-muted",
        )}
      />
      {(unit ?? noun) && <span className="font-mono text-base text-muted">{unit ?? noun}</span>}
    </span>
  );
  const below = (
    <>
      {message !== null && (
        <p id={`${id}-wrong`} role="alert" className="pt-0.5 text-sm text-signal">
          {message}
        </p>
      )}
      {hint && (
        <div id={`${id}-hint`} className="text-sm text-muted">
          {hint}
        </div>
      )}
    </>
  );

  if (layout === "bare" || hideLabel) {
    return (
      <span className={props.className}>
        {field}
        {below}
      </span>
    );
  }
  return (
    <FieldFrame {...{ id, layout, below }} label={labelText ?? label} className={props.className}>
      {field}
    </FieldFrame>
  );
}

function ReadOnly({ label, labelText, hint, layout = "row", text, className }: NumberFieldProps & { text: string }) {
  const number = <span className="font-mono whitespace-nowrap">{text}</span>;
  if (layout === "bare") return number;
  return (
    <div className={classes("hairline py-1", className)}>
      <div className="flex items-baseline justify-between gap-3">
        <span className="min-w-0">{labelText ?? label}</span>
        {number}
      </div>
      {hint && <div className="text-sm text-muted">{hint}</div>}
    </div>
  );
}
