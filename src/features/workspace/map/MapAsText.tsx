import { useMemo } from "react";
import { FormulaText } from "../../../components/FormulaText";
import { useRested } from "../../../lib/useRested";
import { mapText } from "./mapText";

/** The words may come so long after the map, ms. */
const WORDS_AFTER = 250;

/** What the map shows, in words: always there for a reader who does not see it, and on wish for everybody. */
export function MapAsText({ id, open, asked }: { id: string; open: boolean; asked: Parameters<typeof mapText>[0] }) {
  const rested = useRested(asked, WORDS_AFTER);
  const parts = useMemo(() => mapText(rested), [rested]);
  return (
    <div
      id={id}
      data-testid="map-as-text"
      {...(open ? { tabIndex: 0, role: "region", "aria-label": "The map as text" } : {})}
      className={
        open
          ? "absolute inset-x-2 top-1 bottom-2 z-20 overflow-y-auto border border-ink bg-sheet px-4 py-3 text-sm xl:columns-2 xl:gap-8"
          : "sr-only"
      }
    >
      {parts.map(({ heading, sentences }) => (
        <div key={heading} className="mb-2 break-inside-avoid-column">
          <p className="font-mono font-bold">{heading}</p>
          {sentences.map((sentence) => (
            <p key={sentence}>{open ? <FormulaText text={sentence} /> : sentence}</p>
          ))}
        </div>
      ))}
    </div>
  );
}
