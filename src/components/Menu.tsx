import { DropdownMenu } from "radix-ui";
import type { ReactNode } from "react";
import { classes } from "../lib/classes";

const item =
  "flex cursor-pointer items-baseline justify-between gap-6 px-3 py-1.5 outline-none data-[highlighted]:bg-tint data-[disabled]:cursor-not-allowed data-[disabled]:opacity-50";

/** A list of commands under the word that opens it. `trigger` is one focusable element. */
export function Menu({
  trigger,
  children,
  align = "end",
}: {
  trigger: ReactNode;
  children: ReactNode;
  align?: "start" | "end";
}) {
  return (
    <DropdownMenu.Root>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align={align}
          sideOffset={4}
          className="z-50 max-h-[80vh] min-w-48 overflow-y-auto border border-ink bg-paper py-1 text-base text-ink"
        >
          {children}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}

export function MenuItem({
  children,
  onSelect,
  disabled,
  note,
  danger = false,
}: {
  children: ReactNode;
  onSelect: () => void;
  disabled?: boolean;
  /** quiet text at the right: a key, a count */
  note?: ReactNode;
  danger?: boolean;
}) {
  return (
    <DropdownMenu.Item className={classes(item, danger && "text-signal")} disabled={disabled} onSelect={onSelect}>
      <span>{children}</span>
      {note !== undefined && <span className="text-sm text-muted">{note}</span>}
    </DropdownMenu.Item>
  );
}

export function MenuLabel({ children }: { children: ReactNode }) {
  return <DropdownMenu.Label className="px-3 pt-2 pb-1 font-mono text-xs font-bold">{children}</DropdownMenu.Label>;
}

export const MenuSeparator = () => <DropdownMenu.Separator className="my-1 h-px bg-rule" />;

/** One of several; the chosen one says so in words. */
export function MenuChoice<Value extends string>({
  value,
  onChange,
  options,
  stays = false,
}: {
  value: Value;
  onChange: (value: Value) => void;
  /** the menu stays open, so that one sees what the choice does */
  stays?: boolean;
  options: readonly { value: Value; label: ReactNode }[];
}) {
  return (
    <DropdownMenu.RadioGroup value={value} onValueChange={(next) => onChange(next as Value)}>
      {options.map((option) => (
        <DropdownMenu.RadioItem
          key={option.value}
          value={option.value}
          className={classes(item, option.value === value && "font-bold")}
          onSelect={(event) => stays && event.preventDefault()}
        >
          <span>{option.label}</span>
          {option.value === value && <span className="text-sm font-normal text-verdigris">chosen</span>}
        </DropdownMenu.RadioItem>
      ))}
    </DropdownMenu.RadioGroup>
  );
}
