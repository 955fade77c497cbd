import { Slot } from "radix-ui";
import { createContext, use, useEffect, useRef, useState, type ReactElement, type ReactNode } from "react";
import { classes } from "../lib/classes";
import type { MenuParts } from "./MenuList";
import { lateFailure, useLate } from "./useLate";

const loadList = () => import("./MenuList");

const item =
  "flex cursor-pointer items-baseline justify-between gap-6 px-3 py-1.5 pointer-coarse:min-h-11 pointer-coarse:items-center -outline-offset-2 data-[highlighted]:bg-tint data-[disabled]:cursor-not-allowed data-[disabled]:opacity-50";

export interface MenuProps {
  /** one button */
  trigger: ReactElement;
  children: ReactNode;
  align?: "start" | "end";
}

/** A list of commands under the word that opens it; the list is fetched when a hand comes near. */
export function Menu({ trigger, children, align = "end" }: MenuProps) {
  const button = useRef<HTMLElement>(null);
  const [byKeyboard, setByKeyboard] = useState(false);
  const { Part: List, failed, open, close, near } = useLate(loadList);

  // The open list has a trigger of its own; with it goes the focus.
  const wasOpen = useRef(false);
  useEffect(() => {
    if (wasOpen.current && !List) button.current?.focus({ preventScroll: true });
    wasOpen.current = List !== null;
  }, [List]);

  if (List)
    return (
      <List trigger={trigger} align={align} onClose={close} byKeyboard={byKeyboard}>
        {children}
      </List>
    );
  const ask = (keyboard: boolean) => {
    setByKeyboard(keyboard);
    open();
  };
  return (
    <Slot.Root
      ref={button}
      aria-haspopup="menu"
      aria-expanded={false}
      // a click without a count comes from Enter or the space bar
      onClick={(event) => ask(event.detail === 0)}
      onKeyDown={(event) => {
        if (event.key !== "ArrowDown") return;
        event.preventDefault();
        ask(true);
      }}
      {...near}
      {...(failed ? { title: lateFailure } : {})}
    >
      {trigger}
    </Slot.Root>
  );
}

/** What an open list is made of; it comes with the list. */
export const MenuPartsContext = createContext<MenuParts | null>(null);

function useParts(): MenuParts {
  const parts = use(MenuPartsContext);
  if (!parts) throw new Error("A menu's lines stand inside a Menu.");
  return parts;
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
  const { Item } = useParts();
  return (
    <Item className={classes(item, danger && "text-signal")} disabled={disabled ?? false} onSelect={onSelect}>
      <span>{children}</span>
      {note !== undefined && <span className="text-sm text-muted">{note}</span>}
    </Item>
  );
}

export function MenuLabel({ children }: { children: ReactNode }) {
  const { Label } = useParts();
  return <Label className="px-3 pt-2 pb-1 font-mono text-xs font-bold">{children}</Label>;
}

export function MenuSeparator() {
  const { Separator } = useParts();
  return <Separator className="my-1 h-px bg-rule" />;
}

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
  const { RadioGroup, RadioItem } = useParts();
  return (
    <RadioGroup value={value} onValueChange={(next) => onChange(next as Value)}>
      {options.map((option) => (
        <RadioItem
          key={option.value}
          value={option.value}
          className={classes(item, option.value === value && "font-bold")}
          onSelect={(event) => stays && event.preventDefault()}
        >
          <span>{option.label}</span>
          {option.value === value && <span className="text-sm font-normal text-verdigris">chosen</span>}
        </RadioItem>
      ))}
    </RadioGroup>
  );
}
