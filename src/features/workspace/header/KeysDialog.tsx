import { Dialog } from "../../../components/Dialog";
import { Row } from "../../../components/text";

const keys: readonly (readonly [string, string])[] = [
  ["Ctrl Z", "undo"],
  ["Ctrl Shift Z", "redo"],
  ["Ctrl S", "save a revision"],
  ["f", "all fields, or shut and open ground"],
  ["1 to 9", "focus on a metal, in the order of the list"],
  ["0 or Escape", "all metals again; the crosscuts back at the set point"],
  ["w", "the next window"],
  ["r", "revisions"],
  ["arrow keys, on the map", "move the cursor; with Shift five times as far"],
  ["Enter or a click, on the map", "pin the crosscuts there"],
  ["drag, on the map", "zoom in; with Shift move the map; a double click goes back to the frame"],
  [
    "drag, on the set point",
    "move it by hand; arrow keys while it has the focus do the same, with Shift five times as far",
  ],
  ["arrow keys, in a number", "step it; with Shift ten times as far"],
  ["?", "this list"],
];

export default function KeysDialog(props: { open: boolean; onOpenChange: (open: boolean) => void }) {
  return (
    <Dialog {...props} title="Keys" width={560}>
      {keys.map(([key, what]) => (
        <Row key={key} label={<span className="font-mono text-sm">{key}</span>}>
          <span className="font-sans">{what}</span>
        </Row>
      ))}
    </Dialog>
  );
}
