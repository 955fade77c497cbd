/** Every key and gesture of the plan's screen: what the dialog shows, and what a test holds against the code. */
export const keyMap: readonly {
  readonly place: string;
  readonly keys: readonly (readonly [keys: string, what: string])[];
}[] = [
  {
    place: "Anywhere on the plan",
    keys: [
      ["Ctrl Z", "undo"],
      ["Ctrl Shift Z or Ctrl Y", "redo"],
      ["Ctrl S", "save a revision"],
      ["f", "all fields, or shut and open ground"],
      ["1 to 9", "focus on a metal, in the order of the list; again: all metals"],
      ["0 or Escape", "all metals again, nothing pinned; 0 draws hidden metals too"],
      ["w", "the next window"],
      ["r", "revisions"],
      ["c", "comments, and back to the answers"],
      ["l", "copy a link to what is seen, unsaved settings included"],
      ["?", "this list"],
    ],
  },
  {
    place: "On the map",
    keys: [
      ["arrow keys", "move the cursor; with Shift five times as far"],
      ["Enter or a click", "pin a second pair of crosscuts there; on a trial: open it"],
      ["a tap on a limit", "name it; the next tap, or Escape, lets it go"],
      ["+ and −", "zoom in and out round the cursor, or the set point"],
      ["Home", "the whole frame again"],
      ["two fingers", "zoom and move; one finger moves the map once it is zoomed"],
      ["wheel", "zoom at the pointer"],
      ["drag", "zoom in on a box; a double click, or “whole frame”, goes back"],
      ["Shift and drag", "move the map, as does “move”; where trials are shown: brush them"],
    ],
  },
  {
    place: "On the set point or a proposed trial",
    keys: [
      ["drag", "move it by hand"],
      ["arrow keys", "the same by keys; with Shift five times as far"],
    ],
  },
  {
    place: "In a number",
    keys: [
      ["up and down", "step it; with Shift ten times as far"],
      ["Enter", "take it; Escape brings the last good number back"],
    ],
  },
  {
    place: "In a table",
    keys: [
      ["up and down", "the row above or below"],
      ["Enter or a double click", "open the row"],
    ],
  },
];
