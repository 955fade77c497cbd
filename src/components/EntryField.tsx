import { useId, useState, type ReactNode } from "react";
import { quantities, unitsOf, type QuantityName } from "../../shared/entry/quantities";
import { readEntry, type Entry } from "../../shared/entry/readEntry";
import { refusalOf } from "../../shared/schemas/entry";
import { afterPress } from "../lib/afterPress";
import { classes } from "../lib/classes";
import { unitText } from "../lib/units";
import { UnitSelect } from "./UnitSelect";

export interface EntryFieldProps {
  label: string;
  /** drawn instead of the label */
  labelText?: ReactNode;
  quantity: QuantityName;
  value: Entry;
  /** every keystroke: the text is the record, and stays as it was typed */
  onChange: (entry: Entry) => void;
  /** a refusal that came from elsewhere; stands at once, not only after leaving the field */
  error?: string | null | undefined;
  hint?: ReactNode;
  readOnly?: boolean;
  /** said of an empty one that cannot be typed in */
  emptyText?: string;
  /** of the input, in characters */
  width?: number;
  className?: string;
}

/** A number as it is typed at a bench, with its unit: "<0.01", decimal comma, nothing at all. The text is kept, never rounded or
 *  converted; what it cannot be is said beside it. */
export function EntryField(props: EntryFieldProps) {
  const { label, labelText, quantity, value, onChange, hint, readOnly = false, width = 9, className } = props;
  const { emptyText = "not measured" } = props;
  const id = useId();
  const [left, setLeft] = useState(true);
  const message = props.error ?? (left ? refusalOf(value, quantity) : null);
  const censored = censoredWords(value, quantity);
  if (readOnly) {
    return (
      <div className={classes("hairline flex items-baseline justify-between gap-3 py-1", className)}>
        <span className="min-w-0">{labelText ?? label}</span>
        <span className="font-mono whitespace-nowrap">
          {value.text.trim() === "" ? (
            <span className="font-sans text-muted">{emptyText}</span>
          ) : (
            `${value.text} ${unitText(value.unit)}`
          )}
        </span>
      </div>
    );
  }
  return (
    <div className={classes("hairline py-1", className)}>
      <div className="flex items-baseline justify-between gap-3">
        <label htmlFor={id} className="min-w-0">
          {labelText ?? label}
        </label>
        <span className="inline-flex shrink-0 items-baseline gap-1 whitespace-nowrap">
          <input
            id={id}
            type="text"
            inputMode={quantities[quantity].censored ? "text" : "decimal"}
            autoComplete="off"
            spellCheck={false}
            value={value.text}
            aria-invalid={message !== null}
            aria-describedby={message === null ? undefined : `${id}-wrong`}
            onChange={(event) => onChange({ ...value, text: event.target.value })}
            onFocus={(event) => {
              setLeft(false);
              event.target.select();
            }}
            onBlur={() => afterPress(() => setLeft(true))}
            style={{ width: `${width}ch` }}
            className={classes(
              "h-6 rounded-sm border bg-sheet px-1 text-right font-mono text-base pointer-coarse:h-9",
              message === null ? "border-rule hover:border-muted" : "border-signal",
            )}
          />
          <span className="inline-flex w-19">
            <UnitSelect
              label={`Unit of ${label}`}
              units={unitsOf(quantity)}
              value={value.unit}
              onChange={(unit) => onChange({ ...value, unit })}
            />
          </span>
        </span>
      </div>
      {message !== null && (
        <p id={`${id}-wrong`} role="alert" className="pt-0.5 text-sm text-signal">
          {message}
        </p>
      )}
      {censored !== null && <p className="text-sm text-muted">{censored}</p>}
      {hint !== undefined && <div className="text-sm text-muted">{hint}</div>}
    </div>
  );
}

/** What a "<" or ">" is kept as. */
function censoredWords(entry: Entry, quantity: QuantityName): string | null {
  const read = readEntry(entry.text);
  if (!quantities[quantity].censored || (read.kind !== "less" && read.kind !== "more")) return null;
  const limit = `${read.limit} ${unitText(entry.unit)}`;
  return read.kind === "less" ? `kept as anything from 0 to ${limit}` : `kept as ${limit} or more`;
}
