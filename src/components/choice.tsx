import { Tabs as RadixTabs, ToggleGroup } from "radix-ui";
import { useId, type ReactNode } from "react";
import { classes } from "../lib/classes";

export interface Choice<Value extends string> {
  value: Value;
  label: ReactNode;
  disabled?: boolean;
  title?: string;
}

/** A few choices side by side; one always holds. Arrow keys move along. */
export function Segmented<Value extends string>({
  label,
  value,
  onChange,
  options,
  disabled = false,
  className,
}: {
  label: string;
  value: Value;
  onChange: (value: Value) => void;
  options: readonly Choice<Value>[];
  disabled?: boolean;
  className?: string;
}) {
  return (
    <ToggleGroup.Root
      type="single"
      aria-label={label}
      value={value}
      disabled={disabled}
      onValueChange={(next) => next !== "" && onChange(next as Value)}
      className={classes("inline-flex rounded-sm border border-ink font-sans", className)}
    >
      {options.map((option) => (
        <ToggleGroup.Item
          key={option.value}
          value={option.value}
          disabled={option.disabled ?? false}
          title={option.title}
          className="h-6 pointer-coarse:min-h-11 pointer-coarse:min-w-11 border-l border-ink px-2 text-sm whitespace-nowrap first:border-l-0 hover:bg-tint focus-visible:z-10 disabled:opacity-50 data-[state=on]:bg-ink data-[state=on]:font-bold data-[state=on]:text-paper"
        >
          {option.label}
        </ToggleGroup.Item>
      ))}
    </ToggleGroup.Root>
  );
}

/** Panels behind a row of words; the word in force is underlined. */
export function Tabs<Value extends string>({
  label,
  value,
  onChange,
  panels,
  className,
}: {
  label: string;
  value: Value;
  onChange: (value: Value) => void;
  /** `fill`: the panel takes the height that is left and scrolls inside itself */
  panels: readonly (Choice<Value> & { content: ReactNode; fill?: boolean })[];
  className?: string;
}) {
  return (
    <RadixTabs.Root value={value} onValueChange={(next) => onChange(next as Value)} className={className}>
      <RadixTabs.List aria-label={label} className="flex gap-5 border-b border-ink">
        {panels.map((panel) => (
          <RadixTabs.Trigger
            key={panel.value}
            value={panel.value}
            disabled={panel.disabled ?? false}
            className="-mb-px border-b-[3px] border-transparent px-0 py-1 text-sm whitespace-nowrap pointer-coarse:min-h-11 pointer-coarse:min-w-11 data-[state=active]:border-verdigris data-[state=active]:font-bold"
          >
            {panel.label}
          </RadixTabs.Trigger>
        ))}
      </RadixTabs.List>
      {panels.map((panel) => (
        <RadixTabs.Content
          key={panel.value}
          value={panel.value}
          className={classes(
            "pt-3 outline-offset-4",
            panel.fill && "min-h-0 flex-1 data-[state=active]:flex data-[state=active]:flex-col",
          )}
        >
          {panel.content}
        </RadixTabs.Content>
      ))}
    </RadixTabs.Root>
  );
}

/** A box to tick, with its words. */
export function Check({
  label,
  children,
  checked,
  onChange,
  disabled = false,
  hint,
}: {
  /** accessible name where the children are not plain text */
  label?: string;
  children: ReactNode;
  checked: boolean;
  onChange: (checked: boolean) => void;
  disabled?: boolean;
  hint?: ReactNode;
}) {
  const id = useId();
  return (
    <div className="py-1 pointer-coarse:py-0">
      <div className="flex items-baseline gap-2 pointer-coarse:items-center pointer-coarse:gap-0">
        <input
          id={id}
          type="checkbox"
          aria-label={label}
          checked={checked}
          disabled={disabled}
          onChange={(event) => onChange(event.target.checked)}
          className="relative top-0.5 h-3.5 w-3.5 shrink-0 pointer-coarse:top-0 accent-verdigris pointer-coarse:h-5 pointer-coarse:w-5"
        />
        <label htmlFor={id} className="min-w-0 pointer-coarse:py-3 pointer-coarse:pl-3">
          {children}
        </label>
      </div>
      {hint !== undefined && <div className="pl-5.5 text-sm text-muted">{hint}</div>}
    </div>
  );
}
