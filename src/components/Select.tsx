import { Select as Radix } from "radix-ui";
import { useId, useState, type ReactNode } from "react";
import { classes } from "../lib/classes";

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

/** One of a list, with room for a line that says what each choice means. */
export function Select<Value extends string>(props: SelectProps<Value>) {
  const { label, labelText, value, onChange, options, placeholder, hint, error, disabled, layout = "row" } = props;
  const id = useId();
  const [open, setOpen] = useState(false);
  const chosen = options.find((option) => option.value === value);
  const control = props.readOnly ? (
    <span className="font-sans">{chosen?.label ?? "none"}</span>
  ) : (
    <Radix.Root
      value={value}
      onValueChange={(next) => onChange(next as Value)}
      open={open}
      onOpenChange={setOpen}
      disabled={disabled ?? false}
    >
      <Radix.Trigger
        id={id}
        aria-label={label}
        aria-invalid={Boolean(error)}
        data-cell={props.cell}
        className={classes(
          "inline-flex h-6 min-w-0 items-center font-sans justify-between gap-2 rounded-sm border bg-sheet px-2 text-left text-base disabled:opacity-60",
          layout === "stacked" && "h-8! w-full",
          error ? "border-signal" : "border-rule hover:border-muted",
        )}
      >
        <span className="truncate">
          <Radix.Value placeholder={placeholder ?? "choose"}>{chosen?.label}</Radix.Value>
        </span>
        <span aria-hidden className="font-mono text-xs text-muted">
          ▾
        </span>
      </Radix.Trigger>
      {/* closed, the list would still be drawn, out of sight, at every step of a drag elsewhere */}
      {open && (
        <Radix.Portal>
          <Radix.Content
            position="popper"
            sideOffset={2}
            className="z-50 max-h-[min(340px,var(--radix-select-content-available-height))] max-w-[420px] min-w-(--radix-select-trigger-width) border border-ink bg-paper text-base text-ink"
          >
            <Radix.Viewport className="py-1">
              {options.map((option) => (
                <Radix.Item
                  key={option.value}
                  value={option.value}
                  disabled={option.disabled ?? false}
                  {...(option.text === undefined ? {} : { textValue: option.text })}
                  className="cursor-pointer px-3 py-1 outline-none data-[disabled]:opacity-50 data-[highlighted]:bg-tint data-[state=checked]:font-bold"
                >
                  <Radix.ItemText>{option.label}</Radix.ItemText>
                  {option.note !== undefined && <div className="text-sm font-normal text-muted">{option.note}</div>}
                </Radix.Item>
              ))}
            </Radix.Viewport>
          </Radix.Content>
        </Radix.Portal>
      )}
    </Radix.Root>
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
  if (layout === "stacked") {
    return (
      <div className={props.className}>
        <label htmlFor={id} className="mb-1 block text-sm">
          {labelText ?? label}
        </label>
        {control}
        {below}
      </div>
    );
  }
  return (
    <div className={classes("hairline py-1", props.className)}>
      <div className="flex items-baseline justify-between gap-3">
        <label htmlFor={id} className="min-w-0">
          {labelText ?? label}
        </label>
        {control}
      </div>
      {below}
    </div>
  );
}
