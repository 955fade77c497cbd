import { useEffect, useId, useRef, type KeyboardEvent, type ReactNode } from "react";
import { classes } from "../lib/classes";
import { FieldFrame } from "./FieldFrame";
import { lateFailure, useLate } from "./useLate";

const loadList = () => import("./SelectList");

export interface SelectOption<Value extends string> {
  value: Value;
  label: ReactNode;
  /** for type-ahead, where the label is not plain text */
  text?: string;
  /** quiet second line: what the choice means */
  note?: ReactNode;
  disabled?: boolean;
}

export interface SelectProps<Value extends string> {
  label: string;
  labelText?: ReactNode;
  value: Value | "";
  onChange: (value: Value) => void;
  options: readonly SelectOption<Value>[];
  placeholder?: string;
  hint?: ReactNode;
  error?: string | null;
  disabled?: boolean;
  readOnly?: boolean;
  layout?: "row" | "stacked" | "bare";
  /** its place in a grid, by which the grid's keys find it */
  cell?: string;
  className?: string;
}

const opensList = (event: KeyboardEvent) => event.key === "ArrowDown" || event.key === "ArrowUp";

/** One of a list, with room for a line that says what each choice means. Closed it is a button that says what is chosen; the list
 *  is fetched when a hand comes near. */
export function Select<Value extends string>(props: SelectProps<Value>) {
  const { label, labelText, value, onChange, options, placeholder, hint, disabled, layout = "row" } = props;
  const id = useId();
  const button = useRef<HTMLButtonElement>(null);
  const { Part: List, failed, open, close, near } = useLate(loadList);
  const error = props.error ?? (failed ? lateFailure : null);
  const chosen = options.find((option) => option.value === value);

  // The open list has a trigger of its own; with it goes the focus.
  const wasOpen = useRef(false);
  useEffect(() => {
    if (wasOpen.current && !List) button.current?.focus({ preventScroll: true });
    wasOpen.current = List !== null;
  }, [List]);

  const look = {
    id,
    type: "button",
    disabled: disabled ?? false,
    "aria-label": label,
    "aria-invalid": Boolean(error),
    "data-cell": props.cell,
    className: classes(
      "inline-flex h-6 pointer-coarse:min-h-11 min-w-0 items-center font-sans justify-between gap-2 rounded-sm border bg-sheet px-2 text-left text-base disabled:opacity-60",
      layout === "stacked" && "h-8! w-full",
      error ? "border-signal" : "border-rule hover:border-muted",
    ),
    children: (
      <>
        <span className="truncate">{chosen?.label ?? placeholder ?? "choose"}</span>
        <span aria-hidden className="font-mono text-xs text-muted">
          ▾
        </span>
      </>
    ),
  } as const;
  const control = props.readOnly ? (
    <span className="font-sans">{chosen?.label ?? "none"}</span>
  ) : List ? (
    <List
      trigger={<button {...look} />}
      value={value}
      onChange={(next) => onChange(next as Value)}
      options={options}
      onClose={close}
    />
  ) : (
    <button
      {...look}
      ref={button}
      role="combobox"
      aria-expanded={false}
      aria-haspopup="listbox"
      onClick={open}
      onKeyDown={(event) => {
        if (!opensList(event)) return;
        event.preventDefault();
        open();
      }}
      {...near}
    />
  );
  const below = (
    <>
      {error && (
        <p role="alert" className="pt-0.5 text-sm text-signal">
          {error}
        </p>
      )}
      {hint !== undefined && <div className="text-sm text-muted">{hint}</div>}
    </>
  );
  if (layout === "bare") return control;
  return (
    <FieldFrame {...{ id, layout, below }} label={labelText ?? label} className={props.className}>
      {control}
    </FieldFrame>
  );
}
