import type { RefObject } from "react";
import { Button } from "../../../components/Button";
import { Check } from "../../../components/choice";
import { MetalName } from "../../../components/MetalLine";
import PopoverSheet from "../../../components/PopoverSheet";
import { Note, SectionHead } from "../../../components/text";
import type { MapMetal } from "../../../map/view";
import type { SightInHand } from "../model/useSight";

interface MetalsSheetProps extends SightInHand {
  anchor: RefObject<HTMLElement | null>;
  onClose: () => void;
  metals: readonly MapMetal[];
}

/** Which metals the map draws: some hidden, or two compared. */
export default function MetalsSheet({ anchor, onClose, metals, sight, change }: MetalsSheetProps) {
  const hidden = new Set(sight.hidden);
  const pair = sight.pair;
  const elements = metals.map((m) => m.element);
  const [first = "", second = ""] = pair ?? elements;
  const compare = (a: string, b: string) =>
    change({ pair: a === b ? [a, elements.find((e) => e !== a) ?? b] : [a, b], focus: null });
  return (
    <PopoverSheet anchor={anchor} onClose={onClose} label="Metals on the map" align="end" className="w-72 px-4 py-3">
      <div>
        <SectionHead>Drawn on the map</SectionHead>
        <div className="grid grid-cols-2 gap-x-4">
          {metals.map((metal) => (
            <Check
              key={metal.element}
              label={`Draw ${metal.element}`}
              checked={!hidden.has(metal.element)}
              disabled={pair !== null || (!hidden.has(metal.element) && hidden.size === metals.length - 1)}
              onChange={(on) =>
                change({
                  hidden: on ? sight.hidden.filter((e) => e !== metal.element) : [...sight.hidden, metal.element],
                  ...(sight.focus === metal.element ? { focus: null } : {}),
                })
              }
            >
              <MetalName {...metal} />
            </Check>
          ))}
        </div>
        <Note className="pb-2">A metal that is not drawn counts in the windows all the same.</Note>
        {metals.length > 1 && (
          <>
            <SectionHead className="mt-1">Two compared</SectionHead>
            <div className="flex items-baseline gap-2 py-2">
              <Pick label="First metal" value={first} options={elements} onChange={(a) => compare(a, second)} />
              with
              <Pick label="Second metal" value={second} options={elements} onChange={(b) => compare(first, b)} />
              <span className="ml-auto">
                {pair ? (
                  <Button kind="quiet" className="h-auto!" onClick={() => change({ pair: null })}>
                    all metals
                  </Button>
                ) : (
                  <Button className="h-7!" onClick={() => compare(first, second)}>
                    Compare
                  </Button>
                )}
              </span>
            </div>
            <Note>Only these two are drawn, and every piece of ground names what both are there.</Note>
          </>
        )}
      </div>
    </PopoverSheet>
  );
}

/** A plain list of the browser's: it works by mouse, finger and keys inside a sheet that closes on a press outside. */
function Pick(props: { label: string; value: string; options: readonly string[]; onChange: (value: string) => void }) {
  return (
    <select
      aria-label={props.label}
      value={props.value}
      onChange={(event) => props.onChange(event.target.value)}
      className="h-7 border border-ink bg-sheet px-1 font-mono"
    >
      {props.options.map((option) => (
        <option key={option}>{option}</option>
      ))}
    </select>
  );
}
