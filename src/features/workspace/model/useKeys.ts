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

/** A number field in which nothing is half typed: its own undo has nothing to take back. */
const atRest = (target: EventTarget | null): boolean =>
  target instanceof HTMLInputElement && target.role === "spinbutton" && target.dataset.typed === undefined;

/** Lets a field take what is typed in it, and then goes on; stays where that cannot be taken. */
function afterTaking(field: EventTarget | null, run: () => void): void {
  if (!(field instanceof HTMLElement) || !typing(field)) return run();
  field.blur();
  field.focus();
  setTimeout(() => field.getAttribute("aria-invalid") !== "true" && run());
}

/** Keys of a screen. A letter typed into a field is a letter; with Ctrl or Command undo goes to the plan unless something is half typed
 *  in a field, whose own undo is then meant, and save takes it first. Dialogs and menus keep the keyboard to themselves. */
export function useKeys(commands: readonly KeyCommand[]): void {
  const now = useRef(commands);
  useEffect(() => {
    now.current = commands;
  });
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.defaultPrevented || event.altKey) return;
      if (event.target instanceof HTMLElement && event.target.closest("[role=dialog],[role=menu],[role=listbox]"))
        return;
      const key = event.key.toLowerCase();
      const ctrl = event.ctrlKey || event.metaKey;
      const save = ctrl && key === "s";
      if (typing(event.target) && !save && !(ctrl && atRest(event.target))) return;
      const found = now.current.find(
        (c) => c.key === key && (c.ctrl ?? false) === ctrl && (c.shift === undefined || c.shift === event.shiftKey),
      );
      if (!found) return;
      event.preventDefault();
      if (save) afterTaking(event.target, () => now.current.find((c) => c.key === "s" && c.ctrl)?.run());
      else found.run();
    };
    window.addEventListener("keydown", onKey);
    return () => window.removeEventListener("keydown", onKey);
  }, []);
}
