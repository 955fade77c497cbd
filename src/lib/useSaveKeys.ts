import { useEffect, useRef } from "react";

/** Ctrl+S saves wherever one stands; Ctrl+Z and Ctrl+Shift+Z step back and forth through the whole record, also from inside a
 *  field, where they would else only undo its letters. A dialog keeps the keyboard to itself. */
export function useSaveKeys(keys: { save: () => void; undo: () => void; redo: () => void }, enabled = true): void {
  const now = useRef(keys);
  useEffect(() => {
    now.current = keys;
  });
  useEffect(() => {
    if (!enabled) return;
    const onKey = (event: KeyboardEvent) => {
      if (event.altKey || !(event.ctrlKey || event.metaKey)) return;
      if (event.target instanceof HTMLElement && event.target.closest("[role=dialog]")) return;
      const key = event.key.toLowerCase();
      const run =
        key === "s"
          ? now.current.save
          : key === "y" || (key === "z" && event.shiftKey)
            ? now.current.redo
            : key === "z"
              ? now.current.undo
              : null;
      if (!run) return;
      event.preventDefault();
      run();
    };
    window.addEventListener("keydown", onKey);
    return () => window.removeEventListener("keydown", onKey);
  }, [enabled]);
}
