import { glossary } from "../lib/glossary";
import type { GlossaryWord } from "../lib/glossaryTitles";
import PopoverSheet, { type PopoverSheetProps } from "./PopoverSheet";

/** What a word means, or what is said of it here. */
export default function HelpSheet({
  title,
  word,
  children,
  ...sheet
}: PopoverSheetProps & { title: string; word?: GlossaryWord }) {
  return (
    <PopoverSheet {...sheet}>
      <p className="mb-1 font-mono text-sm font-bold">{title}</p>
      <div className="space-y-2 text-sm">
        {word === undefined ? children : glossary[word].map((paragraph) => <p key={paragraph}>{paragraph}</p>)}
      </div>
    </PopoverSheet>
  );
}
