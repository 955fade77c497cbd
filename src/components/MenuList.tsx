import { DropdownMenu } from "radix-ui";
import { useRef, type ReactElement, type ReactNode } from "react";
import { MenuPartsContext } from "./Menu";

const { Item, Label, Separator, RadioGroup, RadioItem } = DropdownMenu;
const parts = { Item, Label, Separator, RadioGroup, RadioItem };
export type MenuParts = typeof parts;

export interface MenuListProps {
  /** stands where the closed control stood */
  trigger: ReactElement;
  align: "start" | "end";
  /** opened by a key: the first line has the focus */
  byKeyboard: boolean;
  onClose: () => void;
  children: ReactNode;
}

/** The open list of a Menu. */
export default function MenuList({ trigger, align, byKeyboard, onClose, children }: MenuListProps) {
  const entered = useRef(!byKeyboard);
  return (
    // A menu is no dialog: the page behind it stays in reach of screen readers, and of the pointer.
    <DropdownMenu.Root modal={false} open onOpenChange={(open) => !open && onClose()}>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align={align}
          sideOffset={4}
          // Radix looks for the key that opened a menu from the moment the menu is there, and this key came before.
          onFocus={({ currentTarget }) => {
            if (entered.current) return;
            entered.current = true;
            currentTarget.querySelector<HTMLElement>("[role^=menuitem]:not([data-disabled])")?.focus();
          }}
          className="z-50 max-h-[80vh] min-w-48 overflow-y-auto border border-ink bg-paper py-1 text-base text-ink"
        >
          <MenuPartsContext value={parts}>{children}</MenuPartsContext>
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}
