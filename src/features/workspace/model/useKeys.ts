import { useEffect, useRef } from "react";

export interface KeyCommand {
  /** as KeyboardEvent.key gives it, lower case */
  key: string;
  ctrl?: boolean;
  shift?: boolean;
  run: () => void;
}

const typing = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement &&
  (target.isContentEditable || ["INPUT", "TEXTAREA", "SELECT"].includes(target.tagName)) &&
  !(target instanceof HTMLInputElement && target.type === "checkbox");

/** Keys of a screen. A letter typed into a field is a letter; with Ctrl or Command undo goes to the plan unless a field has the
 *  focus, whose own undo is then meant. Dialogs and menus keep the keyboard to themselves. */
export function useKeys(commands: readonly KeyCommand[]): void {
  const now = useRef(commands);
  useEffect(() => {
    now.current = commands;
  });
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.defaultPrevented || event.altKey || typing(event.target)) return;
      if (event.target instanceof HTMLElement && event.target.closest("[role=dialog],[role=menu],[role=listbox]"))
        return;
      const key = event.key.toLowerCase();
      const ctrl = event.ctrlKey || event.metaKey;
      const found = now.current.find(
        (c) => c.key === key && (c.ctrl ?? false) === ctrl && (c.shift === undefined || c.shift === event.shiftKey),
      );
      if (!found) return;
      event.preventDefault();
      found.run();
    };
    window.addEventListener("keydown", onKey);
    return () => window.removeEventListener("keydown", onKey);
  }, []);
}
