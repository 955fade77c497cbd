import { Dialog } from "../../../components/Dialog";
import { Row, SectionHead } from "../../../components/text";
import { keyMap } from "./keyMap";

export default function KeysDialog(props: { open: boolean; onOpenChange: (open: boolean) => void }) {
  return (
    <Dialog {...props} title="Keys" width={600} toRead>
      {keyMap.map(({ place, keys }) => (
        <section key={place} aria-label={place} className="pb-4 last:pb-0">
          <SectionHead level={3}>{place}</SectionHead>
          {keys.map(([key, what]) => (
            <Row key={key} label={<span className="font-mono text-sm">{key}</span>}>
              <span className="font-sans">{what}</span>
            </Row>
          ))}
        </section>
      ))}
    </Dialog>
  );
}
