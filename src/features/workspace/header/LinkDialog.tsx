import { useEffect, useRef } from "react";
import { Button } from "../../../components/Button";
import { Dialog } from "../../../components/Dialog";
import { Note } from "../../../components/text";

/** The link itself, where the browser does not let a page copy it. */
export default function LinkDialog({ link, onClose }: { link: string; onClose: () => void }) {
  const field = useRef<HTMLTextAreaElement>(null);
  useEffect(() => field.current?.select(), []);
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Link to what is seen"
      width={620}
      footer={
        <Button kind="primary" onClick={onClose}>
          Done
        </Button>
      }
    >
      <textarea
        ref={field}
        readOnly
        rows={5}
        aria-label="Link"
        value={link}
        onFocus={(event) => event.target.select()}
        className="w-full border border-rule bg-sheet p-2 font-mono text-sm break-all"
      />
      <Note className="mt-1">This browser does not let the page copy it: press Ctrl C.</Note>
    </Dialog>
  );
}
